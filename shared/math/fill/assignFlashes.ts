import { ABSENT_STOPS, countOf, mostAt } from './fillMisses';
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
/** Two to this is still a finite number beside light of any strength. */
const MOST_STOPS = 500;
/** The sum may be anything; parts of 1/120 stop. */
const ANY_SUM = 60_000;

/** Misses that are allowed for the sum of the light and for the ratio of key and fill; parts of 1/120 stop. */
export interface Allowed {
  readonly sum: number;
  readonly ratio: number;
}

const FREE = { ratioLow: 0, ratioHigh: Infinity, needsKey: false, needsFill: false };

function boundsFor(
  { ambient, wished, ratio, isNeeded }: FlashTask,
  sumStops: number,
  ratioStops: number,
): Bounds {
  if (isNeeded && sumStops >= ABSENT_STOPS) return { sumLow: 0, sumHigh: Infinity, ...FREE };
  const factor = 2 ** Math.min(sumStops, MOST_STOPS);
  // Each bound is wider by its own rounding, since lights may differ by any number of stops.
  const sum = {
    sumLow: wished * (1 / factor - SAME_LIGHT) - ambient,
    sumHigh: wished * factor * (1 + SAME_LIGHT) - ambient,
  };
  if (ratio === null || ratioStops >= ABSENT_STOPS) return { ...sum, ...FREE, needsKey: isNeeded };
  const ratioFactor = 2 ** ratioStops;
  return {
    ...sum,
    ratioLow: Math.max(0, (ratio / ratioFactor) * (1 - SAME_LIGHT) - 1),
    ratioHigh: ratio * ratioFactor * (1 + SAME_LIGHT) - 1,
    needsKey: true,
    needsFill: true,
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

/** What the flashes from one place on can give: their most, and the least of any one that is on. */
interface Rest {
  readonly key: number;
  readonly fill: number;
  readonly leastKey: number;
  readonly leastFill: number;
}

/** From each place on, with no flash above its top. */
function restsOf(flashes: readonly FlashLevels[], tops: readonly number[]): Rest[] {
  const rests: Rest[] = [{ key: 0, fill: 0, leastKey: Infinity, leastFill: Infinity }];
  for (let i = flashes.length - 1; i >= 0; i--) {
    const [one, before] = [flashes[i], rests[0]];
    if (one === undefined || before === undefined) continue;
    const top = tops[i] ?? 0;
    const most = one.high[top] ?? 0;
    const least = top > 0 ? (one.low[1] ?? Infinity) : Infinity;
    rests.unshift(
      one.isFill
        ? { ...before, fill: before.fill + most, leastFill: Math.min(before.leastFill, least) }
        : { ...before, key: before.key + most, leastKey: Math.min(before.leastKey, least) },
    );
  }
  return rests;
}

/** The first level that can give as much, by halving; levels rise. */
function firstGiving(high: Float64Array, needed: number, end: number): number {
  let [first, last] = [0, end];
  while (first < last) {
    const middle = (first + last) >> 1;
    if ((high[middle] ?? 0) < needed) first = middle + 1;
    else last = middle;
  }
  return first;
}

/**
 * The first way to set the flashes that keeps within a miss, powers tried from off upwards, flash by flash.
 *
 * @param flashes fills first, each role from the strongest down
 * @param task what is wished
 * @param allowed the misses that are allowed
 * @param mostPower fraction of full power that no flash may exceed
 * @param mostUsed flashes that may be in use
 * @returns a place in `powers` for each flash, or null where there is no way
 * @source exhaustive search; a branch is left as soon as what remains can't reach the bounds
 */
export function assignWithin(
  flashes: readonly FlashLevels[],
  task: FlashTask,
  allowed: Allowed,
  mostPower = 1,
  mostUsed = flashes.length,
): Assignment | null {
  const b = boundsFor(task, mostAt(allowed.sum), mostAt(allowed.ratio));
  if (b.sumHigh < 0) return null;
  const tops = flashes.map(({ powers }) => topOf(powers, mostPower));
  const rests = restsOf(flashes, tops);
  const chosen = new Array<number>(flashes.length).fill(0);
  const isLeft = (i: number, k1: number, k2: number, l1: number, l2: number): boolean => {
    const rest = rests[i];
    if (rest === undefined) return false;
    const leastKey = b.needsKey && k2 === 0 ? rest.leastKey : k1;
    const leastFill = b.needsFill && l2 === 0 ? rest.leastFill : l1;
    return isPossible(b, leastKey, k2 + rest.key, leastFill, l2 + rest.fill);
  };
  const go = (i: number, used: number, k1: number, k2: number, l1: number, l2: number): boolean => {
    const [one, rest] = [flashes[i], rests[i + 1]];
    if (one === undefined || rest === undefined) return true;
    const { low, high, isFill } = one;
    const top = used < mostUsed ? (tops[i] ?? 0) : 0;
    // What is needed of this flash when all that follow give their most.
    const needed = isFill
      ? Math.max(b.sumLow - k2 - rest.key, k1 / b.ratioHigh) - l2 - rest.fill
      : Math.max(b.sumLow - l2 - rest.fill, b.ratioLow * l1) - k2 - rest.key;
    const most = b.sumHigh - k1 - l1;
    for (let level = firstGiving(high, needed * (1 - SAME_LIGHT), top + 1); level <= top; level++) {
      const [lo, hi] = [low[level] ?? 0, high[level] ?? 0];
      if (lo > most) break;
      const [k, kk] = isFill ? [k1, k2] : [k1 + lo, k2 + hi];
      const [l, ll] = isFill ? [l1 + lo, l2 + hi] : [l1, l2];
      if (!isLeft(i + 1, k, kk, l, ll)) continue;
      chosen[i] = level;
      if (go(i + 1, level === 0 ? used : used + 1, k, kk, l, ll)) return true;
    }
    chosen[i] = 0;
    return false;
  };
  return isLeft(0, 0, 0, 0, 0) && go(0, 0, 0, 0, 0, 0) ? chosen : null;
}

function topOf(powers: readonly number[], mostPower: number): number {
  let top = powers.length - 1;
  while (top > 0 && (powers[top] ?? 0) > mostPower * (1 + SAME_LIGHT)) top--;
  return top;
}

const alike = (count: number): Allowed => ({ sum: count, ratio: count });

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
 * The least miss that any setting of the flashes leaves, the larger of sum and ratio, by halving.
 *
 * @param most the largest that is of interest; parts of 1/120 stop
 * @returns parts of 1/120 stop, or null where even `most` is out of reach
 */
export function leastCount(flashes: readonly FlashLevels[], task: FlashTask, most: number): number | null {
  const find = (count: number) => assignWithin(flashes, task, alike(count));
  const known = find(most);
  if (known === null) return null;
  return find(0) === null ? lowestFound(1, most, known, find)[0] : 0;
}

/** The same for the ratio alone, whatever the sum; an absent ratio is missed by ten stops. */
export function leastRatioCount(flashes: readonly FlashLevels[], task: FlashTask): number {
  const absent = countOf(ABSENT_STOPS);
  const find = (count: number) => assignWithin(flashes, task, { sum: ANY_SUM, ratio: count });
  return lowestFound(0, absent, null as Assignment | null, find)[0];
}

/**
 * What sum and ratio miss by at least: alike where both can be on the aim; else the sum as little as half a step
 * allows, and then the ratio.
 *
 * @param most the largest miss of the sum that is of interest; parts of 1/120 stop
 * @param onAim half a step; parts of 1/120 stop
 * @returns the misses, or null where even `most` is out of reach
 */
export function leastMisses(
  flashes: readonly FlashLevels[],
  task: FlashTask,
  most: number,
  onAim: number,
): Allowed | null {
  const both = leastCount(flashes, task, Math.min(most, onAim));
  if (both !== null) return alike(both);
  const absent = countOf(ABSENT_STOPS);
  const withSum = (sum: number) => assignWithin(flashes, task, { sum, ratio: absent });
  const any = withSum(most);
  if (any === null) return null;
  const [sum, found] = lowestFound(onAim, most, any, withSum);
  if (task.ratio === null) return alike(sum);
  const [ratio] = lowestFound(onAim, absent, found, (at) => assignWithin(flashes, task, { sum, ratio: at }));
  return { sum, ratio };
}

/**
 * The flashes as they are set: as few as keep within the misses that are allowed, with so many the least miss, then the
 * least power of the one that works hardest, then the first way in order.
 *
 * @param powers every power that one of them can be set to, rising
 * @param least from {@link leastMisses}
 * @param spare what may be spent on fewer flashes where sum and ratio are alike; parts of 1/120 stop
 * @returns a place in `powers` for each flash and the misses, or null where there is no way
 */
export function easiestAssignment(
  flashes: readonly FlashLevels[],
  powers: readonly number[],
  task: FlashTask,
  least: Allowed,
  spare: number,
): { readonly chosen: Assignment; readonly allowed: Allowed } | null {
  const isAlike = least.sum === least.ratio;
  const wide = isAlike ? alike(Math.max(least.sum, spare)) : least;
  const any = assignWithin(flashes, task, wide);
  if (any === null) return null;
  const [used, few] = lowestFound(0, flashes.length, any, (most) =>
    assignWithin(flashes, task, wide, 1, most),
  );
  const tight = (count: number): Allowed => (isAlike ? alike(count) : { sum: count, ratio: wide.ratio });
  const [count, near] = lowestFound(0, wide.sum, few, (at) =>
    assignWithin(flashes, task, tight(at), 1, used),
  );
  if (used === 0) return { chosen: near, allowed: tight(count) };
  const [, chosen] = lowestFound(0, powers.length - 1, near, (place) =>
    assignWithin(flashes, task, tight(count), powers[place], used),
  );
  return { chosen, allowed: tight(count) };
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
function nearestMix(task: FlashTask, span: ReturnType<typeof spanOf>, allowed: Allowed): [number, number] {
  const { k1, k2, l1, l2 } = span;
  if (k1 === k2 && l1 === l2) return [k1, l1];
  const isAlike = allowed.sum === allowed.ratio;
  const boundsAt = (stops: number) => boundsFor(task, stops, isAlike ? stops : mostAt(allowed.ratio));
  let [bad, good] = [0, mostAt(allowed.sum)];
  if (isPossible(boundsAt(0), k1, k2, l1, l2)) good = 0;
  for (let i = 0; i < 60 && good - bad > 1e-15; i++) {
    const middle = (bad + good) / 2;
    if (isPossible(boundsAt(middle), k1, k2, l1, l2)) good = middle;
    else bad = middle;
  }
  const b = boundsAt(good);
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
  allowed: Allowed,
): number[] {
  const span = spanOf(flashes, chosen);
  const [key, fill] = nearestMix(task, span, allowed);
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
