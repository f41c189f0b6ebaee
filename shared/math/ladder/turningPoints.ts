import { stepsPerStop } from '../marks';
import type { Change } from './climb';
import type { TurningCode, TurningPoint } from './ladderTypes';
import { whenPassing, type LightStretch } from './lightTable';
import type { NaturalLight } from './naturalLight';
import type { RungPower } from './rungPower';
import type { SceneModel } from './sceneModel';
import type { Stair, StaircasePlan } from './staircase';

type Plan = Pick<StaircasePlan, 'scale' | 'holdAperture' | 'holdIso'>;

/**
 * The instants at which the ladder's settings reach a limit, or begin to give way.
 *
 * The shutter at its slowest; the aperture opener than held; the ISO over the held one; a flash power outside its range.
 *
 * @param changes the ladder's changes
 * @param stairs its settings
 * @param powers the flash power on each stair; null without a flash, or where none is needed
 * @param plan what is held
 * @returns points in order; those that hold from the start on are told only for the flash
 * @example settingPoints(changes, stairs, powers, plan) // [{ code: 'handheld_limit', ... }]
 * @source derivation
 */
export function settingPoints(
  changes: readonly Change[],
  stairs: readonly Stair[],
  powers: readonly (RungPower | null)[],
  plan: Plan,
): TurningPoint[] {
  const slowestS = Math.max(...stairs.map((stair) => stair.shutterS));
  const states: [TurningCode, (stair: number) => boolean][] = [
    ['handheld_limit', (stair) => stairs[stair]?.shutterS === slowestS],
    ['aperture_opens', (stair) => (stairs[stair]?.aperture ?? Infinity) < plan.holdAperture],
    ['iso_rises', (stair) => (stairs[stair]?.iso ?? 0) > plan.holdIso],
    ['flash_limit', (stair) => powers[stair]?.isInRange === false],
  ];
  return states.flatMap(([code, holds]) => {
    let was = code === 'flash_limit' ? false : holds(changes[0]?.stair ?? 0);
    return changes.flatMap(({ atMs, stair }) => {
      const is = holds(stair);
      if (is === was) return [];
      was = is;
      return [{ atMs, code, isLeft: !is }];
    });
  });
}

/**
 * The instants at which the light leaves, or comes back into, what the settings can follow to half a step.
 *
 * @param light sky and moon
 * @param model offset and lamps
 * @param table the scene's light, see `lightTable`
 * @param stairs settings from bright to dark
 * @param aimStops how much brighter than a middle tone the background is to come out
 * @param plan its scale
 * @returns points in order, the start included where it is out of reach
 * @example reachPoints(light, model, table, stairs, 0, plan) // [{ code: 'out_of_reach', ... }]
 * @source derivation
 */
export function reachPoints(
  light: NaturalLight,
  model: SceneModel,
  table: readonly LightStretch[],
  stairs: readonly Stair[],
  aimStops: number,
  { scale }: Plan,
): TurningPoint[] {
  const half = 0.5 / stepsPerStop(scale) + ROUNDING_STOPS;
  const darkest = (stairs.at(-1)?.ev100 ?? NaN) + aimStops - half;
  const brightest = (stairs[0]?.ev100 ?? NaN) + aimStops + half;
  const isOut = (ev100: number): boolean => ev100 < darkest || ev100 > brightest;
  const points: TurningPoint[] = [];
  let was = false;
  const note = (atMs: number, is: boolean): void => {
    if (is !== was) points.push({ atMs, code: 'out_of_reach', isLeft: !is });
    was = is;
  };
  for (const stretch of table) {
    note(stretch.fromMs, isOut(stretch.samples[0]?.ev100 ?? NaN));
    for (let step = 1; step < stretch.samples.length; step += 1) {
      const is = isOut(stretch.samples[step]?.ev100 ?? NaN);
      if (is === was) continue;
      const passings = [darkest, brightest].map((ev) => whenPassing(light, model, stretch, step - 1, ev));
      note(passings.find((atMs) => atMs !== null) ?? stretch.samples[step]?.atMs ?? NaN, is);
    }
  }
  return points;
}

/** Half a step is on the edge; this much beyond it is out. */
const ROUNDING_STOPS = 1e-6;
