import { lightInRanges, MOON_RANGES } from './illuminanceRanges';

/** The lowest altitude of the model; below it the moon has set and adds nothing. */
const MOONSET_DEG = -0.8;

/** The horizontal parallax that the ranges are for, degrees. */
const MEAN_PARALLAX_DEG = 0.951;

/**
 * Horizontal illuminance by the moon on a clear sky.
 *
 * log10 E = l0 + l1·x + l2·x² + l3·x³ − 8.68e-3·f − 2.2e-9·f⁴ + 2·log10(π/0.951), x = h/90
 *
 * @param altitudeDeg h of the moon's centre as seen from the place, without refraction, −90 to 90 degrees
 * @param phaseAngleDeg f, 0 (full) to 180 (new): 180° less the elongation from the sun
 * @param parallaxDeg π, horizontal parallax, > 0, usually 0.90 to 1.02
 * @returns lx; 0 below −0.8°
 * @throws RangeError when a value is out of range
 * @example moonLight(90, 0, 0.951) // 0.2692
 * @source Explanatory Supplement (1992), p. 491, as transcribed in two independent codes
 */
export function moonLight(altitudeDeg: number, phaseAngleDeg: number, parallaxDeg: number): number {
  if (!(Math.abs(altitudeDeg) <= 90)) throw new RangeError(`an altitude of −90 to 90, not ${altitudeDeg}`);
  if (!(phaseAngleDeg >= 0 && phaseAngleDeg <= 180)) {
    throw new RangeError(`a phase angle of 0 to 180 degrees, not ${phaseAngleDeg}`);
  }
  if (!(parallaxDeg > 0)) throw new RangeError(`a parallax above 0 degrees, not ${parallaxDeg}`);
  if (altitudeDeg < MOONSET_DEG) return 0;
  const phase = -8.68e-3 * phaseAngleDeg - 2.2e-9 * phaseAngleDeg ** 4;
  const distance = 2 * Math.log10(parallaxDeg / MEAN_PARALLAX_DEG);
  return 10 ** (lightInRanges(MOON_RANGES, altitudeDeg).log10Lux + phase + distance);
}
