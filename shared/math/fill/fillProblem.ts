import { assignWithin, leastCount, type FlashTask } from './assignFlashes';
import { cameraGrid, type CameraGrid, type GridLens, type GridShutter } from './cameraGrid';
import { ABSENT_STOPS, countOf, mostAt } from './fillMisses';
import type { FillWish } from './fillTypes';
import { flashTables, type FlashTable } from './flashLevels';

/** More than any miss, in parts of 1/120 stop: light spans less than 500 stops. */
export const ANY_COUNT = 60_000;
/** Two to this is still a finite number beside light of any strength. */
const MOST_ROOM_STOPS = 500;

/** A lens case with a shutter: everything but which of the equal apertures and speeds is taken. */
export interface FillCase {
  readonly lens: GridLens;
  readonly shutter: GridShutter;
  readonly table: FlashTable;
  readonly front: FlashTask;
  readonly rim: FlashTask | null;
  /** how far the background is off; parts of 1/120 stop */
  readonly backgroundCount: number;
}

/** A request with its marks laid out. */
export interface FillProblem {
  readonly wish: FillWish;
  readonly grid: CameraGrid;
  readonly tableAt: (shutter: GridShutter) => FlashTable;
  /** which parts of the aim the flashes could serve at all; the others are missed by every recipe alike */
  readonly parts: { readonly ratio: boolean; readonly rim: boolean };
}

/**
 * Lays out a request's marks and flashes.
 * @param before a problem like it, of which what is the same is used again
 */
export function fillProblem(wish: FillWish, before?: FillProblem): FillProblem {
  const has = (role: string) => wish.flashes.some((flash) => flash.role === role);
  const flashes = wish.flashes.filter(({ role }) => role !== 'rim' || wish.aim.rimStops !== null);
  const isSameCamera = before?.wish.camera === wish.camera;
  const isSameRim = (before?.wish.aim.rimStops === null) === (wish.aim.rimStops === null);
  const isSameFlash =
    before?.wish.flashes === wish.flashes &&
    before.wish.camera.shutCurtainS === wish.camera.shutCurtainS &&
    isSameRim;
  return {
    wish,
    grid: before && isSameCamera ? before.grid : cameraGrid(wish.camera, before?.grid.shutters),
    tableAt: before && isSameFlash ? before.tableAt : flashTables(flashes, wish.camera),
    parts: {
      ratio: wish.aim.ratio !== null && has('key') && has('fill'),
      rim: wish.aim.rimStops !== null && has('rim'),
    },
  };
}

/** How far the background comes out from its aim, stops. */
export function backgroundMiss({ wish }: FillProblem, lens: GridLens, shutter: GridShutter): number {
  return wish.scene.backgroundEv100 - wish.aim.backgroundStops - lens.stops - shutter.tv;
}

/** A case with what its flashes have to do, all in the light of the flash table: f/1, ISO 100, no filter. */
export function caseOf(problem: FillProblem, lens: GridLens, shutter: GridShutter): FillCase {
  const { wish, parts, tableAt } = problem;
  const { aim, scene } = wish;
  const lossFactor = 2 ** shutter.lossStops;
  const unit = lossFactor / lens.factor;
  return {
    lens,
    shutter,
    table: tableAt(shutter),
    front: {
      ambient: 2 ** scene.subjectEv100 * shutter.mark.exact * lossFactor,
      wished: 2 ** aim.subjectStops * unit,
      ratio: parts.ratio ? aim.ratio : null,
      isNeeded: false,
    },
    rim:
      parts.rim && aim.rimStops !== null
        ? { ambient: 0, wished: 2 ** aim.rimStops * unit, ratio: null, isNeeded: true }
        : null,
    backgroundCount: countOf(backgroundMiss(problem, lens, shutter)),
  };
}

/**
 * Whether a case keeps its background within a miss of so many parts, and its flashes front and rim.
 * @param flashCount what is allowed for front and rim where that is not the same
 */
export function isWithin(one: FillCase, count: number, flashCount = count): boolean {
  return one.backgroundCount <= count && areFlashesWithin(one, flashCount);
}

