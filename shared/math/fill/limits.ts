import { rolesWithTooManyWays } from './countWays';
import { exactAt, positionOf, stepsPerStop, type MarkedKind } from '../marks';
import type { FillCamera, FillFlash, FillRecipe, FillWish } from './fillTypes';

/** A limit of the camera that could be moved a mark at a time. */
export type CameraLimit =
  | 'aperture_min'
  | 'aperture_max'
  | 'iso_min'
  | 'iso_max'
  | 'shutter_slowest'
  | 'shutter_fastest'
  | 'sync_speed'
  | 'nd_stops';

/** A limit of the flashes: how near they may come to give more, how far they may go to give less. */
export type FlashLimit =
  'key_power' | 'fill_power' | 'front_power' | 'rim_power' | 'key_least' | 'fill_least' | 'rim_least';

/** How far any gear goes; the ranges that requests may use. */
const FARTHEST: Record<MarkedKind, readonly [number, number]> = {
  aperture: [0.5, 256],
  shutter: [1e-6, 86_400],
  iso: [1, 10_000_000],
};
const STRONGEST_FILTER_STOPS = 20;
const NEAREST_M = 0.01;
const FARTHEST_M = 10_000;
/** Allows a limit that stands on a mark to count as reached in spite of rounding. */
const EDGE = 1e-9;

/** A limit with what happens when it is given up by so many steps of the scale. */
export interface MovableLimit {
  readonly limit: CameraLimit;
  readonly mostSteps: number;
  /** more steps allow everything that fewer allow */
  readonly isNested: boolean;
  readonly movedBy: (steps: number) => FillWish;
  /** the same with nothing but what is new, where the rest is known not to be enough */
  readonly alone?: (steps: number) => FillWish;
}

const withCamera = (wish: FillWish, camera: Partial<FillCamera>): FillWish => ({
  ...wish,
  camera: { ...wish.camera, ...camera },
});

/** A limit that stands at the low or the high end of a scale of marks. */
function markLimit(
  wish: FillWish,
  limit: CameraLimit,
  kind: MarkedKind,
  field: 'apertureMin' | 'apertureMax' | 'isoMin' | 'isoMax' | 'shutterSlowestS' | 'shutterFastestS',
  direction: 1 | -1,
): MovableLimit {
  const { scale } = wish.camera;
  const at = positionOf(kind, scale, wish.camera[field]);
  const from = direction < 0 ? Math.ceil(at - EDGE) : Math.floor(at + EDGE);
  const ends = FARTHEST[kind].map((exact) => positionOf(kind, scale, exact));
  const mostSteps =
    direction < 0 ? from - Math.ceil(Math.min(...ends) - EDGE) : Math.floor(Math.max(...ends) + EDGE) - from;
  const movedBy = (steps: number) =>
    withCamera(wish, { [field]: exactAt(kind, scale, from + direction * steps) });
  return { limit, mostSteps: Math.max(0, mostSteps), isNested: true, movedBy };
}

function syncLimit(wish: FillWish): MovableLimit {
  const { scale, syncSpeedS, shutterFastestS, highSpeedSync } = wish.camera;
  const from = Math.floor(positionOf('shutter', scale, syncSpeedS) + EDGE);
  const last = Math.floor(positionOf('shutter', scale, shutterFastestS) + EDGE);
  const movedBy = (steps: number) => {
    const faster = exactAt('shutter', scale, from + steps);
    const curtainS = Math.min(highSpeedSync?.curtainS ?? 0, faster);
    return withCamera(wish, {
      syncSpeedS: faster,
      highSpeedSync: highSpeedSync && { ...highSpeedSync, curtainS },
    });
  };
  return {
    limit: 'sync_speed',
    mostSteps: Math.max(0, last - from),
    isNested: highSpeedSync === null,
    movedBy,
  };
}

