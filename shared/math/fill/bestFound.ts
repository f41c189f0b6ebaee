import { markAt } from '../marks';
import { easiestAssignment, leastCount, leastMisses } from './assignFlashes';
import { fillOutcome } from './fillOutcome';
import { caseOf, type FillCase, type FillProblem, type MissLimits } from './fillProblem';
import {
  caseCost,
  leastOutcomeCost,
  missCounts,
  onAimCount,
  outcomeCost,
  scoreOf,
  settingCost,
  type FillObjective,
} from './fillScore';
import type { Candidate, FillSearch, KnownCase, Solved, Tier } from './fillSearch';
import { exactSettingsOf, type FillRecipe, type UsedFlash } from './fillTypes';
import { placeFlashes } from './placeFlashes';

/** A recipe and the places of its settings on the scale, to tell how far two recipes are apart. */
export interface Found {
  readonly recipe: FillRecipe;
  readonly stops: readonly [number, number, number];
}

/** In the order of the request, which is how people look for them. */
function inRequestOrder(problem: FillProblem, used: readonly UsedFlash[]): UsedFlash[] {
  const { flashes } = problem.wish;
  return [...used].sort((a, b) => flashes.indexOf(a.flash) - flashes.indexOf(b.flash));
}

function solve({ problem, limit, solved }: FillSearch, known: KnownCase): Solved | null {
  const before = solved.get(known);
  if (before !== undefined) return before;
  const result = known.one.backgroundCount > limit.main ? null : solvedCase(problem, known, limit);
  solved.set(known, result);
  return result;
}

function solvedCase(problem: FillProblem, { one, cost }: KnownCase, limit: MissLimits): Solved | null {
  const { table } = one;
  const onAim = onAimCount(problem.grid);
  const frontLeast = leastMisses(table.front, one.front, limit.main, onAim);
  const rimLeast = one.rim && leastCount(table.rim, one.rim, limit.beside);
  if (frontLeast === null || frontLeast.ratio > Math.max(limit.beside, frontLeast.sum)) return null;
  if (one.rim !== null && rimLeast === null) return null;
  // What the largest miss allows anyway may be spent on using fewer flashes.
  const spare = Math.min(
    onAim,
    Math.max(one.backgroundCount, frontLeast.sum, frontLeast.ratio, rimLeast ?? 0),
  );
  const front = easiestAssignment(table.front, one.front, frontLeast, spare);
  if (front === null) return null;
  const rim =
    one.rim && rimLeast !== null
      ? easiestAssignment(table.rim, one.rim, { sum: rimLeast, ratio: rimLeast }, spare)
      : null;
  const used = inRequestOrder(problem, [
    ...placeFlashes(table.front, one.front, front),
    ...(one.rim && rim ? placeFlashes(table.rim, one.rim, rim) : []),
  ]);
  const sync = used.length === 0 ? 'none' : one.shutter.sync;
  const settings = settingsAt(problem, one, one.lens.widest);
  const outcome = fillOutcome(
    problem.wish,
    exactSettingsOf({ ...settings, sync, flashes: used }),
    sync,
    used,
  );
  return { one, cost, sync, used, outcome, counts: missCounts(problem, outcome) };
}

function settingsAt({ grid }: FillProblem, { lens, shutter }: FillCase, position: number) {
  return {
    aperture: markAt('aperture', grid.scale, position),
    shutter: shutter.mark,
    iso: markAt('iso', grid.scale, position - lens.difference),
    ndStops: lens.ndStops,
  };
}

/** Aperture, shutter and ISO in stops, by which recipes are told apart. */
function stopsAt({ grid }: FillProblem, { lens, shutter }: FillCase, position: number): Found['stops'] {
  return [position / grid.steps, shutter.tv, (position - lens.difference) / grid.steps];
}

