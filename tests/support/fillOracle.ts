import { clippedBy, flashPulse } from '../../shared/math/flashDuration';
import type { ExactSettings } from '../../shared/math/exposure';
import type { FillFlash, FillWish, SyncKind, UsedFlash } from '../../shared/math/fill/fillTypes';
import { markAt, type MarkedKind, type Scale } from '../../shared/math/marks';

/**
 * Goes through every combination of marks, filters and powers of a request, and nothing cleverer: the oracle for the
 * search by bounds. Light is counted in plain factors of a middle tone.
 */

const ROOM = 1 + 1e-9;

/** All marks that any limit of these tests could allow, made once, as naming them takes long. */
const allMarks = new Map<string, [number, number][]>();

function marksOf(scale: Scale, kind: MarkedKind): [number, number][] {
  const known = allMarks.get(`${scale} ${kind}`);
  if (known) return known;
  const made = Array.from({ length: 181 }, (_, i): [number, number] => [
    markAt(kind, scale, i - 60).exact,
    i - 60,
  ]);
  allMarks.set(`${scale} ${kind}`, made);
  return made;
}

const marksBetween = (wish: FillWish, kind: MarkedKind, low: number, high: number) =>
  marksOf(wish.camera.scale, kind).filter(([exact]) => exact >= low / ROOM && exact <= high * ROOM);

/** Every setting of the camera. */
export function everySetting(
  wish: FillWish,
): { settings: ExactSettings; positions: [number, number, number] }[] {
  const { camera } = wish;
  const shutters = marksBetween(wish, 'shutter', camera.shutterFastestS, camera.shutterSlowestS);
  const isos = marksBetween(wish, 'iso', camera.isoMin, camera.isoMax);
  return marksBetween(wish, 'aperture', camera.apertureMin, camera.apertureMax).flatMap(([aperture, a]) =>
    isos.flatMap(([iso, s]) =>
      shutters.flatMap(([shutterS, t]) =>
        [...new Set([0, ...camera.ndStops])].map((ndStops) => ({
          settings: { aperture, shutterS, iso, ndStops },
          positions: [a, t, s] as [number, number, number],
        })),
      ),
    ),
  );
}

export function syncOf({ camera }: FillWish, shutterS: number): SyncKind {
  if (shutterS * ROOM >= camera.syncSpeedS) return 'normal';
  return camera.highSpeedSync ? 'highSpeed' : 'none';
}

/** Every way to set a flash, off first, each with its light on the subject in factors of a middle tone. */
export function everyPower(
  wish: FillWish,
  flash: FillFlash,
  settings: ExactSettings,
  distancesM: readonly number[] = [flash.nearM],
): { light: number; used: UsedFlash | null }[] {
  const sync = syncOf(wish, settings.shutterS);
  const ways: { light: number; used: UsedFlash | null }[] = [{ light: 0, used: null }];
  if (sync === 'none') return ways;
  const { aperture, shutterS, iso, ndStops } = settings;
  const { highSpeedSync, shutCurtainS } = wish.camera;
  for (let k = 400; k >= 0; k--) {
    const power = 2 ** -(k * flash.powerStepStops);
    if (power < flash.minPower / ROOM) continue;
    let stops = Math.log2(power) + Math.log2(iso / 100) - flash.lossStops - ndStops;
    if (sync === 'highSpeed' && highSpeedSync)
      stops -= Math.log2((highSpeedSync.curtainS + shutterS) / shutterS) + highSpeedSync.extraLossStops;
    if (sync === 'normal' && flash.t05S !== null) {
      const pulse = flashPulse({ t05S: flash.t05S }, { control: flash.control, power });
      stops += shutterS > shutCurtainS ? clippedBy(pulse, shutterS, shutCurtainS).clippedStops : -60;
    }
    for (const distanceM of distancesM) {
      const reach = 2 * Math.log2(flash.guideNumberM / (aperture * distanceM));
      ways.push({ light: 2 ** (stops + reach), used: { flash, power, distanceM } });
    }
  }
  return ways;
}

