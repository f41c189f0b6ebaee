import { ANY, inDomain, SMALLEST } from './domain';
import { stepsPerStop, type Rounding, type Scale } from './marks';

/** A flash power marking such as "1/16" or "1/16+1/3" (a third of a stop over a sixteenth). */
export interface PowerMark {
  readonly label: string;
  /** Fraction of full power, 0 < exact ≤ 1. */
  readonly exact: number;
}

/** How a power is written: "1/16", "1/16+1/3", "1/16 + 1/2". A part of a stop is less than a whole one. */
export const POWER_FORM = '1/(\\d+(?:\\.\\d+)?)(?:\\s*\\+\\s*(?:(1)/([23])|(2)/(3)))?';
/** Steps this close to a whole number, or to a half, are on it; covers rounding of log2 and pow. */
const ON_STEP = 1e-9;

const FORM = new RegExp(`^${POWER_FORM}$`);

/**
 * Names a power so many whole steps below full: 1/2^n, with the part of a stop above it.
 * @param stepsBelowFull whole, ≥ 0
 * @returns the mark. Throws RangeError when the steps are not whole or below 0.
 * Example: powerMarkAt('third', 11) is "1/16+1/3", 2^(−11/3). Common practice, no source.
 */
export function powerMarkAt(scale: Scale, stepsBelowFull: number): PowerMark {
  if (!Number.isInteger(stepsBelowFull) || stepsBelowFull < 0)
    throw new RangeError(`steps below full power are ${stepsBelowFull}, but must be whole and at least 0`);
  const n = stepsPerStop(scale);
  const stops = Math.ceil(stepsBelowFull / n);
  const over = stops * n - stepsBelowFull;
  return { label: `1/${2 ** stops}${over ? `+${over}/${n}` : ''}`, exact: 2 ** (-stepsBelowFull / n) };
}

/**
 * The power marking to set for an exact fraction.
 * @param exact fraction of full power, > 0; more than full is marked as full
 * @param rounding `nearest` (an exact half goes to the lower power), `floor` (never more light than asked) or
 *   `ceil` (never less)
 * @returns the mark. Throws RangeError when exact is not over 0.
 * Example: nearestPowerMark('third', 0.08) is "1/16+1/3" (0.0787).
 */
export function nearestPowerMark(scale: Scale, exact: number, rounding: Rounding = 'nearest'): PowerMark {
  const steps = -Math.log2(inDomain('power', exact, SMALLEST, ANY)) * stepsPerStop(scale);
  const near = Math.floor(steps + 0.5 + ON_STEP);
  let chosen = near;
  if (Math.abs(steps - near) > ON_STEP && rounding !== 'nearest')
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
  const [, denominator, one, of, two, three] = match;
  const over = one ? 1 / Number(of) : two ? 2 / Number(three) : 0;
  const power = 2 ** over / Number(denominator);
  return power > 0 && power <= 1 ? power : null;
}
