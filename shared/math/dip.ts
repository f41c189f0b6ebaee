/** Minutes of arc for an eye one metre up: the Nautical Almanac's dip of the visible horizon. */
const VISIBLE_ARCMIN = 1.76;

/** The same with the refraction between horizon and eye added once more, as the rising sun's ray suffers it. */
const SUNRISE_ARCMIN = 2.12;

/**
 * How far below the level the visible horizon appears.
 *
 * D = 1.76′·√m
 *
 * @param eyeHeightM m, metres above the visible horizon, 0 or more
 * @returns degrees, 0 or more
 * @throws RangeError when the height is negative or not finite
 * @example dipOfHorizonDeg(100) * 60 // 17.6
 * @source The Nautical Almanac's formula as quoted on NavList
 */
export function dipOfHorizonDeg(eyeHeightM: number): number {
  return (VISIBLE_ARCMIN * rootOfHeight(eyeHeightM)) / 60;
}

/**
 * How far the eye's height lowers the sun's centre at sunrise and sunset: dip, and 0.37′·√m of refraction.
 *
 * D = 2.12′·√m
 *
 * @param eyeHeightM m, metres above the visible horizon (not above sea level), 0 or more
 * @returns degrees, 0 or more
 * @throws RangeError when the height is negative or not finite
 * @example dipOfSunriseDeg(100) * 60 // 21.2
 * @source Explanatory Supplement (1992), pp. 484–489, as quoted by R. H. van Gent
 */
export function dipOfSunriseDeg(eyeHeightM: number): number {
  return (SUNRISE_ARCMIN * rootOfHeight(eyeHeightM)) / 60;
}

function rootOfHeight(eyeHeightM: number): number {
  if (!(eyeHeightM >= 0) || eyeHeightM === Infinity) {
    throw new RangeError(`an eye height of 0 metres or more, not ${eyeHeightM}`);
  }
  return Math.sqrt(eyeHeightM);
}
