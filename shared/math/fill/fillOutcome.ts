import { sceneEv100, type ExactSettings } from '../exposure';
import { flashStops } from '../flashExposure';
import { flashPulse, tenthPeakS } from '../flashDuration';
import { ghostVisibility, stopsBelowFlash, throughStops } from '../ghost';
import { slowestHandheldS, stopsOverLimit } from '../handheld';
import { highSpeedSyncLossStops } from '../highSpeedSync';
import { addStops, ratioOfStops } from '../mixing';
import { blurOf, magnificationAt, type SensorView } from '../motionBlur';
import { missesOf, sizesOf } from './fillMisses';
import type { FillMotion, FillOutcome, FillSetup, SyncKind, UsedFlash } from './fillTypes';
import { pulseClipStops } from './pulseClip';

/** A trail shorter than this is none, and details this wide are looked for in it; as in the motion calculator. */
const TOLERANCE_PX = 1;
const DETAIL_PX = 10;
/** A time on the limit is within it; covers rounding. */
const ON_LIMIT_STOPS = 1e-9;
/** Key over fill is told up to this, so that a ratio stays a finite number. */
const WIDEST_RATIO_STOPS = 1000;

/** What one flash puts on the subject, and what the shutter took of it. */
interface Lit {
  readonly used: UsedFlash;
  readonly stops: number;
  readonly clipStops: number;
}

const sumOf = (stops: readonly number[]) => (stops.length === 0 ? null : addStops(stops));

function lightOf(used: UsedFlash, setup: FillSetup, settings: ExactSettings, sync: SyncKind): Lit {
  const { flash, power, distanceM } = used;
  const { aperture, iso, ndStops, shutterS } = settings;
  const lossStops = flash.lossStops + ndStops + (highSpeedLossOf(setup, settings, sync) ?? 0);
  const whole = flashStops(
    { guideNumberM: flash.guideNumberM, distanceM, aperture, iso, power },
    { lossStops },
  );
  const clipStops = sync === 'normal' ? pulseClipStops(flash, power, shutterS, setup.camera.shutCurtainS) : 0;
  return { used, stops: whole + clipStops, clipStops };
}

function highSpeedLossOf({ camera }: FillSetup, { shutterS }: ExactSettings, sync: SyncKind): number | null {
  if (sync !== 'highSpeed' || camera.highSpeedSync === null) return null;
  const { curtainS, extraLossStops } = camera.highSpeedSync;
  return highSpeedSyncLossStops(shutterS, curtainS, extraLossStops);
}

/** What the shutter takes from the sum of the pulses on the front, where any duration is known. */
function clippedOf(front: readonly Lit[], sync: SyncKind): number | null {
  if (sync !== 'normal' || !front.some(({ used }) => used.flash.t05S !== null)) return null;
  const through = addStops(front.map(({ stops }) => stops));
  return Math.min(0, through - addStops(front.map(({ stops, clipStops }) => stops - clipStops)));
}

function sensorOf({ view }: FillMotion): SensorView | null {
  if (view === null) return null;
  const { focalLengthMm, distanceM, pitchUm } = view;
  return {
    magnification: magnificationAt(focalLengthMm, distanceM),
    pitchUm,
    toleranceUm: TOLERANCE_PX * pitchUm,
  };
}

function ghostOf(
  motion: FillMotion,
  shutterS: number,
  lit: { flash: number; ambient: number; background: number },
): FillOutcome['ghost'] {
  const sensor = sensorOf(motion);
  if (sensor === null || motion.subject === null) return null;
  const trailPx = blurOf(motion.subject, shutterS, sensor).blurPx;
  const belowFlashStops = stopsBelowFlash(lit.flash, lit.ambient);
  return {
    stopsBelowFlash: belowFlashStops,
    trailPx,
    visibility: ghostVisibility({ belowFlashStops, trailPx, tolerancePx: TOLERANCE_PX, detailPx: DETAIL_PX }),
    throughStops: trailPx < TOLERANCE_PX ? null : throughStops(lit.background, trailPx, DETAIL_PX),
  };
}

/** How long the flash on the front burns, t0.1 of the slowest; null where one of them is not known. */
function flashTimeS(front: readonly Lit[]): number | null {
  let longestS = 0;
  for (const { used } of front) {
    const { t05S, control } = used.flash;
    if (t05S === null) return null;
    longestS = Math.max(longestS, tenthPeakS(flashPulse({ t05S }, { control, power: used.power })));
  }
  return front.length === 0 ? null : longestS;
}

function blurBy(motion: FillMotion, by: 'flash' | 'shutter', lightS: number | null): FillOutcome['blur'] {
  const sensor = sensorOf(motion);
  if (sensor === null || motion.subject === null || lightS === null) return null;
  return { ...blurOf(motion.subject, lightS, sensor), by, lightS };
}

