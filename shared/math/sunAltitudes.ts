import { dipOfSunriseDeg } from './dip';

/**
 * Altitude of the sun's centre at sunrise and sunset with a level horizon: −50′, that is 34′ of refraction and 16′ of
 * semidiameter. Source: USNO, Rise, Set, and Twilight Definitions.
 */
export const SUNRISE_DEG = -50 / 60;

/** Limits of civil, nautical and astronomical twilight, geometric. Source: USNO, as above. */
export const CIVIL_DEG = -6;
export const NAUTICAL_DEG = -12;
export const ASTRONOMICAL_DEG = -18;

/**
 * Altitude of the sun's centre at sunrise and sunset for an eye above the visible horizon.
 *
 * h = −50′ − 2.12′·√m
 *
 * @param eyeHeightM m, metres above the visible horizon, 0 or more
 * @returns degrees without refraction
 * @throws RangeError when the height is negative or not finite
 * @example sunriseAltitudeDeg(100) // −1.18667
 * @source USNO definition; dip with refraction: Explanatory Supplement (1992), pp. 484–489, as quoted by R. H. van Gent
 */
export function sunriseAltitudeDeg(eyeHeightM: number): number {
  return SUNRISE_DEG - dipOfSunriseDeg(eyeHeightM);
}
