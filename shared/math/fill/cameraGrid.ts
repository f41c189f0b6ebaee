import { isFasterThanSync } from '../highSpeedSync';
import { markAt, positionOf, stepsPerStop, type Mark, type MarkedKind, type Scale } from '../marks';
import type { FillCamera, SyncKind } from './fillTypes';

/** Allows a limit that stands on a mark to count as reached in spite of rounding. */
const EDGE = 1e-9;

/** A shutter mark, and what a flash can do with it. */
export interface GridShutter {
  /** position on the scale, whole */
  readonly step: number;
  readonly mark: Mark;
  /** Tv = −log2(t), stops */
  readonly tv: number;
  /** how a flash is fired at this shutter; none where it can't be */
  readonly sync: SyncKind;
  /** what high-speed sync takes, stops; 0 in normal sync */
  readonly lossStops: number;
}

/**
 * What the lens, the ISO and a filter let through together: X = Av − Sv + nd, with Sv = log2(S/100). Every brightness
 * depends on X and the shutter alone, so settings with the same X are one case.
 */
export interface GridLens {
  /** position of the aperture minus position of the ISO, steps */
  readonly difference: number;
  readonly ndStops: number;
  readonly stops: number;
  /** 2^−X */
  readonly factor: number;
  /** the widest and the smallest aperture that go with it, positions */
  readonly widest: number;
  readonly smallest: number;
}

/** Every setting that a camera has, by marks. */
export interface CameraGrid {
  readonly scale: Scale;
  readonly steps: number;
  /** lowest and highest position; nothing between where highest is the lower one */
  readonly aperture: readonly [number, number];
  readonly iso: readonly [number, number];
  /** from slow to fast */
  readonly shutters: readonly GridShutter[];
  readonly lenses: readonly GridLens[];
}

function positions(kind: MarkedKind, scale: Scale, low: number, high: number): readonly [number, number] {
  return [Math.ceil(positionOf(kind, scale, low) - EDGE), Math.floor(positionOf(kind, scale, high) + EDGE)];
}

/** How a flash is fired at a shutter, and what that takes. */
function syncAt(camera: FillCamera, shutterS: number): { sync: SyncKind; lossStops: number } {
  if (!isFasterThanSync(shutterS, camera.syncSpeedS)) return { sync: 'normal', lossStops: 0 };
  if (camera.highSpeedSync === null) return { sync: 'none', lossStops: 0 };
  const { curtainS, extraLossStops } = camera.highSpeedSync;
  return { sync: 'highSpeed', lossStops: Math.log1p(curtainS / shutterS) / Math.LN2 + extraLossStops };
}

/** Naming a mark takes longer than anything else here; there are a few hundred of them. */
const named = new Map<string, Mark>();

function shutterAt(scale: Scale, position: number): Mark {
  const key = `${scale} ${position}`;
  const mark = named.get(key) ?? markAt('shutter', scale, position);
  named.set(key, mark);
  return mark;
}

function shuttersOf(camera: FillCamera): GridShutter[] {
  const { scale, shutterSlowestS, shutterFastestS } = camera;
  // The slowest time stands at the lowest position.
  const [low, high] = positions('shutter', scale, shutterSlowestS, shutterFastestS);
  const shutters: GridShutter[] = [];
  // Beyond the slowest marking a step is given in whole seconds, which may lie just within the limit, or just beyond.
  for (let position = low - 1; position <= high; position++) {
    const mark = shutterAt(scale, position);
    if (mark.exact > shutterSlowestS * (1 + EDGE)) continue;
    shutters.push({ step: position, mark, tv: -Math.log2(mark.exact), ...syncAt(camera, mark.exact) });
  }
  return shutters;
}

function lensesOf(
  aperture: readonly [number, number],
  iso: readonly [number, number],
  ndStops: readonly number[],
  steps: number,
): GridLens[] {
  const lenses: GridLens[] = [];
  for (const nd of new Set([0, ...ndStops]))
    for (let difference = aperture[0] - iso[1]; difference <= aperture[1] - iso[0]; difference++) {
      const stops = difference / steps + nd;
      const widest = Math.max(aperture[0], difference + iso[0]);
      const smallest = Math.min(aperture[1], difference + iso[1]);
      if (widest > smallest) continue;
      lenses.push({ difference, ndStops: nd, stops, factor: 2 ** -stops, widest, smallest });
    }
  return lenses;
}

/** A grid with the camera that it was made for. */
interface KnownGrid {
  readonly camera: FillCamera;
  readonly grid: CameraGrid;
}

function sameShutters(camera: FillCamera, { camera: was }: KnownGrid): boolean {
  return (
    camera.shutterSlowestS === was.shutterSlowestS &&
    camera.shutterFastestS === was.shutterFastestS &&
    camera.syncSpeedS === was.syncSpeedS &&
    camera.highSpeedSync === was.highSpeedSync
  );
}

const isSamePair = (a: readonly [number, number], b: readonly [number, number]) =>
  a[0] === b[0] && a[1] === b[1];

/**
 * All marks that lie within a camera's limits. Times beyond 30 s are the scale's steps in whole seconds.
 *
 * @param camera limits, filters, sync
 * @param before a grid of the same scale, of which what is the same is used again
 * @returns the grid; empty parts where a limit leaves no mark
 * @throws RangeError when a limit is no positive number
 * @example f/2.8 to f/4 in thirds: positions 9 to 12
 * @source ISO 516, ISO 517 and trade practice for the marks; derivation
 */
export function cameraGrid(camera: FillCamera, before?: KnownGrid): CameraGrid {
  const { scale } = camera;
  const steps = stepsPerStop(scale);
  const aperture = positions('aperture', scale, camera.apertureMin, camera.apertureMax);
  const iso = positions('iso', scale, camera.isoMin, camera.isoMax);
  const known = before?.camera.scale === scale ? before : undefined;
  const areLensesKnown =
    known !== undefined &&
    isSamePair(known.grid.aperture, aperture) &&
    isSamePair(known.grid.iso, iso) &&
    known.camera.ndStops === camera.ndStops;
  return {
    scale,
    steps,
    aperture,
    iso,
    shutters: known && sameShutters(camera, known) ? known.grid.shutters : shuttersOf(camera),
    lenses: areLensesKnown ? known.grid.lenses : lensesOf(aperture, iso, camera.ndStops, steps),
  };
}
