import { directSun } from './directSun';
import type { SolarDay } from './solarDay';

const DAY_S = 86_400;

/**
 * How long the sun's upper limb is above the visible horizon on a solar day.
 *
 * sunset − sunrise; where one of them does not happen, up to or from solar midnight; 86,400 s under the midnight sun
 *
 * @param day the solar day
 * @param eyeHeightM metres above the visible horizon, 0 or more
 * @returns seconds, 0 to 86,400
 * @throws RangeError when the height is negative or not finite
 * @example dayLengthS(solarDay({ latitude: 80, longitude: 0 }, Date.UTC(2026, 5, 21, 12)), 0) // 86400
 * @source derivation
 */
export function dayLengthS(day: SolarDay, eyeHeightM: number): number {
  const spans = directSun(day, { horizonDeg: 0 }, eyeHeightM);
  const lightS = spans.reduce((sum, { fromMs, toMs }) => sum + (toMs - fromMs) / 1000, 0);
  const solarDayS = (day.lowAfter.u - day.lowBefore.u) * DAY_S;
  return lightS >= solarDayS - 1e-3 ? DAY_S : Math.min(DAY_S, lightS);
}
