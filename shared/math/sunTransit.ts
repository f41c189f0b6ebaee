import { wrapRadians } from './angles';
import { slopeOfQuartic } from './quartic';
import { hourAngleRad } from './sunCurve';
import { DAY_MS, sunFitAt, type SunFit } from './sunFit';
import type { SunSite } from './sunSite';

/**
 * The transit nearest to an instant: the sun on the meridian, at hour angle 0 (upper) or π (lower).
 *
 * u' = u − (H(u) − H0 wrapped to ±π) / H′(u), twice
 *
 * @param fit polynomials of a day that reach the transit
 * @param site the place
 * @param nearU days since the fit's noon
 * @param targetRad H0: 0 for the upper transit, π for the lower
 * @returns days since the fit's noon
 * @example transitInFit(fit, site, 0, 0) // solar noon on the meridian of Greenwich, within 17 minutes of 0
 * @source definition of the transit; Newton's method
 */
export function transitInFit(fit: SunFit, site: SunSite, nearU: number, targetRad: number): number {
  const first = nearU - stepTo(fit, site, nearU, targetRad);
  return first - stepTo(fit, site, first, targetRad);
}

function stepTo(fit: SunFit, site: SunSite, u: number, targetRad: number): number {
  const slope = 2 * Math.PI + slopeOfQuartic(fit.hourAngleRad, u);
  return wrapRadians(hourAngleRad(fit, site, u) - targetRad) / slope;
}

/**
 * Solar noon: the upper transit nearest to an instant.
 *
 * @param site the place
 * @param nearMs instant, milliseconds since 1970 (UTC), for a civil date its middle
 * @returns milliseconds since 1970 (UTC), not rounded
 * @throws RangeError when the instant is not finite
 * @example solarNoonNear(siteOf({ latitude: 0, longitude: 0 }), Date.UTC(2026, 1, 11, 12)) // 12:14:10 UTC
 * @source as `transitInFit`
 */
export function solarNoonNear(site: SunSite, nearMs: number): number {
  const fit = sunFitAt(nearMs);
  return fit.noonMs + transitInFit(fit, site, (nearMs - fit.noonMs) / DAY_MS, 0) * DAY_MS;
}
