import { inDomain } from './domain';

/** Domains: far beyond any lens and any exposure, near enough for every result to be a finite number. */
const FOCAL_MM = [1e-3, 1e6] as const;
const SHUTTER_S = [1e-12, 1e9] as const;

/**
 * How fast a hand turns a camera, in radians a second, for the rule of thumb to hold: at the rule's time 1/f(mm)
 * the blur f·ω·t is ω millimetres, and 0.030 mm is the usual circle of confusion of 36 × 24 mm. Derivation.
 */
export const HAND_TURN_RAD_PER_S = 0.03;

/**
 * Longest time for a camera in the hand: t = 2^s/(f·crop).
 * @param focalLengthMm f, the lens's own focal length, millimetres, 1e-3 to 1e6
 * @param cropFactor 43.27 mm over the sensor's diagonal, 1e-3 to 1e3; 1 for 36 × 24 mm
 * @param stabilisationStops s, what the stabiliser is claimed to gain, stops, 0 to 20
 * @returns seconds; 50 mm, crop 1.5, none gives 1/75. Throws RangeError outside the domain.
 * Source: the reciprocal rule, common practice ("Camera Shake and Image Stabilization", J. A. Wrotniak); stops as
 * log2 of the ratio of times as in CIPA DC-X011, as described by a test laboratory.
 */
export function slowestHandheldS(focalLengthMm: number, cropFactor = 1, stabilisationStops = 0): number {
  inDomain('focal length in mm', focalLengthMm, ...FOCAL_MM);
  inDomain('crop factor', cropFactor, 1e-3, 1e3);
  inDomain('stabilisation in stops', stabilisationStops, 0, 20);
  return 2 ** stabilisationStops / (focalLengthMm * cropFactor);
}

/**
 * Blur on the sensor by a camera that turns in the hand: b = f·ω·2^(−s)·t.
 * @param focalLengthMm f, millimetres, 1e-3 to 1e6
 * @param shutterS t, seconds, 1e-12 to 1e9
 * @param stabilisationStops s, stops, 0 to 20
 * @param turnRadPerS ω, radians a second, 1e-9 to 1e3
 * @returns micrometres; 200 mm for 1/60 s at 0.03 rad/s gives 100. Throws RangeError outside the domain.
 * Source: derivation for small angles (project handbook, section 7.1); a model, hands differ.
 */
export function shakeBlurUm(
  focalLengthMm: number,
  shutterS: number,
  stabilisationStops = 0,
  turnRadPerS: number = HAND_TURN_RAD_PER_S,
): number {
  inDomain('focal length in mm', focalLengthMm, ...FOCAL_MM);
  inDomain('shutter in s', shutterS, ...SHUTTER_S);
  inDomain('stabilisation in stops', stabilisationStops, 0, 20);
  inDomain('turn in rad/s', turnRadPerS, 1e-9, 1e3);
  return 1000 * focalLengthMm * turnRadPerS * 2 ** -stabilisationStops * shutterS;
}

/**
 * How far a time is over a limit: log2(t/limit).
 * @param shutterS t, seconds, 1e-12 to 1e9
 * @param limitS seconds, 1e-12 to 1e9
 * @returns stops, 0 or less within the limit; 1/25 s over a limit of 1/50 s is 1. Throws RangeError outside the
 *   domain. Source: definition of the stop.
 */
export function stopsOverLimit(shutterS: number, limitS: number): number {
  inDomain('shutter in s', shutterS, ...SHUTTER_S);
  inDomain('limit in s', limitS, ...SHUTTER_S);
  return Math.log2(shutterS) - Math.log2(limitS);
}
