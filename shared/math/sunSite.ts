import { RADIANS_PER_DEGREE } from './angles';

/** A point on the earth: degrees, north and east positive. ±180 is the same meridian. */
export interface Place {
  readonly latitude: number;
  readonly longitude: number;
}

/** A place as the sun's equations need it: its vertical, and where it stands from the earth's centre. */
export interface SunSite {
  readonly sinLatitude: number;
  readonly cosLatitude: number;
  readonly longitudeRad: number;
  /** Distance from the earth's axis, astronomical units. */
  readonly fromAxisAu: number;
  /** Distance north of the equator's plane, astronomical units. */
  readonly fromEquatorAu: number;
}

const EQUATORIAL_RADIUS_KM = 6378.1366;
const POLAR_SHARE = 0.996647180302104;
const KM_PER_AU = 149_597_870.69098932;

/**
 * What the sun's equations need of a place at sea level.
 *
 * On the ellipsoid: c = 1/√(cos²φ + f²·sin²φ); from the axis a·c·cos φ, from the equator a·f²·c·sin φ.
 *
 * @param place φ latitude −90 to 90, λ longitude −180 to 180, degrees
 * @returns sines, radians and astronomical units
 * @throws RangeError when a coordinate is out of range or not a number
 * @example siteOf({ latitude: 90, longitude: 0 }).fromEquatorAu * 149597870.7 // 6356.75 km
 * @source geodetic to geocentric position, derivation; ellipsoid of IERS 2003 as in astronomy-engine 2.1.19
 */
export function siteOf(place: Place): SunSite {
  const { latitude, longitude } = place;
  if (!(Math.abs(latitude) <= 90)) throw new RangeError(`latitude −90 to 90 degrees, not ${latitude}`);
  if (!(Math.abs(longitude) <= 180)) throw new RangeError(`longitude −180 to 180 degrees, not ${longitude}`);
  const sinLatitude = Math.sin(latitude * RADIANS_PER_DEGREE);
  const cosLatitude = Math.cos(latitude * RADIANS_PER_DEGREE);
  const polarSquared = POLAR_SHARE * POLAR_SHARE;
  const curvature = 1 / Math.sqrt(cosLatitude * cosLatitude + polarSquared * sinLatitude * sinLatitude);
  const scaleAu = (EQUATORIAL_RADIUS_KM * curvature) / KM_PER_AU;
  return {
    sinLatitude,
    cosLatitude,
    longitudeRad: longitude * RADIANS_PER_DEGREE,
    fromAxisAu: scaleAu * cosLatitude,
    fromEquatorAu: scaleAu * polarSquared * sinLatitude,
  };
}
