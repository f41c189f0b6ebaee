import { ABSENT_STOPS, mostAt } from './fillMisses';
import type { FlashLevels } from './flashLevels';

/** What the flashes of one part have to do, in the light of {@link FlashLevels}. */
export interface FlashTask {
  /** what is there already, and what is wished in all */
  readonly ambient: number;
  readonly wished: number;
  /** (key + fill):fill; null where none is wished or there are not both */
  readonly ratio: number | null;
  /** nothing may be left out: without a flash the part is absent (a rim) */
  readonly isNeeded: boolean;
}

/** Bounds on key K and fill L for a miss: sumLow ≤ K + L ≤ sumHigh, ratioLow·L ≤ K ≤ ratioHigh·L. */
interface Bounds {
  readonly sumLow: number;
  readonly sumHigh: number;
  readonly ratioLow: number;
  readonly ratioHigh: number;
  readonly needsKey: boolean;
  readonly needsFill: boolean;
}

/** Sums that differ by less are the same; covers the rounding of a few additions. */
const SAME_LIGHT = 1e-12;

function boundsFor({ ambient, wished, ratio, isNeeded }: FlashTask, missStops: number): Bounds {
  const isAbsentAllowed = missStops >= ABSENT_STOPS;
  if (isNeeded && isAbsentAllowed)
    return {
      sumLow: 0,
      sumHigh: Infinity,
      ratioLow: 0,
      ratioHigh: Infinity,
      needsKey: false,
      needsFill: false,
    };
  const factor = 2 ** missStops;
  const free = ratio === null || isAbsentAllowed;
  // Each bound is wider by its own rounding, since lights may differ by any number of stops.
  return {
    sumLow: wished * (1 / factor - SAME_LIGHT) - ambient,
    sumHigh: wished * factor * (1 + SAME_LIGHT) - ambient,
    ratioLow: free ? 0 : Math.max(0, (ratio / factor) * (1 - SAME_LIGHT) - 1),
    ratioHigh: free ? Infinity : ratio * factor * (1 + SAME_LIGHT) - 1,
    needsKey: isNeeded || !free,
    needsFill: !free,
  };
}

/** The fills that go with keys from k1 to k2 and fills from l1 to l2, as bounds; crossed where there are none. */
function fillBetween(b: Bounds, k1: number, k2: number, l1: number, l2: number): [number, number] {
  const low = Math.max(l1, b.sumLow / (1 + b.ratioHigh), b.sumLow - k2, k1 / b.ratioHigh);
  const high = Math.min(l2, b.sumHigh / (1 + b.ratioLow), b.sumHigh - k1);
  return [low, b.ratioLow > 0 ? Math.min(high, k2 / b.ratioLow) : high];
}

function isPossible(b: Bounds, k1: number, k2: number, l1: number, l2: number): boolean {
  const [low, high] = fillBetween(b, k1, k2, l1, l2);
  return low <= high;
}

/** Which power each flash has, by its place in `powers`. */
export type Assignment = readonly number[];

/**
 * The first way to set the flashes that keeps within a miss, powers tried from off upwards, flash by flash.
 *
 * @param flashes strongest first
 * @param task what is wished
 * @param count the miss that is allowed, parts of 1/120 stop
 * @param mostPower fraction of full power that no flash may exceed
 * @param mostUsed flashes that may be in use
 * @returns a place in `powers` for each flash, or null where there is no way
 * @source exhaustive search; a branch is left as soon as what remains can't reach the bounds
 */
