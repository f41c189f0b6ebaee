import type { NaturalLight } from './naturalLight';

/** When lamps and windows are lit; without one they are lit all the time. */
export interface LampTimes {
  readonly onMs: number;
  readonly offMs?: number;
}

/** What makes a scene out of the natural light: how the scene takes it, and what the lamps add. */
export interface SceneModel {
  /** Scene above (+) or below (−) a middle tone under horizontal light: tone, direction, haze, cloud. */
  readonly offsetStops: number;
  /** The lamps' share as EV100, null where there is none. */
  readonly floorEv100: number | null;
  readonly lamps: LampTimes | null;
}

/** Whether the lamps are lit at an instant. */
export function areLampsOn(lamps: LampTimes | null, atMs: number): boolean {
  return !lamps || (atMs >= lamps.onMs && (lamps.offMs === undefined || atMs < lamps.offMs));
}

/**
 * Scene brightness by a model: natural light and lamps add.
 *
 * EV = log2(2^(n + o) + 2^F), the second term while the lamps are lit
 *
 * @param naturalEv100 n, stops
 * @param offsetStops o, stops
 * @param floorEv100 F, stops; null for none, or while the lamps are out
 * @returns EV100 of the scene
 * @example combinedEv100(3, 0, 3) // 4
 * @source additivity of light, derivation
 */
export function combinedEv100(naturalEv100: number, offsetStops: number, floorEv100: number | null): number {
  const sky = naturalEv100 + offsetStops;
  if (floorEv100 === null) return sky;
  const brighter = Math.max(sky, floorEv100);
  return brighter + Math.log2(1 + 2 ** (Math.min(sky, floorEv100) - brighter));
}

/** Scene brightness at an instant, EV100. */
export function sceneEv100At(light: NaturalLight, model: SceneModel, atMs: number): number {
  const floor = areLampsOn(model.lamps, atMs) ? model.floorEv100 : null;
  return combinedEv100(light.ev100At(atMs), model.offsetStops, floor);
}
