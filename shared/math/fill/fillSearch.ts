import { distancesFor, easiestAssignment, type Assignment, type FlashTask } from './assignFlashes';
import { fillOutcome } from './fillOutcome';
import {
  ANY_COUNT,
  caseOf,
  isWithin,
  leastCounts,
  someCase,
  type FillCase,
  type FillProblem,
} from './fillProblem';
import type { GridLens, GridShutter } from './cameraGrid';
import {
  caseCost,
  leastOutcomeCost,
  missCount,
  onAimCount,
  outcomeCost,
  scoreOf,
  settingCost,
  type FillObjective,
} from './fillScore';
import {
  exactSettingsOf,
  type FillOutcome,
  type FillPreference,
  type FillRecipe,
  type SyncKind,
  type UsedFlash,
} from './fillTypes';
import type { FlashLevels } from './flashLevels';
import { markAt } from '../marks';

/** A case with its flashes set. */
interface Solved {
  readonly one: FillCase;
  readonly cost: number;
  readonly sync: SyncKind;
  readonly used: readonly UsedFlash[];
  readonly outcome: FillOutcome;
  readonly count: number;
}

/** A recipe and the places of its settings on the scale, to tell how far two recipes are apart. */
export interface Found {
  readonly recipe: FillRecipe;
  readonly stops: readonly [number, number, number];
}

interface BoundedCase {
  readonly lens: GridLens;
  readonly shutter: GridShutter;
  /** the least miss that it can have; parts of 1/120 stop */
  readonly bound: number;
}

/** A case with what of its score is known before it is worked out. */
interface KnownCase {
  readonly one: FillCase;
  readonly bound: number;
  /** of shutter and filter */
  readonly cost: number;
}

/** What is known of a problem while recipes are looked for. */
export interface FillSearch {
  readonly problem: FillProblem;
  /** the least miss of all; parts of 1/120 stop; null where there is no setting at all */
  readonly least: number | null;
  /** up to this miss recipes are given; parts of 1/120 stop */
  readonly limit: number;
  /** the cases that may keep within it */
  readonly cases: readonly KnownCase[];
  readonly solved: Map<KnownCase, Solved | null>;
  readonly ranked: Map<FillPreference | null, { weight: number; list: readonly Candidate[] }>;
}

/** The cases that may keep within a miss, in order of the least that each can have. */
function casesWithin(problem: FillProblem, count: number): BoundedCase[] {
  const cases: BoundedCase[] = [];
  someCase(problem, count, (lens, shutter, bound) => {
    cases.push({ lens, shutter, bound });
    return false;
  });
  return cases.sort((a, b) => a.bound - b.bound);
}

/** The least miss of the cases; null where none keeps within `atMost`. Only a case that may be better is worked out. */
function leastMiss(problem: FillProblem, cases: readonly BoundedCase[], atMost: number): number | null {
  let best = atMost + 1;
  for (const { lens, shutter, bound } of cases) {
    if (bound >= best) break;
    const one = caseOf(problem, lens, shutter);
    if (!isWithin(one, best - 1)) continue;
    let [below, at] = [bound - 1, best - 1];
    while (at - below > 1) {
      const middle = Math.floor((below + at) / 2);
      if (isWithin(one, middle)) at = middle;
      else below = middle;
    }
    best = at;
  }
  return best > atMost ? null : best;
}

/** How much wider the search becomes when nothing was found. */
const WIDER = 4;

/** Looks for the least miss, first near the aim, then ever farther away. */
export function startSearch(problem: FillProblem): FillSearch {
  const onAim = onAimCount(problem.grid);
  let within = onAim;
  let cases = casesWithin(problem, within);
  let least = leastMiss(problem, cases, within);
  while (least === null && within < ANY_COUNT) {
    within = Math.min(ANY_COUNT, within * WIDER);
    cases = casesWithin(problem, within);
    least = leastMiss(problem, cases, within);
  }
  const limit = Math.max(least ?? 0, onAim);
  return {
    problem,
    least,
    limit,
    cases: cases
      .filter(({ bound }) => bound <= limit)
      .map(({ lens, shutter, bound }) => ({
        one: caseOf(problem, lens, shutter),
        bound,
        cost: caseCost(problem, lens, shutter),
      })),
    solved: new Map(),
    ranked: new Map(),
  };
}

/**
 * Whether any setting keeps within a miss of so many parts.
 * @param flashCount what is allowed for front and rim where that is not the same
 */
export function isReachable(problem: FillProblem, count: number, flashCount = count): boolean {
  return someCase(problem, count, (lens, shutter) =>
    isWithin(caseOf(problem, lens, shutter), count, flashCount),
  );
}

function setFlashes(
  levels: readonly FlashLevels[],
  task: FlashTask,
  { chosen, count }: { chosen: Assignment; count: number },
): UsedFlash[] {
  const distances = distancesFor(levels, task, chosen, count);
  return levels.flatMap(({ flash, powers }, i) => {
    const level = chosen[i] ?? 0;
    return level === 0 ? [] : [{ flash, power: powers[level] ?? 1, distanceM: distances[i] ?? flash.nearM }];
  });
}

