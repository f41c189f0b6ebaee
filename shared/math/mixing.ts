/**
 * Adding light, in stops.
 *
 * Light adds linearly on the subject and on the sensor (H = H1 + H2 + ...), so amounts that are written in stops
 * are turned into factors of two, added, and turned back. The largest amount is taken out of the sum first, so
 * that neither very bright nor very dim parts overflow or vanish.
 */

/**
 * The sum of several lights.
 *
 * s = log2(2^s1 + 2^s2 + ...), computed as m + log2(sum of 2^(si - m)) with m the largest.
 *
 * @param stops s1, s2, ...: each light, in stops from a common reference (EV100 of each works too); any finite
 *   number, at least one
 * @returns the sum, in stops from the same reference
 * @throws RangeError when the list is empty or holds a number that is not finite
 * @example addStops([0, 0]) // 1: two equal lights are one stop more than either
 * @source additivity of exposure, derivation (project handbook, section 10.1)
 */
export function addStops(stops: readonly number[]): number {
  const brightest = largestOf(stops);
  let sum = 0;
  for (const part of stops) sum += 2 ** (part - brightest);
  return brightest + Math.log2(sum);
}

/**
 * How much of the total each light contributes.
 *
 * share_i = 2^si / (2^s1 + 2^s2 + ...)
 *
 * @param stops s1, s2, ...: each light, in stops from a common reference; any finite number, at least one
 * @returns one share for each light, in the same order, dimensionless, 0 to 1; they add up to 1
 * @throws RangeError when the list is empty or holds a number that is not finite
 * @example sharesOfLight([0, -1]) // [2/3, 1/3]
 * @source additivity of exposure, derivation (project handbook, section 10.4 gives the two-light case)
 */
export function sharesOfLight(stops: readonly number[]): number[] {
  const brightest = largestOf(stops);
  const factors = stops.map((part) => 2 ** (part - brightest));
  const sum = factors.reduce((total, factor) => total + factor, 0);
  return factors.map((factor) => factor / sum);
}

/**
 * The light that is still needed to bring what is there up to a wanted total.
 *
 * s = log2(2^total - 2^already) = total + log2(1 - 2^(already - total))
 *
 * @param totalStops the wanted total, in stops from a common reference; finite
 * @param alreadyStops what is there already, in stops from the same reference; finite
 * @returns the missing light in stops from the same reference, or null when there is no room for any: what is
 *   there already reaches the total, and no light darkens
 * @throws RangeError when a number is not finite
 * @example stopsStillNeeded(0, -1) // -1: half of the light is there, the other half is missing
 * @source additivity of exposure, derivation (project handbook, section 10.1)
 */
export function stopsStillNeeded(totalStops: number, alreadyStops: number): number | null {
  requireFinite(totalStops);
  requireFinite(alreadyStops);
  const room = totalStops - alreadyStops;
  if (room <= 0) return null;
  // expm1 keeps the digits of 1 - 2^-room when there is hardly any room left.
  return totalStops + Math.log2(-Math.expm1(-room * Math.LN2));
}

/**
 * The lighting ratio of a key light that reaches one side of a face and a fill that reaches both:
 * (key + fill):fill, the cinematographers' definition.
 *
 * R = (2^k + 2^f) / 2^f = 1 + 2^(k - f)
 *
 * @param keyStops k: the key at the subject, in stops from a common reference; finite
 * @param fillStops f: the fill at the subject, in stops from the same reference; finite
 * @returns R, dimensionless, above 1 (Infinity when the key is more than 1,023 stops over the fill)
 * @throws RangeError when a number is not finite
 * @example ratioOfStops(1, 0) // 3: one stop between the lights is 3:1
 * @source the (key + fill):fill definition as given by the encyclopaedia article "Lighting ratio" (200 and 100 fc
 *   are 3:1, 800 and 200 fc are 5:1); formula by derivation
 */
export function ratioOfStops(keyStops: number, fillStops: number): number {
  requireFinite(keyStops);
  requireFinite(fillStops);
  return 1 + 2 ** (keyStops - fillStops);
}

/**
 * How far the key is over the fill, for a lighting ratio of (key + fill):fill. The other way round of
 * {@link ratioOfStops}.
 *
 * d = log2(R - 1)
 *
 * @param ratio R: (key + fill):fill, dimensionless, above 1
 * @returns d = key minus fill, in stops; negative when the fill is stronger than the key
 * @throws RangeError when the ratio is not a finite number above 1: a lit side is always brighter than a side
 *   that lacks the key
 * @example differenceOfRatio(4) // 1.585: 4:1 needs a key of three times the fill
 * @source derivation from the definition above
 */
export function differenceOfRatio(ratio: number): number {
  if (!Number.isFinite(ratio) || ratio <= 1) throw new RangeError('A ratio of (key + fill):fill is above 1.');
  return Math.log2(ratio - 1);
}

/**
 * How much brighter the side that key and fill light is than the side that only the fill lights.
 *
 * s = log2(1 + 2^d) = log2 of the lighting ratio
 *
 * @param differenceStops d: key minus fill, in stops; finite
 * @returns s, in stops, 0 or more
 * @throws RangeError when the number is not finite
 * @example litOverShadowStops(0) // 1: equal lights make the lit side twice as bright
 * @source derivation (project handbook, section 10.2)
 */
export function litOverShadowStops(differenceStops: number): number {
  requireFinite(differenceStops);
  // log1p keeps the digits of a key that is far weaker than the fill; taking a stronger key out keeps it finite.
  const over = Math.max(differenceStops, 0);
  return over + Math.log1p(2 ** -Math.abs(differenceStops)) / Math.LN2;
}

function largestOf(stops: readonly number[]): number {
  if (stops.length === 0) throw new RangeError('There is no light to add.');
  let largest = -Infinity;
  for (const part of stops) {
    requireFinite(part);
    if (part > largest) largest = part;
  }
  return largest;
}

function requireFinite(stops: number): void {
  if (!Number.isFinite(stops)) throw new RangeError('An amount of light in stops is a finite number.');
}
