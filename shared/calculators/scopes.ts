import { calculatorList } from './index';

/** What a key may be allowed to call: groups of calculators, test frames and batches; "*" alone is everything. */
export const KEY_SCOPES: readonly string[] = [
  ...new Set([...calculatorList.map(({ id }) => id.split('/')[0] ?? id), 'frames', 'batch']),
];