/** In the order of the request, which is how people look for them. */
function inRequestOrder(problem: FillProblem, used: readonly UsedFlash[]): UsedFlash[] {
  const { flashes } = problem.wish;
  return [...used].sort((a, b) => flashes.indexOf(a.flash) - flashes.indexOf(b.flash));
}

function solve({ problem, limit, solved }: FillSearch, known: KnownCase): Solved | null {
  const before = solved.get(known);
  if (before !== undefined) return before;
  const { one } = known;
  const counts = one.backgroundCount > limit ? null : leastCounts(one, limit);
  const result = counts === null ? null : solvedCase(problem, known, counts);
  solved.set(known, result);
  return result;
}

function solvedCase(
  problem: FillProblem,
  { one, cost }: KnownCase,
  counts: { front: number; rim: number },
): Solved | null {
  const { table } = one;
  // What the largest miss allows anyway may be spent on using fewer flashes.
  const allowed = Math.max(one.backgroundCount, counts.front, counts.rim);
  const front = easiestAssignment(table.front, table.frontPowers, one.front, counts.front, allowed);
  if (front === null) return null;
  const rim = one.rim && easiestAssignment(table.rim, table.rimPowers, one.rim, counts.rim, allowed);
  const used = inRequestOrder(problem, [
    ...setFlashes(table.front, one.front, front),
    ...(one.rim && rim ? setFlashes(table.rim, one.rim, rim) : []),
  ]);
  const sync = used.length === 0 ? 'none' : one.shutter.sync;
  const settings = settingsAt(problem, one, one.lens.widest);
  const outcome = fillOutcome(
    problem.wish,
    exactSettingsOf({ ...settings, sync, flashes: used }),
    sync,
    used,
  );
  return { one, cost, sync, used, outcome, count: missCount(problem, outcome) };
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
export function isApart(stops: Found['stops'], from: readonly Found[], apartStops: number): boolean {
  return from.every((other) => {
    const [a, b, c] = other.stops;
    const apart = Math.max(Math.abs(stops[0] - a), Math.abs(stops[1] - b), Math.abs(stops[2] - c));
    return apart >= apartStops - 1e-9;
  });
}

interface Candidate {
  readonly known: KnownCase;
  readonly least: number;
}

/** Every case that may be given, with the least score that it can have, best first; made once for each wish. */
function candidates(search: FillSearch, objective: FillObjective): readonly Candidate[] {
  const { problem, limit, least, cases, ranked } = search;
  const before = ranked.get(objective.prefer);
  if (before?.weight === objective.weight) return before.list;
  const list = cases.map((known) => {
    const { one, bound, cost } = known;
    // The cost of a setting has no dip between its ends.
    const setting = Math.min(
      settingCost(problem.grid, objective, one.lens, one.lens.widest),
      settingCost(problem.grid, objective, one.lens, one.lens.smallest),
    );
    const beside = cost + setting + leastOutcomeCost(one, objective, limit);
    return { known, least: scoreOf(Math.max(bound, least ?? 0), beside) };
  });
  list.sort((a, b) => a.least - b.least);
  ranked.set(objective.prefer, { weight: objective.weight, list });
  return list;
}

/** The cheapest aperture and speed of a case that stand apart from the recipes taken already; null where none do. */
function cheapestSetting(
  problem: FillProblem,
  objective: FillObjective,
  { one, cost, outcome, sync, count }: Solved,
  taken: readonly Found[],
  apartStops: number,
): { position: number; score: number } | null {
  const { lens, shutter } = one;
  const beside = cost + outcomeCost(problem, objective, outcome, sync, shutter.mark.exact);
  let best: { position: number; score: number } | null = null;
  for (let position = lens.widest; position <= lens.smallest; position++) {
    if (!isApart(stopsAt(problem, one, position), taken, apartStops)) continue;
    const score = scoreOf(count, settingCost(problem.grid, objective, lens, position) + beside);
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
  for (const { known, least } of candidates(search, objective)) {
    if (best !== null && least >= best.score) break;
    const solved = solve(search, known);
    const setting = solved && cheapestSetting(problem, objective, solved, taken, apartStops);
    if (solved && setting && (best === null || setting.score < best.score)) best = { solved, ...setting };
  }
  return best && foundAt(problem, best.solved, best.position, best.score);
}

function foundAt(problem: FillProblem, { one, sync, used }: Solved, position: number, score: number): Found {
  const settings = { ...settingsAt(problem, one, position), sync, flashes: used };
  const outcome = fillOutcome(problem.wish, exactSettingsOf(settings), sync, used);
  return { recipe: { ...settings, outcome, score }, stops: stopsAt(problem, one, position) };
}
