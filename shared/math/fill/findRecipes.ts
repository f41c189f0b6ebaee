import { fillProblem } from './fillProblem';
import {
  ALTERNATIVE_WEIGHT,
  caseCost,
  missCounts,
  outcomeCost,
  OWN_WEIGHT,
  scoreOf,
  settingCost,
  type FillObjective,
} from './fillScore';
import { bestFound, type Found } from './bestFound';
import { startSearch, type FillSearch } from './fillSearch';
import type { FillPreference, FillRecipe, FillWish } from './fillTypes';

/** Recipes that are given beside each other differ by this much in aperture, shutter or ISO; by the first, if so many are. */
const APART_STOPS = [2, 1] as const;
const ALTERNATIVES: readonly FillPreference[] = ['deepFocus', 'frozen', 'battery', 'shallowFocus', 'lowIso'];

/**
 * The best recipe and different ones beside it: each of those is the best for another wish that stands apart from the
 * recipes before it, and, when wishes run out, the next best that stands apart. Best first, by one score.
 *
 * @param search what {@link startSearch} found
 * @returns recipes, as many as were asked for and there are
 */
function differentRecipes(search: FillSearch): FillRecipe[] {
  const { wish } = search.problem;
  const own: FillObjective = { prefer: wish.prefer, weight: OWN_WEIGHT };
  const first = bestFound(search, own);
  if (first === null) return [];
  const taken: Found[] = [first];
  const take = (objective: FillObjective, apartStops: number) => {
    const next = taken.length < wish.count ? bestFound(search, objective, taken, apartStops) : null;
    if (next) taken.push(next);
    return next !== null;
  };
  for (const prefer of ALTERNATIVES)
    if (prefer !== wish.prefer) take({ prefer, weight: ALTERNATIVE_WEIGHT }, APART_STOPS[0]);
  for (const apartStops of APART_STOPS) while (taken.length < wish.count && take(own, apartStops));
  return taken.map((found) => rescored(search, own, found)).sort((a, b) => a.score - b.score);
}

/** A recipe that was found for another wish, with the score that it has for the request's own. */
function rescored({ problem }: FillSearch, own: FillObjective, { recipe, stops }: Found): FillRecipe {
  const { grid } = problem;
  const position = Math.round(stops[0] * grid.steps);
  const difference = Math.round((stops[0] - stops[2]) * grid.steps);
  const lens = grid.lenses.find((one) => one.difference === difference && one.ndStops === recipe.ndStops);
  const shutter = grid.shutters.find(({ mark }) => mark.exact === recipe.shutter.exact);
  if (lens === undefined || shutter === undefined) throw new RangeError('a recipe is none of its grid');
  const cost =
    caseCost(problem, lens, shutter) +
    settingCost(grid, own, lens, position) +
    outcomeCost(own, recipe.outcome, recipe.sync, recipe.shutter.exact);
  return { ...recipe, score: scoreOf(grid, missCounts(problem, recipe.outcome), cost) };
}

/** Finds recipes for a request; the search is given too, for what else is to be asked of it. */
export function findRecipes(wish: FillWish): { readonly search: FillSearch; readonly recipes: FillRecipe[] } {
  const search = startSearch(fillProblem(wish));
  return { search, recipes: search.least === null ? [] : differentRecipes(search) };
}
