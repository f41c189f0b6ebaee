import { offsetMinutes } from './zone';

const MINUTE_MS = 60_000;
const HOUR_MS = 3_600_000;
const DAY_MS = 86_400_000;

/** A date on the calendar, years 1 to 9999. */
export interface CivilDate {
  readonly year: number;
  readonly month: number;
  readonly day: number;
}

/** The span of a civil date: from its first instant to the first of the next date. */
export interface CivilDay {
  /** Milliseconds since 1970 (UTC). */
  readonly startMs: number;
  readonly endMs: number;
}

/**
 * A date from its ISO form.
 *
 * @param text such as "2026-06-21"
 * @returns the date; null when it is none, such as 30 February
 * @example parseCivilDate('2026-02-30') // null
 * @source ISO 8601, Gregorian calendar
 */
export function parseCivilDate(text: string): CivilDate | null {
  const match = /^(\d{4})-(\d\d)-(\d\d)$/.exec(text);
  if (!match) return null;
  const [year, month, day] = [Number(match[1]), Number(match[2]), Number(match[3])];
  const date = new Date(utcMidnightMs({ year, month, day }));
  return year > 0 && date.getUTCMonth() === month - 1 && date.getUTCDate() === day
    ? { year, month, day }
    : null;
}

/** The ISO form of a date: { year: 2026, month: 6, day: 21 } is "2026-06-21". */
export function formatCivilDate({ year, month, day }: CivilDate): string {
  return `${String(year).padStart(4, '0')}-${String(month).padStart(2, '0')}-${String(day).padStart(2, '0')}`;
}

/**
 * The date that a zone's calendar shows at an instant.
 *
 * @param atMs instant, milliseconds since 1970 (UTC)
 * @param timeZone an IANA name
 * @returns the date
 * @throws RangeError when there is no zone of that name, or the instant is not finite
 * @example civilDateAt(Date.UTC(2026, 5, 20, 23, 30), 'Europe/London') // 21 June 2026
 * @source the IANA time zone database as the runtime has it
 */
export function civilDateAt(atMs: number, timeZone: string): CivilDate {
  return dateOfUtc(localMs(atMs, timeZone));
}

/**
 * When a civil date begins and ends.
 *
 * It begins at the first instant at which the zone's calendar shows it: at midnight, or where the clocks are put
 * forward at midnight, later. A date may have 23, 24 or 25 hours, and a date that the zone skipped has none.
 *
 * @param date the date
 * @param timeZone an IANA name
 * @returns the span; null when the zone never had that date (30 December 2011 in Samoa)
 * @throws RangeError when there is no zone of that name
 * @example civilDay({ year: 2026, month: 3, day: 29 }, 'Europe/London') // 23 hours from 2026-03-29T00:00Z
 * @source the IANA time zone database as the runtime has it
 */
export function civilDay(date: CivilDate, timeZone: string): CivilDay | null {
  const midnightMs = utcMidnightMs(date);
  const startMs = firstInstantAt(midnightMs, timeZone);
  const endMs = firstInstantAt(midnightMs + DAY_MS, timeZone);
  return endMs > startMs ? { startMs, endMs } : null;
}

/**
 * The first instant from which on the local clock has reached a reading, clock changes of up to a day considered:
 * the reading itself where the clock shows it, else the end of the gap it lies in.
 */
function firstInstantAt(readingMs: number, timeZone: string): number {
  const earliest = readingMs - offsetBefore(readingMs, timeZone) * MINUTE_MS;
  const latest = readingMs - offsetAfter(readingMs, timeZone) * MINUTE_MS;
  if (earliest === latest) return earliest;
  for (const candidate of [Math.min(earliest, latest), Math.max(earliest, latest)]) {
    if (localMs(candidate, timeZone) === readingMs) return candidate;
  }
  return gapEnd(Math.min(earliest, latest), Math.max(earliest, latest), readingMs, timeZone);
}

/** Offsets a day and two hours before and after: on either side of any change that concerns the reading. */
function offsetBefore(readingMs: number, timeZone: string): number {
  return offsetMinutes(timeZone, readingMs - DAY_MS - 2 * HOUR_MS);
}

function offsetAfter(readingMs: number, timeZone: string): number {
  return offsetMinutes(timeZone, readingMs + DAY_MS + 2 * HOUR_MS);
}

/** The reading was skipped: halve to the instant, a whole second, at which the clock jumps over it. */
function gapEnd(beforeMs: number, afterMs: number, readingMs: number, timeZone: string): number {
  let low = Math.floor(beforeMs / 1000) - 1;
  let high = Math.ceil(afterMs / 1000) + 1;
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    if (localMs(middle * 1000, timeZone) >= readingMs) high = middle;
    else low = middle;
  }
  return high * 1000;
}

/** What the zone's clock shows, written as if it were UTC. */
function localMs(atMs: number, timeZone: string): number {
  return atMs + Math.round(offsetMinutes(timeZone, atMs) * MINUTE_MS);
}

function utcMidnightMs({ year, month, day }: CivilDate): number {
  const date = new Date(0);
  return date.setUTCFullYear(year, month - 1, day);
}

function dateOfUtc(ms: number): CivilDate {
  const date = new Date(ms);
  return { year: date.getUTCFullYear(), month: date.getUTCMonth() + 1, day: date.getUTCDate() };
}
