import type { Range } from './plotFrame';

const HALF_DAY_MS = 12 * 3_600_000;

/** The day around solar noon, milliseconds since 1970; null where an answer names no noon. */
export function dayAround(
  events: readonly { readonly name: string; readonly at: string | null }[],
): Range | null {
  const noon = events.find(({ name }) => name === 'solarNoon')?.at;
  if (!noon) return null;
  const noonMs = Date.parse(noon);
  return [noonMs - HALF_DAY_MS, noonMs + HALF_DAY_MS];
}
