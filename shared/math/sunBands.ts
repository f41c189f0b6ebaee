import { dayCrossings, type NoCrossing } from './dayCrossings';
import { instantOf, type DayPart, type SolarDay } from './solarDay';
import { ASTRONOMICAL_DEG, CIVIL_DEG, NAUTICAL_DEG, sunriseAltitudeDeg } from './sunAltitudes';
import { crossingsIn } from './sunCrossings';
import { sunEquation } from './sunEquation';
import { positionInFit } from './sunPosition';

export type SunBandName =
  'goldenHour' | 'blueHour' | 'civilTwilight' | 'nauticalTwilight' | 'astronomicalTwilight';

/** The altitudes of the sun's centre, without refraction, between which a band lies. */
export interface BandLimits {
  readonly fromDeg: number;
  readonly toDeg: number;
}

/** A band's span in one half of a day. */
export interface SunBand {
  readonly name: SunBandName;
  readonly part: DayPart;
  /** Milliseconds since 1970 (UTC), not rounded. */
  readonly fromMs: number;
  readonly toMs: number;
}

/** Golden and blue hour. Common practice, no standard. */
export const GOLDEN_HOUR: BandLimits = { fromDeg: -4, toDeg: 6 };
export const BLUE_HOUR: BandLimits = { fromDeg: -6, toDeg: -4 };

/**
 * The bands of a solar day: golden and blue hour, and the three twilights, morning and evening, in order of time.
 *
 * @param day the solar day
 * @param eyeHeightM metres above the visible horizon, 0 or more; where civil twilight meets the sun
 * @param goldenHour limits, degrees, from below to
 * @param blueHour limits, degrees, from below to
 * @returns the bands that the sun passes; one that it turns in ends at its highest or lowest altitude
 * @throws RangeError when the height is out of range or a band's limits are not in order
 * @example sunBands(day, 0).find(({ name, part }) => name === 'blueHour' && part === 'evening')
 * @source twilights: USNO; golden and blue hour: common practice
 */
export function sunBands(
  day: SolarDay,
  eyeHeightM: number,
  goldenHour: BandLimits = GOLDEN_HOUR,
  blueHour: BandLimits = BLUE_HOUR,
): SunBand[] {
  const sunriseDeg = sunriseAltitudeDeg(eyeHeightM);
  const bands = [
    ...bandsOf(day, 'astronomicalTwilight', { fromDeg: ASTRONOMICAL_DEG, toDeg: NAUTICAL_DEG }),
    ...bandsOf(day, 'nauticalTwilight', { fromDeg: NAUTICAL_DEG, toDeg: CIVIL_DEG }),
    // From 21 km up the dip swallows civil twilight.
    ...(sunriseDeg > CIVIL_DEG
      ? bandsOf(day, 'civilTwilight', { fromDeg: CIVIL_DEG, toDeg: sunriseDeg })
      : []),
    ...bandsOf(day, 'blueHour', blueHour),
    ...bandsOf(day, 'goldenHour', goldenHour),
  ];
  return bands.sort((a, b) => a.fromMs - b.fromMs || a.toMs - b.toMs);
}

function bandsOf(day: SolarDay, name: SunBandName, limits: BandLimits): SunBand[] {
  if (!(limits.fromDeg < limits.toDeg)) {
    throw new RangeError(`a band from below to above, not ${limits.fromDeg} to ${limits.toDeg}`);
  }
  const spans = day.turns ? spansOf(day, limits) : polarSpans(day, limits);
  return spans.map(([part, fromU, toU]) => ({
    name,
    part,
    fromMs: instantOf(day, fromU),
    toMs: instantOf(day, toU),
  }));
}

type PartSpan = [part: DayPart, fromU: number, toU: number];

function spansOf(day: SolarDay, { fromDeg, toDeg }: BandLimits): PartSpan[] {
  const lower = dayCrossings(day, fromDeg);
  const upper = dayCrossings(day, toDeg);
  const spans: PartSpan[] = [];
  if (lower.morning !== 'sun_stays_below' && upper.morning !== 'sun_stays_above') {
    spans.push(['morning', instantOr(lower.morning, day.lowBefore.u), instantOr(upper.morning, day.high.u)]);
  }
  if (lower.evening !== 'sun_stays_below' && upper.evening !== 'sun_stays_above') {
    spans.push(['evening', instantOr(upper.evening, day.high.u), instantOr(lower.evening, day.lowAfter.u)]);
  }
  return spans;
}

function instantOr(crossing: number | NoCrossing, otherwiseU: number): number {
  return typeof crossing === 'number' ? crossing : otherwiseU;
}

/** Beside a pole the altitude may only climb, or only fall: cut the day at every crossing and at noon. */
function polarSpans(day: SolarDay, { fromDeg, toDeg }: BandLimits): PartSpan[] {
  const { fit, site, lowBefore, high, lowAfter } = day;
  const crossings = [fromDeg, toDeg].flatMap((altitudeDeg) =>
    crossingsIn(sunEquation(fit, site, altitudeDeg), lowBefore.u, lowAfter.u),
  );
  const cuts = [...crossings.map(({ u }) => u), lowBefore.u, high.u, lowAfter.u].sort((a, b) => a - b);
  const spans: PartSpan[] = [];
  for (let index = 1; index < cuts.length; index += 1) {
    const [fromU, toU] = [cuts[index - 1] ?? 0, cuts[index] ?? 0];
    const { altitudeDeg } = positionInFit(fit, site, (fromU + toU) / 2);
    if (altitudeDeg > fromDeg && altitudeDeg < toDeg && toU > fromU) {
      spans.push([fromU < high.u ? 'morning' : 'evening', fromU, toU]);
    }
  }
  return spans;
}
