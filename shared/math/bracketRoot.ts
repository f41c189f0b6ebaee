/** Every third step halves, so that the bracket shrinks by at least 2^(1/3) a step whatever the curve. */
const STEPS = 200;

/**
 * A root of a continuous curve between two points on either side of zero.
 *
 * Regula falsi, an end that stays twice counting half (Illinois), every third step a halving.
 *
 * @param curve f, finite between the two points
 * @param from first point
 * @param to second point; f has opposite signs at the two, or is zero at one
 * @param tolerance how far from the root the answer may be, in the unit of the points, > 0
 * @returns a point within the tolerance of a sign change
 * @example bracketRoot((x) => x * x - 2, 0, 2, 1e-12) // √2
 * @source Dowell and Jarratt's Illinois method from memory; the halving makes it safe, derivation
 */
export function bracketRoot(
  curve: (x: number) => number,
  from: number,
  to: number,
  tolerance: number,
): number {
  let [low, high] = [from, to];
  let [atLow, atHigh] = [curve(from), curve(to)];
  let kept: 'low' | 'high' | null = null;
  let probe: number | null = null;
  if (atLow === 0) return low;
  for (let step = 1; step < STEPS && Math.abs(high - low) > tolerance; step += 1) {
    const chord = (low * atHigh - high * atLow) / (atHigh - atLow);
    const next: number = probe ?? (step % 3 === 0 ? (low + high) / 2 : chord);
    const value = curve(next);
    if (value === 0) return next;
    const isHigh = value > 0 === atHigh > 0;
    // A step that hardly moves an end may have met the root: look just beyond it, once, to close the bracket.
    const isSmall: boolean = probe === null && Math.abs(next - (isHigh ? high : low)) < tolerance;
    probe = isSmall ? next + 0.9 * tolerance * Math.sign(isHigh ? low - next : high - next) : null;
    if (isHigh) {
      [high, atHigh] = [next, value];
      if (kept === 'low') atLow /= 2;
      kept = 'low';
    } else {
      [low, atLow] = [next, value];
      if (kept === 'high') atHigh /= 2;
      kept = 'high';
    }
  }
  return (low + high) / 2;
}
