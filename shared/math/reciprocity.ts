import { inDomain } from './domain';

/** Times that the arithmetic is meant for, in seconds: from far below any shutter to thirty years. */
const TIMES_S = [1e-9, 1e9] as const;

/** Up to this metered time film needs no correction; the power law bends here. */
export const RECIPROCITY_BREAK_S = 1;

/** Beyond this metered time makers give no data: a correction is extrapolation. Common practice, no source. */
export const RECIPROCITY_TRUSTED_S = 1000;

/** Films in production lie between 1.2 and 1.5; anything steeper than this is a slip. */
export const STEEPEST_EXPONENT = 3;

/** One line of a film's table: what the meter says and what to expose for, both in seconds. */
export interface ReciprocityPair {
  readonly meteredS: number;
  readonly correctedS: number;
}

/**
 * Exposure time of a film by its power law: t_c = t^P for t > 1 s, else t.
 * @param meteredS t, seconds the meter asks for, 1e-9 to 1e9
 * @param exponent P, dimensionless, of the film, 1 to 3
 * @returns t_c in seconds, never less than t; 10 s at P 1.31 gives 20.4 s. Throws RangeError outside the domain.
 * Source: a film maker's fact sheet (Tc = Tm^P, no correction to 1 s, 10^1.31 = 20.4 s); Schwarzschild's law with
 * P = 1/p as in an encyclopaedia's "Reciprocity (photography)".
 */
export function correctedByPower(meteredS: number, exponent: number): number {
  inDomain('metered seconds', meteredS, ...TIMES_S);
  inDomain('exponent', exponent, 1, STEEPEST_EXPONENT);
  return meteredS > RECIPROCITY_BREAK_S ? meteredS ** exponent : meteredS;
}

/**
 * Exposure time of a film by its table, on straight lines between the pairs in log t against log t_c, so that a
 * power law is met exactly.
 *
 * Outside the pairs: a first pair above 1 s is joined to (1 s, 1 s), as films keep to reciprocity up to about there;
 * below the first pair of the two its added stops hold. Beyond the last pair the last line goes on, but with a slope
 * of at least 1 (added stops never shrink) and at most 3.
 * @param meteredS t, seconds the meter asks for, 1e-9 to 1e9
 * @param table what `tableFault` finds no fault in
 * @returns t_c in seconds, rising with t and never less than t; 20 s between (10, 15) and (40, 120) gives 42.4 s.
 *   Throws RangeError outside the domain.
 * Source: derivation; the rule outside the pairs is a modelling choice.
 */
export function correctedByTable(meteredS: number, table: readonly ReciprocityPair[]): number {
  inDomain('metered seconds', meteredS, ...TIMES_S);
  if (tableFault(table)) throw new RangeError('the pairs must rise, and no time may get shorter');
  const pairs = withBreak(table);
  const above = pairs.findIndex((pair) => pair.meteredS >= meteredS);
  const first = pairs[0] as ReciprocityPair;
  if (above === 0) return scaledFrom(first, meteredS, 1);
  if (above > 0) {
    const [low, high] = [pairs[above - 1] as ReciprocityPair, pairs[above] as ReciprocityPair];
    return scaledFrom(low, meteredS, slopeBetween(low, high));
  }
  const last = pairs[pairs.length - 1] as ReciprocityPair;
  const before = pairs[pairs.length - 2];
  const slope = before ? slopeBetween(before, last) : 1;
  return scaledFrom(last, meteredS, Math.min(Math.max(slope, 1), STEEPEST_EXPONENT));
}

/** What is wrong with a table: nothing, no pairs, a pair not above the one before, or a time that gets shorter. */
export type TableFault = { kind: 'empty' } | { kind: 'notRising' | 'shorter'; index: number };

/**
 * The first fault of a table, or null.
 * @param table pairs in seconds, 1e-9 to 1e9; metered and corrected times both rise from pair to pair, and no
 *   corrected time is shorter than its metered one. Example: tableFault([]) is { kind: 'empty' }.
 */
export function tableFault(table: readonly ReciprocityPair[]): TableFault | null {
  if (table.length === 0) return { kind: 'empty' };
  for (const [index, pair] of table.entries()) {
    if (!(pair.meteredS >= TIMES_S[0] && pair.correctedS >= pair.meteredS && pair.correctedS <= TIMES_S[1])) {
      return { kind: 'shorter', index };
    }
    const before = table[index - 1];
    if (before && !(pair.meteredS > before.meteredS && pair.correctedS > before.correctedS)) {
      return { kind: 'notRising', index };
    }
  }
  return null;
}

/**
 * How much light a longer time adds: log2(t_c/t).
 * @param meteredS t, seconds, 1e-9 to 1e300
 * @param correctedS t_c, seconds, 1e-9 to 1e300
 * @returns stops; 10 s to 20 s is 1. Throws RangeError outside the domain. Source: definition of the stop.
 */
export function addedStops(meteredS: number, correctedS: number): number {
  inDomain('metered seconds', meteredS, 1e-9, 1e300);
  inDomain('corrected seconds', correctedS, 1e-9, 1e300);
  return Math.log2(correctedS) - Math.log2(meteredS);
}

function withBreak(table: readonly ReciprocityPair[]): readonly ReciprocityPair[] {
  const first = table[0];
  if (!first || first.meteredS <= RECIPROCITY_BREAK_S) return table;
  return [{ meteredS: RECIPROCITY_BREAK_S, correctedS: RECIPROCITY_BREAK_S }, ...table];
}

function slopeBetween(low: ReciprocityPair, high: ReciprocityPair): number {
  return Math.log(high.correctedS / low.correctedS) / Math.log(high.meteredS / low.meteredS);
}

function scaledFrom(pair: ReciprocityPair, meteredS: number, slope: number): number {
  return pair.correctedS * (meteredS / pair.meteredS) ** slope;
}
