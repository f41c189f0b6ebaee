/** c0 + c1·u + c2·u² + c3·u³ + c4·u⁴ */
export type Quartic = readonly [number, number, number, number, number];

/**
 * The quartic through five equally spaced points.
 *
 * Central differences of y at u = −1, −1/2, 0, 1/2, 1, written for v = 2u.
 *
 * @param values y, one at each of the five points, in order; finite
 * @returns the coefficients, in the unit of y
 * @throws RangeError unless there are five values
 * @example quarticThrough([1, 0.0625, 0, 0.0625, 1]) // [0, 0, 0, 0, 1]
 * @source Stirling's interpolation formula, derivation
 */
export function quarticThrough(values: readonly number[]): Quartic {
  const [a, b, c, d, e] = values;
  if (a === undefined || b === undefined || c === undefined || d === undefined || e === undefined) {
    throw new RangeError('a quartic needs five values');
  }
  return [
    c,
    (2 * (a - 8 * b + 8 * d - e)) / 12,
    (4 * (-a + 16 * b - 30 * c + 16 * d - e)) / 24,
    (8 * (-a + 2 * b - 2 * d + e)) / 12,
    (16 * (a - 4 * b + 6 * c - 4 * d + e)) / 24,
  ];
}

/**
 * The quartic's value.
 *
 * @param quartic c0 ... c4
 * @param u any number; dimensionless
 * @returns the value, in the unit of c0
 * @example valueOfQuartic([0, 0, 0, 0, 1], 2) // 16
 * @source Horner's scheme
 */
export function valueOfQuartic(quartic: Quartic, u: number): number {
  return quartic[0] + u * (quartic[1] + u * (quartic[2] + u * (quartic[3] + u * quartic[4])));
}

/**
 * The quartic's slope, c1 + 2·c2·u + 3·c3·u² + 4·c4·u³.
 *
 * @param quartic c0 ... c4
 * @param u any number; dimensionless
 * @returns the slope, in the unit of c1
 * @example slopeOfQuartic([0, 0, 0, 0, 1], 2) // 32
 * @source Horner's scheme
 */
export function slopeOfQuartic(quartic: Quartic, u: number): number {
  return quartic[1] + u * (2 * quartic[2] + u * (3 * quartic[3] + u * 4 * quartic[4]));
}
