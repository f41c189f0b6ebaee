import type { Rung } from '../text/eveningAnswers';

/** What holds at an instant, what comes next, and in how long; null outside the ladder. */
export interface Standing {
  readonly rung: Rung;
  readonly next: Rung | null;
  readonly untilMs: number;
}

export function rungAt(rungs: readonly Rung[], atMs: number): Standing | null {
  const i = rungs.findIndex(({ at, until }) => Date.parse(at) <= atMs && atMs < Date.parse(until));
  // The last instant belongs to the last rung, though nothing follows it.
  const last = rungs.at(-1);
  const isEnd = last !== undefined && atMs === Date.parse(last.until);
  const rung = isEnd ? last : rungs[i];
  if (!rung) return null;
  const next = isEnd ? null : (rungs[i + 1] ?? null);
  return { rung, next, untilMs: Date.parse(rung.until) - atMs };
}
