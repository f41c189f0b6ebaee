import { USUAL_GEAR } from '../../../shared/contract/limits';
import { markAt, positionOf } from '../../../shared/math/marks';

/** Where a setting stands on the plane, in stops as the additive system counts them. */
export interface PlanePoint {
  readonly apertureStops: number;
  readonly shutterStops: number;
}

/** The plane: aperture across, shutter up, both so that more light is to the right and up. */
export interface PlaneFrame {
  readonly leftPx: number;
  readonly topPx: number;
  readonly rightPx: number;
  readonly bottomPx: number;
  readonly apertures: readonly [darkest: number, brightest: number];
  readonly shutters: readonly [darkest: number, brightest: number];
}

const stopsOf = (kind: 'aperture' | 'shutter', exact: number) => positionOf(kind, 'full', exact);

/** A camera's exact settings as a point. */
export function pointOf(aperture: number, shutterS: number): PlanePoint {
  return { apertureStops: stopsOf('aperture', aperture), shutterStops: stopsOf('shutter', shutterS) };
}

/** A plane over usual gear, widened by whole stops where a point lies outside. */
export function planeFrame(
  points: readonly PlanePoint[],
  edges: Pick<PlaneFrame, 'leftPx' | 'topPx' | 'rightPx' | 'bottomPx'>,
): PlaneFrame {
  const a = points.map(({ apertureStops }) => apertureStops).filter(Number.isFinite);
  const t = points.map(({ shutterStops }) => shutterStops).filter(Number.isFinite);
  const { apertureMin, apertureMax, shutterFastestS, shutterSlowestS } = USUAL_GEAR;
  return {
    ...edges,
    apertures: [
      Math.ceil(Math.max(stopsOf('aperture', apertureMax), ...a)),
      Math.floor(Math.min(stopsOf('aperture', apertureMin), ...a)),
    ],
    shutters: [
      Math.ceil(Math.max(stopsOf('shutter', shutterFastestS), ...t)),
      Math.floor(Math.min(stopsOf('shutter', shutterSlowestS), ...t)),
    ],
  };
}

/** Across, from the darkest aperture at the left edge to the widest at the right. */
export function xOfAperture(
  { leftPx, rightPx, apertures: [dark, bright] }: PlaneFrame,
  stops: number,
): number {
  return leftPx + ((dark - stops) / (dark - bright)) * (rightPx - leftPx);
}

/** Up, from the shortest time at the bottom edge to the longest at the top. */
export function yOfShutter({ topPx, bottomPx, shutters: [dark, bright] }: PlaneFrame, stops: number): number {
  return bottomPx - ((dark - stops) / (dark - bright)) * (bottomPx - topPx);
}

export interface EvLine {
  readonly ev: number;
  readonly fromX: number;
  readonly fromY: number;
  readonly toX: number;
  readonly toY: number;
  /** The lower right end lies on the right edge, not on the bottom. */
  readonly endsRight: boolean;
}

/**
 * The stretch of a line of equal exposure value that lies in the plane. Positions add (APEX, Ev = Av + Tv), so the
 * line runs one stop down for every stop to the right. Null where it misses the plane or only touches a corner.
 */
export function evLine(frame: PlaneFrame, ev: number): EvLine | null {
  const [darkA, brightA] = frame.apertures;
  const [darkT, brightT] = frame.shutters;
  const fromA = Math.min(darkA, ev - brightT);
  const toA = Math.max(brightA, ev - darkT);
  if (fromA <= toA) return null;
  return {
    ev,
    fromX: xOfAperture(frame, fromA),
    fromY: yOfShutter(frame, ev - fromA),
    toX: xOfAperture(frame, toA),
    toY: yOfShutter(frame, ev - toA),
    endsRight: toA === brightA,
  };
}

/** All lines of whole exposure values in the plane. */
export function evLines(frame: PlaneFrame): EvLine[] {
  const least = frame.apertures[1] + frame.shutters[1];
  const most = frame.apertures[0] + frame.shutters[0];
  return Array.from({ length: most - least + 1 }, (_, i) => evLine(frame, least + i)).filter(
    (line) => line !== null,
  );
}

/** The full stops along one edge, every `every`th with the mark that stands on the camera. */
export function edgeMarks(
  kind: 'aperture' | 'shutter',
  [dark, bright]: readonly [number, number],
  every: number,
): { stops: number; label: string }[] {
  return Array.from({ length: dark - bright + 1 }, (_, i) => bright + i)
    .filter((stops) => stops % every === 0)
    .map((stops) => ({ stops, label: markAt(kind, 'full', stops).label }));
}
