import {
  backgroundMiss,
  caseOf,
  fillProblem,
  isWithin,
  someCase,
  someNearBackground,
  type FillProblem,
} from './fillProblem';
import { halfStep, onAimCount } from './fillScore';
import { isReachable, type FillSearch } from './fillSearch';
import type { FillAim, FillWish } from './fillTypes';
import { bestOf, type FillLimit, type LimitInTheWay } from './limitInTheWay';

const withAim = (wish: FillWish, aim: Partial<FillAim>): FillWish => ({
  ...wish,
  aim: { ...wish.aim, ...aim },
});

/** The front's least miss by light alone over all cases whose background is right: + is too bright, − too dark. */
function frontMiss(problem: FillProblem): number | null {
  let least: number | null = null;
  someNearBackground(problem, onAimCount(problem.grid), (lens, shutter) => {
    const { front, table } = caseOf(problem, lens, shutter);
    const most = front.ambient + table.frontMost;
    const miss =
      front.ambient > front.wished
        ? Math.log2(front.ambient / front.wished)
        : Math.min(0, Math.log2(most / front.wished));
    if (least === null || Math.abs(miss) < Math.abs(least)) least = miss;
    return false;
  });
  return least;
}

/** Whether ambient light alone makes the subject too bright wherever the background comes out so, give or take some room. */
function isTooBright({ scene, aim }: FillWish, backgroundStops: number, roomStops: number): boolean {
  const ambientStops = scene.subjectEv100 - scene.backgroundEv100 + backgroundStops;
  return ambientStops - roomStops > aim.subjectStops + ROUNDING_STOPS;
}

const ROUNDING_STOPS = 1e-6;

/** Farther off than this a background is none of the picture's any more. */
const MOST_BACKGROUND_STOPS = 10;

/** The least by which the background has to be off for the flashes to be right, stops with its sign; null where never. */
function backgroundRoom(problem: FillProblem): number | null {
  const { grid, wish } = problem;
  const most = { main: onAimCount(grid), beside: onAimCount(grid) };
  // Rings of one step on either side, from the aim outwards.
  for (let ring = 1; ring <= MOST_BACKGROUND_STOPS * grid.steps; ring++) {
    let best: number | null = null;
    for (const sign of [1, -1]) {
      const shifted = wish.aim.backgroundStops + (sign * ring) / grid.steps;
      if (isTooBright(wish, shifted, 2 * halfStep(grid))) continue;
      const moved = { ...problem, wish: withAim(wish, { backgroundStops: shifted }) };
      someCase(moved, most, (lens, shutter) => {
        const miss = backgroundMiss(problem, lens, shutter);
        if (best !== null && Math.abs(miss) >= Math.abs(best)) return false;
        if (isWithin(caseOf(moved, lens, shutter), most)) best = miss;
        return false;
      });
    }
    if (best !== null) return best;
  }
  return null;
}

/** What of the scene or of the aim itself could be given up; only what brings the rest onto the aim is told. */
export function aimsGivenUp({ problem }: FillSearch): (LimitInTheWay | null)[] {
  const { wish, parts } = problem;
  const { aim, scene } = wish;
  const front = frontMiss(problem) ?? 0;
  const room = backgroundRoom(problem) ?? 0;
  const most = { main: onAimCount(problem.grid), beside: onAimCount(problem.grid) };
  const give = (isAsked: boolean, limit: FillLimit, shortByStops: number | null, changed: FillWish) => {
    const other = isAsked ? fillProblem(changed, problem) : null;
    const best = other && isReachable(other, most) ? bestOf(other, aim) : null;
    return best && { limit, shortByStops, ...best };
  };
  const shaded = { ...wish, scene: { ...scene, subjectEv100: scene.subjectEv100 - front } };
  const otherBackground = withAim(wish, { backgroundStops: aim.backgroundStops + room });
  const otherSubject = withAim(wish, { subjectStops: aim.subjectStops + front });
  return [
    give(front > 0, 'ambient_too_bright', front, shaded),
    give(room !== 0, 'aim_background', Math.abs(room), otherBackground),
    give(front !== 0, 'aim_subject', Math.abs(front), otherSubject),
    give(parts.ratio, 'aim_ratio', null, withAim(wish, { ratio: null })),
    give(parts.rim, 'aim_rim', null, withAim(wish, { rimStops: null })),
  ];
}

/** Both parts that light decides, as the best recipe leaves them: what is to be accepted when nothing alone helps. */
export function aimsAsTheyAre({ problem }: FillSearch): LimitInTheWay[] {
  const best = bestOf(problem, problem.wish.aim);
  if (best === null) return [];
  const { backgroundStops, subjectStops } = best.recipe.outcome.misses;
  const parts = [
    { limit: 'aim_background' as const, own: Math.abs(backgroundStops), other: Math.abs(subjectStops) },
    { limit: 'aim_subject' as const, own: Math.abs(subjectStops), other: Math.abs(backgroundStops) },
  ];
  const allowed = halfStep(problem.grid);
  return parts
    .filter(({ own }) => own > allowed)
    .map(({ limit, own, other }) => ({
      limit,
      shortByStops: own,
      leavesStops: other > allowed ? other : 0,
      recipe: best.recipe,
    }));
}