/** Where the hand's limit is and how far the shutter is over it, where the camera is held. */
export function handheldOf({ view, handheld }: FillMotion, shutterS: number): FillOutcome['handheld'] {
  if (view === null || handheld === null) return null;
  const limitS = slowestHandheldS(view.focalLengthMm, view.cropFactor, handheld.stabilisationStops);
  const over = stopsOverLimit(shutterS, limitS);
  const withinLimit = over <= ON_LIMIT_STOPS;
  return { withinLimit, overStops: withinLimit ? 0 : over, limitS };
}

function recycleOf(used: readonly UsedFlash[]): number | null {
  const times = used.map(({ flash, power }) =>
    flash.recycleFullS === null ? null : flash.recycleFullS * power,
  );
  const known = times.filter((time) => time !== null);
  return known.length === 0 ? null : Math.max(...known);
}

const reserveOf = (used: readonly UsedFlash[]) =>
  used.length === 0 ? null : Math.min(...used.map(({ power }) => 0 - Math.log2(power)));

function ratioOf(key: number | null, fill: number | null): number | null {
  if (key === null || fill === null || Math.abs(key - fill) > WIDEST_RATIO_STOPS) return null;
  return ratioOfStops(key, fill);
}

/**
 * How a frame comes out: exposures add, so
 *
 * background = B − E, ambient on the subject a = A − E, E the settings' EV100; each flash by its guide number;
 * subject = log2(2^a + 2^key + 2^fill), shadow side = log2(2^a + 2^fill), (key + fill):fill = 1 + 2^(key − fill)
 *
 * The rim is by itself and does not count on the subject's front. In high-speed sync every flash loses
 * log2((T + t)/t) and more; in normal sync the open shutter may clip a pulse.
 *
 * @param setup scene, aim, camera and what is known of movement
 * @param settings exact settings
 * @param sync how the flashes are fired; `none` goes with no flashes
 * @param used the flashes in use with power and distance
 * @returns the outcome
 * @throws RangeError when a value is outside its domain
 * @example background 12, ambient one stop under it, EV100 12, key at −1: subject 0, shadow side −1
 * @source additivity of exposure and GN = N·d; project handbook, sections 5 and 10
 */
export function fillOutcome(
  setup: FillSetup,
  settings: ExactSettings,
  sync: SyncKind,
  used: readonly UsedFlash[],
): FillOutcome {
  const { scene, aim, motion } = setup;
  const { shutterS } = settings;
  const ev100 = sceneEv100(settings.aperture, shutterS, settings.iso, settings.ndStops);
  const lights = used.map((one) => lightOf(one, setup, settings, sync));
  const front = lights.filter((lit) => lit.used.flash.role !== 'rim');
  const sumOfRole = (role: string) =>
    sumOf(lights.filter((lit) => lit.used.flash.role === role).map(({ stops }) => stops));
  const [key, fill, rim] = [sumOfRole('key'), sumOfRole('fill'), sumOfRole('rim')];
  const flash = sumOf(front.map(({ stops }) => stops));
  const ambient = scene.subjectEv100 - ev100;
  const background = scene.backgroundEv100 - ev100;
  const lit = {
    backgroundStops: background,
    subjectStops: flash === null ? ambient : addStops([ambient, flash]),
    ratio: ratioOf(key, fill),
    rimStops: rim,
  };
  const misses = missesOf(lit, aim);
  const isFrozenByFlash = sync === 'normal' && flash !== null;
  return {
    ...lit,
    subjectAmbientStops: ambient,
    subjectFlashStops: flash,
    keyStops: key,
    fillStops: fill,
    shadowSideStops: key === null ? null : fill === null ? ambient : addStops([ambient, fill]),
    rimAmbientStops: scene.rimEv100 === null ? null : scene.rimEv100 - ev100,
    flashToAmbientStops: flash === null ? null : flash - ambient,
    clippedStops: clippedOf(front, sync),
    highSpeedLossStops: used.length === 0 ? null : highSpeedLossOf(setup, settings, sync),
    reserveStops: reserveOf(used),
    recycleS: recycleOf(used),
    ghost: isFrozenByFlash ? ghostOf(motion, shutterS, { flash, ambient, background }) : null,
    blur: isFrozenByFlash ? blurBy(motion, 'flash', flashTimeS(front)) : blurBy(motion, 'shutter', shutterS),
    handheld: handheldOf(motion, shutterS),
    misses,
    missStops: Math.max(...sizesOf(misses)),
    onSubjectStops: lights.map(({ stops }) => stops),
  };
}
