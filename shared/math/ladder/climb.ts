import type { LightStretch } from './lightTable';
import { whenPassing } from './lightTable';
import type { NaturalLight } from './naturalLight';
import type { SceneModel } from './sceneModel';
import type { Stair } from './staircase';

/** A change of settings: from when on, to which stair, and at which brightness it is due. */
export interface Change {
  readonly atMs: number;
  readonly stair: number;
  /** EV100 of the scene that the change waits for; null at the start and where lamps are switched. */
  readonly thresholdEv100: number | null;
  readonly isFalling: boolean;
}

/**
 * The stair for a brightness: the nearest one.
 *
 * The boundary of two stairs lies midway; on it the brighter stair counts.
 *
 * @param stairs with falling EV100, at least one
 * @param ev100 what the settings are to be set for
 * @returns its index
 * @example stairFor([{ ev100: 5, ... }, { ev100: 4, ... }], 4.4) // 1
 * @source derivation
 */
function stairFor(stairs: readonly Stair[], ev100: number): number {
  let low = 0;
  let high = stairs.length - 1;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (ev100 < boundaryBelow(stairs, middle)) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** EV100 midway between a stair and the next darker one. */
function boundaryBelow(stairs: readonly Stair[], index: number): number {
  return ((stairs[index]?.ev100 ?? NaN) + (stairs[index + 1]?.ev100 ?? NaN)) / 2;
}

/**
 * The changes of settings that follow the light, one stair at a time, or several at once where lamps are switched.
 *
 * @param light sky and moon
 * @param model offset and lamps
 * @param table the scene's light, see `lightTable`
 * @param stairs settings from bright to dark
 * @param aimStops how much brighter than a middle tone the background is to come out
 * @returns changes in order, the first at the table's start
 * @example climb(light, model, table, stairs, 0)[0]?.atMs // the start
 * @source derivation
 */
export function climb(
  light: NaturalLight,
  model: SceneModel,
  table: readonly LightStretch[],
  stairs: readonly Stair[],
  aimStops: number,
): Change[] {
  const changes: Change[] = [];
  let stair = -1;
  for (const stretch of table) {
    const first = stairFor(stairs, (stretch.samples[0]?.ev100 ?? NaN) - aimStops);
    if (first !== stair) {
      changes.push({ atMs: stretch.fromMs, stair: first, thresholdEv100: null, isFalling: first > stair });
      stair = first;
    }
    for (let step = 1; step < stretch.samples.length; step += 1) {
      const target = stairFor(stairs, (stretch.samples[step]?.ev100 ?? NaN) - aimStops);
      while (stair !== target) {
        const isFalling = target > stair;
        const thresholdEv100 = boundaryBelow(stairs, isFalling ? stair : stair - 1) + aimStops;
        const passing = whenPassing(light, model, stretch, step - 1, thresholdEv100);
        stair += isFalling ? 1 : -1;
        const atMs = passing ?? stretch.samples[step - 1]?.atMs ?? stretch.fromMs;
        changes.push({ atMs, stair, thresholdEv100, isFalling });
      }
    }
  }
  return changes;
}
