import { clippedBy, flashPulse } from '../../shared/math/flashDuration';
import type { ExactSettings } from '../../shared/math/exposure';
import { countOf } from '../../shared/math/fill/fillMisses';
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
function everyPower(
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

/** What a request is judged by at one setting of the camera; misses in stops, without their signs. */
export interface Judge {
  readonly background: number;
  /** ambient light on the subject, factor of a middle tone */
  readonly ambient: number;
  readonly subject: (one: Combination) => number;
  /** 0 where no ratio is wished or there are not both key and fill */
  readonly ratio: (one: Combination) => number;
  readonly rim: (one: Combination) => number;
}

export function judgeOf(wish: FillWish, { aperture, shutterS, iso, ndStops }: ExactSettings): Judge {
  const { scene, aim } = wish;
  const has = (role: string) => wish.flashes.some((flash) => flash.role === role);
  const wished = aim.ratio !== null && has('key') && has('fill') ? aim.ratio : null;
  const ev = Math.log2((aperture * aperture) / shutterS) - Math.log2(iso / 100) + ndStops;
  const ambient = 2 ** (scene.subjectEv100 - ev);
  return {
    background: Math.abs(scene.backgroundEv100 - ev - aim.backgroundStops),
    ambient,
    subject: ({ key, fill }) => Math.abs(Math.log2(ambient + key + fill) - aim.subjectStops),
    ratio: ({ key, fill }) => {
      if (wished === null) return 0;
      return key > 0 && fill > 0 ? Math.min(10, Math.abs(Math.log2(1 + key / fill) - Math.log2(wished))) : 10;
    },
    rim: ({ key }) => (key > 0 ? Math.min(10, Math.abs(Math.log2(key) - (aim.rimStops ?? 0))) : 10),
  };
}

export const frontOf = ({ flashes }: FillWish) => flashes.filter(({ role }) => role !== 'rim');

export const rimsOf = ({ flashes, aim }: FillWish) =>
  aim.rimStops === null ? [] : flashes.filter(({ role }) => role === 'rim');

/** Misses over every combination, in parts of 1/120 stop as the solver counts them. */
export interface OracleMisses {
  /** the least of the larger of background and subject */
  readonly main: number;
  /** with those within half a step, the least of the larger of ratio and rim; 0 where they can't be */
  readonly beside: number;
  /** where all are within half a step, the least of the largest; else half a step */
  readonly near: number;
}

export function leastMissesOf(wish: FillWish, onAim: number, distancesOf?: DistancesOf): OracleMisses {
  let [main, beside, near] = [Infinity, Infinity, Infinity];
  const rims = rimsOf(wish);
  for (const { settings } of everySetting(wish)) {
    const judge = judgeOf(wish, settings);
    const background = countOf(judge.background);
    // A background that is off by more can't be part of a better combination.
    if (background > Math.max(main, onAim)) continue;
    const rim =
      rims.length === 0
        ? 0
        : Math.min(
            ...everyCombination(wish, rims, settings, distancesOf).map((one) => countOf(judge.rim(one))),
          );
    for (const one of everyCombination(wish, frontOf(wish), settings, distancesOf)) {
      const mainHere = Math.max(background, countOf(judge.subject(one)));
      main = Math.min(main, mainHere);
      if (mainHere > onAim) continue;
      const besideHere = Math.max(rim, countOf(judge.ratio(one)));
      beside = Math.min(beside, besideHere);
      near = Math.min(near, Math.max(mainHere, besideHere));
    }
  }
  return { main, beside: main > onAim ? 0 : beside, near: Math.min(near, onAim) };
}

/** Whether any combination keeps every part within a miss; parts of 1/120 stop. */
export function isMetBy(wish: FillWish, onAim: number): boolean {
  const rims = rimsOf(wish);
  return everySetting(wish).some(({ settings }) => {
    const judge = judgeOf(wish, settings);
    if (countOf(judge.background) > onAim) return false;
    const isFrontMet = everyCombination(wish, frontOf(wish), settings).some(
      (one) => countOf(judge.subject(one)) <= onAim && countOf(judge.ratio(one)) <= onAim,
    );
    if (!isFrontMet || rims.length === 0) return isFrontMet;
    return everyCombination(wish, rims, settings).some((one) => countOf(judge.rim(one)) <= onAim);
  });
}
