import { falloffStops, type EvenZone } from '../../../../shared/math/falloff';
import { pointsOf, type PlotPoint, type Range } from './plotFrame';

/** Brightness against distance, in stops from the reference. */
export interface FalloffPlot {
  readonly across: Range;
  readonly up: Range;
  readonly points: readonly PlotPoint[];
}

const ROOM = 1.1;
/** The curve rises without end towards a small light; higher than this it says nothing more. */
const MOST_UP = 6;

/** The curve over the distances asked about, the reference and the even zone. */
export function falloffPlot(
  rows: readonly { readonly distanceM: number; readonly stops: number }[],
  even: EvenZone,
  light: { readonly referenceM: number; readonly toleranceStops: number; readonly sourceDiameterM: number },
): FalloffPlot {
  const { referenceM, sourceDiameterM, toleranceStops } = light;
  const distances = rows.map(({ distanceM }) => distanceM);
  const zoneEnd = Number.isFinite(even.farM) ? Math.min(even.farM, referenceM * 4) : referenceM;
  const endM = Math.max(referenceM, zoneEnd, ...distances) * ROOM;
  const at = (distance: number) => falloffStops(Math.max(distance, endM * 1e-4), referenceM, sourceDiameterM);
  const high = Math.max(1, Math.min(toleranceStops * 1.3, MOST_UP), ...rows.map(({ stops }) => stops));
  const low = Math.min(-1, at(endM), ...rows.map(({ stops }) => stops));
  return {
    across: [0, endM],
    up: [Math.floor(low), Math.ceil(Math.min(high, MOST_UP)) + 0.5],
    points: pointsOf(at, [0, endM], 240),
  };
}
