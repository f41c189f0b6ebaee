/** Radians in one degree. */
export const RADIANS_PER_DEGREE = Math.PI / 180;

const TURN = 2 * Math.PI;

/**
 * The same angle within half a turn of zero.
 *
 * a' = a − 2π·round(a / 2π)
 *
 * @param angleRad a, radians; any finite number
 * @returns radians, −π to π
 * @example wrapRadians(1.5 * Math.PI) // −π/2
 * @source derivation
 */
export function wrapRadians(angleRad: number): number {
  return angleRad - TURN * Math.round(angleRad / TURN);
}

/**
 * The same direction as degrees clockwise from north.
 *
 * A' = A mod 360
 *
 * @param azimuthDeg A, degrees; any finite number
 * @returns degrees, 0 ≤ A' < 360
 * @example wrapAzimuthDeg(-90) // 270
 * @source derivation
 */
export function wrapAzimuthDeg(azimuthDeg: number): number {
  return turned(azimuthDeg % 360);
}

/**
 * The compass direction of a horizontal vector.
 *
 * A = atan2(east, north)
 *
 * @param east component towards the east
 * @param north component towards the north, same unit
 * @returns degrees clockwise from north, 0 ≤ A < 360; 0 for the zero vector
 * @example compassDeg(-1, 0) // 270
 * @source derivation
 */
export function compassDeg(east: number, north: number): number {
  return turned(Math.atan2(east, north) / RADIANS_PER_DEGREE);
}

/** −360 < A < 360 to 0 ≤ A < 360; an angle too small to be told from a full turn is north. */
function turned(degrees: number): number {
  if (degrees >= 0) return degrees;
  return degrees + 360 < 360 ? degrees + 360 : 0;
}