/** Whether the flashes of a case keep front and rim within a miss of so many parts. */
export function areFlashesWithin(one: FillCase, flashCount: number): boolean {
  if (assignWithin(one.table.front, one.front, flashCount) === null) return false;
  return one.rim === null || assignWithin(one.table.rim, one.rim, flashCount) !== null;
}

/** The least misses of front and rim; parts of 1/120 stop; null where one of them is over the limit. */
export function leastCounts(one: FillCase, limit: number): { front: number; rim: number } | null {
  const front = leastCount(one.table.front, one.front, 0, limit);
  if (front === null) return null;
  const rim = one.rim === null ? 0 : leastCount(one.table.rim, one.rim, 0, limit);
  return rim === null ? null : { front, rim };
}

/** Where the shutters from one Tv to another begin and end in a list that runs from slow to fast. */
export function shutterRange(
  shutters: readonly GridShutter[],
  tvLow: number,
  tvHigh: number,
): [number, number] {
  let [first, last] = [0, shutters.length];
  while (first < last) {
    const middle = (first + last) >> 1;
    if ((shutters[middle]?.tv ?? 0) < tvLow) first = middle + 1;
    else last = middle;
  }
  let end = first;
  while (end < shutters.length && (shutters[end]?.tv ?? 0) <= tvHigh) end++;
  return [first, end];
}

/**
 * Goes through the lenses and shutters that keep the background within a miss.
 *
 * @param count the miss; parts of 1/120 stop
 * @param visit what is done with each; true ends the round
 * @returns whether a visit ended it
 */
export function someNearBackground(
  problem: FillProblem,
  count: number,
  visit: (lens: GridLens, shutter: GridShutter, place: number) => boolean,
): boolean {
  const { grid, wish } = problem;
  const { shutters, lenses } = grid;
  const wished = wish.scene.backgroundEv100 - wish.aim.backgroundStops;
  const room = mostAt(count);
  for (const lens of lenses) {
    const tv = wished - lens.stops;
    const [first, end] = shutterRange(shutters, tv - room, tv + room);
    for (let place = first; place < end; place++) {
      const shutter = shutters[place];
      if (shutter !== undefined && visit(lens, shutter, place)) return true;
    }
  }
  return false;
}

/**
 * Goes through the lenses and shutters that may keep within a miss, each with the least miss that it can have: that of
 * the background, that of a subject which ambient light alone makes too bright or all flashes at full leave too dark,
 * and the same for the rim.
 *
 * @param count the miss; parts of 1/120 stop
 * @param visit what is done with a case; true ends the round
 * @returns whether a visit ended it
 */
export function someCase(
  problem: FillProblem,
  count: number,
  visit: (lens: GridLens, shutter: GridShutter, bound: number) => boolean,
): boolean {
  const { wish, parts, tableAt } = problem;
  const room = mostAt(count);
  const factor = 2 ** Math.min(room, MOST_ROOM_STOPS);
  const subject = 2 ** wish.aim.subjectStops;
  const ambient = 2 ** wish.scene.subjectEv100;
  const rim = parts.rim && room < ABSENT_STOPS ? 2 ** (wish.aim.rimStops ?? 0) : 0;
  const known: { front: number; rim: number }[] = [];
  const mostAtShutter = (place: number, shutter: GridShutter) => {
    const table = tableAt(shutter);
    const loss = 2 ** -shutter.lossStops;
    return (known[place] ??= { front: (table.keyMost + table.fillMost) * loss, rim: table.rimMost * loss });
  };
  return someNearBackground(problem, count, (lens, shutter, place) => {
    const there = ambient * lens.factor * shutter.mark.exact;
    if (there > subject * factor) return false;
    const most = mostAtShutter(place, shutter);
    const full = there + most.front * lens.factor;
    if (full * factor < subject || most.rim * lens.factor * factor < rim) return false;
    let miss = Math.abs(backgroundMiss(problem, lens, shutter));
    if (there > subject) miss = Math.max(miss, Math.log2(there / subject));
    else if (full < subject) miss = Math.max(miss, Math.log2(subject / full));
    const bound = countOf(miss);
    return bound <= count && visit(lens, shutter, bound);
  });
}