export function assignWithin(
  flashes: readonly FlashLevels[],
  task: FlashTask,
  count: number,
  mostPower = 1,
  mostUsed = flashes.length,
): Assignment | null {
  const b = boundsFor(task, mostAt(count));
  if (b.sumHigh < 0) return null;
  const tops = flashes.map(({ powers }) => topOf(powers, mostPower));
  const [keyRest, fillRest] = restsOf(flashes, tops);
  const chosen = new Array<number>(flashes.length).fill(0);
  const go = (i: number, used: number, k1: number, k2: number, l1: number, l2: number): boolean => {
    const one = flashes[i];
    if (one === undefined) return !((b.needsKey && k2 === 0) || (b.needsFill && l2 === 0));
    const [moreKey, moreFill] = [keyRest[i + 1] ?? 0, fillRest[i + 1] ?? 0];
    const { low, high, isFill } = one;
    const top = used < mostUsed ? (tops[i] ?? 0) : 0;
    for (let level = 0; level <= top; level++) {
      const [lo, hi] = [low[level] ?? 0, high[level] ?? 0];
      const [k, kk] = isFill ? [k1, k2] : [k1 + lo, k2 + hi];
      const [l, ll] = isFill ? [l1 + lo, l2 + hi] : [l1, l2];
      if (k + l > b.sumHigh) break;
      if (!isPossible(b, k, kk + moreKey, l, ll + moreFill)) continue;
      chosen[i] = level;
      if (go(i + 1, level === 0 ? used : used + 1, k, kk, l, ll)) return true;
    }
    chosen[i] = 0;
    return false;
  };
  if (!isPossible(b, 0, keyRest[0] ?? 0, 0, fillRest[0] ?? 0)) return null;
  return go(0, 0, 0, 0, 0, 0) ? chosen : null;
}

function topOf(powers: readonly number[], mostPower: number): number {
  let top = powers.length - 1;
  while (top > 0 && (powers[top] ?? 0) > mostPower * (1 + SAME_LIGHT)) top--;
  return top;
}

/** The most that the flashes from each place on can give, key and fill. */
function restsOf(flashes: readonly FlashLevels[], tops: readonly number[]): [number[], number[]] {
  const key = new Array<number>(flashes.length + 1).fill(0);
  const fill = new Array<number>(flashes.length + 1).fill(0);
  for (let i = flashes.length - 1; i >= 0; i--) {
    const most = flashes[i]?.high[tops[i] ?? 0] ?? 0;
    const isFill = flashes[i]?.isFill ?? false;
    key[i] = (key[i + 1] ?? 0) + (isFill ? 0 : most);
    fill[i] = (fill[i + 1] ?? 0) + (isFill ? most : 0);
  }
  return [key, fill];
}

/**
 * The least miss that any setting of the flashes leaves, in parts of 1/120 stop, by halving between bounds.
 *
 * @param low a miss that is known to be the least possible; parts of 1/120 stop
 * @param high the largest that is of interest; parts of 1/120 stop
 * @returns parts of 1/120 stop, or null where even `high` is out of reach
 */
export function leastCount(
  flashes: readonly FlashLevels[],
  task: FlashTask,
  low: number,
  high: number,
): number | null {
  if (assignWithin(flashes, task, low) !== null) return low;
  if (high <= low || assignWithin(flashes, task, high) === null) return null;
  let [below, at] = [low, high];
  while (at - below > 1) {
    const middle = Math.floor((below + at) / 2);
    if (assignWithin(flashes, task, middle) === null) below = middle;
    else at = middle;
  }
  return at;
}

/** The lowest place from `low` to `high` at which `find` finds something, and what; the last one is known to. */
function lowestFound<T>(low: number, high: number, known: T, find: (place: number) => T | null): [number, T] {
  let [below, at, best] = [low - 1, high, known];
  while (at - below > 1) {
    const middle = Math.floor((below + at) / 2);
    const found = find(middle);
    if (found === null) below = middle;
    else [at, best] = [middle, found];
  }
  return [at, best];
}

/**
 * The flashes as they are set: as few as keep within a miss, with so many the least miss, then the least power of the
 * one that works hardest, then the first way in order.
 *
 * @param powers every power that one of them can be set to, rising
 * @param least the least miss that there is; parts of 1/120 stop, from {@link leastCount}
 * @param allowed the miss that may not be exceeded; parts of 1/120 stop, `least` or more
 * @returns a place in `powers` for each flash and the miss, or null where there is no way
 */