function filterLimit(wish: FillWish): MovableLimit {
  const steps = stepsPerStop(wish.camera.scale);
  const movedBy = (count: number) => withCamera(wish, { ndStops: [...wish.camera.ndStops, count / steps] });
  const alone = (count: number) => withCamera(wish, { ndStops: [count / steps] });
  return { limit: 'nd_stops', mostSteps: STRONGEST_FILTER_STOPS * steps, isNested: false, movedBy, alone };
}

/** The limits of a request's camera, each as something that could be moved. */
export function movableLimits(wish: FillWish): readonly MovableLimit[] {
  return everyLimit(wish).map(heldWithinWays);
}

/** A limit that moves no farther than a request may go, which may not have its flashes set in more ways than are gone through. */
function heldWithinWays(movable: MovableLimit): MovableLimit {
  let { mostSteps } = movable;
  while (mostSteps > 0 && rolesWithTooManyWays(movable.movedBy(mostSteps)).length > 0) mostSteps--;
  return { ...movable, mostSteps };
}

function everyLimit(wish: FillWish): MovableLimit[] {
  return [
    filterLimit(wish),
    markLimit(wish, 'iso_max', 'iso', 'isoMax', 1),
    markLimit(wish, 'iso_min', 'iso', 'isoMin', -1),
    markLimit(wish, 'shutter_slowest', 'shutter', 'shutterSlowestS', -1),
    markLimit(wish, 'shutter_fastest', 'shutter', 'shutterFastestS', 1),
    markLimit(wish, 'aperture_min', 'aperture', 'apertureMin', -1),
    markLimit(wish, 'aperture_max', 'aperture', 'apertureMax', 1),
    syncLimit(wish),
  ];
}

const ROLES: Record<FlashLimit, readonly FillFlash['role'][]> = {
  key_power: ['key'],
  fill_power: ['fill'],
  front_power: ['key', 'fill'],
  rim_power: ['rim'],
  key_least: ['key'],
  fill_least: ['fill'],
  rim_least: ['rim'],
};

/** Whether a limit belongs to flashes that the request has. */
export const hasFlashesFor = ({ flashes }: FillWish, limit: FlashLimit): boolean =>
  ROLES[limit].every((role) => flashes.some((flash) => flash.role === role));

export const isTooWeak = (limit: FlashLimit): boolean => limit.endsWith('_power');

/**
 * The request with the flashes of a limit free to come nearer (or, where they are too strong, to go farther away), as
 * far as so many stops of their light: the inverse square makes s stops of 2^(−s/2) of the distance.
 */
export function flashesMoved(wish: FillWish, limit: FlashLimit, stops: number): FillWish {
  const factor = 2 ** (stops / 2);
  const move = (flash: FillFlash): FillFlash =>
    isTooWeak(limit)
      ? { ...flash, nearM: Math.max(NEAREST_M, flash.nearM / factor) }
      : { ...flash, farM: Math.min(FARTHEST_M, flash.farM * factor) };
  return { ...wish, flashes: wish.flashes.map((one) => (ROLES[limit].includes(one.role) ? move(one) : one)) };
}

/** The most stops that moving can bring. */
export function mostMovedStops(wish: FillWish, limit: FlashLimit): number {
  const room = wish.flashes
    .filter(({ role }) => ROLES[limit].includes(role))
    .map(({ nearM, farM }) => (isTooWeak(limit) ? nearM / NEAREST_M : FARTHEST_M / farM));
  return Math.max(0, ...room.map((factor) => 2 * Math.log2(factor)));
}

/** By how many stops a recipe's flashes stand beyond where the request lets them stand. */
export function movedStops(wish: FillWish, limit: FlashLimit, recipe: FillRecipe): number {
  const own = new Map(wish.flashes.map((flash) => [flash.name, flash]));
  const moved = recipe.flashes.map(({ flash, distanceM }) => {
    const before = own.get(flash.name);
    if (before === undefined || !ROLES[limit].includes(flash.role)) return 0;
    return 2 * Math.log2(isTooWeak(limit) ? before.nearM / distanceM : distanceM / before.farM);
  });
  return Math.max(0, ...moved);
}
