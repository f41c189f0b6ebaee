import { z } from 'zod';
import type { FillCamera, FillRecipe, FillWish } from '../math/fill/fillTypes';
import type { FillLimit, LimitInTheWay } from '../math/fill/limitInTheWay';
import { exactAt, nearestMark, positionOf, stepsPerStop, type MarkedKind } from '../math/marks';
import { fillLimits, fillSides, type LimitParams } from '../text';
import { fillRecipeOut, shapeRecipe } from './fillRecipeOut';

/** A limit that stands in the way of the aim. */
export const limitOut = z.strictObject({
  limit: z.string().meta({ title: 'Limit', description: 'stable, for programs' }),
  shortByStops: z.number().nullable().meta({
    title: 'Short by',
    unit: 'stops',
    description: 'by so much the limit would have to move; null where it is no question of stops',
  }),
  giveUp: z.string().meta({ title: 'Give up', description: 'a sentence, for people' }),
  leavesStops: z.number().meta({
    title: 'Leaves',
    unit: 'stops',
    description: 'the largest miss of what remains of the aim; 0 where that is met to within half a step',
  }),
  distanceFactor: z.number().optional().meta({
    title: 'Distance times',
    description: 'a flash that is too weak, or too strong, at this share of its distance does it',
  }),
  headsFactor: z
    .number()
    .optional()
    .meta({ title: 'Heads times', description: 'or so many times as many equal heads' }),
  recipe: fillRecipeOut.optional().meta({ title: 'Recipe', description: 'what results from giving it up' }),
});

export type LimitOut = z.output<typeof limitOut>;

interface MarkedLimit {
  readonly kind: MarkedKind;
  readonly exactOf: (camera: FillCamera) => number;
  /** the way in which it moves along its scale, and the side to which its own mark rounds */
  readonly direction: 1 | -1;
}

const MARKED: Partial<Record<FillLimit, MarkedLimit>> = {
  aperture_min: { kind: 'aperture', exactOf: (camera) => camera.apertureMin, direction: -1 },
  aperture_max: { kind: 'aperture', exactOf: (camera) => camera.apertureMax, direction: 1 },
  iso_min: { kind: 'iso', exactOf: (camera) => camera.isoMin, direction: -1 },
  iso_max: { kind: 'iso', exactOf: (camera) => camera.isoMax, direction: 1 },
  shutter_slowest: { kind: 'shutter', exactOf: (camera) => camera.shutterSlowestS, direction: -1 },
  shutter_fastest: { kind: 'shutter', exactOf: (camera) => camera.shutterFastestS, direction: 1 },
  sync_speed: { kind: 'shutter', exactOf: (camera) => camera.syncSpeedS, direction: 1 },
};

/** The mark that a limit would have to reach: whole steps from the last mark that it allows. */
function markReached(limit: FillLimit, stops: number, camera: FillCamera): string {
  const marked = MARKED[limit];
  if (marked === undefined) return '';
  const { kind, exactOf, direction } = marked;
  const { scale } = camera;
  const last = nearestMark(kind, scale, exactOf(camera), direction > 0 ? 'floor' : 'ceil');
  const steps = Math.round(stops * stepsPerStop(scale));
  const from = Math.round(positionOf(kind, scale, last.exact));
  return nearestMark(kind, scale, exactAt(kind, scale, from + direction * steps)).label;
}

/** Which way a part of the aim would have to be given up, by what its recipe makes of it. */
function sideOf({ limit, recipe }: LimitInTheWay): string {
  const misses = recipe?.outcome.misses;
  const miss = limit === 'aim_background' ? misses?.backgroundStops : misses?.subjectStops;
  return (miss ?? 0) > 0 ? fillSides.brighter : fillSides.darker;
}

const isOfFlash = (limit: FillLimit) => limit.endsWith('_power') || limit.endsWith('_least');

const rolesOf = (limit: FillLimit) =>
  limit.startsWith('front') ? ['key', 'fill'] : [limit.slice(0, limit.indexOf('_'))];

function paramsOf(one: LimitInTheWay, wish: FillWish): LimitParams {
  const { limit, shortByStops, guideNumberPerM = 0 } = one;
  const stops = shortByStops ?? 0;
  const losses = wish.flashes
    .filter(({ role }) => rolesOf(limit).includes(role))
    .map(({ lossStops }) => lossStops);
  return {
    stops,
    to: limit.startsWith('aim_') ? sideOf(one) : markReached(limit, stops, wish.camera),
    distanceFactor: 2 ** (-stops / 2),
    heads: 2 ** stops,
    lossStops: losses.length === 0 ? 0 : Math.min(...losses),
    guideNumberPerM,
  };
}

/** A limit in the answer's shape; its recipe is told against the best one, where there is one. */
export function shapeLimit(one: LimitInTheWay, wish: FillWish, first: FillRecipe | undefined): LimitOut {
  const { limit, shortByStops, leavesStops, recipe } = one;
  const params = paramsOf(one, wish);
  const factors = isOfFlash(limit)
    ? {
        distanceFactor: limit.endsWith('_least') ? 1 / params.distanceFactor : params.distanceFactor,
        ...(limit.endsWith('_power') ? { headsFactor: params.heads } : {}),
      }
    : {};
  return {
    limit,
    shortByStops,
    giveUp: fillLimits[limit](params),
    leavesStops,
    ...factors,
    ...(recipe ? { recipe: shapeRecipe(recipe, wish.camera, first ?? recipe) } : {}),
  };
}
