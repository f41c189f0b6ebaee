import { dayCrossings, type NoCrossing } from './dayCrossings';
import { instantOf, type SolarDay } from './solarDay';
import { ASTRONOMICAL_DEG, CIVIL_DEG, NAUTICAL_DEG, sunriseAltitudeDeg } from './sunAltitudes';
import { azimuthInFit, positionInFit } from './sunPosition';

export type SunEventName =
  | 'astronomicalDawn'
  | 'nauticalDawn'
  | 'civilDawn'
  | 'sunrise'
  | 'solarNoon'
  | 'sunset'
  | 'civilDusk'
  | 'nauticalDusk'
  | 'astronomicalDusk';

/** An event of the sun's day; without an instant it says why. */
export interface SunEvent {
  readonly name: SunEventName;
  /** Milliseconds since 1970 (UTC), not rounded. */
  readonly atMs: number | null;
  /** Of the centre, without refraction: the event's own altitude, whether or not the sun reaches it. */
  readonly sunAltitudeDeg: number;
  readonly azimuthDeg: number | null;
  readonly reason?: NoCrossing;
}

/**
 * The nine events of a solar day, in the order of their names.
 *
 * @param day the solar day
 * @param eyeHeightM metres above the visible horizon, 0 or more; lowers the horizon of sunrise and sunset only
 * @returns the events
 * @throws RangeError when the height is negative or not finite
 * @example sunEvents(solarDay(place, middleOfDateMs), 0)[3] // sunrise
 * @source USNO, Rise, Set, and Twilight Definitions; see `sunriseAltitudeDeg`
 */
export function sunEvents(day: SolarDay, eyeHeightM: number): SunEvent[] {
  const sunriseDeg = sunriseAltitudeDeg(eyeHeightM);
  const astronomical = dayCrossings(day, ASTRONOMICAL_DEG);
  const nautical = dayCrossings(day, NAUTICAL_DEG);
  const civil = dayCrossings(day, CIVIL_DEG);
  const limb = dayCrossings(day, sunriseDeg);
  return [
    event(day, 'astronomicalDawn', ASTRONOMICAL_DEG, astronomical.morning),
    event(day, 'nauticalDawn', NAUTICAL_DEG, nautical.morning),
    event(day, 'civilDawn', CIVIL_DEG, civil.morning),
    event(day, 'sunrise', sunriseDeg, limb.morning),
    solarNoon(day),
    event(day, 'sunset', sunriseDeg, limb.evening),
    event(day, 'civilDusk', CIVIL_DEG, civil.evening),
    event(day, 'nauticalDusk', NAUTICAL_DEG, nautical.evening),
    event(day, 'astronomicalDusk', ASTRONOMICAL_DEG, astronomical.evening),
  ];
}

function event(
  day: SolarDay,
  name: SunEventName,
  sunAltitudeDeg: number,
  crossing: number | NoCrossing,
): SunEvent {
  if (typeof crossing === 'string') {
    return { name, atMs: null, sunAltitudeDeg, azimuthDeg: null, reason: crossing };
  }
  const azimuthDeg = azimuthInFit(day.fit, day.site, crossing);
  return { name, atMs: instantOf(day, crossing), sunAltitudeDeg, azimuthDeg };
}

function solarNoon(day: SolarDay): SunEvent {
  const { altitudeDeg, azimuthDeg } = positionInFit(day.fit, day.site, day.noonU);
  return { name: 'solarNoon', atMs: instantOf(day, day.noonU), sunAltitudeDeg: altitudeDeg, azimuthDeg };
}
