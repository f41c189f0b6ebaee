import { type CivilDate, civilDateAt } from './civilDate';
import { offsetMinutes } from './zone';

const MINUTE_MS = 60_000;
const HOUR_MS = 3_600_000;
const CLOCK = /^([01]\d|2[0-3]):([0-5]\d)(?::([0-5]\d))?$/;

/** Until this hour a clock time belongs to the evening before; a choice, so that a late dusk needs no other date. */
const NIGHT_ENDS_H = 3;

/** Whether a text is a reading of a clock, such as "18:45". */
export const isClockTime = (text: unknown): text is string => typeof text === 'string' && CLOCK.test(text);

/**
 * The instant at which a clock shows a reading on an evening's date; readings before 3:00 belong to the night after.
 *
 * @param date the evening's date
 * @param clock hours and minutes, optional seconds
 * @param timeZone an IANA name
 * @returns milliseconds since 1970 (UTC), the later instant where the clock shows it twice; null when it is no reading
 * @throws RangeError when there is no zone of that name
 * @example instantOfClock({ year: 2026, month: 10, day: 4 }, '18:45', 'Europe/London') // 17:45 UTC
 * @source derivation
 */
export function instantOfClock(date: CivilDate, clock: string, timeZone: string): number | null {
  const match = CLOCK.exec(clock);
  if (!match) return null;
  const [hour, minute, second] = [Number(match[1]), Number(match[2]), Number(match[3] ?? 0)];
  const nightDays = hour < NIGHT_ENDS_H ? 1 : 0;
  const readingMs = Date.UTC(date.year, date.month - 1, date.day + nightDays, hour, minute, second);
  const guessMs = readingMs - offsetMinutes(timeZone, readingMs) * MINUTE_MS;
  return readingMs - offsetMinutes(timeZone, guessMs) * MINUTE_MS;
}

/** The reading of a clock at an instant, seconds only where there are some: "18:45". */
export function clockTimeAt(atMs: number, timeZone: string): string {
  const local = new Date(atMs + offsetMinutes(timeZone, atMs) * MINUTE_MS).toISOString().slice(11, 19);
  return local.endsWith(':00') ? local.slice(0, 5) : local;
}

/** The date whose evening an instant belongs to; the inverse of `instantOfClock`. */
export function eveningDateAt(atMs: number, timeZone: string): CivilDate {
  return civilDateAt(atMs - NIGHT_ENDS_H * HOUR_MS, timeZone);
}
