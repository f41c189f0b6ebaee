import { dayCrossings } from '../dayCrossings';
import { instantOf, solarDay } from '../solarDay';
import { ASTRONOMICAL_DEG } from '../sunAltitudes';
import { GOLDEN_HOUR } from '../sunBands';
import type { Place } from '../sunSite';

/**
 * When a ladder ends that begins at an instant: in the evening when the sky has become dark, at −18° or solar midnight; in
 * the morning when the golden hour is over, at +6° or solar noon.
 *
 * @param place latitude and longitude, degrees
 * @param fromMs its start, milliseconds since 1970 (UTC)
 * @returns milliseconds since 1970 (UTC), after the start
 * @throws RangeError when a coordinate is out of range or the instant is not finite
 * @example ladderEndMs(london, Date.UTC(2026, 11, 21, 15, 53)) // 17:57:46 UTC
 * @source modelling choice; the altitudes: USNO, and common practice for the golden hour
 */
export function ladderEndMs(place: Place, fromMs: number): number {
  const day = solarDay(place, fromMs);
  const isMorning = fromMs < instantOf(day, day.high.u);
  const turnMs = instantOf(day, isMorning ? day.high.u : day.lowAfter.u);
  const crossings = dayCrossings(day, isMorning ? GOLDEN_HOUR.toDeg : ASTRONOMICAL_DEG);
  const crossing = isMorning ? crossings.morning : crossings.evening;
  const endMs = typeof crossing === 'number' ? instantOf(day, crossing) : turnMs;
  return endMs > fromMs ? endMs : Math.max(turnMs, fromMs + 60_000);
}
