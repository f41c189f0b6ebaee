import { RADIANS_PER_DEGREE } from './angles';
import { slopeOfQuartic, valueOfQuartic } from './quartic';
import type { SunFit } from './sunFit';
import type { SunSite } from './sunSite';

/**
 * "The sun's centre stands at this altitude" as g(u) = polar·sin δ + equatorial·cos δ·cos H − level = 0.
 * Parallax is folded into the three constants, so it costs nothing while solving.
 */
export interface SunEquation {
  readonly fit: SunFit;
  readonly longitudeRad: number;
  /** Sine of the altitude that is looked for. */
  readonly sine: number;
  readonly polar: number;
  readonly equatorial: number;
  readonly level: number;
}

/**
 * The equation for one altitude on one day.
 *
 * n·s − n·ρ/r = sin h·(1 − s·ρ/r), sorted by the terms of s.
 *
 * @param fit polynomials of a day
 * @param site the place
 * @param altitudeDeg h of the sun's centre without refraction, −90 to 90 degrees
 * @returns the equation
 * @example sunEquation(fit, site, -6) // civil twilight
 * @source derivation
 */
export function sunEquation(fit: SunFit, site: SunSite, altitudeDeg: number): SunEquation {
  const sine = Math.sin(altitudeDeg * RADIANS_PER_DEGREE);
  const axis = site.fromAxisAu / fit.distanceAu;
  const equator = site.fromEquatorAu / fit.distanceAu;
  return {
    fit,
    longitudeRad: site.longitudeRad,
    sine,
    polar: site.sinLatitude + sine * equator,
    equatorial: site.cosLatitude + sine * axis,
    level: sine + site.cosLatitude * axis + site.sinLatitude * equator,
  };
}

/**
 * How far the sun is above the altitude: g(u), a sine's difference.
 *
 * @param equation the altitude on a day
 * @param u days since the fit's noon
 * @returns dimensionless; positive above
 * @example residualOf(sunEquation(fit, site, -90), 0) // 1 + the sine of the altitude at noon UTC
 * @source as `sunEquation`
 */
export function residualOf(equation: SunEquation, u: number): number {
  const sinDec = valueOfQuartic(equation.fit.sinDeclination, u);
  const hourRad = 2 * Math.PI * u + valueOfQuartic(equation.fit.hourAngleRad, u) + equation.longitudeRad;
  const along = Math.sqrt(1 - sinDec * sinDec) * Math.cos(hourRad);
  return equation.polar * sinDec + equation.equatorial * along - equation.level;
}

/**
 * The slope of g.
 *
 * @param equation the altitude on a day
 * @param u days since the fit's noon
 * @returns per day
 * @example slopeOf(sunEquation(fit, siteOf({ latitude: 0, longitude: 0 }), 0), -0.25) // about 2π
 * @source derivation
 */
export function slopeOf(equation: SunEquation, u: number): number {
  const sinDec = valueOfQuartic(equation.fit.sinDeclination, u);
  const sinSlope = slopeOfQuartic(equation.fit.sinDeclination, u);
  const cosDec = Math.sqrt(1 - sinDec * sinDec);
  const hourRad = 2 * Math.PI * u + valueOfQuartic(equation.fit.hourAngleRad, u) + equation.longitudeRad;
  const hourSlope = 2 * Math.PI + slopeOfQuartic(equation.fit.hourAngleRad, u);
  const alongSlope =
    (-sinDec * sinSlope * Math.cos(hourRad)) / cosDec - cosDec * hourSlope * Math.sin(hourRad);
  return equation.polar * sinSlope + equation.equatorial * alongSlope;
}
