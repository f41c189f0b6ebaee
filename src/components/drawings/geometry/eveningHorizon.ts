import { skylineAltitudeDeg, skylineFrom, type SkylinePoint } from '../../../../shared/math/skyline';
import { sunPosition } from '../../../../shared/math/sunPosition';
import type { Place } from '../../../../shared/math/sunSite';
import { pointsOf, type PlotPoint, type Range } from './plotFrame';

/** What stands in the sun's direction at each instant of a span, degrees above the horizontal. */
export function directHorizonDeg(
  place: Place,
  across: Range,
  skyline: readonly SkylinePoint[] | number,
): PlotPoint[] {
  if (typeof skyline === 'number') return across.map((x) => ({ x, y: skyline }));
  const corners = skylineFrom(skyline, 0);
  return pointsOf((ms) => skylineAltitudeDeg(corners, sunPosition(place, ms).azimuthDeg), across, 288);
}
