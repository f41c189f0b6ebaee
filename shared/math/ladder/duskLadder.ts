import { changeSpread } from './changeSpread';
import { climb, type Change } from './climb';
import { ladderEndMs } from './ladderSpan';
import type { DuskLadder, LadderInput, LadderNote, Rung, TurningPoint } from './ladderTypes';
import { lightTable, type LightStretch } from './lightTable';
import { naturalLight, type NaturalLight } from './naturalLight';
import { readFrames, type FramesRead } from './readFrames';
import { rungPower, type RungPower } from './rungPower';
import { combinedEv100, sceneEv100At, type SceneModel } from './sceneModel';
import { staircase, type Stair, type StaircasePlan } from './staircase';
import { reachPoints, settingPoints } from './turningPoints';

/** How far before and after the ladder a change may be due, by the model's spread. */
const SPREAD_REACH_MS = 2 * 3_600_000;

/** Lamps that the frames leave so open that the darkest of the ladder differs by more than this are said to be. */
const UNDETERMINED_STOPS = 0.5;

/** A moon that adds more than this is worth knowing of. */
const MOON_COUNTS_STOPS = 0.05;

/**
 * The dusk ladder: the settings that follow the falling light, or the rising one, with the instant of each change.
 *
 * scene(t) = log2(2^(sky and moon(t) + offset) + 2^floor), offset and floor by least squares from the test frames; at each
 * instant the nearest stair of the settings that give way in order. See the parts for the formulas.
 *
 * @param input place, frames, aim, what is held, limits; angles in degrees, instants in milliseconds since 1970 (UTC)
 * @returns rungs without gaps from start to end, turning points, the model and what is doubtful in it
 * @throws RangeError when there is no frame, the end is not after the start, or the limits leave no shutter
 * @example duskLadder({ place, frames: [frame], aim, plan }).rungs[0]?.shutterS
 * @source light: Explanatory Supplement (1992), p. 491, and additivity; the rest by derivation, spreads by choice
 */
export function duskLadder(input: LadderInput): DuskLadder {
  const { plan, aim } = input;
  const { fromMs, toMs } = spanOf(input);
  const frameTimes = input.frames.map((frame) => frame.atMs);
  const light = naturalLight(
    input.place,
    Math.min(fromMs - SPREAD_REACH_MS, ...frameTimes),
    Math.max(toMs + SPREAD_REACH_MS, ...frameTimes),
  );
  const read = readFrames(input, light);
  const model: SceneModel = { ...read.fit.best, lamps: read.lamps };
  const table = lightTable(light, model, fromMs, toMs);
  const brightest = Math.max(...table.flatMap(({ samples }) => samples.map(({ ev100 }) => ev100)));
  const stairs = staircase(wholePlan(input), brightest - aim.backgroundStops);
  const onSubject = input.flash?.onSubject;
  const powers = stairs.map((stair) => (onSubject ? rungPower(onSubject, aim, stair, plan.ndStops) : null));
  const changes = climb(light, model, table, stairs, aim.backgroundStops);
  const points = [
    ...settingPoints(changes, stairs, powers, plan),
    ...reachPoints(light, model, table, stairs, aim.backgroundStops, plan),
  ];
  return {
    rungs: rungsOf(input, { light, model, read, stairs, powers, changes, fromMs, toMs }),
    turningPoints: points.sort((a: TurningPoint, b: TurningPoint) => a.atMs - b.atMs),
    model: {
      skyOffsetStops: model.offsetStops,
      lampFloorEv100: model.floorEv100,
      spreadStops: read.spreadStops,
      misfitStops: read.fit.misfitStops,
    },
    notes: [...read.notes, ...lampNotes(read, light, table), ...moonNotes(light, table)],
  };
}

function spanOf({ place, frames, fromMs, toMs }: LadderInput): { fromMs: number; toMs: number } {
  const startMs = fromMs ?? frames[0]?.atMs;
  if (startMs === undefined) throw new RangeError('a ladder of at least one frame');
  const endMs = toMs ?? ladderEndMs(place, startMs);
  if (!(endMs > startMs)) throw new RangeError('a ladder that ends after it starts');
  return { fromMs: startMs, toMs: endMs };
}

function wholePlan({ plan, frames, flash }: LadderInput): StaircasePlan {
  return {
    ...plan,
    baseShutterS: frames[0]?.shutterS ?? plan.slowestShutterS,
    ...(flash?.syncS === undefined ? {} : { fastestShutterS: flash.syncS }),
  };
}

interface Climbed {
  readonly light: NaturalLight;
  readonly model: SceneModel;
  readonly read: FramesRead;
  readonly stairs: readonly Stair[];
  readonly powers: readonly (RungPower | null)[];
  readonly changes: readonly Change[];
  readonly fromMs: number;
  readonly toMs: number;
}

function rungsOf(input: LadderInput, climbed: Climbed): Rung[] {
  const { light, model, stairs, powers, changes, toMs } = climbed;
  const [darker, brighter] = spreadCurves(climbed);
  return changes.map((change, index) => {
    const stair = stairs[change.stair] as Stair;
    const sceneEv100 = sceneEv100At(light, model, change.atMs);
    const spread = index === 0 ? { earlyS: null, lateS: null } : changeSpread(change, darker, brighter);
    return {
      atMs: change.atMs,
      untilMs: changes[index + 1]?.atMs ?? toMs,
      aperture: stair.aperture,
      shutterS: stair.shutterS,
      iso: stair.iso,
      ...(input.flash?.onSubject ? { power: powers[change.stair]?.power ?? null } : {}),
      sceneEv100,
      sunAltitudeDeg: light.sunAltitudeAt(change.atMs),
      errorStops: sceneEv100 - stair.ev100 - input.aim.backgroundStops,
      ...spread,
    };
  });
}

/** The scene's light at the dark and at the bright end of what the frames leave open. */
function spreadCurves({
  light,
  read,
  fromMs,
  toMs,
}: Climbed): [LightStretch['samples'], LightStretch['samples']] {
  const { fit, lamps, spreadStops } = read;
  const curve = (ends: SceneModel): LightStretch['samples'] =>
    lightTable(light, ends, fromMs - SPREAD_REACH_MS, toMs + SPREAD_REACH_MS).flatMap(
      ({ samples }) => samples,
    );
  return [
    curve({ ...fit.low, offsetStops: fit.low.offsetStops - spreadStops, lamps }),
    curve({ ...fit.high, offsetStops: fit.high.offsetStops + spreadStops, lamps }),
  ];
}

function lampNotes({ fit }: FramesRead, light: NaturalLight, table: readonly LightStretch[]): LadderNote[] {
  const { low, high } = fit;
  if (low.floorEv100 === high.floorEv100) return [];
  const ends = table.flatMap(({ fromMs, toMs }) => [fromMs, toMs]);
  const openStops = ends.map((atMs) => {
    const natural = light.ev100At(atMs);
    const bright = combinedEv100(natural, high.offsetStops, high.floorEv100);
    return bright - combinedEv100(natural, low.offsetStops, low.floorEv100);
  });
  if (Math.max(...openStops) <= UNDETERMINED_STOPS) return [];
  return [{ code: 'lamps_undetermined', lowEv100: low.floorEv100, highEv100: high.floorEv100 }];
}

function moonNotes(light: NaturalLight, table: readonly LightStretch[]): LadderNote[] {
  const counts = table.some(({ samples }) =>
    samples.some(({ atMs }) => light.moonStopsAt(atMs) > MOON_COUNTS_STOPS),
  );
  return counts ? [{ code: 'moon_counts' }] : [];
}
