import { sceneEv100 } from '../exposure';
import { SUNRISE_DEG } from '../sunAltitudes';
import { fitScene, type FrameReading, type SceneFit } from './fitScene';
import type { LadderFrame, LadderInput, LadderNote } from './ladderTypes';
import type { NaturalLight } from './naturalLight';
import { areLampsOn, type LampTimes } from './sceneModel';

/** A reading is to the nearest third of a stop: half of that either way. A modelling choice. */
const READING_SIGMA_STOPS = 1 / 6;

/** Before sunset the horizontal light says little of the sky that a frame shows: two stops. A modelling choice. */
const BEFORE_SUNSET_STOPS = 2;

/** How well a clear sky's model tells the rest of an evening, from one frame and from several. Modelling choices. */
const SPREAD_OF_ONE_STOPS = 0.5;
const SPREAD_OF_SEVERAL_STOPS = 0.25;

/** Brighter by more than this on a sky that fell by more than this is no reading error. */
const NOTICEABLE_STOPS = 0.25;

/** An offset beyond this is more likely a wrong clock or place than a scene. */
const BELIEVABLE_OFFSET_STOPS = 3;

/** What the frames tell. */
export interface FramesRead {
  readonly fit: SceneFit;
  readonly lamps: LampTimes | null;
  readonly spreadStops: number;
  readonly notes: readonly LadderNote[];
}

/**
 * What the test frames tell of the scene: the model, its spread, and what is doubtful in it.
 *
 * @param input frames, and lamps where the caller knows them
 * @param light sky and moon over a span that holds the frames
 * @returns fit, lamp times, spread and notes
 * @throws RangeError when there is no frame
 * @example readFrames({ frames: [frame], ... }, light).fit.best.offsetStops
 * @source `fitScene`; spreads and thresholds are modelling choices
 */
export function readFrames(
  input: Pick<LadderInput, 'frames' | 'lampFloorEv100' | 'lamps'>,
  light: NaturalLight,
): FramesRead {
  const notes: LadderNote[] = [];
  const cameOnMs = input.lamps ? null : whenLampsCameOn(input.frames, light);
  const lamps = input.lamps ?? (cameOnMs === null ? null : { onMs: cameOnMs });
  const isBeforeSunset = input.frames.map((frame) => light.sunAltitudeAt(frame.atMs) > SUNRISE_DEG);
  const readings: FrameReading[] = input.frames.map((frame, index) => ({
    sceneEv100: evOfFrame(frame),
    naturalEv100: light.ev100At(frame.atMs),
    areLampsOn: areLampsOn(lamps, frame.atMs),
    sigmaStops: isBeforeSunset[index] ? BEFORE_SUNSET_STOPS : READING_SIGMA_STOPS,
  }));
  const fit = fitScene(readings, input.lampFloorEv100);
  if (input.frames.length === 1 && input.lampFloorEv100 === undefined) notes.push({ code: 'lamps_unknown' });
  if (cameOnMs !== null) notes.push({ code: 'lamps_came_on', atMs: cameOnMs });
  if (isBeforeSunset.includes(true)) notes.push({ code: 'frame_before_sunset' });
  const dimmest = dimmestUnder(input.lampFloorEv100, readings);
  if (dimmest !== null) notes.push(dimmest);
  else if (Math.abs(fit.best.offsetStops) > BELIEVABLE_OFFSET_STOPS) {
    notes.push({ code: 'check_clock', offsetStops: fit.best.offsetStops });
  }
  return { fit, lamps, spreadStops: spreadOf(fit, isBeforeSunset), notes };
}

/** EV100 of the scene by a test frame: the settings' plus how much brighter than a middle tone it came out. */
function evOfFrame(frame: LadderFrame): number {
  return sceneEv100(frame.aperture, frame.shutterS, frame.iso, frame.ndStops) + frame.offsetStops;
}

/** A frame that is no brighter than the lamps that are said to light it leaves nothing for the sky. */
function dimmestUnder(floorEv100: number | undefined, readings: readonly FrameReading[]): LadderNote | null {
  if (floorEv100 === undefined) return null;
  const lit = readings.filter(({ areLampsOn: areOn }) => areOn).map((reading) => reading.sceneEv100);
  const dimmest = Math.min(...lit);
  if (dimmest > floorEv100 || lit.length === 0) return null;
  return { code: 'frame_below_lamps', sceneEv100: dimmest, lampFloorEv100: floorEv100 };
}

function spreadOf(fit: SceneFit, isBeforeSunset: readonly boolean[]): number {
  if (!isBeforeSunset.includes(false)) return BEFORE_SUNSET_STOPS;
  const misfits = fit.misfitStops.filter((_, index) => !isBeforeSunset[index]).map(Math.abs);
  return Math.max(misfits.length > 1 ? SPREAD_OF_SEVERAL_STOPS : SPREAD_OF_ONE_STOPS, ...misfits);
}

/** The first frame that is brighter than one before it although the sky has fallen since. */
function whenLampsCameOn(frames: readonly LadderFrame[], light: NaturalLight): number | null {
  const inOrder = [...frames].sort((a, b) => a.atMs - b.atMs);
  const later = inOrder.find((frame, index) =>
    inOrder
      .slice(0, index)
      .some(
        (before) =>
          evOfFrame(frame) > evOfFrame(before) + NOTICEABLE_STOPS &&
          light.ev100At(frame.atMs) < light.ev100At(before.atMs) - NOTICEABLE_STOPS,
      ),
  );
  return later ? later.atMs : null;
}
