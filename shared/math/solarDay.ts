import { sineOfAltitude } from './sunCurve';
import { DAY_MS, sunFitAt, type SunFit } from './sunFit';
import { siteOf, type Place, type SunSite } from './sunSite';
import { solarNoonNear, transitInFit } from './sunTransit';
import { turningBeside } from './sunTurning';

/** Which half of the solar day. */
export type DayPart = 'morning' | 'evening';

/** A turning point of the sun's altitude: days since the fit's noon, and the sine of the altitude. */
export interface Turning {
  readonly u: number;
  readonly sine: number;
}

/** The day of the sun around one solar noon, from lower transit to lower transit. */
export interface SolarDay {
  readonly fit: SunFit;
  readonly site: SunSite;
  readonly noonU: number;
  readonly midnightBeforeU: number;
  readonly midnightAfterU: number;
  /** False within 8 km of a pole, where the altitude need not turn at noon and midnight. */
  readonly turns: boolean;
  /** The lowest altitude that the morning starts from, the highest of the day, the lowest that the evening ends at. */
  readonly lowBefore: Turning;
  readonly high: Turning;
  readonly lowAfter: Turning;
}

/**
 * The solar day whose noon is nearest to an instant.
 *
 * Morning and evening meet at the highest altitude and end at the lowest, which lie within seconds of the transits in
 * middle latitudes: so every crossing of an altitude belongs to exactly one half of one day, grazing ones included.
 *
 * @param place latitude and longitude, degrees
 * @param nearMs instant, milliseconds since 1970 (UTC); for a civil date its middle
 * @returns the day, instants in days since noon UTC of the day that holds its solar noon
 * @throws RangeError when a coordinate is out of range or the instant is not finite
 * @example instantOf(day, solarDay({ latitude: 0, longitude: 0 }, Date.UTC(2026, 1, 11, 12)).noonU) // 12:14:10 UTC
 * @source definitions of upper and lower transit; halves by extremes are a derivation
 */
export function solarDay(place: Place, nearMs: number): SolarDay {
  const site = siteOf(place);
  const noonMs = solarNoonNear(site, nearMs);
  const fit = sunFitAt(noonMs);
  const noonU = (noonMs - fit.noonMs) / DAY_MS;
  const midnightBeforeU = transitInFit(fit, site, noonU - 0.5, Math.PI);
  const midnightAfterU = transitInFit(fit, site, noonU + 0.5, Math.PI);
  const lowBeforeU = turningBeside(fit, site, midnightBeforeU, false);
  const highU = turningBeside(fit, site, noonU, true);
  const lowAfterU = turningBeside(fit, site, midnightAfterU, false);
  const turning = (u: number): Turning => ({ u, sine: sineOfAltitude(fit, site, u) });
  return {
    fit,
    site,
    noonU,
    midnightBeforeU,
    midnightAfterU,
    turns: lowBeforeU !== null && highU !== null && lowAfterU !== null,
    // Each end falls back by itself, so that a day ends where the next one begins.
    lowBefore: turning(lowBeforeU ?? midnightBeforeU),
    high: turning(highU ?? noonU),
    lowAfter: turning(lowAfterU ?? midnightAfterU),
  };
}

/** An instant of the day as milliseconds since 1970 (UTC), not rounded. */
export function instantOf(day: SolarDay, u: number): number {
  return day.fit.noonMs + u * DAY_MS;
}
