import type { FlashLevels } from './flashLevels';

/**
 * What the flashes of one role give together, one entry for each way to set their powers, by rising least light. Light
 * is that of {@link FlashLevels}; an entry gives anything from `low` to `high`, where flashes may be moved.
 */
export interface RoleSums {
  readonly flashes: readonly FlashLevels[];
  readonly low: Float64Array;
  readonly high: Float64Array;
  /** the most that any entry up to this one gives */
  readonly reach: Float64Array;
  /** flashes that are on */
  readonly used: Uint8Array;
  /** fraction of full power of the one that works hardest */
  readonly power: Float64Array;
  /** which powers: the places in `powers` as digits, those of the first flash leading */
  readonly code: Int32Array;
}

/** Ways to set the powers of one role together; more are refused before it comes to this. */
export const MOST_WAYS = 12_500;

/** Low bits of a double that hold a way's place while its light is sorted; they change it by 1e-11 at most. */
const PLACE_MASK = 32_767;

/** The most that any entry up to each gives. */
function reachOf(high: Float64Array): Float64Array {
  const reach = new Float64Array(high.length);
  let most = 0;
  for (let i = 0; i < high.length; i++) {
    const light = high[i] ?? 0;
    if (light > most) most = light;
    reach[i] = most;
  }
  return reach;
}

/**
 * The order of ways by their light: sorting plain doubles is many times quicker than sorting by a comparison. The low
 * word of a double comes first on every processor that runs this.
 */
function placesByLight(light: Float64Array): Uint32Array {
  const keys = Float64Array.from(light);
  const words = new Uint32Array(keys.buffer);
  for (let i = 0; i < light.length; i++) words[2 * i] = ((words[2 * i] ?? 0) & ~PLACE_MASK) | i;
  keys.sort();
  const places = new Uint32Array(light.length);
  for (let i = 0; i < light.length; i++) places[i] = (words[2 * i] ?? 0) & PLACE_MASK;
  return places;
}

/**
 * Every way to set the flashes of one role: all sums of their levels.
 *
 * @param flashes of one role; the product of their numbers of powers, off included, is at most {@link MOST_WAYS}
 * @returns the ways by rising least light, off first
 * @throws RangeError when there are too many ways
 * @source additivity of light
 */
export function roleSums(flashes: readonly FlashLevels[]): RoleSums {
  const ways = flashes.reduce((product, { powers }) => product * powers.length, 1);
  if (ways > MOST_WAYS) throw new RangeError(`there are ${ways} ways to set the flashes of a role`);
  const sums = flashes.reduce(withFlash, NONE_ON);
  const places = placesByLight(sums.low);
  const rising = inOrderOf(places, sums.high);
  const used = new Uint8Array(ways);
  for (let i = 0; i < ways; i++) used[i] = sums.used[places[i] ?? 0] ?? 0;
  return {
    flashes,
    low: inOrderOf(places, sums.low),
    high: rising,
    reach: reachOf(rising),
    used,
    power: inOrderOf(places, sums.power),
    code: Int32Array.from(places),
  };
}

type Ways = Pick<RoleSums, 'low' | 'high' | 'used' | 'power'>;

const NONE_ON: Ways = {
  low: new Float64Array(1),
  high: new Float64Array(1),
  used: new Uint8Array(1),
  power: new Float64Array(1),
};

/** Each way as it was with each power of one flash more. */
function withFlash(before: Ways, { powers, low, high }: FlashLevels): Ways {
  const ways = before.low.length * powers.length;
  const after = {
    low: new Float64Array(ways),
    high: new Float64Array(ways),
    used: new Uint8Array(ways),
    power: new Float64Array(ways),
  };
  for (let i = 0, at = 0; i < before.low.length; i++)
    for (let level = 0; level < powers.length; level++, at++) {
      const [fraction, hardest] = [powers[level] ?? 0, before.power[i] ?? 0];
      after.low[at] = (before.low[i] ?? 0) + (low[level] ?? 0);
      after.high[at] = (before.high[i] ?? 0) + (high[level] ?? 0);
      after.used[at] = (before.used[i] ?? 0) + (fraction > 0 ? 1 : 0);
      after.power[at] = fraction > hardest ? fraction : hardest;
    }
  return after;
}

