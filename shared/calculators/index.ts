import type { AnyCalculator } from '../contract/defineCalculator';

/** One line a calculator. The server loads all at its start, the browser one at a time. */
export interface CalculatorEntry {
  readonly id: string;
  readonly title: string;
  readonly load: () => Promise<AnyCalculator>;
}

// prettier-ignore
export const calculatorList: readonly CalculatorEntry[] = [
  { id: 'exposure/value', title: 'Exposure value of settings', load: async () => (await import('./exposure/value')).exposureValue },
  { id: 'exposure/solve', title: 'Missing setting', load: async () => (await import('./exposure/solve')).exposureSolve },
  { id: 'exposure/equivalents', title: 'Equivalent settings', load: async () => (await import('./exposure/equivalents')).exposureEquivalents },
  { id: 'exposure/difference', title: 'Difference of two settings', load: async () => (await import('./exposure/difference')).exposureDifference },
  { id: 'light/convert', title: 'Light in three units', load: async () => (await import('./light/convert')).lightConvert },
];

/** Loads every calculator, in the list's order. */
export function loadCalculators(): Promise<AnyCalculator[]> {
  return Promise.all(calculatorList.map((entry) => entry.load()));
}
