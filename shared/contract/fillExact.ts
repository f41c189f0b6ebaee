import { sceneEv100 } from '../math/exposure';
import type {
  FillAim,
  FillCamera,
  FillFlash,
  FillMotion,
  FillScene,
  FillSetup,
  FillWish,
  UsedFlash,
} from '../math/fill/fillTypes';
import type { FillCheckIn, FillRecipesIn } from './fillIn';
import { guideNumberOf } from './flashIn';
import { exactHighSpeedSync } from './highSpeedSyncIn';
import { placeOf } from './placeIn';
import { exactOf, exactSettings, type Reading } from './settings';

/** Pixels across a sensor where nobody said. Common practice, no source. */
const USUAL_IMAGE_WIDTH_PX = 6000;
/** Steps typed as 0.33 or 0.67 mean thirds. */
const MEANT_THIRD = 0.004;

type Given = FillRecipesIn | FillCheckIn;

function backgroundEv100({ background }: Given, reading: Reading): number {
  if (background.testFrame === undefined) return background.ev100 ?? 0;
  const { aperture, shutterS, iso, ndStops } = exactSettings(background.testFrame, reading);
  return sceneEv100(aperture, shutterS, iso, ndStops) + background.testFrame.offsetStops;
}

/** The light that is there. */
export function fillScene(given: Given): FillScene {
  const background = backgroundEv100(given, given);
  const of = (ambient: { ev100?: number; belowBackgroundStops?: number }) =>
    ambient.ev100 ?? background - (ambient.belowBackgroundStops ?? 0);
  return {
    backgroundEv100: background,
    subjectEv100: of(given.subjectAmbient),
    rimEv100: given.rimAmbient === undefined ? null : of(given.rimAmbient),
  };
}

function fillAim({ aim }: Given): FillAim {
  return {
    backgroundStops: aim.backgroundStops,
    subjectStops: aim.subjectStops,
    ratio: aim.ratio ?? null,
    rimStops: aim.rimStops ?? null,
  };
}

function fillMotion({ view, subject, support }: Given): FillMotion {
  const cropFactor = view?.cropFactor ?? support?.cropFactor ?? 1;
  const pitchUm = view?.pixelPitchUm ?? 36_000 / cropFactor / USUAL_IMAGE_WIDTH_PX;
  const { kind, stabilisationStops } = support ?? { kind: 'tripod', stabilisationStops: 0 };
  return {
    view: view ? { focalLengthMm: view.focalLengthMm, distanceM: view.distanceM, pitchUm, cropFactor } : null,
    subject: subject ?? null,
    handheld: kind === 'handheld' ? { stabilisationStops } : null,
  };
}

function syncOf({ camera, ...reading }: Given) {
  const syncSpeedS = exactOf('shutter', camera.syncSpeed, reading);
  return {
    syncSpeedS,
    highSpeedSync: camera.highSpeedSync ? exactHighSpeedSync(camera.highSpeedSync, syncSpeedS) : null,
    // A curtain that was assumed for the energy model says nothing about how long the frame is wholly open.
    shutCurtainS: camera.highSpeedSync?.curtainS ?? 0,
  };
}

/** A step that is written as 0.333 means a third. */
export const stepOf = (step: number) => {
  const third = Math.round(step * 3) / 3;
  return third > 0 && Math.abs(step - third) < MEANT_THIRD ? third : step;
};

/** A request for recipes as exact numbers. */
export function fillWish(given: FillRecipesIn): FillWish {
  const { camera } = given;
  const exactCamera: FillCamera = {
    scale: given.scale,
    apertureMin: exactOf('aperture', camera.apertureMin, given),
    apertureMax: exactOf('aperture', camera.apertureMax, given),
    isoMin: exactOf('iso', camera.isoMin, given),
    isoMax: exactOf('iso', camera.isoMax, given),
    shutterSlowestS: exactOf('shutter', camera.shutterSlowest, given),
    shutterFastestS: exactOf('shutter', camera.shutterFastest, given),
    ...syncOf(given),
    ndStops: camera.ndStops ?? [],
  };
  return {
    scene: fillScene(given),
    aim: fillAim(given),
    camera: exactCamera,
    motion: fillMotion(given),
    flashes: given.flashes.map((flash): FillFlash => ({
      ...flashOf(flash),
      minPower: exactOf('power', flash.minPower, given),
      powerStepStops: stepOf(flash.powerStep),
      ...placeOf(flash),
    })),
    prefer: given.prefer ?? null,
    count: given.count,
  };
}

type SetFlash = FillCheckIn['flashes'][number];
type AnyFlash = FillRecipesIn['flashes'][number] | SetFlash;

function flashOf(flash: AnyFlash) {
  const { name, role, guideNumberM, lossStops, t05S = null, control, recycleFullS = null } = flash;
  return { name, role, guideNumberM: guideNumberOf(guideNumberM), lossStops, t05S, control, recycleFullS };
}

/** Settings to be worked out forward: the setup, and the flashes as they are set. */
export function fillGiven(given: FillCheckIn): { readonly setup: FillSetup; readonly used: UsedFlash[] } {
  const anything = { apertureMin: 0.5, apertureMax: 256, isoMin: 1, isoMax: 1e7 };
  const times = { shutterSlowestS: 86_400, shutterFastestS: 1e-6 };
  const camera: FillCamera = { scale: given.scale, ...anything, ...times, ...syncOf(given), ndStops: [] };
  const used = given.flashes.map((flash): UsedFlash => {
    const power = exactOf('power', flash.power, given);
    const { distanceM } = flash;
    const range = { minPower: power, powerStepStops: stepOf(flash.powerStep) };
    return { flash: { ...flashOf(flash), ...range, nearM: distanceM, farM: distanceM }, power, distanceM };
  });
  return { setup: { scene: fillScene(given), aim: fillAim(given), camera, motion: fillMotion(given) }, used };
}
