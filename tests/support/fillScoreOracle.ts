import { cameraGrid } from '../../shared/math/fill/cameraGrid';
import { countOf } from '../../shared/math/fill/fillMisses';
import { fillOutcome } from '../../shared/math/fill/fillOutcome';
import { fillProblem } from '../../shared/math/fill/fillProblem';
import {
  caseCost,
  missCounts,
  onAimCount,
  outcomeCost,
  OWN_WEIGHT,
  scoreOf,
  settingCost,
} from '../../shared/math/fill/fillScore';
import type { FillFlash, FillWish, UsedFlash } from '../../shared/math/fill/fillTypes';
import {
  everyCombination,
  everySetting,
  frontOf,
  judgeOf,
  rimsOf,
  syncOf,
  type Combination,
} from './fillOracle';

/** Fills first, then the strongest, then by name: the order in which ways that are otherwise equal are taken. */
function inOwnOrder(wish: FillWish): FillWish {
  const strength = (one: FillFlash) => 2 * Math.log2(one.guideNumberM / one.nearM) - one.lossStops;
  const turn = ({ role }: FillFlash) => (role === 'fill' ? 0 : 1);
  const flashes = [...wish.flashes].sort(
    (a, b) => turn(a) - turn(b) || strength(b) - strength(a) || (a.name < b.name ? -1 : 1),
  );
  return { ...wish, flashes };
}

const hardest = (used: readonly UsedFlash[]) => Math.max(0, ...used.map(({ power }) => power));

type Count = (one: Combination) => number;

const leastOf = (all: readonly Combination[], count: Count) => Math.min(...all.map(count));

/** As few flashes as keep within, then the least miss, then the least power of the hardest, then the first. */
function easiest(within: readonly Combination[], miss: Count): readonly UsedFlash[] {
  const few = Math.min(...within.map(({ used }) => used.length));
  const sparing = within.filter(({ used }) => used.length === few);
  const near = sparing.filter((one) => miss(one) === leastOf(sparing, miss));
  const power = Math.min(...near.map(({ used }) => hardest(used)));
  const [first] = near.filter(({ used }) => hardest(used) <= power * (1 + 1e-9));
  if (!first) throw new Error('no combination is left');
  return first.used;
}

/** The combinations of the front among which the easiest is taken, and what then tells them apart. */
function frontWithin(
  all: readonly Combination[],
  sum: Count,
  ratio: Count,
  onAim: number,
  spare: (least: number) => number,
) {
  const larger: Count = (one) => Math.max(sum(one), ratio(one));
  const least = leastOf(all, larger);
  if (least <= onAim) {
    const allowed = Math.max(least, spare(least));
    return { within: all.filter((one) => larger(one) <= allowed), miss: larger };
  }
  const leastSum = Math.max(onAim, leastOf(all, sum));
  const right = all.filter((one) => sum(one) <= leastSum);
  const leastRatio = Math.max(onAim, leastOf(right, ratio));
  return { within: right.filter((one) => ratio(one) <= leastRatio), miss: sum };
}

/** The least score over every setting of the camera, its flashes set by the rule; by going through all of them. */
export function leastScoreOf(given: FillWish): number {
  const wish = inOwnOrder(given);
  const problem = fillProblem(given);
  const grid = cameraGrid(wish.camera);
  const onAim = onAimCount(grid);
  const objective = { prefer: wish.prefer, weight: OWN_WEIGHT };
  let best = Infinity;
  for (const { settings, positions } of everySetting(wish)) {
    const judge = judgeOf(wish, settings);
    const front = everyCombination(wish, frontOf(wish), settings);
    const rims = rimsOf(wish);
    const rim = rims.length === 0 ? [] : everyCombination(wish, rims, settings);
    const sum: Count = (one) => countOf(judge.subject(one));
    const ratio: Count = (one) => countOf(judge.ratio(one));
    const rimMiss: Count = (one) => countOf(judge.rim(one));
    const rimLeast = rim.length === 0 ? 0 : leastOf(rim, rimMiss);
    const spare = (least: number) => Math.min(onAim, Math.max(countOf(judge.background), least, rimLeast));
    const chosen = frontWithin(front, sum, ratio, onAim, spare);
    const frontLeast = Math.max(leastOf(chosen.within, sum), leastOf(chosen.within, ratio));
    const allowed = Math.max(rimLeast, spare(frontLeast));
    const used = [
      ...easiest(chosen.within, chosen.miss),
      ...(rim.length === 0
        ? []
        : easiest(
            rim.filter((one) => rimMiss(one) <= allowed),
            rimMiss,
          )),
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
      outcomeCost(objective, outcome, sync, settings.shutterS);
    best = Math.min(best, scoreOf(grid, missCounts(problem, outcome), cost));
  }
  return best;
}
