import { assumedCurtainS } from '../highSpeedSync';
import { ANY_COUNT, fillProblem, type FillProblem } from './fillProblem';
import { isReachable, startSearch } from './fillSearch';
import type { FillWish } from './fillTypes';
import { bestOf, type LimitInTheWay } from './limitInTheWay';
import {
  flashesMoved,
  hasFlashesFor,
  mostMovedStops,
  movableLimits,
  movedStops,
  type FlashLimit,
  type MovableLimit,
} from './limits';

const HALVINGS = 12;
/** Giving up a limit that brings less than this is no help. */
const LEAST_HELP = 6;

/** The fewest steps by which a limit must move for a miss of so many parts to be kept; null where none are enough. */
function fewestSteps(
  problem: FillProblem,
  { mostSteps, isNested, movedBy, alone }: MovableLimit,
  count: number,
): number | null {
  const reaches = (steps: number) => isReachable(fillProblem((alone ?? movedBy)(steps), problem), count);
  if (!isNested) {
    for (let steps = 1; steps <= mostSteps; steps++) if (reaches(steps)) return steps;
    return null;
  }
  if (mostSteps === 0 || !reaches(mostSteps)) return null;
  let [below, at] = [0, mostSteps];
  while (at - below > 1) {
    const middle = Math.floor((below + at) / 2);
    if (reaches(middle)) at = middle;
    else below = middle;
  }
  return at;
}

function givenUp(problem: FillProblem, movable: MovableLimit, count: number): LimitInTheWay | null {
  const steps = fewestSteps(problem, movable, count);
  if (steps === null) return null;
  const best = bestOf(fillProblem(movable.movedBy(steps), problem), problem.wish.aim);
  return best && { limit: movable.limit, shortByStops: steps / problem.grid.steps, ...best };
}

/** How near (or far) flashes have to go, by halving; first for the aim itself, else for what still counts as on it. */
function flashesGivenUp(problem: FillProblem, limit: FlashLimit, count: number): LimitInTheWay | null {
  const { wish } = problem;
  const mostStops = mostMovedStops(wish, limit);
  if (!hasFlashesFor(wish, limit) || mostStops === 0) return null;
  const reaches = (stops: number, flashCount: number) =>
    isReachable(fillProblem(flashesMoved(wish, limit, stops), problem), count, flashCount);
  if (!reaches(mostStops, count)) return null;
  const flashCount = reaches(mostStops, 0) ? 0 : count;
  let [below, at] = [0, mostStops];
  for (let i = 0; i < HALVINGS; i++) {
    const middle = (below + at) / 2;
    if (reaches(middle, flashCount)) at = middle;
    else below = middle;
  }
  const best = bestOf(fillProblem(flashesMoved(wish, limit, at), problem), wish.aim);
  return best && { limit, shortByStops: movedStops(wish, limit, best.recipe), ...best };
}

const FLASH_LIMITS: readonly FlashLimit[] = [
  'key_power',
  'fill_power',
  'rim_power',
  'key_least',
  'fill_least',
  'rim_least',
];

/** High-speed sync where the camera has none: by how many stops the recipe's shutter is over the sync speed. */
function highSpeedSyncGivenUp(problem: FillProblem, count: number): LimitInTheWay | null {
  const { wish } = problem;
  const { highSpeedSync, syncSpeedS } = wish.camera;
  if (highSpeedSync !== null) return null;
  const camera = {
    ...wish.camera,
    highSpeedSync: { curtainS: assumedCurtainS(syncSpeedS), extraLossStops: 0 },
  };
  const able = fillProblem({ ...wish, camera }, problem);
  const best = isReachable(able, count) ? bestOf(able, wish.aim) : null;
  return (
    best && {
      limit: 'high_speed_sync',
      shortByStops: Math.max(0, Math.log2(syncSpeedS / best.recipe.shutter.exact)),
      ...best,
    }
  );
}

/** Every limit of the gear that alone, given up, lets a miss of so many parts be kept. */
export function gearGivenUp(problem: FillProblem, count: number): (LimitInTheWay | null)[] {
  const { wish } = problem;
  const ofFlashes = FLASH_LIMITS.map((limit) => flashesGivenUp(problem, limit, count));
  const isOneEnough = ofFlashes.some((one) => one?.limit === 'key_power' || one?.limit === 'fill_power');
  return [
    ...movableLimits(wish).map((movable) => givenUp(problem, movable, count)),
    highSpeedSyncGivenUp(problem, count),
    ...ofFlashes,
    isOneEnough ? null : flashesGivenUp(problem, 'front_power', count),
  ];
}

/** Every limit of the gear that, given up, brings the best recipe nearer to the aim, though not onto it. */
export function gearThatHelps(problem: FillProblem, least: number | null): (LimitInTheWay | null)[] {
  const { wish } = problem;
  const most = least === null ? ANY_COUNT : least - LEAST_HELP;
  const helpful = (changed: FillWish) => {
    const other = fillProblem(changed, problem);
    return most >= 0 && isReachable(other, most) ? startSearch(other).least : null;
  };
  const cameras = movableLimits(wish)
    .filter(({ isNested, mostSteps }) => isNested && mostSteps > 0)
    .map((movable) => {
      const count = helpful(movable.movedBy(movable.mostSteps));
      return count === null ? null : givenUp(problem, movable, count);
    });
  const flashes = FLASH_LIMITS.filter((limit) => hasFlashesFor(wish, limit)).map((limit) => {
    const count = helpful(flashesMoved(wish, limit, mostMovedStops(wish, limit)));
    return count === null ? null : flashesGivenUp(problem, limit, count);
  });
  return [...cameras, ...flashes];
}
