import { combinedEv100 } from './sceneModel';

/** A measured scene beside the natural light at that instant. */
export interface FrameReading {
  /** EV100 of the scene: the settings' and how much brighter than a middle tone it came out. */
  readonly sceneEv100: number;
  readonly naturalEv100: number;
  readonly areLampsOn: boolean;
  /** Standard deviation that the reading is given, stops, > 0. */
  readonly sigmaStops: number;
}

/** An offset and a lamp floor; EV100, null for no lamps. */
export interface OffsetAndFloor {
  readonly offsetStops: number;
  readonly floorEv100: number | null;
}

/** The model that fits the frames best, and how well they determine it. */
export interface SceneFit {
  readonly best: OffsetAndFloor;
  /** The lowest and the highest floor with which the frames' misfit stays within one standard deviation more. */
  readonly low: OffsetAndFloor;
  readonly high: OffsetAndFloor;
  /** Measured less modelled, stops, one a frame. */
  readonly misfitStops: readonly number[];
}

/** Floors are looked for from so far below the darkest frame, where they would not show, up to it. */
const DEEPEST_STOPS = 14;
const GRID_STOPS = 0.25;

/** Sums of squares that differ by less are the same: then there are no lamps. */
const EQUAL_COST = 1e-9;

/**
 * Offset and lamp floor by least squares in stops.
 *
 * min over o, F of Σ ((log2(2^(n + o) + on·2^F) − s) / σ)²; a floor is only sought where two frames or more could show
 * one, and no frame is darker than the lamps alone.
 *
 * @param frames s, n, on and σ of each, at least one
 * @param givenFloorEv100 F where the caller knows it; undefined to seek it
 * @returns the best model, the range of floors that do nearly as well, and the misfits
 * @throws RangeError when there is no frame
 * @example fitScene([{ sceneEv100: 5, naturalEv100: 4, areLampsOn: true, sigmaStops: 0.2 }]).best.offsetStops // 1
 * @source least squares, derivation
 */
export function fitScene(frames: readonly FrameReading[], givenFloorEv100?: number): SceneFit {
  if (frames.length === 0) throw new RangeError('a fit of at least one frame');
  if (givenFloorEv100 !== undefined)
    return fitOf(frames, [givenFloorEv100, givenFloorEv100, givenFloorEv100]);
  const canShow = frames.length > 1 && frames.some((frame) => frame.areLampsOn);
  return fitOf(frames, canShow ? soughtFloors(frames) : [null, null, null]);
}

type Floor = number | null;

function fitOf(
  frames: readonly FrameReading[],
  floors: readonly [best: Floor, low: Floor, high: Floor],
): SceneFit {
  const [best, low, high] = floors.map((floorEv100) => ({
    offsetStops: bestOffset(frames, floorEv100),
    floorEv100,
  })) as [OffsetAndFloor, OffsetAndFloor, OffsetAndFloor];
  const misfitStops = frames.map(
    (frame) => frame.sceneEv100 - modelled(frame, best.offsetStops, best.floorEv100),
  );
  return { best, low, high, misfitStops };
}

/** The floor of least squares, and the lowest and highest that do nearly as well; null: no lamps. */
function soughtFloors(frames: readonly FrameReading[]): [best: Floor, low: Floor, high: Floor] {
  const bare = chiSquare(frames, null);
  const grid = floorGrid(frames);
  const costs = grid.map((floor) => chiSquare(frames, floor));
  const lowest = costs.indexOf(Math.min(...costs));
  const found = goldenMinimum(
    (floor) => chiSquare(frames, floor),
    grid[Math.max(0, lowest - 1)] ?? NaN,
    grid[Math.min(grid.length - 1, lowest + 1)] ?? NaN,
  );
  const atFound = chiSquare(frames, found);
  const least = Math.min(bare, atFound);
  const isBare = bare <= atFound + EQUAL_COST;
  const near = grid.filter((_, index) => (costs[index] ?? Infinity) <= least + 1);
  if (!isBare) near.push(found);
  return [
    isBare ? null : found,
    bare <= least + 1 ? null : Math.min(...near),
    near.length === 0 ? null : Math.max(...near),
  ];
}

function modelled(frame: FrameReading, offsetStops: number, floorEv100: number | null): number {
  return combinedEv100(frame.naturalEv100, offsetStops, frame.areLampsOn ? floorEv100 : null);
}

/** Σ (misfit/σ)² with the offset that suits the floor best. */
function chiSquare(frames: readonly FrameReading[], floorEv100: number | null): number {
  return chiSquareAt(frames, bestOffset(frames, floorEv100), floorEv100);
}

function chiSquareAt(
  frames: readonly FrameReading[],
  offsetStops: number,
  floorEv100: number | null,
): number {
  let sum = 0;
  for (const frame of frames) {
    const misfit = (frame.sceneEv100 - modelled(frame, offsetStops, floorEv100)) / frame.sigmaStops;
    sum += misfit * misfit;
  }
  return sum;
}

/**
 * The offset for a floor.
 *
 * Gauss and Newton: o ← o + Σ w·r/σ² / Σ w²/σ², r the misfit, w = dm/do the sky's share of a frame's light; from above,
 * where the shares are largest, with steps of at most two stops. Without lamps every share is 1: one step.
 */
function bestOffset(frames: readonly FrameReading[], floorEv100: number | null): number {
  const differences = frames.map((frame) => frame.sceneEv100 - frame.naturalEv100);
  const least = Math.min(...differences) - DEEPEST_STOPS;
  let offset = Math.max(...differences);
  for (let round = 0; round < 60; round += 1) {
    let [pull, grip] = [0, 0];
    for (const frame of frames) {
      const model = modelled(frame, offset, floorEv100);
      const share = 2 ** (frame.naturalEv100 + offset - model);
      const weight = share / (frame.sigmaStops * frame.sigmaStops);
      pull += weight * (frame.sceneEv100 - model);
      grip += weight * share;
    }
    const step = Math.max(-2, Math.min(2, pull / grip));
    if (!(Math.abs(step) > 1e-10)) break;
    offset = Math.max(least, offset + step);
    if (offset === least) break;
  }
  return offset;
}

function floorGrid(frames: readonly FrameReading[]): number[] {
  const lit = frames.filter((frame) => frame.areLampsOn).map((frame) => frame.sceneEv100);
  const darkest = Math.min(...lit);
  // A floor may lie a little over the darkest reading, whose error is as likely either way.
  const count = Math.ceil((DEEPEST_STOPS + 1) / GRID_STOPS);
  return Array.from({ length: count + 1 }, (_, index) => darkest - DEEPEST_STOPS + index * GRID_STOPS);
}

/** The lowest point of a valley, by golden section: to 1e-7 stop. */
function goldenMinimum(cost: (x: number) => number, from: number, to: number): number {
  const golden = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [from, to];
  let [left, right] = [high - golden * (high - low), low + golden * (high - low)];
  let [atLeft, atRight] = [cost(left), cost(right)];
  while (high - low > 1e-7) {
    if (atLeft <= atRight) {
      [high, right, atRight] = [right, left, atLeft];
      left = high - golden * (high - low);
      atLeft = cost(left);
    } else {
      [low, left, atLeft] = [left, right, atRight];
      right = low + golden * (high - low);
      atRight = cost(right);
    }
  }
  return (low + high) / 2;
}
