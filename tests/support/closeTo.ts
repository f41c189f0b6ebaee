import { expect } from 'vitest';

/** Asserts that two answers are alike, numbers to nine digits; everything else exactly. */
export function expectAlike(given: unknown, wanted: unknown, where = 'answer'): void {
  if (typeof wanted === 'number' && typeof given === 'number') {
    const room = 1e-9 * Math.max(1, Math.abs(wanted));
    expect(Math.abs(given - wanted), `${where}: ${given} against ${wanted}`).toBeLessThanOrEqual(room);
    return;
  }
  if (typeof wanted !== 'object' || wanted === null) {
    expect(given, where).toEqual(wanted);
    return;
  }
  expect(typeof given, where).toBe('object');
  expect(given, where).not.toBeNull();
  expect(Object.keys(given as object).sort(), where).toEqual(Object.keys(wanted).sort());
  for (const [key, value] of Object.entries(wanted))
    expectAlike((given as Record<string, unknown>)[key], value, `${where}.${key}`);
}

/** Whether every number in a value is finite. */
export function isFiniteThroughout(value: unknown): boolean {
  if (typeof value === 'number') return Number.isFinite(value);
  if (typeof value !== 'object' || value === null) return true;
  return Object.values(value).every(isFiniteThroughout);
}
