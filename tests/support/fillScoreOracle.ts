import { cameraGrid } from '../../shared/math/fill/cameraGrid';
import { countOf } from '../../shared/math/fill/fillMisses';
import { fillOutcome } from '../../shared/math/fill/fillOutcome';
import { fillProblem } from '../../shared/math/fill/fillProblem';
import {
  caseCost,
  missCount,
  outcomeCost,
  OWN_WEIGHT,
  scoreOf,
  settingCost,
} from '../../shared/math/fill/fillScore';
import type { FillWish, UsedFlash } from '../../shared/math/fill/fillTypes';
import {
  everyCombination,
  everySetting,
  frontOf,
  judgeOf,
  rimsOf,
  syncOf,
  type Combination,
} from './fillOracle';

/** Strongest first, then by name: the order in which ways that are otherwise equal are taken. */
function inOwnOrder(wish: FillWish): FillWish {
  const strength = (one: FillWish['flashes'][number]) =>
    2 * Math.log2(one.guideNumberM / one.nearM) - one.lossStops;
  const flashes = [...wish.flashes].sort((a, b) => strength(b) - strength(a) || (a.name < b.name ? -1 : 1));
  return { ...wish, flashes };
}

const hardest = (used: readonly UsedFlash[]) => Math.max(0, ...used.map(({ power }) => power));

/** As few flashes as keep within `allowed`, then the least miss, then the least power of the hardest, then the first. */
function easiest(
  all: readonly Combination[],
  miss: (one: Combination) => number,
  allowed: number,
): Combination {
  const within = all.filter((one) => countOf(miss(one)) <= allowed);
  const few = Math.min(...within.map(({ used }) => used.length));
  const sparing = within.filter(({ used }) => used.length === few);
  const least = Math.min(...sparing.map((one) => countOf(miss(one))));
  const near = sparing.filter((one) => countOf(miss(one)) === least);
  const power = Math.min(...near.map(({ used }) => hardest(used)));
  const [first] = near.filter(({ used }) => hardest(used) <= power * (1 + 1e-9));
  if (!first) throw new Error('no combination is left');
  return first;
}

/** The least score over every setting of the camera, its flashes set by the rule; by going through all of them. */
export function leastScoreOf(given: FillWish): number {
  const wish = inOwnOrder(given);
  const problem = fillProblem(given);
  const grid = cameraGrid(wish.camera);
  const objective = { prefer: wish.prefer, weight: OWN_WEIGHT };
  let best = Infinity;
  for (const { settings, positions } of everySetting(wish)) {
    const judge = judgeOf(wish, settings);
    const [front, rims] = [everyCombination(wish, frontOf(wish), settings), rimsOf(wish)];
    const rim = rims.length === 0 ? [] : everyCombination(wish, rims, settings);
    const allowed = Math.max(
      countOf(judge.backgroundMiss),
      Math.min(...front.map((one) => countOf(judge.front(one)))),
      rim.length === 0 ? 0 : Math.min(...rim.map((one) => countOf(judge.rim(one)))),
    );
    const used = [
      ...easiest(front, judge.front, allowed).used,
      ...(rim.length === 0 ? [] : easiest(rim, judge.rim, allowed).used),
    ];
    const sync = used.length === 0 ? 'none' : syncOf(wish, settings.shutterS);
    const outcome = fillOutcome(wish, settings, sync, used);
    const [a, , s] = positions;
    const lens = grid.lenses.find((one) => one.difference === a - s && one.ndStops === settings.ndStops);
    const shutter = grid.shutters.find(({ mark }) => mark.exact === settings.shutterS);
    if (!lens || !shutter) throw new Error('a setting is none of the grid');
    const cost =
      caseCost(problem, lens, shutter) +
      settingCost(grid, objective, lens, a) +
      outcomeCost(problem, objective, outcome, sync, settings.shutterS);
    best = Math.min(best, scoreOf(missCount(problem, outcome), cost));
  }
  return best;
}
