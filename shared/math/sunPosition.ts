import { compassDeg, RADIANS_PER_DEGREE } from './angles';
import { valueOfQuartic } from './quartic';
import { hourAngleRad, sineSlope } from './sunCurve';
import { DAY_MS, sunFitAt, type SunFit } from './sunFit';
import { siteOf, type Place, type SunSite } from './sunSite';

/** Where the sun's centre stands, without refraction, and how fast it climbs. */
export interface SunPosition {
  readonly altitudeDeg: number;
  /** Clockwise from true north. */
  readonly azimuthDeg: number;
  /** Positive while the sun climbs. */
  readonly climbDegPerMinute: number;
}

/**
 * Position of the sun's centre at a place and an instant, without refraction, parallax included.
 *
 * sin h = (sin φ·sin δ + cos φ·cos δ·cos H − ρ·u/r) / |r − ρ|, with H = 2π·u + E(u) + λ from the day's polynomials.
 *
 * @param place latitude and longitude, degrees
 * @param atMs instant, milliseconds since 1970 (UTC)
 * @returns degrees, and degrees per minute
 * @throws RangeError when a coordinate is out of range or the instant is not finite
 * @example sunPosition({ latitude: 39.742476, longitude: -105.1786 }, Date.UTC(2003, 9, 17, 19, 30, 30)) // altitude 39.8720
 * @source spherical astronomy, derivation; checked against NREL's solar position example and ephem 4.1.4
 */
export function sunPosition(place: Place, atMs: number): SunPosition {
  const fit = sunFitAt(atMs);
  return positionInFit(fit, siteOf(place), (atMs - fit.noonMs) / DAY_MS);
}

/**
 * The same from a day's polynomials.
 *
 * @param fit polynomials of a day
 * @param site the place
 * @param u days since the fit's noon, −1 to 1
 * @returns as `sunPosition`
 * @example positionInFit(sunFitAt(ms), siteOf(place), 0) // at noon UTC
 * @source as `sunPosition`
 */
export function positionInFit(fit: SunFit, site: SunSite, u: number): SunPosition {
  const { sinLatitude, cosLatitude, fromAxisAu, fromEquatorAu } = site;
  const sinDec = valueOfQuartic(fit.sinDeclination, u);
  const cosDec = Math.sqrt(1 - sinDec * sinDec);
  const hourRad = hourAngleRad(fit, site, u);
  const equatorial = cosDec * Math.cos(hourRad) - fromAxisAu / fit.distanceAu;
  const polar = sinDec - fromEquatorAu / fit.distanceAu;
  const zenith = sinLatitude * polar + cosLatitude * equatorial;
  const north = cosLatitude * polar - sinLatitude * equatorial;
  const east = -cosDec * Math.sin(hourRad);
  const level = Math.sqrt(north * north + east * east);
  return {
    altitudeDeg: Math.atan2(zenith, level) / RADIANS_PER_DEGREE,
    azimuthDeg: compassDeg(east, north),
    // At the zenith itself, where the sun turns, the climb is zero.
    climbDegPerMinute: level < 1e-9 ? 0 : sineSlope(fit, site, u) / level / RADIANS_PER_DEGREE / 1440,
  };
}

/**
 * The azimuth alone.
 *
 * tan A = −cos δ·sin H / (cos φ·sin δ − sin φ·cos δ·cos H), less the parallax, which the flattened earth leaves in it
 *
 * @param fit polynomials of a day
 * @param site the place
 * @param u days since the fit's noon, −1 to 1
 * @returns degrees clockwise from true north, 0 to 360
 * @example azimuthInFit(fit, siteOf({ latitude: 51, longitude: 0 }), 0) // about 180
 * @source as `sunPosition`
 */
export function azimuthInFit(fit: SunFit, site: SunSite, u: number): number {
  const sinDec = valueOfQuartic(fit.sinDeclination, u);
  const cosDec = Math.sqrt(1 - sinDec * sinDec);
  const hourRad = hourAngleRad(fit, site, u);
  const equatorial = cosDec * Math.cos(hourRad) - site.fromAxisAu / fit.distanceAu;
  const north =
    site.cosLatitude * (sinDec - site.fromEquatorAu / fit.distanceAu) - site.sinLatitude * equatorial;
  return compassDeg(-cosDec * Math.sin(hourRad), north);
}
