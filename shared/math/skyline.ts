import { wrapAzimuthDeg } from './angles';

/** A corner of the skyline as seen from the subject. */
export interface SkylinePoint {
  /** Clockwise from true north. */
  readonly azimuthDeg: number;
  /** Apparent altitude; 0 means that nothing stands there. */
  readonly altitudeDeg: number;
}

/** The horizon all around: corners in order of azimuth, joined by straight lines, the last to the first. */
export type Skyline = readonly SkylinePoint[];

/**
 * A skyline from corners in any order.
 *
 * Corners that share an azimuth make a vertical edge, in the order in which they were given. Where nothing stands
 * (altitude 0), the horizon is the visible one, lowered by the dip.
 *
 * @param points at least one; azimuth any finite number, altitude −90 to 90, degrees
 * @param dipDeg of the visible horizon, degrees, 0 or more
 * @returns corners sorted by azimuth, 0 ≤ azimuth < 360
 * @throws RangeError when there is no point, or one is out of range
 * @example skylineFrom([{ azimuthDeg: -90, altitudeDeg: 5 }], 0) // 5 degrees all around, its corner at azimuth 270
 * @source derivation
 */
export function skylineFrom(points: readonly SkylinePoint[], dipDeg: number): Skyline {
  if (points.length === 0) throw new RangeError('a skyline of at least one point');
  const corners = points.map(({ azimuthDeg, altitudeDeg }) => {
    if (!Number.isFinite(azimuthDeg)) throw new RangeError(`an azimuth in degrees, not ${azimuthDeg}`);
    if (!(Math.abs(altitudeDeg) <= 90)) throw new RangeError(`an altitude of −90 to 90, not ${altitudeDeg}`);
    return {
      azimuthDeg: wrapAzimuthDeg(azimuthDeg),
      altitudeDeg: altitudeDeg === 0 ? 0 - dipDeg : altitudeDeg,
    };
  });
  return corners.sort((a, b) => a.azimuthDeg - b.azimuthDeg);
}

/**
 * The skyline's apparent altitude in a direction.
 *
 * a = a1 + (a2 − a1)·(A − A1)/(A2 − A1) between neighbouring corners; on a vertical edge, the later corner
 *
 * @param skyline corners in order
 * @param azimuthDeg A, degrees, 0 to 360
 * @returns degrees
 * @example skylineAltitudeDeg(skylineFrom([{ azimuthDeg: 0, altitudeDeg: 0 }, { azimuthDeg: 90, altitudeDeg: 9 }], 0), 30) // 3
 * @source linear interpolation
 */
export function skylineAltitudeDeg(skyline: Skyline, azimuthDeg: number): number {
  const after = firstCornerAfter(skyline, azimuthDeg);
  const left = skyline[(after + skyline.length - 1) % skyline.length];
  const right = skyline[after % skyline.length];
  if (!left || !right) throw new RangeError('a skyline of at least one point');
  const span = right.azimuthDeg - left.azimuthDeg;
  const width = span > 0 ? span : span + 360;
  const along = azimuthDeg - left.azimuthDeg;
  const share = (along >= 0 ? along : along + 360) / width;
  return left.altitudeDeg + (right.altitudeDeg - left.altitudeDeg) * share;
}

/** Index of the first corner whose azimuth is greater, by halving; the number of corners where there is none. */
export function firstCornerAfter(skyline: Skyline, azimuthDeg: number): number {
  let low = 0;
  let high = skyline.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((skyline[middle]?.azimuthDeg ?? Infinity) > azimuthDeg) high = middle;
    else low = middle + 1;
  }
  return low;
}
