import { residualOf, slopeOf, sunEquation, type SunEquation } from './sunEquation';
import { DAY_MS, sunFitAt } from './sunFit';
import { siteOf, type Place } from './sunSite';
import { solveCrossing } from './sunSolver';

/** The sun's centre passing an altitude. */
export interface SunCrossing {
  /** Milliseconds since 1970 (UTC), not rounded. */
  readonly atMs: number;
  readonly rises: boolean;
}

/** Two crossings closer than this, 0.86 s, are taken for a touch. */
const TOUCH_DAYS = 1e-5;

/**
 * Every instant at which the sun's centre passes an altitude, rising or falling, in order.
 *
 * The span is halved until a bound on g″ proves that a piece holds no crossing or at most one, so none is missed and
 * none is invented, at the poles and where the sun only grazes the altitude.
 *
 * @param place latitude and longitude, degrees
 * @param altitudeDeg of the sun's centre without refraction, −90 to 90
 * @param fromMs start, milliseconds since 1970 (UTC), included
 * @param toMs end, not included
 * @returns the crossings; a pair less than 0.86 s apart counts as none
 * @throws RangeError when a coordinate is out of range or an instant is not finite
 * @example sunCrossings({ latitude: 51.5074, longitude: -0.1278 }, -50 / 60, Date.UTC(2026, 5, 20, 23), Date.UTC(2026, 5, 21, 23)) // 03:43:06 rising, 20:21:33 falling
 * @source derivation; checked against astronomy-engine's SearchAltitude and ephem 4.1.4
 */
export function sunCrossings(place: Place, altitudeDeg: number, fromMs: number, toMs: number): SunCrossing[] {
  const site = siteOf(place);
  if (!Number.isFinite(toMs - fromMs)) throw new RangeError(`a span of instants, not ${fromMs} to ${toMs}`);
  const found: SunCrossing[] = [];
  let startMs = fromMs;
  while (startMs < toMs) {
    const fit = sunFitAt(startMs);
    const endMs = Math.min(toMs, fit.noonMs + DAY_MS / 2);
    const equation = sunEquation(fit, site, altitudeDeg);
    const from = (startMs - fit.noonMs) / DAY_MS;
    for (const crossing of crossingsIn(equation, from, (endMs - fit.noonMs) / DAY_MS)) {
      found.push({ atMs: fit.noonMs + crossing.u * DAY_MS, rises: crossing.rises });
    }
    startMs = endMs;
  }
  return found;
}

/**
 * The same within one day's polynomials.
 *
 * @param equation the altitude on a day
 * @param fromU start, days since the fit's noon
 * @param toU end
 * @returns instants in days since the fit's noon, in order
 * @example crossingsIn(sunEquation(fit, site, 0), -0.5, 0.5) // one rising, one falling at an equinox
 * @source derivation
 */
export function crossingsIn(
  equation: SunEquation,
  fromU: number,
  toU: number,
): { u: number; rises: boolean }[] {
  // |g″| ≤ polar·|(sin δ)″| + equatorial·(H′² and smaller terms), per day squared.
  const bend = 4e-4 * Math.abs(equation.polar) + 40 * Math.abs(equation.equatorial);
  const found: { u: number; rises: boolean }[] = [];
  const split = (lowU: number, highU: number, isLowAbove: boolean, isHighAbove: boolean): void => {
    const middleU = (lowU + highU) / 2;
    const half = (highU - lowU) / 2;
    const value = residualOf(equation, middleU);
    const slope = slopeOf(equation, middleU);
    const isOneWay = Math.abs(slope) > bend * half || 2 * half < TOUCH_DAYS;
    if (isOneWay && isLowAbove !== isHighAbove) {
      found.push({
        u: solveCrossing(equation, lowU, highU, middleU - value / slope, isHighAbove),
        rises: isHighAbove,
      });
    }
    if (isOneWay || Math.abs(value) > Math.abs(slope) * half + (bend * half * half) / 2) return;
    split(lowU, middleU, isLowAbove, value > 0);
    split(middleU, highU, value > 0, isHighAbove);
  };
  split(fromU, toU, residualOf(equation, fromU) > 0, residualOf(equation, toU) > 0);
  return found;
}
