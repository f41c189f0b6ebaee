import type { CameraGrid, GridLens, GridShutter } from './cameraGrid';
import { stepsPerStop, type Scale } from '../marks';
import { countOf, mostAt, sizesOf } from './fillMisses';
import { handheldOf } from './fillOutcome';
import type { FillCase, FillProblem, MissLimits } from './fillProblem';
import type { FillOutcome, FillPreference, SyncKind } from './fillTypes';

/**
 * What is favoured, and how much a stop of it counts. A request's own wish outweighs everything but the aim; for the
 * alternatives beside it the same wish counts just less than a stop of ISO, so that they stay usable.
 */
export interface FillObjective {
  readonly prefer: FillPreference | null;
  readonly weight: number;
}

export const OWN_WEIGHT = 10;
export const ALTERNATIVE_WEIGHT = 0.9;

/**
 * The aim comes first: by how much background or subject are over half a step, then ratio or rim, then the largest miss
 * within half a step, each in parts of 1/120 stop and each outweighing all that follows; everything else together
 * stays below one such part.
 */
const PER_NEAR_PART = 1000;
const PER_BESIDE_PART = 100 * PER_NEAR_PART;
const PER_MAIN_PART = 2000 * PER_BESIDE_PART;
const MOST_BESIDE = 999;
const PER_HANDHELD_STOP = 4;
const PER_GHOST_LEVEL = 3;
const PER_ISO_STOP = 1;
const FILTER_COST = 0.5;
const HIGH_SPEED_COST = 0.5;
const PER_STOP_SHORT_OF_RESERVE = 1;
const RECYCLE_S_PER_POINT = 10;
const MOST_RECYCLE = 3;
/** Where nothing else decides: an aperture near f/4. Common practice, no source. */
const PER_STOP_FROM_MIDDLE = 0.01;
const MIDDLE_AV = 4;
/** Times and powers are counted in stops above these. */
const SHORTEST_LIGHT_S = 1e-6;
const LEAST_POWER_STOPS = -14;

const GHOST_LEVELS = { none: 0, faint: 1, clear: 2, dominant: 3 } as const;

/** Half of the scale's step, stops: what still counts as on the aim. */
export const halfStep = (grid: Pick<CameraGrid, 'steps'>): number => 0.5 / grid.steps;
/** The most by which a part may miss and still count as on the aim, with room for rounding. */
export const onAimStops = (scale: Scale): number => halfStep({ steps: stepsPerStop(scale) }) + 1e-8;
/** The same in whole parts of 1/120 stop. */
export const onAimCount = (grid: Pick<CameraGrid, 'steps'>): number => countOf(halfStep(grid));

/** What the shutter and the filter of a case cost, whichever aperture and speed are taken. */
export function caseCost({ wish }: FillProblem, lens: GridLens, shutter: GridShutter): number {
  const over = handheldOf(wish.motion, shutter.mark.exact)?.overStops ?? 0;
  return PER_HANDHELD_STOP * over + (lens.ndStops > 0 ? FILTER_COST : 0);
}

/** What the aperture, and the speed that goes with it, cost. */
export function settingCost(
  { steps, aperture, iso }: CameraGrid,
  { prefer, weight }: FillObjective,
  lens: GridLens,
  position: number,
): number {
  const isoStops = (position - lens.difference - iso[0]) / steps;
  const cost = PER_ISO_STOP * isoStops + PER_STOP_FROM_MIDDLE * Math.abs(position / steps - MIDDLE_AV);
  if (prefer === 'shallowFocus') return cost + (weight * (position - aperture[0])) / steps;
  if (prefer === 'deepFocus') return cost + (weight * (aperture[1] - position)) / steps;
  return prefer === 'lowIso' ? cost + weight * isoStops : cost;
}

const frozenCost = (lightS: number) => Math.max(0, Math.log2(lightS / SHORTEST_LIGHT_S));
const batteryCost = (powerStops: number) => Math.max(0, powerStops - LEAST_POWER_STOPS);

/** The least that a case can cost for what only its outcome tells, so that most cases need not be worked out. */
export function leastOutcomeCost(one: FillCase, { prefer, weight }: FillObjective, limit: number): number {
  const { front, shutter, table } = one;
  const most = front.wished * 2 ** mostAt(limit);
  if (prefer === 'frozen') {
    const share = shutter.sync === 'normal' ? Math.min(1, front.ambient / most) : 1;
    return weight * frozenCost(share * shutter.mark.exact);
  }
  if (prefer !== 'battery') return 0;
  const needed = front.wished * 2 ** -mostAt(limit) - front.ambient;
  if (!(needed > 0) || !(table.frontWhole > 0)) return 0;
  return weight * batteryCost(Math.log2(needed / table.frontWhole) - 1e-9);
}

/** The mean time over which the subject's light comes in: ambient light takes the shutter's, a pulse its own. */
function gatheringS(outcome: FillOutcome, sync: SyncKind, shutterS: number): number {
  const over = outcome.flashToAmbientStops;
  if (sync !== 'normal' || over === null) return shutterS;
  const share = 1 / (1 + 2 ** over);
  const flashS = outcome.blur?.by === 'flash' ? outcome.blur.lightS : 0;
  return share * shutterS + (1 - share) * flashS;
}

/** What an outcome costs beside the camera's settings and its largest miss. */
export function outcomeCost(
  { prefer, weight }: FillObjective,
  outcome: FillOutcome,
  sync: SyncKind,
  shutterS: number,
): number {
  let cost = 0;
  if (outcome.ghost !== null) cost += PER_GHOST_LEVEL * GHOST_LEVELS[outcome.ghost.visibility];
  if (sync === 'highSpeed') cost += HIGH_SPEED_COST;
  if (outcome.reserveStops !== null)
    cost += PER_STOP_SHORT_OF_RESERVE * Math.max(0, 1 - outcome.reserveStops);
  if (outcome.recycleS !== null) cost += Math.min(MOST_RECYCLE, outcome.recycleS / RECYCLE_S_PER_POINT);
  if (prefer === 'frozen') cost += weight * frozenCost(gatheringS(outcome, sync, shutterS));
  if (prefer === 'battery' && outcome.reserveStops !== null)
    cost += weight * batteryCost(-outcome.reserveStops);
  return cost;
}

/** The largest miss among the parts of the aim that the flashes can serve, stops. */
export function largestMiss(problem: FillProblem, outcome: FillOutcome): number {
  return Math.max(...sizesOf(outcome.misses, problem.parts));
}

/** How an outcome misses the parts of the aim that the flashes can serve. */
export interface MissCounts extends MissLimits {
  /** the largest of all, up to half a step */
  readonly near: number;
}

export function missCounts(problem: FillProblem, outcome: FillOutcome): MissCounts {
  const none = { ratio: false, rim: false };
  const main = countOf(Math.max(...sizesOf(outcome.misses, none)));
  const [, , ...others] = sizesOf(outcome.misses, problem.parts);
  const beside = countOf(Math.max(0, ...others));
  return { main, beside, near: Math.min(onAimCount(problem.grid), Math.max(main, beside)) };
}

export function scoreOf(grid: Pick<CameraGrid, 'steps'>, counts: MissCounts, cost: number): number {
  const onAim = onAimCount(grid);
  return (
    PER_MAIN_PART * Math.max(0, counts.main - onAim) +
    PER_BESIDE_PART * Math.max(0, counts.beside - onAim) +
    PER_NEAR_PART * counts.near +
    Math.min(MOST_BESIDE, cost)
  );
}