/** Whether a setting differs from all of these by at least so many stops in aperture, shutter or ISO. */
function isApart(stops: Found['stops'], from: readonly Found[], apartStops: number): boolean {
  return from.every((other) => {
    const [a, b, c] = other.stops;
    const apart = Math.max(Math.abs(stops[0] - a), Math.abs(stops[1] - b), Math.abs(stops[2] - c));
    return apart >= apartStops - 1e-9;
  });
}

/** The cases of a tier with the least score that each can have, best first; made once for each wish. */
function candidates(search: FillSearch, tier: Tier, objective: FillObjective): readonly Candidate[] {
  const { problem, limit } = search;
  const before = tier.ranked.get(objective.prefer);
  if (before?.weight === objective.weight) return before.list;
  tier.known ??= tier.bounded.map(({ lens, shutter }) => ({
    one: caseOf(problem, lens, shutter),
    cost: caseCost(problem, lens, shutter),
  }));
  const list = tier.known.map((known) => {
    const { one, cost } = known;
    // The cost of a setting has no dip between its ends.
    const setting = Math.min(
      settingCost(problem.grid, objective, one.lens, one.lens.widest),
      settingCost(problem.grid, objective, one.lens, one.lens.smallest),
    );
    const beside = cost + setting + leastOutcomeCost(one, objective, limit.main);
    return { known, least: scoreOf(problem.grid, tier.counts, beside) };
  });
  list.sort((a, b) => a.least - b.least);
  tier.ranked.set(objective.prefer, { weight: objective.weight, list });
  return list;
}

/** The cheapest aperture and speed of a case that stand apart from the recipes taken already; null where none do. */
function cheapestSetting(
  problem: FillProblem,
  objective: FillObjective,
  { one, cost, outcome, sync, counts }: Solved,
  taken: readonly Found[],
  apartStops: number,
): { position: number; score: number } | null {
  const { lens, shutter } = one;
  const beside = cost + outcomeCost(objective, outcome, sync, shutter.mark.exact);
  let best: { position: number; score: number } | null = null;
  for (let position = lens.widest; position <= lens.smallest; position++) {
    if (!isApart(stopsAt(problem, one, position), taken, apartStops)) continue;
    const score = scoreOf(
      problem.grid,
      counts,
      settingCost(problem.grid, objective, lens, position) + beside,
    );
    if (best === null || score < best.score) best = { position, score };
  }
  return best;
}

/**
 * The recipe with the least score that stands apart from those taken already: cases are worked out in the order of
 * the least score that they can have, until no other can be better.
 *
 * @param search from {@link startSearch}
 * @param objective what is favoured
 * @param taken recipes to stand apart from
 * @param apartStops by how much, in aperture, shutter or ISO
 * @returns the recipe, its score counted for the objective; null where there is none
 * @source branch and bound; tested against going through every combination
 */
export function bestFound(
  search: FillSearch,
  objective: FillObjective,
  taken: readonly Found[] = [],
  apartStops = 0,
): Found | null {
  const { problem } = search;
  let best: { solved: Solved; position: number; score: number } | null = null;
  for (const tier of search.tiers) {
    if (best !== null && scoreOf(problem.grid, tier.counts, 0) >= best.score) break;
    for (const { known, least } of candidates(search, tier, objective)) {
      if (best !== null && least >= best.score) break;
      const solved = solve(search, known);
      const setting = solved && cheapestSetting(problem, objective, solved, taken, apartStops);
      if (solved && setting && (best === null || setting.score < best.score)) best = { solved, ...setting };
    }
  }
  return best && foundAt(problem, best.solved, best.position, best.score);
}

function foundAt(problem: FillProblem, { one, sync, used }: Solved, position: number, score: number): Found {
  const settings = { ...settingsAt(problem, one, position), sync, flashes: used };
  const outcome = fillOutcome(problem.wish, exactSettingsOf(settings), sync, used);
  return { recipe: { ...settings, outcome, score }, stops: stopsAt(problem, one, position) };
}