/** One way to set several flashes, with the light of key and fill. */
export interface Combination {
  readonly key: number;
  readonly fill: number;
  readonly used: readonly UsedFlash[];
}

/** Every way to set several flashes together, none of them first. */
export function everyCombination(
  wish: FillWish,
  flashes: readonly FillFlash[],
  settings: ExactSettings,
  distancesOf: DistancesOf = ({ nearM }) => [nearM],
): Combination[] {
  let all: Combination[] = [{ key: 0, fill: 0, used: [] }];
  for (const flash of flashes) {
    const ways = everyPower(wish, flash, settings, distancesOf(flash));
    all = all.flatMap(({ key, fill, used }) =>
      ways.map((way) => ({
        key: flash.role === 'fill' ? key : key + way.light,
        fill: flash.role === 'fill' ? fill + way.light : fill,
        used: way.used ? [...used, way.used] : used,
      })),
    );
  }
  return all;
}

export type DistancesOf = (flash: FillFlash) => readonly number[];

/** What a request is judged by at one setting of the camera. */
export interface Judge {
  readonly backgroundMiss: number;
  /** ambient light on the subject, factor of a middle tone */
  readonly ambient: number;
  readonly front: (one: Combination) => number;
  readonly rim: (one: Combination) => number;
}

export function judgeOf(wish: FillWish, { aperture, shutterS, iso, ndStops }: ExactSettings): Judge {
  const { scene, aim } = wish;
  const has = (role: string) => wish.flashes.some((flash) => flash.role === role);
  const ratio = aim.ratio !== null && has('key') && has('fill') ? aim.ratio : null;
  const ev = Math.log2((aperture * aperture) / shutterS) - Math.log2(iso / 100) + ndStops;
  const ambient = 2 ** (scene.subjectEv100 - ev);
  return {
    backgroundMiss: scene.backgroundEv100 - ev - aim.backgroundStops,
    ambient,
    front: ({ key, fill }) => {
      const subject = Math.abs(Math.log2(ambient + key + fill) - aim.subjectStops);
      if (ratio === null) return subject;
      const off = key > 0 && fill > 0 ? Math.abs(Math.log2(1 + key / fill) - Math.log2(ratio)) : 10;
      return Math.max(subject, Math.min(10, off));
    },
    rim: ({ key }) => (key > 0 ? Math.min(10, Math.abs(Math.log2(key) - (aim.rimStops ?? 0))) : 10),
  };
}

export const frontOf = ({ flashes }: FillWish) => flashes.filter(({ role }) => role !== 'rim');

export const rimsOf = ({ flashes, aim }: FillWish) =>
  aim.rimStops === null ? [] : flashes.filter(({ role }) => role === 'rim');

/** The least of the largest misses at one setting of the camera; parts that no flash could serve don't count. */
export function missAt(wish: FillWish, settings: ExactSettings, distancesOf?: DistancesOf): number {
  const judge = judgeOf(wish, settings);
  const least = (flashes: readonly FillFlash[], miss: (one: Combination) => number) =>
    Math.min(...everyCombination(wish, flashes, settings, distancesOf).map(miss));
  const rims = rimsOf(wish);
  return Math.max(
    Math.abs(judge.backgroundMiss),
    least(frontOf(wish), judge.front),
    rims.length === 0 ? 0 : least(rims, judge.rim),
  );
}

/** The least of the largest misses over every combination, stops. */
export function leastMissOf(wish: FillWish, distancesOf?: DistancesOf): number {
  let least = Infinity;
  for (const { settings } of everySetting(wish)) {
    // A background that is off by more can't be part of a better combination.
    if (Math.abs(judgeOf(wish, settings).backgroundMiss) >= least) continue;
    least = Math.min(least, missAt(wish, settings, distancesOf));
  }
  return least;
}

/** Whether any combination keeps every part within a miss, `isMet` of its stops. */
export function isMetBy(wish: FillWish, isMet: (stops: number) => boolean): boolean {
  return everySetting(wish).some(
    ({ settings }) =>
      isMet(Math.abs(judgeOf(wish, settings).backgroundMiss)) && isMet(missAt(wish, settings)),
  );
}
