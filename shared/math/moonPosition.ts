import {
  AngleBetween,
  Body,
  GeoMoon,
  GeoVector,
  HorizonFromVector,
  KM_PER_AU,
  MakeTime,
  Observer,
  ObserverVector,
  RotateVector,
  Rotation_EQJ_HOR,
  Vector,
} from 'astronomy-engine';
import { RADIANS_PER_DEGREE } from './angles';
import { moonLight } from './moonLight';
import { siteOf, type Place } from './sunSite';

/** Where the moon stands, without refraction, as seen from the place, and how it is lit. */
export interface MoonPosition {
  readonly altitudeDeg: number;
  /** Clockwise from true north. */
  readonly azimuthDeg: number;
  /** 0 at full moon, 180 at new moon. */
  readonly phaseAngleDeg: number;
  readonly parallaxDeg: number;
  /** Horizontal, clear sky. */
  readonly illuminanceLux: number;
}

const EARTH_RADIUS_KM = 6378.1366;

/**
 * The moon at a place and an instant, and the light it gives.
 *
 * phase angle = 180° − elongation; parallax = asin(a / distance)
 *
 * @param place latitude and longitude, degrees
 * @param atMs instant, milliseconds since 1970 (UTC)
 * @returns degrees and lx
 * @throws RangeError when a coordinate is out of range or the instant is not finite
 * @example moonPosition({ latitude: 0, longitude: 0 }, Date.UTC(2026, 2, 3, 11, 38)).phaseAngleDeg // under 1: full moon
 * @source astronomy-engine 2.1.19 (Montenbruck and Pfleger); light as `moonLight`
 */
export function moonPosition(place: Place, atMs: number): MoonPosition {
  siteOf(place);
  if (!Number.isFinite(atMs)) throw new RangeError(`an instant in milliseconds, not ${atMs}`);
  const time = MakeTime(new Date(atMs));
  const observer = new Observer(place.latitude, place.longitude, 0);
  // The moon's series cost more than everything else, so they are summed once.
  const moon = GeoMoon(time);
  const stand = ObserverVector(time, observer, false);
  const seen = new Vector(moon.x - stand.x, moon.y - stand.y, moon.z - stand.z, time);
  const horizontal = HorizonFromVector(RotateVector(Rotation_EQJ_HOR(time, observer), seen), '');
  const [altitude, azimuth] = [horizontal.lat, horizontal.lon];
  const parallaxDeg = Math.asin(EARTH_RADIUS_KM / (moon.Length() * KM_PER_AU)) / RADIANS_PER_DEGREE;
  const phaseAngleDeg = 180 - AngleBetween(moon, GeoVector(Body.Sun, time, true));
  return {
    altitudeDeg: altitude,
    azimuthDeg: azimuth,
    phaseAngleDeg,
    parallaxDeg,
    illuminanceLux: moonLight(altitude, phaseAngleDeg, parallaxDeg),
  };
}
