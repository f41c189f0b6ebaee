import { easiestAssignment, leastCount, leastMisses } from './assignFlashes';
import { placeFlashes } from './placeFlashes';
import { ABSENT_STOPS, countOf } from './fillMisses';
import { fillOutcome } from './fillOutcome';
import {
  ANY_COUNT,
  caseOf,
  isWithin,
  someCase,
  type FillCase,
  type FillProblem,
  type MissLimits,
} from './fillProblem';
import type { GridLens, GridShutter } from './cameraGrid';
import {
  caseCost,
  leastOutcomeCost,
  missCounts,
  onAimCount,
  outcomeCost,
  scoreOf,
  settingCost,
  type FillObjective,
  type MissCounts,
} from './fillScore';
import {
  exactSettingsOf,
  type FillOutcome,
  type FillPreference,
  type FillRecipe,
  type SyncKind,
  type UsedFlash,
} from './fillTypes';
import { markAt } from '../marks';

/** A case with its flashes set. */
interface Solved {
  readonly one: FillCase;
  readonly cost: number;
  readonly sync: SyncKind;
  readonly used: readonly UsedFlash[];
  readonly outcome: FillOutcome;
  readonly counts: MissCounts;
}

/** A recipe and the places of its settings on the scale, to tell how far two recipes are apart. */
export interface Found {
  readonly recipe: FillRecipe;
  readonly stops: readonly [number, number, number];
}

interface BoundedCase {
  readonly lens: GridLens;
  readonly shutter: GridShutter;
  /** the least misses that it can have */
  readonly bound: MissLimits;
}

/** A case with what of its score is known before it is worked out. */
interface KnownCase {
  readonly one: FillCase;
  /** of shutter and filter */
  readonly cost: number;
}

/** Cases whose misses are at least the same, the best of which are looked at before any of the next. */
interface Tier {
  readonly counts: MissCounts;
  readonly bounded: readonly BoundedCase[];
  /** laid out when they are looked at */
  known: readonly KnownCase[] | null;
  readonly ranked: Map<FillPreference | null, { weight: number; list: readonly Candidate[] }>;
}

/** What is known of a problem while recipes are looked for. */
export interface FillSearch {
  readonly problem: FillProblem;
  /** the least misses of all; null where there is no setting at all */
  readonly least: MissCounts | null;
  /** up to these misses recipes are given */
  readonly limit: MissLimits;
  /** the cases that may keep within it, from the least misses on */
  readonly tiers: readonly Tier[];
  readonly solved: Map<KnownCase, Solved | null>;
}

function casesWithin(problem: FillProblem, most: MissLimits): BoundedCase[] {
  const cases: BoundedCase[] = [];
  someCase(problem, most, (lens, shutter, bound) => {
    cases.push({ lens, shutter, bound });
    return false;
  });
  return cases;
}

/**
 * The least miss over all cases; null where none keeps within `most`. Cases are taken in the order of their bounds, and
 * only one that may be better is worked out.
 */
function leastOver(
  problem: FillProblem,
  cases: readonly BoundedCase[],
  most: number,
  boundOf: (bound: MissLimits) => number,
  limitsAt: (count: number) => MissLimits,
): number | null {
  let best = most + 1;
  const sorted = [...cases].sort((a, b) => boundOf(a.bound) - boundOf(b.bound));
  for (const { lens, shutter, bound } of sorted) {
    const least = boundOf(bound);
    if (least >= best) break;
    const one = caseOf(problem, lens, shutter);
    if (!isWithin(one, limitsAt(best - 1))) continue;
    let [below, at] = [least - 1, best - 1];
    while (at - below > 1) {
      const middle = Math.floor((below + at) / 2);
      if (isWithin(one, limitsAt(middle))) at = middle;
      else below = middle;
    }
    best = at;
  }
  return best > most ? null : best;
}

/** How much wider the search becomes when nothing was found. */
const WIDER = 4;
const ABSENT_COUNT = countOf(ABSENT_STOPS);

/**
 * Looks for the least misses: of background and subject, first near the aim, then ever farther away; of ratio and rim
 * where those are on the aim; and within half a step of all parts together.
 */
export function startSearch(problem: FillProblem): FillSearch {
  const onAim = onAimCount(problem.grid);
  const mainAt = (main: number): MissLimits => ({ main, beside: ABSENT_COUNT });
  let cases: BoundedCase[] = [];
  let main: number | null = null;
  for (let within = onAim; main === null; within = Math.min(ANY_COUNT, within * WIDER)) {
    cases = casesWithin(problem, mainAt(within));
    main = leastOver(problem, cases, within, (bound) => bound.main, mainAt);
    if (within === ANY_COUNT) break;
  }
  if (main === null) return { problem, least: null, limit: mainAt(0), tiers: [], solved: new Map() };
  const limit = { main: Math.max(main, onAim), beside: ABSENT_COUNT };
  cases = cases.filter(({ bound }) => bound.main <= limit.main);
  if (main > onAim) return withTiers(problem, cases, { main, beside: 0, near: onAim }, limit);
  const besideAt = (beside: number): MissLimits => ({ main: onAim, beside });
  const beside = leastOver(problem, cases, ABSENT_COUNT, (bound) => bound.beside, besideAt) ?? ABSENT_COUNT;
  limit.beside = Math.max(beside, onAim);
  cases = cases.filter((one) => one.bound.beside <= limit.beside);
  if (beside > onAim) return withTiers(problem, cases, { main, beside, near: onAim }, limit);
  const nearAt = (count: number): MissLimits => ({ main: count, beside: count });
  const near = leastOver(problem, cases, onAim, (bound) => Math.max(bound.main, bound.beside), nearAt);
  return withTiers(problem, cases, { main, beside, near: near ?? onAim }, limit);
}

function withTiers(
  problem: FillProblem,
  cases: readonly BoundedCase[],
  least: MissCounts,
  limit: MissLimits,
): FillSearch {
  const byScore = new Map<number, Tier & { bounded: BoundedCase[] }>();
  for (const one of cases) {
    const main = Math.max(one.bound.main, least.main);
    const beside = Math.max(one.bound.beside, least.beside);
    const near = Math.max(least.near, Math.min(onAimCount(problem.grid), Math.max(main, beside)));
    const counts = { main, beside, near };
    const score = scoreOf(problem.grid, counts, 0);
    const tier = byScore.get(score);
    if (tier) tier.bounded.push(one);
    else byScore.set(score, { counts, bounded: [one], known: null, ranked: new Map() });
  }
  const tiers = [...byScore.keys()].sort((a, b) => a - b).flatMap((score) => byScore.get(score) ?? []);
  return { problem, least, limit, tiers, solved: new Map() };
}

/** Whether the best recipe of a search meets every part of the aim that its flashes can serve. */
export function isOnAim({ problem, least }: FillSearch): boolean {
  const onAim = onAimCount(problem.grid);
  return least !== null && least.main <= onAim && least.beside <= onAim;
}

/**
 * Whether any setting keeps within misses.
 * @param flash what is allowed for the flashes where that is not the same
 */
export function isReachable(problem: FillProblem, most: MissLimits, flash = most): boolean {
  return someCase(problem, most, (lens, shutter) => isWithin(caseOf(problem, lens, shutter), most, flash));
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
