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
import { ABSENT_COUNT } from './fillMisses';
import { onAimCount, scoreOf, type MissCounts } from './fillScore';
import type { FillOutcome, FillPreference, SyncKind, UsedFlash } from './fillTypes';

/** A case with its flashes set. */
export interface Solved {
  readonly one: FillCase;
  readonly cost: number;
  readonly sync: SyncKind;
  readonly used: readonly UsedFlash[];
  readonly outcome: FillOutcome;
  readonly counts: MissCounts;
}

interface BoundedCase {
  readonly lens: GridLens;
  readonly shutter: GridShutter;
  /** the least misses that it can have */
  readonly bound: MissLimits;
}

/** A case with what of its score is known before it is worked out. */
export interface KnownCase {
  readonly one: FillCase;
  /** of shutter and filter */
  readonly cost: number;
}

/** A case and the least score that it can have. */
export interface Candidate {
  readonly known: KnownCase;
  readonly least: number;
}

/** Cases whose misses are at least the same, the best of which are looked at before any of the next. */
export interface Tier {
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

/** Cases from the least bound on; there are far fewer bounds than cases. */
function* inOrder(
  cases: readonly BoundedCase[],
  boundOf: (bound: MissLimits) => number,
): Generator<BoundedCase> {
  const byBound = new Map<number, BoundedCase[]>();
  for (const one of cases) {
    const bound = boundOf(one.bound);
    const alike = byBound.get(bound);
    if (alike) alike.push(one);
    else byBound.set(bound, [one]);
  }
  for (const bound of [...byBound.keys()].sort((a, b) => a - b)) yield* byBound.get(bound) ?? [];
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
  for (const { lens, shutter, bound } of inOrder(cases, boundOf)) {
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
