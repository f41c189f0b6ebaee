import type { Rounding, Scale } from './marks';

/** A flash power marking such as "1/16" or "1/16+1/3" (a third of a stop over a sixteenth). */
export interface PowerMark {
  readonly label: string;
  /** Fraction of full power, 0 < exact ≤ 1. */
  readonly exact: number;
}

const STEPS: Record<Scale, number> = { full: 1, half: 2, third: 3 };
const FORM = /^1\/(\d+(?:\.\d+)?)(?:\s*\+\s*([12])\/([23]))?$/;

/**
 * Names a power so many whole steps below full: 1/2^n, with the part of a stop above it.
 * Example: powerMarkAt('third', 11) is "1/16+1/3", 2^(−11/3). Common practice, no source.
 */
export function powerMarkAt(scale: Scale, stepsBelowFull: number): PowerMark {
  const n = STEPS[scale];
  const stops = Math.ceil(stepsBelowFull / n);
  const over = stops * n - stepsBelowFull;
  return { label: `1/${2 ** stops}${over ? `+${over}/${n}` : ''}`, exact: 2 ** (-stepsBelowFull / n) };
}

/**
 * The power marking to set for an exact fraction.
 * @param exact fraction of full power, > 0; more than full is marked as full
 * @param rounding `nearest`, `floor` (never more light than asked) or `ceil` (never less)
 * Example: nearestPowerMark('third', 0.08) is "1/16+1/3" (0.0787).
 */
export function nearestPowerMark(scale: Scale, exact: number, rounding: Rounding = 'nearest'): PowerMark {
  const steps = -Math.log2(exact) * STEPS[scale];
  const near = Math.round(steps);
  let chosen = near;
  if (Math.abs(steps - near) > 1e-9 && rounding !== 'nearest')
    chosen = rounding === 'floor' ? Math.ceil(steps) : Math.floor(steps);
  return powerMarkAt(scale, Math.max(0, chosen));
}

/**
 * Reads "1/16", "1/16+1/3" or "1/1" as a fraction; null when the text is no power or more than full.
 * A power's marking is exact: 1/16 is 2^−4. Example: powerOfText('1/2+1/3') = 2^(−2/3).
 */
export function powerOfText(text: string): number | null {
  const match = FORM.exec(text.trim());
  if (!match) return null;
  const over = match[2] ? Number(match[2]) / Number(match[3]) : 0;
  const power = 2 ** over / Number(match[1]);
  return over < 1 && power > 0 && power <= 1 ? power : null;
}
