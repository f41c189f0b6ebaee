import { bracketRoot } from './bracketRoot';
import { dayCrossings } from './dayCrossings';
import { dipOfHorizonDeg } from './dip';
import { standardRefractionDeg } from './refraction';
import { skylineFrom, type Skyline, type SkylinePoint } from './skyline';
import { walkSkyline, type SkylineStretch } from './skylineWalk';
import { instantOf, type SolarDay } from './solarDay';
import { positionInFit } from './sunPosition';

/** A span of time, milliseconds since 1970 (UTC), not rounded. */
export interface Span {
  readonly fromMs: number;
  readonly toMs: number;
}

/** What hides the sun: the same angle all around, or a skyline. An angle of 0 is the visible horizon. */
export type Horizon = { readonly horizonDeg: number } | { readonly skyline: readonly SkylinePoint[] };

/** The sun's semidiameter as the definition of sunrise has it: 16′. */
const SEMIDIAMETER_DEG = 16 / 60;

/** One millisecond. */
const ROOT_DAYS = 1 / 86_400_000;
const FLICKER_MS = 5;

/**
 * When the sun's upper limb is in view, seen through standard air.
 *
 * The centre, without refraction, stands higher than a − R(a) − 16′, a the horizon's apparent altitude in the sun's
 * direction. With nothing in the way this is sunrise to sunset, dip included.
 *
 * @param day the solar day
 * @param horizon an angle, −90 to 90 degrees, or a skyline as seen from the subject
 * @param eyeHeightM metres above the visible horizon, 0 or more; counts where nothing stands above that horizon
 * @returns spans in order; none in polar night, from solar midnight to solar midnight in polar day
 * @throws RangeError when an angle or the height is out of range
 * @example directSun(day, { horizonDeg: 0 }, 0) // one span, sunrise to sunset
 * @source derivation from the definition of sunrise (USNO) and Bennett (1982)
 */
export function directSun(day: SolarDay, horizon: Horizon, eyeHeightM: number): Span[] {
  const dipDeg = dipOfHorizonDeg(eyeHeightM);
  const points =
    'skyline' in horizon ? horizon.skyline : [{ azimuthDeg: 0, altitudeDeg: horizon.horizonDeg }];
  const skyline = skylineFrom(points, dipDeg);
  const first = skyline[0]?.altitudeDeg ?? 0;
  const isLevel = skyline.every((corner) => corner.altitudeDeg === first);
  return isLevel && day.turns ? aboveLevel(day, first) : aboveSkyline(day, skyline);
}

/**
 * Altitude of the sun's centre, without refraction, when its upper limb touches a horizon.
 *
 * h = a − R(a) − 16′
 *
 * @param horizonDeg a, apparent altitude of the horizon, degrees, −90 to 90
 * @returns degrees
 * @example centreAtHorizonDeg(0) // −50/60
 * @source definition of sunrise (USNO), Bennett (1982); see `standardRefractionDeg`
 */
export function centreAtHorizonDeg(horizonDeg: number): number {
  return horizonDeg - standardRefractionDeg(horizonDeg) - SEMIDIAMETER_DEG;
}

function aboveLevel(day: SolarDay, horizonDeg: number): Span[] {
  const { morning, evening } = dayCrossings(day, Math.max(-90, centreAtHorizonDeg(horizonDeg)));
  if (morning === 'sun_stays_below' || evening === 'sun_stays_below') return [];
  const fromU = typeof morning === 'number' ? morning : day.lowBefore.u;
  const toU = typeof evening === 'number' ? evening : day.lowAfter.u;
  return [{ fromMs: instantOf(day, fromU), toMs: instantOf(day, toU) }];
}

function aboveSkyline(day: SolarDay, skyline: Skyline): Span[] {
  const spans: Span[] = [];
  let openU: number | null = null;
  const note = (u: number, isClear: boolean): void => {
    if (isClear) openU ??= u;
    else if (openU !== null) {
      spans.push({ fromMs: instantOf(day, openU), toMs: instantOf(day, u) });
      openU = null;
    }
  };
  const lines = skyline.map((corner) => corner.altitudeDeg);
  const reach = {
    lowestDeg: centreAtHorizonDeg(Math.min(...lines)),
    highestDeg: centreAtHorizonDeg(Math.max(...lines)),
  };
  for (const stretch of walkSkyline(day, skyline, reach)) {
    const clearance = (u: number): number => clearanceDeg(day, stretch, u);
    let isClear = clearance(stretch.fromU) > 0;
    note(stretch.fromU, isClear);
    for (const u of rootsOf(clearance, stretch.fromU, stretch.toU)) {
      isClear = !isClear;
      note(u, isClear);
    }
  }
  note(day.lowAfter.u, false);
  return withoutFlicker(spans);
}

/** Corners are found to a millisecond: gaps and glimpses about as short are rounding, not sun. */
function withoutFlicker(spans: readonly Span[]): Span[] {
  const joined: Span[] = [];
  for (const span of spans) {
    const before = joined.at(-1);
    if (before && span.fromMs - before.toMs < FLICKER_MS) {
      joined[joined.length - 1] = { fromMs: before.fromMs, toMs: span.toMs };
    } else joined.push(span);
  }
  return joined.filter(({ fromMs, toMs }) => toMs - fromMs >= FLICKER_MS);
}

/** How far the sun's centre stands above where its limb touches the stretch's line. */
function clearanceDeg(day: SolarDay, { left, right }: SkylineStretch, u: number): number {
  const { altitudeDeg, azimuthDeg } = positionInFit(day.fit, day.site, u);
  const span = right.azimuthDeg - left.azimuthDeg;
  const width = span > 0 ? span : span + 360;
  // Measured from the line's middle, and kept on the line, so that its ends may be overstepped.
  const offset = azimuthDeg - left.azimuthDeg - width / 2;
  const share = Math.max(0, Math.min(1, 0.5 + (offset - 360 * Math.round(offset / 360)) / width));
  const lineDeg = left.altitudeDeg + (right.altitudeDeg - left.altitudeDeg) * share;
  return altitudeDeg - centreAtHorizonDeg(lineDeg);
}

/** Sign changes of a curve that a parabola describes well between two instants: none, one or two. */
function rootsOf(curve: (u: number) => number, fromU: number, toU: number): number[] {
  const atFrom = curve(fromU);
  const atTo = curve(toU);
  if (atFrom > 0 !== atTo > 0) return [bracketRoot(curve, fromU, toU, ROOT_DAYS)];
  const vertexU = vertexOf(fromU, toU, atFrom, curve((fromU + toU) / 2), atTo);
  if (vertexU === null || curve(vertexU) > 0 === atFrom > 0) return [];
  return [bracketRoot(curve, fromU, vertexU, ROOT_DAYS), bracketRoot(curve, vertexU, toU, ROOT_DAYS)];
}

function vertexOf(fromU: number, toU: number, a: number, b: number, c: number): number | null {
  const bend = a - 2 * b + c;
  const shift = (a - c) / (4 * bend);
  return Math.abs(shift) < 0.5 ? (fromU + toU) / 2 + shift * (toU - fromU) : null;
}
