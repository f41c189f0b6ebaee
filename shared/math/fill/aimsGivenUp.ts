import {
  backgroundMiss,
  caseAt,
  isWithin,
  lowerBounds,
  NOT_LOOKED_AT,
  type FillProblem,
} from './fillProblem';
import { onAimCount } from './fillScore';
import type { FillSearch } from './fillSearch';
import type { FillAim, FillWish } from './fillTypes';
import { bestOf, type FillLimit, type LimitInTheWay } from './limitInTheWay';

const withAim = (wish: FillWish, aim: Partial<FillAim>): FillWish => ({
  ...wish,
  aim: { ...wish.aim, ...aim },
});

/** The front's least miss by light alone over all cases whose background is right: + is too bright, − too dark. */
function frontMiss(problem: FillProblem): number | null {
  const count = onAimCount(problem.grid);
  const bounds = lowerBounds(problem, count);
  let least: number | null = null;
  for (let place = 0; place < bounds.length; place++) {
    if ((bounds[place] ?? NOT_LOOKED_AT) === NOT_LOOKED_AT) continue;
    const { front, table, shutter, backgroundCount } = caseAt(problem, place);
    if (backgroundCount > count) continue;
    const most = front.ambient + (table.keyMost + table.fillMost) * (shutter.sync === 'none' ? 0 : 1);
    const miss =
      front.ambient > front.wished
        ? Math.log2(front.ambient / front.wished)
        : Math.min(0, Math.log2(most / front.wished));
    if (least === null || Math.abs(miss) < Math.abs(least)) least = miss;
  }
  return least;
}

/** Farther off than this a background is none of the picture's any more. */
const MOST_BACKGROUND_STOPS = 20;

/** The least by which the background has to be off for the flashes to be right, stops with its sign; null where never. */
function backgroundRoom(problem: FillProblem): number | null {
  const { grid, wish } = problem;
  const count = onAimCount(grid);
  // Rings of one step on either side, from the aim outwards.
  for (let ring = 1; ring <= MOST_BACKGROUND_STOPS * grid.steps; ring++) {
    let best: number | null = null;
    for (const sign of [1, -1]) {
      const shifted = wish.aim.backgroundStops + (sign * ring) / grid.steps;
      const moved = { ...problem, wish: withAim(wish, { backgroundStops: shifted }) };
      const bounds = lowerBounds(moved, count);
      for (let place = 0; place < bounds.length; place++) {
        if ((bounds[place] ?? NOT_LOOKED_AT) > count) continue;
        const one = caseAt(moved, place);
        if (!isWithin(one, count)) continue;
        const miss = backgroundMiss(problem, one.lens, one.shutter);
        if (best === null || Math.abs(miss) < Math.abs(best)) best = miss;
      }
    }
    if (best !== null) return best;
  }
  return null;
}

/** A changed request, where it brings what is left onto the aim. */
function changed(
  limit: FillLimit,
  shortByStops: number | null,
  wish: FillWish,
  aim: FillAim,
): LimitInTheWay | null {
  const best = bestOf(wish, aim);
  return best && best.leavesStops === 0 ? { limit, shortByStops, ...best } : null;
}

/** What of the scene or of the aim itself could be given up. */
export function aimsGivenUp(search: FillSearch): (LimitInTheWay | null)[] {
  const { problem } = search;
  const { wish } = problem;
  const { aim, scene } = wish;
  const front = frontMiss(problem);
  const room = backgroundRoom(problem);
  const isTooBright = front !== null && front > 0;
  return [
    isTooBright
      ? changed(
          'ambient_too_bright',
          front,
          { ...wish, scene: { ...scene, subjectEv100: scene.subjectEv100 - front } },
          aim,
        )
      : null,
    room === null
      ? null
      : changed(
          'aim_background',
          Math.abs(room),
          withAim(wish, { backgroundStops: aim.backgroundStops + room }),
          aim,
        ),
    front === null || front === 0
      ? null
      : changed(
          'aim_subject',
          Math.abs(front),
          withAim(wish, { subjectStops: aim.subjectStops + front }),
          aim,
        ),
    problem.parts.ratio ? changed('aim_ratio', null, withAim(wish, { ratio: null }), aim) : null,
    problem.parts.rim ? changed('aim_rim', null, withAim(wish, { rimStops: null }), aim) : null,
  ];
}
