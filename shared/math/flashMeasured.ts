import { solveFlash } from './flashExposure';
import { ambientShare } from './ghost';
import { stopsStillNeeded } from './mixing';

/** A test frame with flash. */
export interface FlashTestFrame {
  /** r: how bright the subject came out, stops from a middle tone, finite */
  readonly resultStops: number;
  /** a: how bright the ambient light alone would have made it, stops; left out where it counts for nothing */
  readonly ambientStops?: number;
  /** d: from the flash to the subject, m, > 0 */
  readonly distanceM: number;
  /** N: f-number, > 0 */
  readonly aperture: number;
  /** S: arithmetic speed, > 0 */
  readonly iso: number;
  /** p: fraction of full power, > 0 */
  readonly power: number;
  /** filter on the lens, stops that take light away */
  readonly ndStops?: number;
}

/** What a test frame says about a flash. */
export interface MeasuredFlash {
  /** f-number times metres at ISO 100 and full power, with the modifier and its loss in it */
  readonly guideNumberM: number;
  /** the flash's own part of the result, stops */
  readonly flashStops: number;
  /** ambient light's part of the subject's exposure, 0 to 1 */
  readonly ambientShare: number;
  /** how many stops the flash is misjudged for each stop by which the result is, for small errors; 1 or more */
  readonly errorFactor: number;
}

/**
 * The guide number that a flash with its modifier really has.
 *
 * f = log2(2^r − 2^a), GN = N·d·√(2^(f + nd)·100/(S·p)); an error of r grows by 2^r/(2^r − 2^a) = 1/(1 − share)
 *
 * @param frame r, a, d, N, S, p and the filter
 * @returns the guide number and what it rests on; null where ambient light alone explains the result
 * @throws RangeError when a value is outside its domain
 * @example measureFlash({ resultStops: 0, distanceM: 3, aperture: 8, iso: 100, power: 1 }) // guideNumberM 24
 * @source derivation from the additivity of exposure and GN = N·d
 */
export function measureFlash(frame: FlashTestFrame): MeasuredFlash | null {
  const { resultStops, ambientStops, distanceM, aperture, iso, power, ndStops = 0 } = frame;
  const flash = ambientStops === undefined ? resultStops : stopsStillNeeded(resultStops, ambientStops);
  if (flash === null) return null;
  const known = { guideNumberM: 1, distanceM, aperture, iso, power };
  const share = ambientStops === undefined ? 0 : ambientShare(flash - ambientStops);
  return {
    guideNumberM: solveFlash('guideNumberM', known, flash, { lossStops: ndStops }),
    flashStops: flash,
    ambientShare: share,
    // From the flash's own share, which stays above 0 where 1 - share would be rounded away.
    errorFactor: ambientStops === undefined ? 1 : 1 + 2 ** (ambientStops - flash),
  };
}
