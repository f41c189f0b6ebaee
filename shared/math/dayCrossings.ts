import { slopeOfQuartic, valueOfQuartic } from './quartic';
import type { SolarDay } from './solarDay';
import { crossingsIn } from './sunCrossings';
import { sunEquation, type SunEquation } from './sunEquation';
import { solveCrossing } from './sunSolver';

/** Why an event does not happen. */
export type NoCrossing = 'sun_stays_above' | 'sun_stays_below';

/** When the sun passes an altitude, rising in the morning and falling in the evening: days since the fit's noon. */
export interface DayCrossings {
  readonly morning: number | NoCrossing;
  readonly evening: number | NoCrossing;
}

/**
 * When the sun passes an altitude on a solar day.
 *
 * Each half of the day only climbs or only falls, so it holds one crossing or none, told by its ends.
 *
 * @param day the solar day
 * @param altitudeDeg of the sun's centre without refraction, −90 to 90 degrees
 * @returns for each half the instant, days since the fit's noon, or why there is none
 * @example dayCrossings(day, -6).evening // the end of civil twilight
 * @source derivation; checked against ephem 4.1.4 and astronomy-engine's SearchAltitude
 */
export function dayCrossings(day: SolarDay, altitudeDeg: number): DayCrossings {
  const equation = sunEquation(day.fit, day.site, altitudeDeg);
  if (!day.turns) return polarCrossings(day, equation);
  const { lowBefore, high, lowAfter } = day;
  const [morningU, eveningU] = guessesFromNoon(day, equation);
  return {
    morning:
      stays(equation, lowBefore.sine, high.sine) ??
      solveCrossing(equation, lowBefore.u, high.u, morningU, true),
    evening:
      stays(equation, lowAfter.sine, high.sine) ??
      solveCrossing(equation, high.u, lowAfter.u, eveningU, false),
  };
}

function stays(equation: SunEquation, lowest: number, highest: number): NoCrossing | undefined {
  if (equation.sine <= lowest) return 'sun_stays_above';
  return equation.sine >= highest ? 'sun_stays_below' : undefined;
}

/** The hour angle of the altitude with the declination of noon, then with the one that it leads to. */
function guessesFromNoon(day: SolarDay, equation: SunEquation): [number, number] {
  const { fit, noonU } = day;
  const sinDec = valueOfQuartic(fit.sinDeclination, noonU);
  const drift = slopeOfQuartic(fit.sinDeclination, noonU);
  const pace = 2 * Math.PI + slopeOfQuartic(fit.hourAngleRad, noonU);
  const roughDays = hourAngleOf(equation, sinDec) / pace;
  return [
    noonU - hourAngleOf(equation, sinDec - drift * roughDays) / pace,
    noonU + hourAngleOf(equation, sinDec + drift * roughDays) / pace,
  ];
}

/** cos H = (level − polar·sin δ) / (equatorial·cos δ); 0 or π where the sun does not get there. */
function hourAngleOf(equation: SunEquation, sinDec: number): number {
  const { level, polar, equatorial } = equation;
  const cosine = (level - polar * sinDec) / (equatorial * Math.sqrt(1 - sinDec * sinDec));
  return Math.acos(Math.max(-1, Math.min(1, cosine)));
}

/** Beside a pole the sun may rise in the afternoon, or once a year: the whole day counts for either half. */
function polarCrossings(day: SolarDay, equation: SunEquation): DayCrossings {
  const { lowBefore, lowAfter } = day;
  const found = crossingsIn(equation, lowBefore.u, lowAfter.u);
  const above = (sine: number): NoCrossing => (sine > equation.sine ? 'sun_stays_above' : 'sun_stays_below');
  return {
    morning: found.find((crossing) => crossing.rises)?.u ?? above(lowBefore.sine),
    evening: found.findLast((crossing) => !crossing.rises)?.u ?? above(lowAfter.sine),
  };
}
