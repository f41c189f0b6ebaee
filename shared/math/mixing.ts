import { ANY, inDomain } from './domain';

/**
 * Adding light, in stops. Light adds linearly on the subject and on the sensor (H = H1 + H2 + ...), so stops are
 * turned into factors of two, added, and turned back. The largest is taken out of the sum first, so that neither
 * very bright nor very dim parts overflow or vanish.
 */

/** Beyond this difference 2^d is no longer a finite number. */
const WIDEST_STOPS = 1023;

/** A ratio this close to 1 can't be told from 1 in a double. */
const SMALLEST_RATIO = 1 + Number.EPSILON;

/**
 * The sum of several lights: s = log2(2^s1 + 2^s2 + ...), computed as m + log2(Σ 2^(si − m)), m the largest.
 * @param stops s1, s2, ...: stops from a common reference (EV100 works too), finite, at least one
 * @returns stops from the same reference; addStops([0, 0]) = 1. Throws RangeError outside the domain.
 * Source: additivity of exposure, derivation (project handbook, section 10.1).
 */
export function addStops(stops: readonly number[]): number {
  const brightest = largestOf(stops);
  let sum = 0;
  for (const part of stops) sum += 2 ** (part - brightest);
  return brightest + Math.log2(sum);
}

/**
 * How much of the total each light contributes: share_i = 2^si / Σ 2^sj.
 * @param stops as for `addStops`
 * @returns shares from 0 to 1 in the same order, adding up to 1; sharesOfLight([0, −1]) = [2/3, 1/3].
 *   Throws RangeError outside the domain.
 * Source: additivity of exposure, derivation (project handbook, section 10.4, for two lights).
 */
export function sharesOfLight(stops: readonly number[]): number[] {
  const brightest = largestOf(stops);
  const factors = stops.map((part) => 2 ** (part - brightest));
  const sum = factors.reduce((total, factor) => total + factor, 0);
  return factors.map((factor) => factor / sum);
}

/**
 * The light that brings what is there up to a wanted total: s = log2(2^T − 2^a) = T + log2(1 − 2^(a − T)).
 * @param totalStops T, the wanted total, stops from a common reference, finite
 * @param alreadyStops a, what is there, stops from the same reference, finite
 * @returns stops from the same reference, or null when what is there already reaches the total, as no light
 *   darkens; stopsStillNeeded(0, −1) = −1. Throws RangeError outside the domain.
 * Source: additivity of exposure, derivation (project handbook, section 10.1).
 */
export function stopsStillNeeded(totalStops: number, alreadyStops: number): number | null {
  const room = finite(totalStops) - finite(alreadyStops);
  if (room <= 0) return null;
  // expm1 keeps the digits of 1 − 2^−room when there is hardly any room left.
  return totalStops + Math.log2(-Math.expm1(-room * Math.LN2));
}

/**
 * Lighting ratio of a key that reaches one side of a face and a fill that reaches both, by the cinematographers'
 * definition (key + fill):fill: R = 1 + 2^(k − f).
 * @param keyStops k, the key at the subject, stops from a common reference, finite
 * @param fillStops f, the fill at the subject, stops from the same reference, within 1,023 stops of k
 * @returns R, dimensionless, 1 or more (below −52 stops the key no longer shows in it); ratioOfStops(1, 0) = 3.
 *   Throws RangeError outside the domain.
 * Source: encyclopaedia, "Lighting ratio" (200 and 100 fc are 3:1, 800 and 200 fc are 5:1); derivation.
 */
export function ratioOfStops(keyStops: number, fillStops: number): number {
  const difference = finite(keyStops) - finite(fillStops);
  return 1 + 2 ** inDomain('key over fill in stops', difference, -ANY, WIDEST_STOPS);
}

/**
 * How far the key is over the fill for a ratio (key + fill):fill, the inverse of `ratioOfStops`:
 * d = log2(R − 1).
 * @param ratio R, dimensionless, above 1: a side that the key also reaches is always the brighter one
 * @returns d, stops, negative where the fill is stronger; differenceOfRatio(3) = 1. Throws RangeError outside the
 *   domain. Source: as for `ratioOfStops`.
 */
export function differenceOfRatio(ratio: number): number {
  return Math.log2(inDomain('a ratio of (key + fill):fill', ratio, SMALLEST_RATIO, ANY) - 1);
}

/**
 * How much brighter the side that key and fill light is than the side that only the fill lights: log2(1 + 2^d),
 * which is log2 of the ratio.
 * @param differenceStops d, key minus fill, stops, finite
 * @returns stops, 0 or more; litOverShadowStops(0) = 1. Throws RangeError outside the domain.
 * Source: derivation (project handbook, section 10.2).
 */
export function litOverShadowStops(differenceStops: number): number {
  // log1p keeps the digits of a key far weaker than the fill; a stronger key is taken out to stay finite.
  const over = Math.max(finite(differenceStops), 0);
  return over + Math.log1p(2 ** -Math.abs(differenceStops)) / Math.LN2;
}

function largestOf(stops: readonly number[]): number {
  if (stops.length === 0) throw new RangeError('there is no light to add');
  let largest = -Infinity;
  for (const part of stops) largest = Math.max(largest, finite(part));
  return largest;
}

function finite(stops: number): number {
  return inDomain('light in stops', stops, -ANY, ANY);
}
