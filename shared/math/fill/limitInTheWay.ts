import { fillOutcome } from './fillOutcome';
import type { FillProblem } from './fillProblem';
import { largestMiss, OWN_WEIGHT } from './fillScore';
import { bestFound } from './bestFound';
import { isOnAim, startSearch } from './fillSearch';
import { exactSettingsOf, type FillAim, type FillRecipe, type FillWish } from './fillTypes';
import type { CameraLimit, FlashLimit } from './limits';

export type FillLimit =
  | CameraLimit
  | FlashLimit
  | 'high_speed_sync'
  | 'ambient_too_bright'
  | 'aim_background'
  | 'aim_subject'
  | 'aim_ratio'
  | 'aim_rim'
  | 'key_missing'
  | 'fill_missing'
  | 'rim_missing';

/** A limit that stands in the way of the aim, and what comes of giving it up. */
export interface LimitInTheWay {
  readonly limit: FillLimit;
  /** by how many stops it would have to move; null where that is no question of stops */
  readonly shortByStops: number | null;
  /** the largest miss that remains, stops; 0 where the rest of the aim is met to within half a step */
  readonly leavesStops: number;
  /** with the limit moved by so much and not more */
  readonly recipe: FillRecipe | null;
  /** guide number that a missing flash needs for each metre of its distance */
  readonly guideNumberPerM?: number;
}

const own = (wish: FillWish) => ({ prefer: wish.prefer, weight: OWN_WEIGHT });

/** The best recipe of a changed request, with its outcome held against the aim of the original one. */
export function bestOf(
  problem: FillProblem,
  aim: FillAim,
): { recipe: FillRecipe; leavesStops: number } | null {
  const changed = problem.wish;
  const search = startSearch(problem);
  const found = search.least === null ? null : bestFound(search, own(changed));
  if (found === null) return null;
  const { recipe } = found;
  const outcome = fillOutcome({ ...changed, aim }, exactSettingsOf(recipe), recipe.sync, recipe.flashes);

  return {
    recipe: { ...recipe, outcome },
    leavesStops: isOnAim(search) ? 0 : largestMiss(problem, recipe.outcome),
  };
}
