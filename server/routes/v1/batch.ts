import { z } from 'zod';
import { answerFor, parseInput, type AnyCalculator } from '../../../shared/contract/defineCalculator';
import { describeFields } from '../../../shared/contract/describeFields';
import { faultsOf } from '../../../shared/contract/faults';
import { problemOf, type Problem } from '../../../shared/contract/problems';
import type { Call } from '../../http/Call';
import { invalidInput } from './invalidInput';
import type { Operation, Prepared } from './operation';

const BODY_LIMIT = 2 * 1024 * 1024;
const BATCH_MAX = 1_000;
/** The event loop is given back this often, so that a batch holds up nobody. */
const SLICE_MS = 10;

const batchSchema = z.strictObject({
  calls: z
    .array(
      z.strictObject({
        calculator: z.string().meta({ title: 'Calculator' }),
        input: z.unknown().meta({ title: 'Input' }),
      }),
    )
    .min(1)
    .max(BATCH_MAX)
    .meta({ title: 'Calls' }),
});
const batchFields = describeFields(batchSchema);

interface BatchDependencies {
  readonly calculators: readonly AnyCalculator[];
  readonly publicUrl: string;
  readonly now: () => Date;
}

type Item = { readonly calculator: AnyCalculator; readonly input: unknown } | { readonly problem: Problem };

/** Walks through a list and lets the event loop turn every 10 ms. */
async function inSlices<T, R>(items: readonly T[], step: (item: T) => R): Promise<R[]> {
  const results: R[] = [];
  let until = performance.now() + SLICE_MS;
  for (const item of items) {
    results.push(step(item));
    if (performance.now() < until) continue;
    await new Promise((resolve) => setImmediate(resolve));
    until = performance.now() + SLICE_MS;
  }
  return results;
}

/**
 * Several calls at once: all units together or none, each item with its own status, in order. An item at fault
 * fails alone and costs nothing; its problem is the one that the single call would get.
 */
export function batchOperation({ calculators, publicUrl, now }: BatchDependencies): Operation {
  const byId = new Map(calculators.map((calculator) => [calculator.id, calculator]));

  const itemOf = (id: string, input: unknown, call: Call): Item => {
    const calculator = byId.get(id);
    const told = { publicUrl, requestId: call.requestId };
    if (!calculator) {
      const detail = `There is no calculator ${JSON.stringify(id.slice(0, 60))}; /v1/calculators lists them.`;
      return { problem: problemOf('not_found', { ...told, detail }) };
    }
    const parsed = parseInput(calculator, input);
    if (!('faults' in parsed)) return { calculator, input: parsed.input };
    const { detail, errors } = invalidInput(parsed.faults);
    return { problem: problemOf('invalid_input', { ...told, detail, errors }) };
  };

  const prepare = async (body: unknown, call: Call): Promise<Prepared> => {
    const parsed = batchSchema.safeParse(body);
    if (!parsed.success) {
      const problem = invalidInput(faultsOf(parsed.error.issues, batchFields, body));
      return { units: 0, needs: ['batch'], problem, answer: () => null };
    }
    const items = await inSlices(parsed.data.calls, ({ calculator, input }) =>
      itemOf(calculator, input, call),
    );
    const good = items.flatMap((item) => ('problem' in item ? [] : [item.calculator]));
    const answer = async () => {
      const moment = now();
      const results = await inSlices(items, (item) =>
        'problem' in item
          ? { status: item.problem.status, problem: item.problem }
          : { status: 200, ...answerFor(item.calculator, item.input, { now: moment }) },
      );
      return { results };
    };
    const units = good.reduce((sum, calculator) => sum + calculator.units, 0);
    return { units, needs: ['batch', ...new Set(good.map(({ id }) => id))], answer };
  };

  return {
    method: 'POST',
    path: '/v1/batch',
    name: 'batch',
    access: 'key',
    bodyLimit: BODY_LIMIT,
    prepare,
  };
}
