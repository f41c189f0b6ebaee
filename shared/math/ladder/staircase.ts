import { sceneEv100 } from '../exposure';
import { markAt, positionOf, type Scale } from '../marks';

export type Giving = 'shutter' | 'aperture' | 'iso';

/** Settings on marks that are set for a scene of this EV100 to come out as a middle tone. */
export interface Stair {
  readonly aperture: number;
  readonly shutterS: number;
  readonly iso: number;
  readonly ev100: number;
}

/** What is held while the light allows, and how far it may give way. */
export interface StaircasePlan {
  readonly scale: Scale;
  readonly holdAperture: number;
  readonly holdIso: number;
  readonly ndStops: number;
  /** The shutter that is kept while something else gives way first; marks other than it are stepped to from it. */
  readonly baseShutterS: number;
  /** What gives way as the light falls, first to last; what is left out never does. */
  readonly order: readonly Giving[];
  readonly slowestShutterS: number;
  /** Not faster than this, such as a flash's sync speed; undefined: as fast as the light asks. */
  readonly fastestShutterS?: number;
  readonly isoMax: number;
  readonly apertureMin: number;
}

/** The default order: first the shutter, then the aperture, last the noise. */
export const SHUTTER_FIRST: readonly Giving[] = ['shutter', 'aperture', 'iso'];

const SAME = 1 + 1e-9;
const LONGEST_STAIRS = 400;

/**
 * All settings of a ladder from the brightest scene to the darkest, each a mark darker than the one before.
 *
 * Faster shutters for scenes brighter than the held settings; then the marks of each setting in the order in which they
 * give way, up to its limit.
 *
 * @param plan what is held, limits and order
 * @param brightestEv100 the brightest scene to be met; shutters beyond it are left out
 * @returns stairs with falling EV100, at least one
 * @throws RangeError when the limits leave no shutter
 * @example staircase(plan, 10).at(-1) // everything at its limit
 * @source derivation
 */
export function staircase(plan: StaircasePlan, brightestEv100: number): Stair[] {
  const { scale, holdAperture, holdIso, order } = plan;
  const shutters = shutterMarks(plan, brightestEv100);
  const slowest = shutters.at(-1);
  if (slowest === undefined) throw new RangeError('the limits leave no shutter');
  const base = order[0] === 'shutter' ? slowest : baseShutter(plan, shutters);
  const bright = shutters.filter((seconds) => seconds <= base * SAME);
  const stairs = bright.map((shutterS) => stairOf(plan, holdAperture, shutterS, holdIso));
  let [aperture, shutterS, iso] = [holdAperture, bright.at(-1) ?? slowest, holdIso];
  for (const giving of order) {
    for (const value of steps(giving)) {
      if (giving === 'aperture') aperture = value;
      else if (giving === 'iso') iso = value;
      else shutterS = value;
      stairs.push(stairOf(plan, aperture, shutterS, iso));
    }
  }
  return stairs;

  function steps(giving: Giving): number[] {
    if (giving === 'shutter') return shutters.filter((seconds) => seconds > shutterS * SAME);
    if (giving === 'aperture') return openerMarks(scale, holdAperture, plan.apertureMin);
    return fasterIsoMarks(scale, holdIso, plan.isoMax);
  }
}

function stairOf({ ndStops }: StaircasePlan, aperture: number, shutterS: number, iso: number): Stair {
  return { aperture, shutterS, iso, ev100: sceneEv100(aperture, shutterS, iso, ndStops) };
}

/** From fast to slow, within the limits, from a mark or two faster than the brightest scene, or the kept shutter, asks. */
function shutterMarks(plan: StaircasePlan, brightestEv100: number): number[] {
  const { scale, holdAperture, holdIso, ndStops, slowestShutterS, fastestShutterS } = plan;
  const neededS = 2 ** (sceneEv100(holdAperture, 1, holdIso, ndStops) - brightestEv100);
  const keptS = plan.order[0] === 'shutter' ? slowestShutterS : Math.min(slowestShutterS, plan.baseShutterS);
  const fastestS = Math.max(fastestShutterS ?? 0, Math.min(neededS, keptS));
  const first = Math.floor(positionOf('shutter', scale, fastestS / SAME));
  const marks: number[] = [];
  // Two marks faster: beyond 30 s the mark itself may be half a second over the limit.
  for (let position = first + 2; marks.length < LONGEST_STAIRS; position -= 1) {
    const { exact } = markAt('shutter', scale, position);
    if (exact > slowestShutterS * SAME) break;
    if (exact * SAME >= (fastestShutterS ?? 0)) marks.push(exact);
  }
  return marks;
}

/** The mark nearest to the shutter that is to be kept. */
function baseShutter({ baseShutterS }: StaircasePlan, shutters: readonly number[]): number {
  const off = (seconds: number): number => Math.abs(Math.log2(seconds / baseShutterS));
  return shutters.reduce((best, seconds) => (off(seconds) < off(best) ? seconds : best));
}

function openerMarks(scale: Scale, from: number, min: number): number[] {
  const marks: number[] = [];
  for (let p = Math.ceil(positionOf('aperture', scale, from / SAME)) - 1; marks.length < 100; p -= 1) {
    const { exact } = markAt('aperture', scale, p);
    if (exact * SAME < min) break;
    marks.push(exact);
  }
  return marks;
}

function fasterIsoMarks(scale: Scale, from: number, max: number): number[] {
  const marks: number[] = [];
  for (let p = Math.floor(positionOf('iso', scale, from * SAME)) + 1; marks.length < 100; p += 1) {
    const { exact } = markAt('iso', scale, p);
    if (exact > max * SAME) break;
    marks.push(exact);
  }
  return marks;
}
