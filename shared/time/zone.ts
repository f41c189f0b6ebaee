import tzLookup from '@photostructure/tz-lookup';
import { IANAZone } from 'luxon';

/** Names that have been looked at; bounded, since they come from callers. */
const KEPT_NAMES = 1000;
const known = new Map<string, IANAZone | null>();

/** Asking the runtime takes 20 µs, so what it said of each six hours is kept: an offset, or null around a change. */
const SPAN_MS = 6 * 3_600_000;
const KEPT_SPANS = 5000;
const spans = new Map<string, number | null>();

/**
 * The zone behind an IANA name, in any case of letters.
 *
 * @param name such as "Europe/London" or "UTC"; offsets such as "+01:00" are not names
 * @returns the zone; null when there is none of that name
 * @example zoneNamed('Europe/London')?.name // 'Europe/London'
 * @source the IANA time zone database as the runtime has it
 */
function zoneNamed(name: string): IANAZone | null {
  const kept = known.get(name);
  if (kept !== undefined) return kept;
  const zone = isName(name) ? IANAZone.create(canonical(name)) : null;
  if (known.size >= KEPT_NAMES) known.clear();
  known.set(name, zone);
  return zone;
}

/** Whether there is an IANA time zone of this name. */
export function isTimeZone(name: string): boolean {
  return zoneNamed(name) !== null;
}

function isName(name: string): boolean {
  return name.length <= 64 && /^[A-Za-z]/.test(name) && IANAZone.isValidZone(name);
}

/** One spelling a zone, so that luxon's own caches hold each zone once. */
function canonical(name: string): string {
  return new Intl.DateTimeFormat('en-US', { timeZone: name }).resolvedOptions().timeZone;
}

/**
 * The time zone that is in force at a point on the earth, at sea the nautical one.
 *
 * @param latitude degrees, −90 to 90
 * @param longitude degrees, −180 to 180
 * @returns an IANA name
 * @throws RangeError when a coordinate is out of range
 * @example timeZoneAt(51.5074, -0.1278) // 'Europe/London'
 * @source @photostructure/tz-lookup (timezone-boundary-builder's outlines, simplified: beside a border it may err)
 */
export function timeZoneAt(latitude: number, longitude: number): string {
  if (!(Math.abs(latitude) <= 90)) throw new RangeError(`latitude −90 to 90 degrees, not ${latitude}`);
  if (!(Math.abs(longitude) <= 180)) throw new RangeError(`longitude −180 to 180 degrees, not ${longitude}`);
  return tzLookup(latitude, longitude);
}

/**
 * Minutes by which a zone's clocks are ahead of UTC.
 *
 * @param timeZone an IANA name
 * @param atMs instant, milliseconds since 1970 (UTC)
 * @returns minutes, east positive; whole ones today, with a fraction before standard time
 * @throws RangeError when there is no zone of that name, or the instant is not finite
 * @example offsetMinutes('Asia/Kathmandu', 1.7e12) // 345
 * @source the IANA time zone database as the runtime has it
 */
export function offsetMinutes(timeZone: string, atMs: number): number {
  if (!Number.isFinite(atMs)) throw new RangeError(`an instant in milliseconds, not ${atMs}`);
  const zone = zoneNamed(timeZone);
  if (!zone) throw new RangeError(`an IANA time zone, not ${timeZone}`);
  return offsetInSpan(zone, Math.floor(atMs / SPAN_MS)) ?? zone.offset(atMs);
}

function offsetInSpan(zone: IANAZone, index: number): number | null {
  const key = `${zone.name} ${index}`;
  const kept = spans.get(key);
  if (kept !== undefined) return kept;
  const first = zone.offset(index * SPAN_MS);
  const offset = first === zone.offset((index + 1) * SPAN_MS) ? first : null;
  if (spans.size >= KEPT_SPANS) spans.clear();
  spans.set(key, offset);
  return offset;
}
