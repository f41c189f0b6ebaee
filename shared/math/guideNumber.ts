import { ANY, inDomain, SMALLEST } from './domain';

/** The ISO speed that a guide number is stated for here; ISO 100 and metres are the customary basis. */
export const GUIDE_NUMBER_ISO = 100;

/** Metres in an international foot, exact by definition. */
const METRES_PER_FOOT = 0.3048;

/** What changes how far a flash reaches. */
export interface GuideNumberScale {
  /** S, arithmetic speed, > 0; default 100 */
  readonly iso?: number;
  /** p, fraction of full power, > 0; default 1 */
  readonly power?: number;
  /** n, equal pops or equal heads, > 0; default 1 */
  readonly count?: number;
  /** loss by modifier, gel and filter, stops that take light away; default 0 */
  readonly lossStops?: number;
}

/**
 * The guide number at another ISO speed, power, number of pops or heads, and loss.
 *
 * GN' = GN·√(S/100·p·n·2^(−loss))
 *
 * @param guideNumberM GN: f-number times metres, at ISO 100 and full power, > 0
 * @param scale what differs from that
 * @returns GN', f-number times metres
 * @throws RangeError when a value is outside its domain
 * @example scaleGuideNumber(40, { iso: 400, power: 1 / 4 }) // 40: two stops up, two stops down
 * @source ISO 1230:2007, introduction (f-number times distance is constant for an ISO speed); the roots by
 *   derivation from the inverse square
 */
export function scaleGuideNumber(guideNumberM: number, scale: GuideNumberScale): number {
  const { iso = GUIDE_NUMBER_ISO, power = 1, count = 1, lossStops = 0 } = scale;
  inDomain('guideNumberM', guideNumberM, SMALLEST, ANY);
  inDomain('iso', iso, SMALLEST, ANY);
  inDomain('power', power, SMALLEST, ANY);
  inDomain('count', count, SMALLEST, ANY);
  inDomain('lossStops', lossStops, -1000, 1000);
  return guideNumberM * Math.sqrt((iso / GUIDE_NUMBER_ISO) * power * count) * 2 ** (-lossStops / 2);
}

/**
 * The guide number of several flashes from one place, aimed alike.
 *
 * GN = √(GN1² + GN2² + ...), because exposures add and each is in proportion to its GN squared
 *
 * @param guideNumbersM GN1, GN2, ...: f-number times metres, on one basis, each > 0; at least one
 * @returns GN, f-number times metres, on the same basis
 * @throws RangeError when the list is empty or a value is outside its domain
 * @example addGuideNumbers([36, 22]) // 42.19
 * @source derivation; the shortcut (GN1 + GN2)/√(2) that circulates is right for equal flashes only
 */
export function addGuideNumbers(guideNumbersM: readonly number[]): number {
  if (guideNumbersM.length === 0) throw new RangeError('guideNumbersM holds at least one guide number.');
  for (const guideNumberM of guideNumbersM) inDomain('guideNumberM', guideNumberM, SMALLEST, ANY);
  return Math.hypot(...guideNumbersM);
}

/**
 * A guide number in feet. GN_ft = GN_m / 0.3048, because the distance is the only length in it.
 *
 * @param guideNumberM GN_m: f-number times metres, > 0
 * @returns GN_ft: f-number times feet
 * @throws RangeError when the value is outside its domain
 * @example guideNumberFeet(40) // 131.23
 * @source derivation from the international foot (0.3048 m); 3.3 is a rule of thumb, 0.6 % off
 */
export function guideNumberFeet(guideNumberM: number): number {
  inDomain('guideNumberM', guideNumberM, SMALLEST, ANY);
  return guideNumberM / METRES_PER_FOOT;
}

/**
 * How much brighter a small source lights a subject at one distance than at another.
 *
 * s = 2·log2(d_from / d_to)
 *
 * @param fromM d_from: distance of light and subject before, m, > 0
 * @param toM d_to: distance afterwards, m, > 0
 * @returns s, stops; negative when the light moves away
 * @throws RangeError when a distance is outside its domain
 * @example inverseSquareStops(2, 4) // -2
 * @source inverse square law, for sources that are small against the distance
 */
export function inverseSquareStops(fromM: number, toM: number): number {
  inDomain('fromM', fromM, SMALLEST, ANY);
  inDomain('toM', toM, SMALLEST, ANY);
  return 2 * Math.log2(fromM / toM);
}

/**
 * What extension of the lens takes from flash and ambient in a close-up: the f-number in use is N·(1 + m).
 *
 * loss = 2·log2(1 + m)
 *
 * @param magnification m: size on the sensor over size of the subject, ≥ 0
 * @returns loss, stops, 0 or more
 * @throws RangeError when the value is outside its domain
 * @example closeUpLossStops(1) // 2: life size costs two stops
 * @source derivation for a symmetric lens (pupil magnification 1) that focuses by extension
 */
export function closeUpLossStops(magnification: number): number {
  inDomain('magnification', magnification, 0, ANY);
  return 2 * Math.log2(1 + magnification);
}
