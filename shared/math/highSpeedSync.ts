import { ANY, inDomain, SMALLEST } from './domain';

/** Times that differ by less than this share are the same setting. */
const SAME_TIME = 1e-9;

/** Usual travel of one curtain, s; stands in where the maker's is not known. Common practice, no source. */
const USUAL_CURTAIN_S = 1 / 300;

/**
 * The curtain travel to assume: 1/300 s, or the sync speed where that is shorter, because at the sync speed the
 * whole frame is open for a moment.
 *
 * @param syncSpeedS the shortest time at which the frame is wholly uncovered, s, > 0
 * @returns s
 * @throws RangeError when the value is outside its domain
 * @example assumedCurtainS(1 / 250) // 1/300
 * @source modelling choice
 */
export function assumedCurtainS(syncSpeedS: number): number {
  inDomain('syncSpeedS', syncSpeedS, SMALLEST, ANY);
  return Math.min(USUAL_CURTAIN_S, syncSpeedS);
}

/**
 * Whether a curtain can belong to a camera with that sync speed: it may not travel longer than the sync speed.
 *
 * @param curtainS T: travel of one curtain, s, ≥ 0
 * @param syncSpeedS s, > 0
 * @throws RangeError when a value is outside its domain
 * @example isCurtainPossible(1 / 200, 1 / 250) // false
 * @source derivation: at the sync speed the second curtain starts when the first has arrived, or later
 */
export function isCurtainPossible(curtainS: number, syncSpeedS: number): boolean {
  inDomain('curtainS', curtainS, 0, ANY);
  inDomain('syncSpeedS', syncSpeedS, SMALLEST, ANY);
  return curtainS <= syncSpeedS * (1 + SAME_TIME);
}

/** Whether a shutter is faster than the sync speed, both in s and > 0, so that one pulse can't light the frame. */
export function isFasterThanSync(shutterS: number, syncSpeedS: number): boolean {
  inDomain('shutterS', shutterS, SMALLEST, ANY);
  inDomain('syncSpeedS', syncSpeedS, SMALLEST, ANY);
  return shutterS < syncSpeedS * (1 - SAME_TIME);
}

/**
 * The share of a flash's full energy that reaches the sensor in high-speed sync. The train of light is spread
 * evenly over the curtain's travel and the exposure; each row of the sensor sees the exposure's part of it.
 *
 * share = t / (T + t)
 *
 * @param shutterS t: exposure time, s, > 0
 * @param curtainS T: travel of one curtain, s, ≥ 0
 * @returns share, 0 to 1
 * @throws RangeError when a value is outside its domain
 * @example highSpeedSyncShare(1 / 1000, 1 / 300) // 0.2308
 * @source energy model (modelling choice): emission even over T + t
 */
export function highSpeedSyncShare(shutterS: number, curtainS: number): number {
  inDomain('shutterS', shutterS, SMALLEST, ANY);
  inDomain('curtainS', curtainS, 0, ANY);
  return shutterS / (curtainS + shutterS);
}

/**
 * What high-speed sync costs against one whole pulse.
 *
 * loss = log2((T + t) / t) + extra
 *
 * @param shutterS t: exposure time, s, > 0
 * @param curtainS T: travel of one curtain, s, ≥ 0
 * @param extraLossStops what the equipment loses beyond the model, measured, stops; 0 to 1.5 is usual
 * @returns loss, stops, 0 or more when extra is
 * @throws RangeError when a value is outside its domain
 * @example highSpeedSyncLossStops(1 / 1000, 1 / 300) // 2.115
 * @source energy model as for {@link highSpeedSyncShare}
 */
export function highSpeedSyncLossStops(shutterS: number, curtainS: number, extraLossStops = 0): number {
  inDomain('extraLossStops', extraLossStops, -ANY, ANY);
  inDomain('shutterS', shutterS, SMALLEST, ANY);
  inDomain('curtainS', curtainS, 0, ANY);
  return Math.log1p(curtainS / shutterS) / Math.LN2 + extraLossStops;
}

/**
 * The share of the frame that one ordinary pulse lights when the shutter is faster than the curtain's travel: the
 * slit's height over the frame's.
 *
 * share = min(1, t / T)
 *
 * @param shutterS t: exposure time, s, > 0
 * @param curtainS T: travel of one curtain, s, > 0
 * @returns share of the frame's height, 0 to 1
 * @throws RangeError when a value is outside its domain
 * @example litFrameShare(1 / 1000, 1 / 300) // 0.30
 * @source derivation for an even travel and a pulse without delay (modelling choice)
 */
export function litFrameShare(shutterS: number, curtainS: number): number {
  inDomain('shutterS', shutterS, SMALLEST, ANY);
  inDomain('curtainS', curtainS, SMALLEST, ANY);
  return Math.min(1, shutterS / curtainS);
}
