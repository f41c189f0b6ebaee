import { offsetMinutes } from './zone';

const MINUTE_MS = 60_000;

const WITH_OFFSET =
  /^(\d{4})-(\d\d)-(\d\d)[Tt](\d\d):(\d\d)(?::(\d\d)(?:\.(\d{1,9}))?)?(?:[Zz]|([+-])(\d\d):?(\d\d))$/;

/**
 * An instant as ISO 8601 with seconds and the offset of a zone.
 *
 * Rounded to the nearest second. Offsets from before standard time, which have seconds, are rounded to minutes and the
 * local time with them, so that the text still names the same instant.
 *
 * @param atMs instant, milliseconds since 1970 (UTC), years 0 to 9999
 * @param timeZone an IANA name
 * @returns such as "2026-06-21T04:43:06+01:00"
 * @throws RangeError when there is no zone of that name or the instant is out of range
 * @example formatInstant(Date.UTC(2026, 5, 21, 3, 43, 5, 752), 'Europe/London') // '2026-06-21T04:43:06+01:00'
 * @source ISO 8601, RFC 3339
 */
export function formatInstant(atMs: number, timeZone: string): string {
  const wholeMs = Math.round(atMs / 1000) * 1000;
  const minutes = Math.round(offsetMinutes(timeZone, wholeMs));
  const local = new Date(wholeMs + minutes * MINUTE_MS).toISOString().slice(0, 19);
  const size = Math.abs(minutes);
  const offset = `${two(Math.floor(size / 60))}:${two(size % 60)}`;
  return `${local}${minutes < 0 ? '-' : '+'}${offset}`;
}

/**
 * The instant that an ISO 8601 text with an offset names.
 *
 * @param text date, "T", hours and minutes, optional seconds and fraction, and "Z" or an offset
 * @returns milliseconds since 1970 (UTC), fractions of a millisecond dropped; null when it names no instant
 * @example parseInstant('2026-06-21T04:43:06+01:00') // Date.UTC(2026, 5, 21, 3, 43, 6)
 * @source ISO 8601, RFC 3339; a leap second is no instant here, 24:00 neither
 */
export function parseInstant(text: string): number | null {
  const match = WITH_OFFSET.exec(text);
  if (!match) return null;
  const [year, month, day, hour, minute] = match.slice(1, 6).map(Number) as [
    number,
    number,
    number,
    number,
    number,
  ];
  const second = Number(match[6] ?? 0);
  const milli = Number((match[7] ?? '').slice(0, 3).padEnd(3, '0'));
  const [offsetHour, offsetMinute] = [Number(match[9] ?? 0), Number(match[10] ?? 0)];
  if (hour > 23 || minute > 59 || second > 59 || offsetHour > 23 || offsetMinute > 59) return null;
  const date = new Date(0);
  date.setUTCFullYear(year, month - 1, day);
  if (date.getUTCMonth() !== month - 1 || date.getUTCDate() !== day) return null;
  const offset = (offsetHour * 60 + offsetMinute) * (match[8] === '-' ? -1 : 1);
  return date.getTime() + ((hour * 60 + minute - offset) * 60 + second) * 1000 + milli;
}

function two(number: number): string {
  return String(number).padStart(2, '0');
}
