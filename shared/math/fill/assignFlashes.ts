import { ABSENT_COUNT } from './fillMisses';
import {
  boundsWithin,
  isMixed,
  someFill,
  type Allowed,
  type FlashGroup,
  type FlashTask,
  type MixBounds,
} from './flashMix';
import { firstAtLeast, withAtMost } from './roleSums';

/** The sum may be anything; parts of 1/120 stop. */
const ANY_SUM = 60_000;

const alike = (count: number): Allowed => ({ sum: count, ratio: count });

/** Whether the flashes can be set within misses. */
export const canDo = (group: FlashGroup, task: FlashTask, allowed: Allowed): boolean =>
  isMixed(group, boundsWithin(task, allowed));

/** The lowest place from `low` to `high` that holds, when `high` is known to and all above one that holds do. */
function lowest(low: number, high: number, holds: (place: number) => boolean): number {
  let [below, at] = [low - 1, high];
  while (at - below > 1) {
    const middle = Math.floor((below + at) / 2);
    if (holds(middle)) at = middle;
    else below = middle;
  }
  return at;
}

/**
 * The least miss that any setting of the flashes leaves, the larger of sum and ratio, by halving.
 *
 * @param most the largest that is of interest; parts of 1/120 stop
 * @returns parts of 1/120 stop, or null where even `most` is out of reach
 */
export function leastCount(group: FlashGroup, task: FlashTask, most: number): number | null {
  const holds = (count: number) => canDo(group, task, alike(count));
  if (!holds(most)) return null;
  return holds(0) ? 0 : lowest(1, most, holds);
}

/** The same for the ratio alone, whatever the sum; an absent ratio is missed by ten stops. */
export function leastRatioCount(group: FlashGroup, ratio: number): number {
  const task = { ambient: 1, wished: 1, ratio, isNeeded: false };
  return lowest(0, ABSENT_COUNT, (count) => canDo(group, task, { sum: ANY_SUM, ratio: count }));
}

/**
 * What sum and ratio miss by at least: alike where both can be on the aim; else the sum as little as half a step
 * allows, and then the ratio.
 *
 * @param most the largest miss of the sum that is of interest; parts of 1/120 stop
 * @param onAim half a step; parts of 1/120 stop
 * @returns the misses, or null where even `most` is out of reach
 */
export function leastMisses(group: FlashGroup, task: FlashTask, most: number, onAim: number): Allowed | null {
  const both = leastCount(group, task, Math.min(most, onAim));
  if (both !== null) return alike(both);
  const withSum = (sum: number) => canDo(group, task, { sum, ratio: ABSENT_COUNT });
  if (!withSum(most)) return null;
  const sum = lowest(onAim, most, withSum);
  if (task.ratio === null) return alike(sum);
  return { sum, ratio: lowest(onAim, ABSENT_COUNT, (ratio) => canDo(group, task, { sum, ratio })) };
}

/** How flashes are set: the codes of their ways, and what was allowed for it. */
export interface Assignment {
  readonly keyCode: number;
  readonly fillCode: number;
  readonly allowed: Allowed;
}

/** The groups in which so many flashes or fewer are on: some of them keys, the others fills. */
function groupsWith({ keys, fills }: FlashGroup, used: number): FlashGroup[] {
  return Array.from({ length: Math.min(used, keys.flashes.length) + 1 }, (_, keysUsed) => ({
    keys: withAtMost(keys, keysUsed),
    fills: withAtMost(fills, used - keysUsed),
  }));
}

interface Way {
  readonly power: number;
  readonly fillCode: number;
  readonly keyCode: number;
}

/** The order in which ways are taken: least power of the hardest, lowest fill, lowest key. */
function isBefore(a: Way, b: Way): boolean {
  if (a.power !== b.power) return a.power < b.power;
  return a.fillCode === b.fillCode ? a.keyCode < b.keyCode : a.fillCode < b.fillCode;
}

/** The way within bounds that comes first. */
function firstWay(groups: readonly FlashGroup[], b: MixBounds): Way | null {
  let best: Way | null = null;
  for (const { keys, fills } of groups)
    someFill({ keys, fills }, b, (fill, least, most) => {
      const [fillCode, fillPower] = [fills.code[fill] ?? 0, fills.power[fill] ?? 0];
      const start = Math.max(b.needsKey ? 1 : 0, firstAtLeast(keys.reach, least));
      for (let i = start; i < keys.low.length && (keys.low[i] ?? 0) <= most; i++) {
        if ((keys.high[i] ?? 0) < least) continue;
        const way = { power: Math.max(fillPower, keys.power[i] ?? 0), fillCode, keyCode: keys.code[i] ?? 0 };
        if (best === null || isBefore(way, best)) best = way;
      }
      return false;
    });
  return best;
}

/**
 * The flashes as they are set: as few as keep within the misses that are allowed, with so many the least miss, then the
 * least power of the one that works hardest, then the first way in order.
 *
 * @param least from {@link leastMisses}
 * @param spare what may be spent on fewer flashes where sum and ratio are alike; parts of 1/120 stop
 * @returns the way, or null where there is none
 */
export function easiestAssignment(
  group: FlashGroup,
  task: FlashTask,
  least: Allowed,
  spare: number,
): Assignment | null {
  const isAlike = least.sum === least.ratio;
  const wide = isAlike ? alike(Math.max(least.sum, spare)) : least;
  if (!canDo(group, task, wide)) return null;
  const can = (groups: readonly FlashGroup[], allowed: Allowed) =>
    groups.some((one) => canDo(one, task, allowed));
  const all = group.keys.flashes.length + group.fills.flashes.length;
  const few = groupsWith(
    group,
    lowest(0, all, (used) => can(groupsWith(group, used), wide)),
  );
  const tight = (count: number): Allowed => (isAlike ? alike(count) : { sum: count, ratio: wide.ratio });
  const allowed = tight(lowest(0, wide.sum, (count) => can(few, tight(count))));
  const way = firstWay(few, boundsWithin(task, allowed));
  return way && { ...way, allowed };
}
