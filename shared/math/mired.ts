import { inDomain } from './domain';

/** Colour temperatures that the arithmetic of mireds is used for, in kelvin. */
export const COLDEST_K = 1000;
export const HOTTEST_K = 40_000;

const MILLION = 1_000_000;

/**
 * Micro reciprocal degrees: M = 10^6/T. Equal steps in mired look about equally large.
 * @param temperatureK T, kelvin, 1,000 to 40,000
 * @returns mired, 25 to 1,000; 5000 K is 200. Throws RangeError outside the domain.
 * Source: encyclopaedia, "Mired".
 */
export function miredOf(temperatureK: number): number {
  return MILLION / inDomain('colour temperature in K', temperatureK, COLDEST_K, HOTTEST_K);
}

/**
 * Shift from one colour temperature to another: Δ = 10^6/T2 − 10^6/T1. Also the cast of a light of T2 in a picture
 * whose white balance is T1.
 * @param fromK T1, kelvin, 1,000 to 40,000
 * @param toK T2, kelvin, 1,000 to 40,000
 * @returns mired, positive is warmer (amber); 5500 K to 3200 K is +130.68. Throws RangeError outside the domain.
 * Source: encyclopaedia, "Mired".
 */
export function miredShift(fromK: number, toK: number): number {
  return miredOf(toK) - miredOf(fromK);
}

/**
 * Colour temperature behind a filter that shifts by so many mired: T2 = 10^6/(10^6/T1 + Δ).
 * @param sourceK T1, kelvin, 1,000 to 40,000
 * @param shift Δ, mired, −1,000 to 1,000
 * @returns kelvin, or null where the result is hotter than 40,000 K (25 mired or less) or colder than 1,000 K;
 *   5500 K by +131 is 3197 K. Throws RangeError outside the domain.
 * Source: encyclopaedia, "Mired"; the limits are the domain of the arithmetic (project handbook, section 11.1).
 */
export function shiftedTemperatureK(sourceK: number, shift: number): number | null {
  const mired = miredOf(sourceK) + inDomain('shift in mired', shift, -1000, 1000);
  if (mired <= MILLION / HOTTEST_K || mired > MILLION / COLDEST_K) return null;
  // As a factor of the source, so that no shift leaves it as it is, to the last digit; at the ends rounding
  // must not lead outside.
  return Math.min(HOTTEST_K, Math.max(COLDEST_K, sourceK / (1 + (sourceK * shift) / MILLION)));
}
