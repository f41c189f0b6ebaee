import { ANY, inDomain } from './domain';

/** Linear light of a middle tone where full white is 1. Common practice: the 18 % grey card. */
export const MIDDLE_TONE_LINEAR = 0.18;

/**
 * Linear light as an sRGB value: V = 12.92·L up to 0.0031308, above it 1.055·L^(1/2.4) − 0.055.
 *
 * @param linear L: share of full white, ≥ 0; what is over 1 is clipped
 * @returns V, 0 to 1, dimensionless
 * @throws RangeError when the value is negative or not a number
 * @example encodeSrgb(0.18) // 0.461
 * @source IEC 61966-2-1:1999, the transfer function, from memory of the standard
 */
export function encodeSrgb(linear: number): number {
  const held = Math.min(1, inDomain('linear', linear, 0, Infinity));
  return held <= 0.0031308 ? 12.92 * held : 1.055 * held ** (1 / 2.4) - 0.055;
}

/**
 * Linear light of a brightness in stops from a middle tone: L = 0.18·2^s.
 *
 * @param stops s: finite
 * @returns L, share of full white; over 1 where a camera would clip
 * @throws RangeError when the value is not finite
 * @example linearOfStops(1) // 0.36
 * @source definition of the stop
 */
export function linearOfStops(stops: number): number {
  return MIDDLE_TONE_LINEAR * 2 ** inDomain('stops', stops, -ANY, ANY);
}
