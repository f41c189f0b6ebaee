/** One range of a model log10 E = l0 + l1·x + l2·x² + l3·x³, x = h/90; its lower limit is included. */
export interface IlluminanceRange {
  readonly fromDeg: number;
  readonly terms: readonly [number, number, number, number];
}

/** What a range gives at an altitude. */
export interface LogLight {
  /** Decimal logarithm of the illuminance in lx. */
  readonly log10Lux: number;
  readonly slopeStopsPerDegree: number;
}

/**
 * Sun on a clear sky, horizontal illuminance. Source: Explanatory Supplement (1992), p. 491, as transcribed alike by
 * E. Ofek's astronomy toolbox and D. Vallado's astrodynamics code (Vallado 2007, eq. 5-9). Stated error 0.01 to 0.02.
 */
export const SUN_RANGES: readonly IlluminanceRange[] = [
  { fromDeg: 20, terms: [3.74, 3.97, -4.07, 1.47] },
  { fromDeg: 5, terms: [3.05, 13.28, -45.98, 64.33] },
  { fromDeg: -0.8, terms: [2.88, 22.26, -207.64, 1034.3] },
  { fromDeg: -5, terms: [2.88, 21.81, -258.11, -858.36] },
  { fromDeg: -12, terms: [2.7, 12.17, -431.69, -1899.83] },
  { fromDeg: -18, terms: [13.84, 262.72, 1447.42, 2797.93] },
];

/** Full moon at mean distance. Source: as above. Stated error 0.02 to 0.03. */
export const MOON_RANGES: readonly IlluminanceRange[] = [
  { fromDeg: 20, terms: [-1.95, 4.06, -4.24, 1.56] },
  { fromDeg: 5, terms: [-2.58, 12.58, -42.58, 59.06] },
  { fromDeg: -0.8, terms: [-2.79, 24.27, -252.95, 1321.29] },
];

/**
 * A model's light at an altitude.
 *
 * log10 E as above; slope = (l1 + 2·l2·x + 3·l3·x²) / (90·log10 2)
 *
 * @param ranges from the highest to the lowest
 * @param altitudeDeg h, degrees, not under the lowest range's limit (the lowest range is used there)
 * @returns the logarithm and the slope
 * @example lightInRanges(SUN_RANGES, 0).log10Lux // 2.88
 * @source Explanatory Supplement (1992), p. 491, see the tables; the slope is its derivative
 */
export function lightInRanges(ranges: readonly IlluminanceRange[], altitudeDeg: number): LogLight {
  const range = ranges.find(({ fromDeg }) => altitudeDeg >= fromDeg) ?? ranges.at(-1);
  if (!range) throw new RangeError('a model of at least one range');
  const [l0, l1, l2, l3] = range.terms;
  const x = altitudeDeg / 90;
  return {
    log10Lux: l0 + x * (l1 + x * (l2 + x * l3)),
    slopeStopsPerDegree: (l1 + x * (2 * l2 + x * 3 * l3)) / (90 * Math.LOG10E * Math.LN2),
  };
}
