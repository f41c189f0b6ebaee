import { loadCalculators } from '../../../shared/calculators';
import { answerFor, parseInput } from '../../../shared/contract/defineCalculator';
import { mixedCalls } from '../mixedCalls';
import type { RunningPart } from './runPart';

const MEASURED_MS = 1_500;

/** The same calculations without a service: JSON in, input parsed, answered, JSON out, as often as one core can. */
export async function calculatorLoop({ count }: { count: number }): Promise<RunningPart> {
  const byId = new Map((await loadCalculators()).map((calculator) => [calculator.id, calculator]));
  const body = JSON.stringify({ calls: await mixedCalls(count) });
  const now = new Date(0);

  function once(): number {
    const { calls } = JSON.parse(body) as { calls: { calculator: string; input: unknown }[] };
    const results = calls.map(({ calculator, input }) => {
      const one = byId.get(calculator);
      const parsed = one && parseInput(one, input);
      if (!one || !parsed || 'faults' in parsed) throw new Error(`${calculator} refused its own example`);
      return answerFor(one, parsed.input, { now });
    });
    return JSON.stringify(results).length;
  }

  const answer = () => {
    const from = performance.now();
    let rounds = 0;
    while (performance.now() - from < MEASURED_MS) {
      if (once() === 0) throw new Error('nothing came out');
      rounds += 1;
    }
    return (rounds * count) / ((performance.now() - from) / 1000);
  };
  return { ready: true, answer };
}
