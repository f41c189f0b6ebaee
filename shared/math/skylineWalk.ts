import { bracketRoot } from './bracketRoot';
import { firstCornerAfter, type Skyline, type SkylinePoint } from './skyline';
import type { SolarDay } from './solarDay';
import { azimuthInFit, positionInFit, type SunPosition } from './sunPosition';

/** A stretch of the sun's path that passes over, or behind, one straight line of the skyline. */
export interface SkylineStretch {
  readonly fromU: number;
  readonly toU: number;
  readonly left: SkylinePoint;
  readonly right: SkylinePoint;
}

/** Altitudes of the sun's centre below which the whole skyline hides it, and above which none of it does. */
export interface SkylineReach {
  readonly lowestDeg: number;
  readonly highestDeg: number;
}

/** Four minutes, one degree of hour angle: the path is so smooth that a parabola describes each step. */
const STEP_DAYS = 4 / 1440;

/** Steps are halved while the azimuth runs faster than this, near the zenith, down to one second. */
const AZIMUTH_STEP_DEG = 2;
const SHORTEST_DAYS = 1 / 86_400;

/** One millisecond. */
const CUT_DAYS = 1 / 86_400_000;

/** In four minutes the altitude changes by one degree at most. */
const STEP_CLIMB_DEG = 1.1;

/**
 * The sun's path over a solar day, cut at every corner of the skyline that it passes.
 *
 * @param day the solar day
 * @param skyline corners in order
 * @param reach where the skyline may matter; elsewhere the path is left whole, beside any one of its lines
 * @returns stretches in order, without gaps
 * @example walkSkyline(day, skylineFrom([{ azimuthDeg: 0, altitudeDeg: 3 }], 0), reach) // about 360 stretches
 * @source derivation
 */
export function walkSkyline(day: SolarDay, skyline: Skyline, reach: SkylineReach): SkylineStretch[] {
  const cuts = [day.lowBefore.u];
  const lengthDays = day.lowAfter.u - day.lowBefore.u;
  const steps = Math.ceil(lengthDays / STEP_DAYS);
  let before = sampleAt(day, day.lowBefore.u);
  for (let step = 1; step <= steps; step += 1) {
    const sample = sampleAt(day, day.lowBefore.u + (lengthDays * step) / steps);
    if (mayMatter(sample.position.altitudeDeg, reach)) cutStep(day, skyline, before, sample, cuts);
    else cuts.push(sample.u);
    before = sample;
  }
  const stretches: SkylineStretch[] = [];
  for (let index = 1; index < cuts.length; index += 1) {
    const [fromU, toU] = [cuts[index - 1] ?? 0, cuts[index] ?? 0];
    if (toU > fromU) stretches.push(stretchBetween(day, skyline, fromU, toU));
  }
  return stretches;
}

function mayMatter(altitudeDeg: number, { lowestDeg, highestDeg }: SkylineReach): boolean {
  return altitudeDeg > lowestDeg - STEP_CLIMB_DEG && altitudeDeg < highestDeg + STEP_CLIMB_DEG;
}

interface Sample {
  readonly u: number;
  readonly position: SunPosition;
}

function sampleAt(day: SolarDay, u: number): Sample {
  return { u, position: positionInFit(day.fit, day.site, u) };
}

/** Adds to the cuts every corner passed between two samples, and the second sample. */
function cutStep(day: SolarDay, skyline: Skyline, from: Sample, to: Sample, cuts: number[]): void {
  const turn = turnDeg(from.position.azimuthDeg, to.position.azimuthDeg);
  if (Math.abs(turn) > AZIMUTH_STEP_DEG && to.u - from.u > SHORTEST_DAYS) {
    const middle = sampleAt(day, (from.u + to.u) / 2);
    cutStep(day, skyline, from, middle, cuts);
    cutStep(day, skyline, middle, to, cuts);
    return;
  }
  for (const azimuthDeg of cornersPassed(skyline, from.position.azimuthDeg, turn)) {
    cuts.push(whenAt(day, azimuthDeg, from, to));
  }
  cuts.push(to.u);
}

/** Azimuths of the corners inside a turn, in the order in which the sun passes them. */
function cornersPassed(skyline: Skyline, fromDeg: number, turn: number): number[] {
  const lowDeg = turn >= 0 ? fromDeg : fromDeg + turn;
  const passed: number[] = [];
  const first = firstCornerAfter(skyline, lowDeg < 0 ? lowDeg + 360 : lowDeg);
  for (let count = 0; count < skyline.length; count += 1) {
    const azimuthDeg = skyline[(first + count) % skyline.length]?.azimuthDeg ?? 0;
    const ahead = azimuthDeg - lowDeg;
    if ((ahead >= 0 && ahead < 360 ? ahead : ahead - 360 * Math.floor(ahead / 360)) > Math.abs(turn)) break;
    passed.push(azimuthDeg);
  }
  return turn >= 0 ? passed : passed.reverse();
}

/** The instant between two samples at which the sun stands in a direction, to 1 ms. */
function whenAt(day: SolarDay, azimuthDeg: number, from: Sample, to: Sample): number {
  const aheadDeg = (u: number): number => turnDeg(azimuthInFit(day.fit, day.site, u), azimuthDeg);
  return bracketRoot(aheadDeg, from.u, to.u, CUT_DAYS);
}

function stretchBetween(day: SolarDay, skyline: Skyline, fromU: number, toU: number): SkylineStretch {
  const after = firstCornerAfter(skyline, azimuthInFit(day.fit, day.site, (fromU + toU) / 2));
  const left = skyline[(after + skyline.length - 1) % skyline.length];
  const right = skyline[after % skyline.length];
  if (!left || !right) throw new RangeError('a skyline of at least one point');
  return { fromU, toU, left, right };
}

/** The shorter turn from one azimuth to another, −180 to 180 degrees, clockwise positive. */
function turnDeg(fromDeg: number, toDeg: number): number {
  const turn = toDeg - fromDeg;
  if (turn > 180) return turn - 360;
  return turn < -180 ? turn + 360 : turn;
}
