/** How a month's units are used up. */
export interface UsagePace {
  /** Units at the month's end if it goes on like this. */
  readonly forecast: number;
  /** When the units are used up, milliseconds since 1970; null where they last. */
  readonly runsOutAtMs: number | null;
}

/** Less than a day tells nothing of a month. */
const LEAST_MS = 86_400_000;

/**
 * Carries the units used so far on to the month's end, evenly: forecast = used · month / elapsed.
 *
 * @param used units since the month began, ≥ 0
 * @param limit units of the month, ≥ 0
 * @param startMs when the month began, ms since 1970
 * @param endMs when it ends, > startMs
 * @param nowMs between the two; the first day counts as whole
 * @returns the forecast in units, and when the limit is reached if it is before the month's end
 * @example 3,000 of 10,000 after 6 days of 30: forecast 15,000; used up after 20 days
 * @source derivation: the mean rate since the month began
 */
export function usagePace(
  used: number,
  limit: number,
  startMs: number,
  endMs: number,
  nowMs: number,
): UsagePace {
  const elapsedMs = Math.min(endMs - startMs, Math.max(LEAST_MS, nowMs - startMs));
  const forecast = (used * (endMs - startMs)) / elapsedMs;
  if (used >= limit) return { forecast, runsOutAtMs: nowMs };
  if (forecast <= limit) return { forecast, runsOutAtMs: null };
  return { forecast, runsOutAtMs: Math.max(nowMs, startMs + (limit * elapsedMs) / used) };
}
