import type { Change } from './climb';
import type { LightStretch } from './lightTable';

/** How much earlier or later a change may be due, seconds; null: by more than the tables reach. */
export interface ChangeSpread {
  readonly earlyS: number | null;
  readonly lateS: number | null;
}

type Sample = LightStretch['samples'][number];

/**
 * How early or late a change may be, from the same light a little darker and a little brighter.
 *
 * On a falling light the darker curve passes the change's threshold before, the brighter one after; on a rising light the
 * other way round. Between minutes the curves are straight.
 *
 * @param change the change
 * @param darker samples of the light at the dark end of the model's spread, in order of time
 * @param brighter at the bright end
 * @returns seconds, 0 or more
 * @example changeSpread(change, darker, brighter).earlyS // 90
 * @source derivation
 */
export function changeSpread(
  change: Change,
  darker: readonly Sample[],
  brighter: readonly Sample[],
): ChangeSpread {
  const { atMs, thresholdEv100, isFalling } = change;
  if (thresholdEv100 === null) return { earlyS: 0, lateS: 0 };
  const ahead = passingBefore(isFalling ? darker : brighter, atMs, thresholdEv100, isFalling);
  const behind = passingAfter(isFalling ? brighter : darker, atMs, thresholdEv100, isFalling);
  return {
    earlyS: ahead === null ? null : Math.max(0, (atMs - ahead) / 1000),
    lateS: behind === null ? null : Math.max(0, (behind - atMs) / 1000),
  };
}

/** When the curve that is already past the threshold passed it, looking back from the change. */
function passingBefore(
  curve: readonly Sample[],
  atMs: number,
  ev100: number,
  isFalling: boolean,
): number | null {
  for (let index = indexAt(curve, atMs); index >= 0; index -= 1) {
    const passing = passingIn(curve[index], curve[index + 1], ev100, isFalling);
    if (passing !== null) return Math.min(passing, atMs);
  }
  return null;
}

/** When the curve that has not yet passed the threshold passes it, looking on from the change. */
function passingAfter(
  curve: readonly Sample[],
  atMs: number,
  ev100: number,
  isFalling: boolean,
): number | null {
  for (let index = indexAt(curve, atMs); index < curve.length - 1; index += 1) {
    const passing = passingIn(curve[index], curve[index + 1], ev100, isFalling);
    if (passing !== null) return Math.max(passing, atMs);
  }
  return null;
}

function passingIn(
  before: Sample | undefined,
  after: Sample | undefined,
  ev100: number,
  isFalling: boolean,
): number | null {
  if (!before || !after) return null;
  const passes = isFalling
    ? before.ev100 > ev100 && after.ev100 <= ev100
    : before.ev100 < ev100 && after.ev100 >= ev100;
  if (!passes) return null;
  const share = (before.ev100 - ev100) / (before.ev100 - after.ev100);
  return before.atMs + (after.atMs - before.atMs) * share;
}

/** Index of the last sample at or before an instant, by halving. */
function indexAt(curve: readonly Sample[], atMs: number): number {
  let low = 0;
  let high = Math.max(0, curve.length - 1);
  while (low < high) {
    const middle = Math.ceil((low + high) / 2);
    if ((curve[middle]?.atMs ?? Infinity) <= atMs) low = middle;
    else high = middle - 1;
  }
  return low;
}
