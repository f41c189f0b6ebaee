import { ANY, inDomain, SMALLEST } from './domain';

/**
 * How large the subject is on the sensor: m = f/(d − f).
 *
 * @param focalLengthMm f: mm, > 0
 * @param distanceM d: from the lens to the subject, m, longer than the focal length
 * @returns m, size on the sensor over size of the subject, dimensionless
 * @throws RangeError when a value is outside its domain
 * @example magnificationAt(50, 10) // 0.005025
 * @source thin lens, derivation
 */
export function magnificationAt(focalLengthMm: number, distanceM: number): number {
  inDomain('focalLengthMm', focalLengthMm, SMALLEST, ANY);
  const spareMm = inDomain(
    'distance beyond the focal length in mm',
    distanceM * 1000 - focalLengthMm,
    SMALLEST,
    ANY,
  );
  return focalLengthMm / spareMm;
}

/**
 * The part of a movement that goes across the picture: |cos(α)|, and 0, not a rounding error, along the axis.
 *
 * @param directionDeg α: degrees from the picture's plane, finite; 0 across the frame, 90 along the lens axis
 * @returns 0 to 1, dimensionless
 * @throws RangeError when the angle is not finite
 * @example shareAcross(60) // 0.5
 * @source derivation
 */
export function shareAcross(directionDeg: number): number {
  inDomain('directionDeg', directionDeg, -ANY, ANY);
  // sin of the angle to the axis: exact at the axis itself.
  const toAxisDeg = 90 - Math.abs(directionDeg % 180);
  return Math.abs(Math.sin((toAxisDeg * Math.PI) / 180));
}

/** A subject that moves while it is exposed. */
export interface Movement {
  /** v: m/s, ≥ 0 */
  readonly speedMS: number;
  /** α: degrees, 0 across the frame, 90 along the lens axis */
  readonly directionDeg: number;
}

/**
 * How far a point of the subject travels across the picture, measured at the subject: v·|cos(α)|·t.
 *
 * @param movement v and α
 * @param durationS t: of the light, s, ≥ 0
 * @returns mm
 * @throws RangeError when a value is outside its domain
 * @example travelMm({ speedMS: 10, directionDeg: 0 }, 0.001) // 10
 * @source derivation
 */
export function travelMm(movement: Movement, durationS: number): number {
  inDomain('speedMS', movement.speedMS, 0, ANY);
  inDomain('durationS', durationS, 0, ANY);
  return movement.speedMS * shareAcross(movement.directionDeg) * durationS * 1000;
}

/**
 * Blur on the sensor by movement: b = v·|cos(α)|·t·m.
 *
 * @param movement v and α
 * @param durationS t: of the light, s, ≥ 0; for a flash its t0.1, for ambient light the exposure time
 * @param magnification m: dimensionless, > 0
 * @returns b, µm
 * @throws RangeError when a value is outside its domain
 * @example motionBlurUm({ speedMS: 10, directionDeg: 0 }, 0.001, magnificationAt(50, 10)) // 50.25
 * @source derivation
 */
export function motionBlurUm(movement: Movement, durationS: number, magnification: number): number {
  inDomain('magnification', magnification, SMALLEST, ANY);
  return travelMm(movement, durationS) * magnification * 1000;
}

/**
 * The longest light that keeps the blur within a tolerance: t = b/(v·|cos(α)|·m).
 *
 * @param movement v and α
 * @param magnification m: dimensionless, > 0
 * @param toleranceUm b: µm on the sensor, > 0
 * @returns t, s; null where nothing moves across the picture, so that no light is too long
 * @throws RangeError when a value is outside its domain
 * @example longestSharpS({ speedMS: 10, directionDeg: 0 }, magnificationAt(50, 10), 6) // 1/8375
 * @source derivation, the inverse of {@link motionBlurUm}
 */
export function longestSharpS(movement: Movement, magnification: number, toleranceUm: number): number | null {
  inDomain('toleranceUm', toleranceUm, SMALLEST, ANY);
  const speedUmS = motionBlurUm(movement, 1, magnification);
  const longestS = toleranceUm / speedUmS;
  return Number.isFinite(longestS) ? longestS : null;
}

/** Blur told in three ways, and whether it stays within the tolerance. */
export interface Blur {
  readonly blurPx: number;
  readonly blurUm: number;
  readonly blurMmAtSubject: number;
  readonly frozen: boolean;
}

/** A blur on the tolerance is within it; covers rounding. */
const ON_TOLERANCE = 1 + 1e-9;

/** The sensor's side of a picture: size on it, pixels, and what still looks sharp. */
export interface SensorView {
  /** m, dimensionless, > 0 */
  readonly magnification: number;
  /** µm, > 0 */
  readonly pitchUm: number;
  /** µm, > 0 */
  readonly toleranceUm: number;
}

/**
 * The blur of a movement in pixels, on the sensor and at the subject; see {@link motionBlurUm}.
 *
 * @param movement v and α
 * @param durationS t: of the light, s, ≥ 0
 * @param view magnification, pixel pitch and tolerance
 * @returns the blur
 * @throws RangeError when a value is outside its domain
 * @example 10 m/s for 1 ms at m = 0.005025 on 6 µm pixels: 8.375 px, 50.25 µm, 10 mm
 * @source derivation
 */
export function blurOf(movement: Movement, durationS: number, view: SensorView): Blur {
  inDomain('pitchUm', view.pitchUm, SMALLEST, ANY);
  const blurUm = motionBlurUm(movement, durationS, view.magnification);
  return {
    blurPx: blurUm / view.pitchUm,
    blurUm,
    blurMmAtSubject: travelMm(movement, durationS),
    frozen: blurUm <= view.toleranceUm * ON_TOLERANCE,
  };
}

/**
 * Distance of the centres of two pixels: sensor width over pixels across.
 *
 * @param sensorWidthMm mm, > 0
 * @param imageWidthPx pixels, > 0
 * @returns µm
 * @throws RangeError when a value is outside its domain
 * @example pixelPitchUm(36, 6000) // 6
 * @source definition
 */
export function pixelPitchUm(sensorWidthMm: number, imageWidthPx: number): number {
  inDomain('sensorWidthMm', sensorWidthMm, SMALLEST, ANY);
  inDomain('imageWidthPx', imageWidthPx, SMALLEST, ANY);
  return (sensorWidthMm / imageWidthPx) * 1000;
}
