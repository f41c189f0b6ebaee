import { ABSENT_COUNT, factorAt } from './fillMisses';
import { firstAtLeast, lastAtMostFrom, type RoleSums } from './roleSums';

/** What the flashes of one part have to do, in the light of the flash levels. */
export interface FlashTask {
  /** what is there already, and what is wished in all */
  readonly ambient: number;
  readonly wished: number;
  /** (key + fill):fill; null where none is wished or there are not both */
  readonly ratio: number | null;
  /** nothing may be left out: without a flash the part is absent (a rim) */
  readonly isNeeded: boolean;
}

/** The flashes that work on one part: keys, or rims, and the fills. */
export interface FlashGroup {
  readonly keys: RoleSums;
  readonly fills: RoleSums;
}

/** Misses that are allowed for the sum of the light and for the ratio of key and fill; parts of 1/120 stop. */
export interface Allowed {
  readonly sum: number;
  readonly ratio: number;
}

/** Bounds on key K and fill L for a miss: sumLow ≤ K + L ≤ sumHigh, ratioLow·L ≤ K ≤ ratioHigh·L. */
export interface MixBounds {
  readonly sumLow: number;
  readonly sumHigh: number;
  readonly ratioLow: number;
  readonly ratioHigh: number;
  readonly needsKey: boolean;
  readonly needsFill: boolean;
}

/** Light that differs by less is the same; covers the rounding of a few additions. */
const SAME_LIGHT = 1e-12;
const FREE = { ratioLow: 0, ratioHigh: Infinity, needsKey: false, needsFill: false };

/**
 * The bounds that misses put on key and fill.
 * @param sumFactor by how much the sum may be off, as a factor of light; null for any sum, absent included
 * @param ratioFactor the same for the ratio; null for any ratio, absent included
 */
export function boundsFor(task: FlashTask, sumFactor: number | null, ratioFactor: number | null): MixBounds {
  const { ambient, wished, ratio, isNeeded } = task;
  if (sumFactor === null) return { sumLow: 0, sumHigh: Infinity, ...FREE };
  // Each bound is wider by its own rounding, since lights may differ by any number of stops.
  const sumLow = wished * (1 / sumFactor - SAME_LIGHT) - ambient;
  const sumHigh = wished * sumFactor * (1 + SAME_LIGHT) - ambient;
  if (ratio === null || ratioFactor === null)
    return { sumLow, sumHigh, ratioLow: 0, ratioHigh: Infinity, needsKey: isNeeded, needsFill: false };
  return {
    sumLow,
    sumHigh,
    ratioLow: Math.max(0, (ratio / ratioFactor) * (1 - SAME_LIGHT) - 1),
    ratioHigh: ratio * ratioFactor * (1 + SAME_LIGHT) - 1,
    needsKey: true,
    needsFill: true,
  };
}

/** The same from counted misses; a part that may miss by ten stops may be left out. */
export const boundsWithin = (task: FlashTask, { sum, ratio }: Allowed): MixBounds =>
  boundsFor(
    task,
    task.isNeeded && sum >= ABSENT_COUNT ? null : factorAt(sum),
    ratio >= ABSENT_COUNT ? null : factorAt(ratio),
  );

const clamp = (value: number, low: number, high: number) => Math.min(high, Math.max(low, value));

/**
 * The keys that go with any fill from l1 to l2 within bounds. The bounds are a convex figure in the plane of key and
 * fill, so the keys are everything from a least to a most; the least lies where both lower edges meet, or next to it,
 * and so does the most.
 *
 * @returns [least, most]; crossed where no key goes with such a fill
 */
export function keysFor(b: MixBounds, l1: number, l2: number): readonly [number, number] {
  const low = Math.max(l1, b.sumLow / (1 + b.ratioHigh));
  const high = Math.min(l2, b.sumHigh / (1 + b.ratioLow));
  if (low > high) return [1, 0];
  const atLeast = clamp(b.sumLow / (1 + b.ratioLow), low, high);
  const least = Math.max(0, b.sumLow - atLeast, b.ratioLow * atLeast);
  // Without a bound on the ratio, the less there is of the fill, the more room is left for the key.
  if (b.ratioHigh === Infinity) return [least, b.sumHigh - low];
  const atMost = clamp(b.sumHigh / (1 + b.ratioHigh), low, high);
  return [least, Math.min(b.sumHigh - atMost, b.ratioHigh * atMost)];
}

/**
 * Goes through the ways to set the fills that bounds leave room for, each with its keys as {@link keysFor} gives them;
 * true from `visit` ends it. Most of a search is spent here, so it makes nothing on the way.
 */
export function someFill(
  { fills, keys }: FlashGroup,
  b: MixBounds,
  visit: (fill: number, leastKey: number, mostKey: number) => boolean,
): boolean {
  const { sumLow, sumHigh, ratioLow, ratioHigh, needsFill } = b;
  const { low: fillLow, high: fillHigh, used } = fills;
  const isRatioFree = ratioHigh === Infinity;
  const lowEdge = sumLow / (1 + ratioHigh);
  const highEdge = sumHigh / (1 + ratioLow);
  const leastEdge = sumLow / (1 + ratioLow);
  const mostEdge = sumHigh / (1 + ratioHigh);
  const least = Math.max(lowEdge, sumLow - (keys.reach[keys.reach.length - 1] ?? 0));
  for (let i = firstAtLeast(fills.reach, least); i < fillLow.length; i++) {
    const from = fillLow[i] ?? 0;
    if (from > highEdge) break;
    const to = fillHigh[i] ?? 0;
    if (to < least || (needsFill && used[i] === 0)) continue;
    const low = from > lowEdge ? from : lowEdge;
    const high = to < highEdge ? to : highEdge;
    if (low > high) continue;
    const atLeast = clamp(leastEdge, low, high);
    const leastKey = Math.max(0, sumLow - atLeast, ratioLow * atLeast);
    const atMost = isRatioFree ? low : clamp(mostEdge, low, high);
    const mostKey = isRatioFree ? sumHigh - low : Math.min(sumHigh - atMost, ratioHigh * atMost);
    if (leastKey <= mostKey && visit(i, leastKey, mostKey)) return true;
  }
  return false;
}

/** Key and fill change places. */
export const swappedGroup = ({ keys, fills }: FlashGroup): FlashGroup => ({ keys: fills, fills: keys });

/** The bounds of a group whose key and fill have changed places. */
export const swappedBounds = (b: MixBounds): MixBounds => ({
  sumLow: b.sumLow,
  sumHigh: b.sumHigh,
  ratioLow: 1 / b.ratioHigh,
  ratioHigh: 1 / b.ratioLow,
  needsKey: b.needsFill,
  needsFill: b.needsKey,
});

/** Whether any way to set the flashes keeps within bounds; the role with fewer ways is gone through, the other searched. */
export function isMixed(group: FlashGroup, bounds: MixBounds): boolean {
  if (bounds.sumHigh < 0) return false;
  const isSwapped = group.keys.low.length < group.fills.low.length;
  const [mixed, b] = isSwapped ? [swappedGroup(group), swappedBounds(bounds)] : [group, bounds];
  const { low, reach } = mixed.keys;
  // Off stands first, and an entry that is on is never below it.
  const first = b.needsKey ? 1 : 0;
  let last: number | null = null;
  return someFill(mixed, b, (_, least, most) => {
    last = lastAtMostFrom(low, most, last);
    return last >= first && (reach[last] ?? 0) >= least;
  });
}
