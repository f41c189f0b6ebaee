import type { BenchContext } from '../BenchContext';
import type { BenchLine, Measurement } from '../benchLine';
import { median, spread } from '../statistics';
import { expressEcho, metered, rawHttp, stockFull, unchanged, type Target } from './targets';

const CONNECTIONS = 32;
const WARM_UP_S = 2;
const ROUNDS = 9;
const ROUND_S = 1;

interface Comparison {
  readonly name: string;
  readonly goal: string;
  readonly unit: string;
  /** The line is this target's rate over that one's. */
  readonly over: readonly [string, string];
}

const targets: Record<string, (context: BenchContext) => Promise<Target>> = {
  raw: rawHttp,
  metered,
  echo: expressEcho,
  unchanged,
  stock: stockFull,
};

const comparisons: readonly Comparison[] = [
  { name: 'metered-vs-stock-full', over: ['metered', 'stock'], unit: '×', goal: '≥ 7' },
  { name: 'metered-vs-express-echo', over: ['metered', 'echo'], unit: '×', goal: '≥ 3' },
  { name: 'metered-vs-raw-http', over: ['metered', 'raw'], unit: '×', goal: '≥ 0.33' },
  { name: 'get-304-vs-post', over: ['unchanged', 'metered'], unit: '×', goal: '≥ 1.05' },
];
const MEMORY = 'memory-at-load';

/** Runs all targets in turn, round after round, so that what slows the machine for a while slows them all. */
async function interleaved(
  context: BenchContext,
  asked: readonly (readonly [string, Target])[],
): Promise<Map<string, number[]>> {
  const rates = new Map<string, number[]>(asked.map(([name]) => [name, []]));
  for (const [, target] of asked)
    await context.load({ ...target, connections: CONNECTIONS, seconds: WARM_UP_S });
  for (let round = 0; round < ROUNDS; round += 1) {
    for (const [name, target] of asked) {
      const { perSecond } = await context.load({ ...target, connections: CONNECTIONS, seconds: ROUND_S });
      rates.get(name)?.push(perSecond);
    }
  }
  return rates;
}

function compared(
  { name, over: [one, other], unit, goal }: Comparison,
  rates: Map<string, number[]>,
): BenchLine {
  const below = rates.get(other) ?? [];
  const ratios = (rates.get(one) ?? []).map((rate, round) => rate / (below[round] ?? Number.NaN));
  return { name, value: median(ratios), unit, goal };
}

/** Requests a second over 32 connections, as ratios within each round. */
export const throughput: Measurement<BenchContext> = {
  names: [...comparisons.map(({ name }) => name), MEMORY],
  async measure(context, wanted) {
    const chosen = comparisons.filter(({ name }) => wanted.includes(name));
    const needed = new Set(['metered', ...chosen.flatMap(({ over }) => over)]);
    const asked: [string, Target][] = [];
    for (const [name, target] of Object.entries(targets))
      if (needed.has(name)) asked.push([name, await target(context)]);
    const rates = await interleaved(context, asked);
    for (const [name, values] of rates) context.note(`${name}: ${spread(values, 0)} requests/s`);
    const memory = (await context.service()).peakMemoryMb();
    return [
      ...chosen.map((comparison) => compared(comparison, rates)),
      { name: MEMORY, value: memory, unit: 'MB', goal: '< 200' },
    ];
  },
};
