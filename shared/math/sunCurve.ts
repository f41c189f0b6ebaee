import { slopeOfQuartic, valueOfQuartic } from './quartic';
import type { SunFit } from './sunFit';
import type { SunSite } from './sunSite';

/**
 * Local hour angle of the sun: H = 2π·u + E(u) + λ.
 *
 * @param fit polynomials of a day
 * @param site the place
 * @param u days since the fit's noon, −1 to 1
 * @returns radians, 0 at an upper transit, growing by 2π a day, not wrapped
 * @example hourAngleRad(fit, siteOf({ latitude: 0, longitude: 0 }), 0) // the equation of time, within ±0.072
 * @source definition of the hour angle
 */
export function hourAngleRad(fit: SunFit, site: SunSite, u: number): number {
  return 2 * Math.PI * u + valueOfQuartic(fit.hourAngleRad, u) + site.longitudeRad;
}

/**
 * Slope of the sine of the geocentric altitude.
 *
 * (sin h)′ = sin φ·(sin δ)′ + cos φ·((cos δ)′·cos H − cos δ·H′·sin H)
 *
 * @param fit polynomials of a day
 * @param site the place
 * @param u days since the fit's noon, −1 to 1
 * @returns per day
 * @example sineSlope(fit, siteOf({ latitude: 0, longitude: 0 }), -0.25) // about 2π: the sun climbs straight up
 * @source derivation
 */
export function sineSlope(fit: SunFit, site: SunSite, u: number): number {
  const sinDec = valueOfQuartic(fit.sinDeclination, u);
  const sinSlope = slopeOfQuartic(fit.sinDeclination, u);
  const cosDec = Math.sqrt(1 - sinDec * sinDec);
  const cosSlope = (-sinDec * sinSlope) / cosDec;
  const hourRad = hourAngleRad(fit, site, u);
  const hourSlope = 2 * Math.PI + slopeOfQuartic(fit.hourAngleRad, u);
  return (
    site.sinLatitude * sinSlope +
    site.cosLatitude * (cosSlope * Math.cos(hourRad) - cosDec * hourSlope * Math.sin(hourRad))
  );
}

/**
 * Sine of the altitude of the sun's centre, without refraction, parallax included.
 *
 * sin h = (n·s − n·ρ/r) / (1 − s·ρ/r), n the vertical, s the sun's direction, ρ the place, r the distance
 *
 * @param fit polynomials of a day
 * @param site the place
 * @param u days since the fit's noon, −1 to 1
 * @returns −1 to 1; terms of (ρ/r)², 0.0002″, are left out
 * @example sineOfAltitude(fit, siteOf({ latitude: 90, longitude: 0 }), 0) // sin δ, less the parallax
 * @source derivation
 */
export function sineOfAltitude(fit: SunFit, site: SunSite, u: number): number {
  const sinDec = valueOfQuartic(fit.sinDeclination, u);
  const along = Math.sqrt(1 - sinDec * sinDec) * Math.cos(hourAngleRad(fit, site, u));
  const equatorial = along - site.fromAxisAu / fit.distanceAu;
  const polar = sinDec - site.fromEquatorAu / fit.distanceAu;
  const shortening = 1 - (along * site.fromAxisAu + sinDec * site.fromEquatorAu) / fit.distanceAu;
  return (site.sinLatitude * polar + site.cosLatitude * equatorial) / shortening;
}
