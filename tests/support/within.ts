import { expect } from 'vitest';

/** Asserts that a number lies within a tolerance of the wanted one; null and NaN never do. */
export function within(given: number | null, wanted: number, tolerance: number, where: string): void {
  const off = Math.abs((given ?? NaN) - wanted);
  expect(off, `${where}: ${given} against ${wanted}`).toBeLessThanOrEqual(tolerance);
}
