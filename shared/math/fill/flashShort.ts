import { canDo } from './assignFlashes';
import { caseOf, someNearBackground, type FillCase, type FillProblem, type MissLimits } from './fillProblem';
import {
  boundsWithin,
  keysFor,
  someFill,
  swappedBounds,
  swappedGroup,
  type FlashGroup,
  type MixBounds,
} from './flashMix';
import { isTooWeak, type FlashLimit } from './limits';
import { lastAtMostFrom, type RoleSums } from './roleSums';

/** Farther than any flash can be moved. */
const MOST_STOPS = 60;

const alike = (count: number) => ({ sum: count, ratio: count });

/** By how much the nearest weaker way falls short of a span of light, as a factor. */
function weakerBy({ reach }: RoleSums, last: number, least: number): number {
  const nearest = reach[last] ?? 0;
  return nearest > 0 ? least / nearest : Infinity;
}

/** By how much the nearest stronger way exceeds a span of light, as a factor. */
function strongerBy({ low }: RoleSums, last: number, least: number, most: number): number {
  const nearest = low[last + 1];
  return nearest === undefined || !(most > 0) ? Infinity : nearest / Math.max(most, least);
}

/** By how much keys of at most so much are too weak at least, whatever the fills: they need no less than the bounds do. */
function weakAtLeast({ keys, fills }: FlashGroup, b: MixBounds): number {
  const [least, most] = keysFor(b, 0, fills.reach[fills.reach.length - 1] ?? 0);
  return least > most ? Infinity : Math.log2(least / (keys.reach[keys.reach.length - 1] ?? 0));
}

/**
 * By how many stops the first role of a group is off, over every way to set the other; at least `best` where it can't be
 * less than that.
 */
function roleOff(group: FlashGroup, b: MixBounds, isWeak: boolean, best: number): number {
  if (isWeak && weakAtLeast(group, b) > best) return best;
  const keyMost = group.keys.reach[group.keys.reach.length - 1] ?? 0;
  // The other role may do with what this one gives once it is moved, so nothing is left out for its present most.
  const most = isWeak ? keyMost * 2 ** best : keyMost;
  const unbounded = { fills: group.fills, keys: { ...group.keys, reach: Float64Array.of(most) } };
  let factor = Infinity;
  let last: number | null = null;
  someFill(unbounded, b, (_, leastKey, mostKey) => {
    last = lastAtMostFrom(group.keys.low, mostKey, last);
    const by = isWeak
      ? weakerBy(group.keys, last, leastKey)
      : strongerBy(group.keys, last, leastKey, mostKey);
    if (by < factor) factor = by;
    return factor <= 1;
  });
  // A weak role is never off by less than nothing; a strong one's nearest way lies above the span.
  const off = Math.log2(factor);
  return Math.min(best, isWeak ? Math.max(0, off) : off);
}

/** By how much key and fill together are too weak: both come nearer by the same. */
function bothOff({ keys, fills }: FlashGroup, b: MixBounds): number {
  const keyMost = keys.reach[keys.reach.length - 1] ?? 0;
  const fillMost = fills.reach[fills.reach.length - 1] ?? 0;
  if (!(keyMost > 0 && fillMost > 0)) return Infinity;
  // The least light that will do, shared out as evenly against what each has as the ratio allows.
  const even = (b.sumLow * keyMost) / (keyMost + fillMost);
  const keyLow = (b.sumLow * b.ratioLow) / (1 + b.ratioLow);
  const keyHigh = b.ratioHigh === Infinity ? b.sumLow : (b.sumLow * b.ratioHigh) / (1 + b.ratioHigh);
  const key = Math.min(keyHigh, Math.max(keyLow, even));
  return Math.max(0, Math.log2(key / keyMost), Math.log2((b.sumLow - key) / fillMost));
}

function caseOff(
  { table, front, rim }: FillCase,
  limit: FlashLimit,
  most: MissLimits,
  flash: MissLimits,
  best: number,
): number {
  const isWeak = isTooWeak(limit);
  if (limit.startsWith('rim')) {
    if (rim === null || !canDo(table.front, front, { sum: most.main, ratio: most.beside })) return Infinity;
    return roleOff(table.rim, boundsWithin(rim, alike(flash.beside)), isWeak, best);
  }
  if (rim !== null && !canDo(table.rim, rim, { sum: most.beside, ratio: most.beside })) return Infinity;
  const b = boundsWithin(front, { sum: flash.main, ratio: most.beside });
  if (b.sumHigh <= 0) return Infinity;
  if (limit === 'front_power') return bothOff(table.front, b);
  return limit.startsWith('fill')
    ? roleOff(swappedGroup(table.front), swappedBounds(b), isWeak, best)
    : roleOff(table.front, b, isWeak, best);
}

/**
 * By how many stops the flashes of a limit are too weak, or too strong, at the settings where they are least so, all
 * else being within misses.
 *
 * @param most the misses that are allowed
 * @param flash those of the part that the flashes light
 * @returns stops; Infinity where no moving of these flashes is enough
 * @source derivation: a flash that may come nearer gives anything up to 2^s of its light
 */
export function flashShort(
  problem: FillProblem,
  limit: FlashLimit,
  most: MissLimits,
  flash: MissLimits,
): number {
  let least = MOST_STOPS;
  someNearBackground(problem, most.main, (lens, shutter) => {
    if (shutter.sync !== 'none')
      least = Math.min(least, caseOff(caseOf(problem, lens, shutter), limit, most, flash, least));
    return false;
  });
  return least < MOST_STOPS ? least : Infinity;
}
