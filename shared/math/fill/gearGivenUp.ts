import { assumedCurtainS } from '../highSpeedSync';
import { ABSENT_COUNT } from './fillMisses';
import { ANY_COUNT, fillProblem, type FillProblem, type MissLimits } from './fillProblem';
import { onAimCount } from './fillScore';
import { flashShort } from './flashShort';
import { isReachable, startSearch, type FillSearch } from './fillSearch';
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

/** Giving up a limit that brings less than this is no help. */
const LEAST_HELP = 6;

/** The fewest steps by which a limit must move for misses to be kept; null where none are enough. */
function fewestSteps(
  problem: FillProblem,
  { mostSteps, isNested, movedBy, alone }: MovableLimit,
  most: MissLimits,
): number | null {
  const reaches = (steps: number) => isReachable(fillProblem((alone ?? movedBy)(steps), problem), most);
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

function givenUp(problem: FillProblem, movable: MovableLimit, most: MissLimits): LimitInTheWay | null {
  const steps = fewestSteps(problem, movable, most);
  if (steps === null) return null;
  const best = bestOf(fillProblem(movable.movedBy(steps), problem), problem.wish.aim);
  return best && { limit: movable.limit, shortByStops: steps / problem.grid.steps, ...best };
}

/** Whether a flash lights its part by itself, so that moving it can bring that part onto the aim exactly. */
function isAlone({ flashes }: FillWish, limit: FlashLimit): boolean {
  const isRim = limit.startsWith('rim');
  return flashes.filter(({ role }) => (role === 'rim') === isRim).length === 1;
}

/** A little more than is needed, so that rounding does not take it away again. */
const ROUNDING_STOPS = 1e-9;

/** How near (or far) flashes have to go: for the aim itself, where one alone decides it, else for what still counts as on it. */
function flashesGivenUp(problem: FillProblem, limit: FlashLimit, most: MissLimits): LimitInTheWay | null {
  const { wish } = problem;
  if (!hasFlashesFor(wish, limit)) return null;
  const exact = limit.startsWith('rim') ? { ...most, beside: 0 } : { ...most, main: 0 };
  const stopsFor = (flash: MissLimits) => flashShort(problem, limit, most, flash);
  const exactly = isAlone(wish, limit) ? stopsFor(exact) : Infinity;
  const stops = exactly <= mostMovedStops(wish, limit) ? exactly : stopsFor(most);
  if (stops > mostMovedStops(wish, limit)) return null;
  const moved = fillProblem(flashesMoved(wish, limit, stops + ROUNDING_STOPS), problem);
  if (!isReachable(moved, most)) return null;
  const best = bestOf(moved, wish.aim);
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
function highSpeedSyncGivenUp(problem: FillProblem, most: MissLimits): LimitInTheWay | null {
  const { wish } = problem;
  const { highSpeedSync, syncSpeedS } = wish.camera;
  if (highSpeedSync !== null) return null;
  const camera = {
    ...wish.camera,
    highSpeedSync: { curtainS: assumedCurtainS(syncSpeedS), extraLossStops: 0 },
  };
  const able = fillProblem({ ...wish, camera }, problem);
  const best = isReachable(able, most) ? bestOf(able, wish.aim) : null;
  return (
    best && {
      limit: 'high_speed_sync',
      shortByStops: Math.max(0, Math.log2(syncSpeedS / best.recipe.shutter.exact)),
      ...best,
    }
  );
}

/** Every limit of the gear that alone, given up, lets the aim be met. */
export function gearGivenUp(problem: FillProblem): (LimitInTheWay | null)[] {
  const { wish, grid } = problem;
  const most = { main: onAimCount(grid), beside: onAimCount(grid) };
  const ofFlashes = FLASH_LIMITS.map((limit) => flashesGivenUp(problem, limit, most));
  const isOneEnough = ofFlashes.some((one) => one?.limit === 'key_power' || one?.limit === 'fill_power');
  return [
    ...movableLimits(wish).map((movable) => givenUp(problem, movable, most)),
    highSpeedSyncGivenUp(problem, most),
    ...ofFlashes,
    isOneEnough ? null : flashesGivenUp(problem, 'front_power', most),
  ];
}

/** The misses that would be a help, and with them those that a changed problem then reaches; null where it is none. */
function helpedTo(changed: FillProblem, { least, problem }: FillSearch): MissLimits | null {
  const onAim = onAimCount(problem.grid);
  const isMainOff = least === null || least.main > onAim;
  const most = isMainOff
    ? { main: least === null ? ANY_COUNT : least.main - LEAST_HELP, beside: ABSENT_COUNT }
    : { main: onAim, beside: least.beside - LEAST_HELP };
  if (!isReachable(changed, most)) return null;
  const reached = startSearch(changed).least;
  if (reached === null) return null;
  return isMainOff
    ? { main: Math.max(onAim, reached.main), beside: ABSENT_COUNT }
    : { main: onAim, beside: Math.max(onAim, reached.beside) };
}

/** Every limit of the gear that, given up, brings the best recipe nearer to the aim, though not onto it. */
export function gearThatHelps(search: FillSearch): (LimitInTheWay | null)[] {
  const { problem } = search;
  const { wish } = problem;
  const cameras = movableLimits(wish)
    .filter(({ isNested, mostSteps }) => isNested && mostSteps > 0)
    .map((movable) => {
      const most = helpedTo(fillProblem(movable.movedBy(movable.mostSteps), problem), search);
      return most && givenUp(problem, movable, most);
    });
  const flashes = FLASH_LIMITS.filter((limit) => hasFlashesFor(wish, limit)).map((limit) => {
    const moved = flashesMoved(wish, limit, mostMovedStops(wish, limit));
    const most = helpedTo(fillProblem(moved, problem), search);
    return most && flashesGivenUp(problem, limit, most);
  });
  return [...cameras, ...flashes];
}
