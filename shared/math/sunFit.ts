import { Body, GeoVector, MakeTime, RotateVector, Rotation_EQJ_EQD, SiderealTime } from 'astronomy-engine';
import { wrapRadians } from './angles';
import { quarticThrough, type Quartic } from './quartic';

/** Milliseconds in one day of universal time. */
export const DAY_MS = 86_400_000;

/** Days of which the polynomials are kept: more than two years, so that a calendar is computed once. */
const KEPT_DAYS = 800;

/** The five instants of a fit, in days from noon of the day: two days wide, so that any solar day fits inside. */
const NODE_DAYS = [-1, -0.5, 0, 0.5, 1] as const;

/** The sun of one UTC day, as smooth functions of u, the days since noon UTC (−1 ≤ u ≤ 1, and a little beyond). */
export interface SunFit {
  /** Noon UTC of the day, milliseconds since 1970. */
  readonly noonMs: number;
  /** Sine of the geocentric apparent declination. */
  readonly sinDeclination: Quartic;
  /** Greenwich hour angle less 2π·u, radians: the equation of time as an angle. */
  readonly hourAngleRad: Quartic;
  /** Distance of the sun at noon, astronomical units; it only scales the parallax of 8.8″. */
  readonly distanceAu: number;
}

const kept = new Map<number, SunFit>();

/**
 * The polynomials for the UTC day that holds an instant.
 *
 * Quartics through five apparent positions of astronomy-engine, twelve hours apart. What they leave out is the
 * fifth derivative: under 1e-5 arc seconds, even for the short terms of nutation.
 *
 * @param atMs instant, milliseconds since 1970 (UTC); finite
 * @returns the fit; a pure function of the day, the last 800 days are kept
 * @throws RangeError when the instant is not finite
 * @example sunFitAt(Date.UTC(2026, 2, 20)).noonMs // Date.UTC(2026, 2, 20, 12)
 * @source positions: astronomy-engine 2.1.19 (VSOP87, IAU2000B nutation), as SearchAltitude uses them; polynomial: derivation
 */
export function sunFitAt(atMs: number): SunFit {
  if (!Number.isFinite(atMs)) throw new RangeError(`an instant in milliseconds, not ${atMs}`);
  const day = Math.floor(atMs / DAY_MS);
  const known = kept.get(day);
  if (known) return known;
  const fit = fitDay((day + 0.5) * DAY_MS);
  if (kept.size >= KEPT_DAYS) forgetOldest();
  kept.set(day, fit);
  return fit;
}

function forgetOldest(): void {
  const oldest = kept.keys().next();
  if (!oldest.done) kept.delete(oldest.value);
}

function fitDay(noonMs: number): SunFit {
  const nodes = NODE_DAYS.map((u) => apparentSun(noonMs, u));
  return {
    noonMs,
    sinDeclination: quarticThrough(nodes.map((node) => node.sinDeclination)),
    hourAngleRad: quarticThrough(nodes.map((node) => node.hourAngleRad)),
    distanceAu: apparentSun(noonMs, 0).distanceAu,
  };
}

/** One apparent geocentric position, true equator and equinox of date, and what is left of its hour angle. */
function apparentSun(noonMs: number, u: number) {
  const time = MakeTime(new Date(noonMs + u * DAY_MS));
  const { x, y, z } = RotateVector(Rotation_EQJ_EQD(time), GeoVector(Body.Sun, time, true));
  const distanceAu = Math.hypot(x, y, z);
  const siderealRad = (SiderealTime(time) * Math.PI) / 12;
  return {
    distanceAu,
    sinDeclination: z / distanceAu,
    hourAngleRad: wrapRadians(siderealRad - Math.atan2(y, x) - 2 * Math.PI * u),
  };
}