export function easiestAssignment(
  flashes: readonly FlashLevels[],
  powers: readonly number[],
  task: FlashTask,
  least: number,
  allowed: number,
): { readonly chosen: Assignment; readonly count: number } | null {
  const all = flashes.length;
  const any = assignWithin(flashes, task, allowed);
  if (any === null) return null;
  const [used, few] = lowestFound(0, all, any, (most) => assignWithin(flashes, task, allowed, 1, most));
  const [count, near] = lowestFound(least, allowed, few, (at) => assignWithin(flashes, task, at, 1, used));
  if (used === 0) return { chosen: near, count };
  const [, chosen] = lowestFound(0, powers.length - 1, near, (place) =>
    assignWithin(flashes, task, count, powers[place], used),
  );
  return { chosen, count };
}

/** Key and fill of an assignment: what they give, or from what to what where flashes may be moved. */
function spanOf(flashes: readonly FlashLevels[], chosen: Assignment) {
  const span = { k1: 0, k2: 0, l1: 0, l2: 0 };
  flashes.forEach(({ low, high, isFill }, i) => {
    const [lo, hi] = [low[chosen[i] ?? 0] ?? 0, high[chosen[i] ?? 0] ?? 0];
    if (isFill) [span.l1, span.l2] = [span.l1 + lo, span.l2 + hi];
    else [span.k1, span.k2] = [span.k1 + lo, span.k2 + hi];
  });
  return span;
}

/** The key and fill within an assignment's reach that come nearest to the task. */
function nearestMix(task: FlashTask, span: ReturnType<typeof spanOf>, count: number): [number, number] {
  const { k1, k2, l1, l2 } = span;
  if (k1 === k2 && l1 === l2) return [k1, l1];
  let [bad, good] = [0, mostAt(count)];
  if (isPossible(boundsFor(task, 0), k1, k2, l1, l2)) good = 0;
  for (let i = 0; i < 60 && good - bad > 1e-15; i++) {
    const middle = (bad + good) / 2;
    if (isPossible(boundsFor(task, middle), k1, k2, l1, l2)) good = middle;
    else bad = middle;
  }
  const b = boundsFor(task, good);
  const [low, high] = fillBetween(b, k1, k2, l1, l2);
  const fill = clamp((low + high) / 2, l1, l2);
  const keyLow = Math.max(k1, b.sumLow - fill, b.ratioLow * fill);
  const keyHigh = Math.min(k2, b.sumHigh - fill, b.ratioHigh === Infinity ? k2 : b.ratioHigh * fill);
  return [clamp((keyLow + keyHigh) / 2, k1, k2), fill];
}

const clamp = (value: number, low: number, high: number) => Math.min(high, Math.max(low, value));

/**
 * Where the flashes of an assignment have to stand: each as far away as it may, then one after the other nearer until
 * the light is right.
 *
 * @returns metres for each flash; of no meaning for one that is off
 * @source inverse square law
 */
export function distancesFor(
  flashes: readonly FlashLevels[],
  task: FlashTask,
  chosen: Assignment,
  count: number,
): number[] {
  const span = spanOf(flashes, chosen);
  const [key, fill] = nearestMix(task, span, count);
  let [keyMissing, fillMissing] = [key - span.k1, fill - span.l1];
  return flashes.map(({ flash, low, high, isFill }, i) => {
    const [lo, hi] = [low[chosen[i] ?? 0] ?? 0, high[chosen[i] ?? 0] ?? 0];
    if (flash.nearM === flash.farM || hi === 0) return flash.nearM;
    const more = clamp(isFill ? fillMissing : keyMissing, 0, hi - lo);
    if (isFill) fillMissing -= more;
    else keyMissing -= more;
    return clamp(flash.farM * Math.sqrt(lo / (lo + more)), flash.nearM, flash.farM);
  });
}
