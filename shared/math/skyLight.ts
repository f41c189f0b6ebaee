import { lightInRanges, SUN_RANGES } from './illuminanceRanges';

/** Sun and clear sky on a horizontal surface. */
export interface SkyLight {
  readonly illuminanceLux: number;
  /** How much the light grows with altitude; 0 outside the model. */
  readonly slopeStopsPerDegree: number;
  /** Whether the altitude lies outside the model, −18 to 90 degrees, and its end is given instead. */
  readonly isClamped: boolean;
}

/** Below this the sun adds nothing that the model knows. */
export const DARKEST_DEG = -18;

/**
 * Horizontal illuminance by sun and clear sky.
 *
 * log10 E = l0 + l1·x + l2·x² + l3·x³, x = h/90, in six ranges; steps of up to 0.014 stop where ranges meet. The
 * altitude is the geometric one everywhere: continuous, and at most half a stop from the refracted one at the horizon.
 *
 * @param sunAltitudeDeg h of the sun's centre without refraction, −90 to 90 degrees
 * @returns lx, stops per degree
 * @throws RangeError when the altitude is out of range
 * @example skyLight(-6).illuminanceLux // 3.41159
 * @source Explanatory Supplement (1992), p. 491, as transcribed in two independent codes; clamping and geometric
 *   altitude are modelling choices
 */
export function skyLight(sunAltitudeDeg: number): SkyLight {
  if (!(Math.abs(sunAltitudeDeg) <= 90)) {
    throw new RangeError(`an altitude of −90 to 90 degrees, not ${sunAltitudeDeg}`);
  }
  const isClamped = sunAltitudeDeg < DARKEST_DEG;
  const { log10Lux, slopeStopsPerDegree } = lightInRanges(SUN_RANGES, Math.max(DARKEST_DEG, sunAltitudeDeg));
  return {
    illuminanceLux: 10 ** log10Lux,
    slopeStopsPerDegree: isClamped ? 0 : slopeStopsPerDegree,
    isClamped,
  };
}

/**
 * How fast the light of the sky falls.
 *
 * −(d log2 E / dh)·(dh/dt)
 *
 * @param sunAltitudeDeg h without refraction, −90 to 90 degrees
 * @param climbDegPerMinute dh/dt, degrees per minute, positive while the sun climbs
 * @returns stops per minute, positive while it darkens; 0 outside the model
 * @throws RangeError when the altitude is out of range
 * @example fallStopsPerMinute(-6, -0.25) // 0.410
 * @source derivation
 */
export function fallStopsPerMinute(sunAltitudeDeg: number, climbDegPerMinute: number): number {
  return 0 - skyLight(sunAltitudeDeg).slopeStopsPerDegree * climbDegPerMinute;
}
