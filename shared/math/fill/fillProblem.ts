import { canDo } from './assignFlashes';
import { cameraGrid, type CameraGrid, type GridLens, type GridShutter } from './cameraGrid';
import { ABSENT_STOPS, countOf, mostAt } from './fillMisses';
import type { FillWish } from './fillTypes';
import { flashTables, type FlashTable, type FlashTables } from './flashLevels';
import type { FlashTask } from './flashMix';

/** More than any miss, in parts of 1/120 stop: light spans less than 500 stops. */
export const ANY_COUNT = 60_000;
/**
 * Misses in parts of 1/120 stop: the main ones, of background and subject, and those beside, of ratio and rim, which
 * may never cost the main ones anything.
 */
export interface MissLimits {
  readonly main: number;
  readonly beside: number;
}

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
  readonly tables: FlashTables;
  /** which parts of the aim the flashes could serve at all; the others are missed by every recipe alike */
  readonly parts: { readonly ratio: boolean; readonly rim: boolean };
}

/**
 * Lays out a request's marks and flashes.
 * @param before a problem like it, of which what is the same is used again
 */
export function fillProblem(wish: FillWish, before?: FillProblem): FillProblem {
  const has = (role: string) => wish.flashes.some((flash) => flash.role === role);
  const parts = {
    ratio: wish.aim.ratio !== null && has('key') && has('fill'),
    rim: wish.aim.rimStops !== null && has('rim'),
  };
  const flashes = parts.rim ? wish.flashes : wish.flashes.filter(({ role }) => role !== 'rim');
  const ratio = parts.ratio ? wish.aim.ratio : null;
  const isSameCamera = before?.wish.camera === wish.camera;
  const known = before && { camera: before.wish.camera, grid: before.grid };
  return {
    wish,
    grid: before && isSameCamera ? before.grid : cameraGrid(wish.camera, known),
    tables: flashTables(flashes, wish.camera.shutCurtainS, ratio, before?.tables),
    parts,
  };
}

/** How far the background comes out from its aim, stops. */
export function backgroundMiss({ wish }: FillProblem, lens: GridLens, shutter: GridShutter): number {
  return wish.scene.backgroundEv100 - wish.aim.backgroundStops - lens.stops - shutter.tv;
}

/** A case with what its flashes have to do, all in the light of the flash table: f/1, ISO 100, no filter. */
export function caseOf(problem: FillProblem, lens: GridLens, shutter: GridShutter): FillCase {
  const { wish, parts, tables } = problem;
  const { aim, scene } = wish;
  const lossFactor = 2 ** shutter.lossStops;
  const unit = lossFactor / lens.factor;
  return {
    lens,
    shutter,
    table: tables.at(shutter),
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
 * Whether a case keeps within misses.
 * @param flash what is allowed for the flashes where that is not the same
 */
export function isWithin(one: FillCase, most: MissLimits, flash = most): boolean {
  if (one.backgroundCount > most.main) return false;
  const { front, rim, table } = one;
  if (!canDo(table.front, front, { sum: flash.main, ratio: flash.beside })) return false;
  return rim === null || canDo(table.rim, rim, { sum: flash.beside, ratio: flash.beside });
}

/** The first shutter from a Tv on, in a list from slow to fast whose marks stand a step apart, but for a few at its slow end. */
function firstShutter(shutters: readonly GridShutter[], steps: number, tvLow: number): number {
  const last = shutters[shutters.length - 1]?.tv ?? 0;
  let first = Math.max(
    0,
    Math.min(shutters.length, shutters.length - 1 - Math.floor((last - tvLow) * steps)),
  );
  while (first > 0 && (shutters[first - 1]?.tv ?? 0) >= tvLow) first--;
  while (first < shutters.length && (shutters[first]?.tv ?? 0) < tvLow) first++;
  return first;
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
    for (let place = firstShutter(shutters, grid.steps, tv - room); place < shutters.length; place++) {
      const shutter = shutters[place];
      if (shutter === undefined || shutter.tv > tv + room) break;
      if (visit(lens, shutter, place)) return true;
    }
  }
  return false;
}

/**
 * Goes through the lenses and shutters that may keep within misses, each with the least misses that it can have: of the
 * background, of a subject which ambient light alone makes too bright or all flashes at full leave too dark; and
 * beside them of a ratio that no powers give, and of a rim that is too weak.
 *
 * @param most the misses that are allowed
 * @param visit what is done with a case; true ends the round
 * @returns whether a visit ended it
 */
export function someCase(
  problem: FillProblem,
  most: MissLimits,
  visit: (lens: GridLens, shutter: GridShutter, bound: MissLimits) => boolean,
): boolean {
  const { wish, parts } = problem;
  const factor = 2 ** Math.min(mostAt(most.main), MOST_ROOM_STOPS);
  const subject = 2 ** wish.aim.subjectStops;
  const ambient = 2 ** wish.scene.subjectEv100;
  const known: ShutterBounds[] = [];
  return someNearBackground(problem, most.main, (lens, shutter, place) => {
    const there = ambient * lens.factor * shutter.mark.exact;
    if (there > subject * factor) return false;
    const bounds = (known[place] ??= boundsAt(problem, shutter));
    const full = there + bounds.front * lens.factor;
    if (full * factor < subject) return false;
    let miss = Math.abs(backgroundMiss(problem, lens, shutter));
    if (there > subject) miss = Math.max(miss, Math.log2(there / subject));
    else if (full < subject) miss = Math.max(miss, Math.log2(subject / full));
    const main = countOf(miss);
    if (main > most.main) return false;
    const weak = Math.min(ABSENT_STOPS, (wish.aim.rimStops ?? 0) - Math.log2(bounds.rim * lens.factor));
    const beside = Math.max(bounds.ratio, parts.rim && weak > 0 ? countOf(weak) : 0);
    return beside <= most.beside && visit(lens, shutter, { main, beside });
  });
}

/** What bounds all cases with one shutter: the most of front and rim, and the least miss of the ratio. */
interface ShutterBounds {
  readonly front: number;
  readonly rim: number;
  readonly ratio: number;
}

function boundsAt({ tables }: FillProblem, shutter: GridShutter): ShutterBounds {
  const table = tables.at(shutter);
  const loss = 2 ** -shutter.lossStops;
  return { front: table.frontMost * loss, rim: table.rimMost * loss, ratio: table.ratioLeast ?? 0 };
}
