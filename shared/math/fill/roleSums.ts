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
  let most = 0;
  return high.map((light) => (most = Math.max(most, light)));
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
  return Uint32Array.from(light, (_, i) => (words[2 * i] ?? 0) & PLACE_MASK);
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
  const [low, high] = [new Float64Array(ways), new Float64Array(ways)];
  let block = ways;
  for (const one of flashes) {
    block /= one.powers.length;
    for (let i = 0; i < ways; i++) {
      const level = Math.floor(i / block) % one.powers.length;
      low[i] = (low[i] ?? 0) + (one.low[level] ?? 0);
      high[i] = (high[i] ?? 0) + (one.high[level] ?? 0);
    }
  }
  const places = placesByLight(low);
  const code = Int32Array.from(places);
  const rising = Float64Array.from(places, (place) => high[place] ?? 0);
  return {
    flashes,
    low: Float64Array.from(places, (place) => low[place] ?? 0),
    high: rising,
    reach: reachOf(rising),
    ...useOf(flashes, code),
    code,
  };
}

/** How many flashes are on in each way, and the power of the one that works hardest. */
function useOf(flashes: readonly FlashLevels[], code: Int32Array): Pick<RoleSums, 'used' | 'power'> {
  const used = new Uint8Array(code.length);
  const power = new Float64Array(code.length);
  for (let i = 0; i < code.length; i++) {
    let digits = code[i] ?? 0;
    for (let f = flashes.length - 1; f >= 0; f--) {
      const { powers } = flashes[f] as FlashLevels;
      const fraction = powers[digits % powers.length] ?? 0;
      digits = Math.floor(digits / powers.length);
      if (fraction > 0) used[i] = (used[i] ?? 0) + 1;
      if (fraction > (power[i] ?? 0)) power[i] = fraction;
    }
  }
  return { used, power };
}

const timesAll = (light: Float64Array, factor: number) =>
  factor === 1 ? light : light.map((one) => one * factor);

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
