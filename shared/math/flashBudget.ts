import { ANY, inDomain, SMALLEST } from './domain';

/** Absorbs the last digit of a division, so that 200 pops at 1/5 power are 1,000 frames and not 999. */
const WHOLE = 1e-9;

/**
 * Frames that one charge of the battery gives at a power; energy is taken to go with power.
 *
 * n = floor(P/p)
 *
 * @param fullPowerPops P: pops at full power from one charge, > 0
 * @param power p: fraction of full power, above 0, at most 1
 * @returns n, whole, 0 or more
 * @throws RangeError when a value is outside its domain
 * @example framesPerCharge(200, 1 / 4) // 800
 * @source modelling choice: no losses beside the pops; a real battery gives less, above all in the cold
 */
export function framesPerCharge(fullPowerPops: number, power: number): number {
  inDomain('fullPowerPops', fullPowerPops, SMALLEST, ANY);
  inDomain('power', power, SMALLEST, 1);
  const frames = fullPowerPops / power;
  return Math.floor(inDomain('frames per charge', frames, 0, ANY) * (1 + WHOLE));
}

/**
 * Charges of the battery for a number of frames: ceil(frames/n), n from {@link framesPerCharge}.
 *
 * @param frames whole, ≥ 0
 * @param perCharge n: frames for each charge, whole, ≥ 0
 * @returns whole, 0 or more; null where one charge is not enough for a single frame
 * @throws RangeError when a value is outside its domain
 * @example chargesNeeded(500, 800) // 1
 * @source derivation
 */
export function chargesNeeded(frames: number, perCharge: number): number | null {
  inDomain('frames', frames, 0, ANY);
  inDomain('perCharge', perCharge, 0, ANY);
  if (frames === 0) return 0;
  return perCharge === 0 ? null : Math.ceil(frames / perCharge);
}

/**
 * Frames that are left in the last charge when the planned ones are done: charges·n − frames, from at least one
 * charge.
 *
 * @param frames whole, ≥ 0
 * @param perCharge n: frames for each charge, whole, ≥ 0
 * @param charges as {@link chargesNeeded} gives them
 * @returns whole, 0 or more
 * @throws RangeError when a value is outside its domain
 * @example framesLeft(900, 800, 2) // 700
 * @source derivation
 */
export function framesLeft(frames: number, perCharge: number, charges: number | null): number {
  inDomain('frames', frames, 0, ANY);
  inDomain('perCharge', perCharge, 0, ANY);
  return charges === null ? 0 : Math.max(1, charges) * perCharge - frames;
}

/**
 * Time until the flash is ready again after a pop: t = t_full·p; energy is taken to flow in evenly.
 *
 * @param recycleFullS t_full: after a pop at full power, s, > 0
 * @param power p: fraction of full power, above 0, at most 1
 * @returns t, s
 * @throws RangeError when a value is outside its domain
 * @example recycleAtS(2, 1 / 8) // 0.25
 * @source modelling choice; real chargers are slower near the top and with an empty battery
 */
export function recycleAtS(recycleFullS: number, power: number): number {
  inDomain('recycleFullS', recycleFullS, SMALLEST, ANY);
  inDomain('power', power, SMALLEST, 1);
  return recycleFullS * power;
}

/** Whether a flash is ready for every frame of a series, and for how many it is from full. */
export interface Pace {
  readonly keepsUp: boolean;
  /** frames before the first one that comes too early; null where the flash keeps up */
  readonly burstFrames: number | null;
}

/**
 * Whether a flash keeps up with a camera. From full, each frame takes p and the time to the next brings
 * g = 1/(r·t_full) back, so frame n + 1 still has its light while 1 − n·(p − g) ≥ p:
 *
 * n = floor((1 − p)/(p − g)) + 1 frames; without end where g ≥ p
 *
 * @param recycleFullS t_full: after a pop at full power, s, > 0
 * @param power p: fraction of full power, above 0, at most 1
 * @param fps r: frames a second, > 0
 * @returns whether it keeps up, and the frames of a burst where not
 * @throws RangeError when a value is outside its domain
 * @example paceOf(2, 1 / 8, 8) // g = 1/16: 15 frames, then one comes too early
 * @source derivation from the even flow of {@link recycleAtS}
 */
export function paceOf(recycleFullS: number, power: number, fps: number): Pace {
  const neededS = recycleAtS(recycleFullS, power);
  inDomain('fps', fps, SMALLEST, ANY);
  if (neededS <= (1 / fps) * (1 + WHOLE)) return { keepsUp: true, burstFrames: null };
  const drain = power - 1 / (fps * recycleFullS);
  return { keepsUp: false, burstFrames: Math.floor(((1 - power) / drain) * (1 + WHOLE)) + 1 };
}
