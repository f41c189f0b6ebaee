import { slopeOfQuartic, valueOfQuartic } from './quartic';
import type { SunEquation } from './sunEquation';

/** A step shorter than this, 0.9 s, on a stretch so straight that g″ matters less than this, is the last one. */
const LAST_STEP_DAYS = 1e-5;
const STRAIGHT = 0.01;

/** Halving alone needs 25; the bound only makes an endless loop impossible. */
const STEPS = 64;

/**
 * The instant at which the sun passes an altitude, between two instants on either side of it.
 *
 * Halley's method, whose g″ ≈ −equatorial·cos δ·cos H·H′² costs nothing here, kept between the two instants: a step that
 * would leave them is replaced by halving. What the last step leaves is under bend²·step, 0.1 ms.
 *
 * @param equation g
 * @param fromU first instant, days since the fit's noon
 * @param toU second instant; g has opposite signs at the two
 * @param startU a first guess; anything at all, it only saves steps
 * @param rises whether g grows from the first to the second
 * @returns days since the fit's noon
 * @example solveCrossing(sunEquation(fit, site, 0), -0.5, 0, -0.25, true) // about −0.25 at an equinox on longitude 0
 * @source Halley's method with bisection as a guard, derivation
 */
export function solveCrossing(
  equation: SunEquation,
  fromU: number,
  toU: number,
  startU: number,
  rises: boolean,
): number {
  const { fit, longitudeRad, polar, equatorial, level } = equation;
  let low = fromU;
  let high = toU;
  let u = startU > fromU && startU < toU ? startU : (fromU + toU) / 2;
  for (let step = 0; step < STEPS; step += 1) {
    const sinDec = valueOfQuartic(fit.sinDeclination, u);
    const sinSlope = slopeOfQuartic(fit.sinDeclination, u);
    const cosDec = Math.sqrt(1 - sinDec * sinDec);
    const hourRad = 2 * Math.PI * u + valueOfQuartic(fit.hourAngleRad, u) + longitudeRad;
    const hourSlope = 2 * Math.PI + slopeOfQuartic(fit.hourAngleRad, u);
    const along = equatorial * cosDec * Math.cos(hourRad);
    const across = equatorial * cosDec * Math.sin(hourRad);
    const value = polar * sinDec + along - level;
    const slope = polar * sinSlope - (along * sinDec * sinSlope) / (cosDec * cosDec) - across * hourSlope;
    if (value > 0 === rises) high = u;
    else low = u;
    const newton = value / slope;
    const bend = (newton * along * hourSlope * hourSlope) / (2 * slope);
    const next = u - newton / (1 + bend);
    const isInside = next > low && next < high;
    if (isInside && Math.abs(newton) < LAST_STEP_DAYS && Math.abs(bend) < STRAIGHT) return next;
    u = isInside ? next : (low + high) / 2;
  }
  return u;
}
