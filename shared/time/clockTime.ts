import { type CivilDate, civilDateAt } from './civilDate';
import { offsetMinutes } from './zone';

const MINUTE_MS = 60_000;
const HOUR_MS = 3_600_000;
const CLOCK = /^([01]\d|2[0-3]):([0-5]\d)(?::([0-5]\d))?$/;

const MEAN_DAY_H = 24;
const DEGREES_AN_HOUR = 15;

/** Where a clock hangs: evenings end at solar midnight, which the zone alone does not tell. */
export interface ClockPlace {
  /** An IANA name. */
  readonly timeZone: string;
  /** Degrees, east positive. */
  readonly longitudeDeg: number;
}

/**
 * Until when in the small hours a clock's readings belong to the evening before: mean solar midnight, so that a late
 * dusk in the north needs no other date and an early dawn keeps its own.
 *
 * H = (offset − longitude/15°) mod 24, and 0 where that lies before midnight by the clock.
 * @param place the clock's
 * @param atMs an instant of that day or night, milliseconds since 1970 (UTC), for summer time
 * @returns hours after midnight by the clock, 0 up to 12; the equation of time moves true solar midnight by ±0.3 h
 * @throws RangeError when there is no zone of that name
 * @example nightEndH({ timeZone: 'America/Anchorage', longitudeDeg: -147.7 }, Date.UTC(2026, 5, 21)) // 1.85
 * @source derivation; mean solar time by its definition
 */
export function nightEndH({ timeZone, longitudeDeg }: ClockPlace, atMs: number): number {
  const clockAheadH = offsetMinutes(timeZone, atMs) / 60 - longitudeDeg / DEGREES_AN_HOUR;
  const readingH = ((clockAheadH % MEAN_DAY_H) + MEAN_DAY_H) % MEAN_DAY_H;
  return readingH > MEAN_DAY_H / 2 ? 0 : readingH;
}

/** Whether a text is a reading of a clock, such as "18:45". */
export const isClockTime = (text: unknown): text is string => typeof text === 'string' && CLOCK.test(text);

/**
 * The instant at which a clock shows a reading on an evening's date; readings before solar midnight belong to the
 * night after.
 *
 * @param date the evening's date
 * @param clock hours and minutes, optional seconds
 * @param place where the clock hangs
 * @returns milliseconds since 1970 (UTC), the later instant where the clock shows it twice; null when it is no reading
 * @throws RangeError when there is no zone of that name
 * @example instantOfClock({ year: 2026, month: 10, day: 4 }, '18:45', london) // 17:45 UTC
 * @source derivation
 */
export function instantOfClock(date: CivilDate, clock: string, place: ClockPlace): number | null {
  const match = CLOCK.exec(clock);
  if (!match) return null;
  const [hour, minute, second] = [Number(match[1]), Number(match[2]), Number(match[3] ?? 0)];
  const endH = nightEndH(place, Date.UTC(date.year, date.month - 1, date.day + 1));
  const nightDays = hour + minute / 60 + second / 3600 < endH ? 1 : 0;
  const readingMs = Date.UTC(date.year, date.month - 1, date.day + nightDays, hour, minute, second);
  const guessMs = readingMs - offsetMinutes(place.timeZone, readingMs) * MINUTE_MS;
  return readingMs - offsetMinutes(place.timeZone, guessMs) * MINUTE_MS;
}

/** The reading of a clock at an instant, seconds only where there are some: "18:45". */
export function clockTimeAt(atMs: number, timeZone: string): string {
  const local = new Date(atMs + offsetMinutes(timeZone, atMs) * MINUTE_MS).toISOString().slice(11, 19);
  return local.endsWith(':00') ? local.slice(0, 5) : local;
}

/** The date whose evening an instant belongs to; the inverse of `instantOfClock`. */
export function eveningDateAt(atMs: number, place: ClockPlace): CivilDate {
  return civilDateAt(atMs - nightEndH(place, atMs) * HOUR_MS, place.timeZone);
}
