import { z } from 'zod';
import { tableFault, type ReciprocityPair } from '../math/reciprocity';
import { contradictionAt, type FoundContradiction } from './contradictionAt';
import { number } from './quantities';

const pair = z.strictObject({
  meteredS: number({ title: 'Metered time', unit: 's', min: 1e-6, max: 86_400 }),
  correctedS: number({ title: 'Time to expose', unit: 's', min: 1e-6, max: 1_000_000 }),
});

function faultsOf(table: readonly ReciprocityPair[]): FoundContradiction[] {
  const fault = tableFault(table);
  if (!fault || fault.kind === 'empty') return [];
  const given = table[fault.index];
  const before = table[fault.index - 1];
  if (fault.kind === 'shorter') {
    return [{ code: 'pair_shortens', path: [fault.index, 'correctedS'], params: { ...given } }];
  }
  const name = given && before && given.meteredS > before.meteredS ? 'correctedS' : 'meteredS';
  const params = { given: given?.[name], before: before?.[name] };
  return [{ code: 'pairs_not_rising', path: [fault.index, name], params }];
}

/** A film's table of metered times and the times to expose for them, both rising, none getting shorter. */
export const reciprocityTableIn = () =>
  contradictionAt<z.ZodArray<typeof pair>>(faultsOf)(z.array(pair).min(1).max(50));