function inOrderOf(places: Uint32Array, from: Float64Array): Float64Array {
  const ordered = new Float64Array(places.length);
  for (let i = 0; i < places.length; i++) ordered[i] = from[places[i] ?? 0] ?? 0;
  return ordered;
}

function timesAll(light: Float64Array, factor: number): Float64Array {
  if (factor === 1) return light;
  const scaled = new Float64Array(light.length);
  for (let i = 0; i < light.length; i++) scaled[i] = (light[i] ?? 0) * factor;
  return scaled;
}

/** The same ways with the least and the most of their light times a factor each. */
export function scaledSums(sums: RoleSums, lowFactor: number, highFactor = lowFactor): RoleSums {
  return {
    ...sums,
    flashes: sums.flashes.map((one) => ({
      ...one,
      low: timesAll(one.low, lowFactor),
      high: timesAll(one.high, highFactor),
    })),
    low: timesAll(sums.low, lowFactor),
    high: timesAll(sums.high, highFactor),
    reach: timesAll(sums.reach, highFactor),
  };
}

const sparing = new WeakMap<RoleSums, RoleSums[]>();

/** Those ways that use no more flashes than so many; made once. */
export function withAtMost(sums: RoleSums, mostUsed: number): RoleSums {
  if (mostUsed >= sums.flashes.length) return sums;
  const known = sparing.get(sums) ?? [];
  sparing.set(sums, known);
  return (known[mostUsed] ??= kept(sums, mostUsed));
}

function kept(sums: RoleSums, mostUsed: number): RoleSums {
  const places: number[] = [];
  sums.used.forEach((used, i) => {
    if (used <= mostUsed) places.push(i);
  });
  const pick = (from: Float64Array) => Float64Array.from(places, (i) => from[i] ?? 0);
  const high = pick(sums.high);
  return {
    flashes: sums.flashes,
    low: pick(sums.low),
    high,
    reach: reachOf(high),
    used: Uint8Array.from(places, (i) => sums.used[i] ?? 0),
    power: pick(sums.power),
    code: Int32Array.from(places, (i) => sums.code[i] ?? 0),
  };
}

/** The place in `powers` of each flash, of a way's code. */
export function levelsOfCode({ flashes }: Pick<RoleSums, 'flashes'>, code: number): number[] {
  const levels = new Array<number>(flashes.length).fill(0);
  let digits = code;
  for (let f = flashes.length - 1; f >= 0; f--) {
    const count = flashes[f]?.powers.length ?? 1;
    levels[f] = digits % count;
    digits = Math.floor(digits / count);
  }
  return levels;
}

/** The first place in a rising list that holds at least so much; its length where none does. */
export function firstAtLeast(rising: Float64Array, value: number): number {
  let [first, last] = [0, rising.length];
  while (first < last) {
    const middle = (first + last) >> 1;
    if ((rising[middle] ?? 0) < value) first = middle + 1;
    else last = middle;
  }
  return first;
}

/** The last place in a rising list that holds at most so much; −1 where none does. */
function lastAtMost(rising: Float64Array, value: number): number {
  let [first, last] = [0, rising.length];
  while (first < last) {
    const middle = (first + last) >> 1;
    if ((rising[middle] ?? 0) <= value) first = middle + 1;
    else last = middle;
  }
  return first - 1;
}

/** The same, looked for from a place that is likely near it: from one search to the next the value moves little. */
export function lastAtMostFrom(rising: Float64Array, value: number, place: number | null): number {
  let last = place ?? lastAtMost(rising, value);
  while (last >= 0 && (rising[last] ?? 0) > value) last--;
  while (last + 1 < rising.length && (rising[last + 1] ?? 0) <= value) last++;
  return last;
}
