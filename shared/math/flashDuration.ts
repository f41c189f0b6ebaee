import { ANY, inDomain, SMALLEST } from './domain';
import { durationAboveS, EXPONENTIAL_RATIO, shapeOfRatio, shareWithin, type FlashPulse } from './flashPulse';

/**
 * How a flash makes less light. `decay`: it does not, the whole capacitor empties. `cutoff`: the tube is switched
 * off early. `voltage`: the capacitor is charged less.
 */
export type FlashControl = 'decay' | 'cutoff' | 'voltage';

/** A duration as measured or stated for full power: time above half of the peak, or above a tenth. */
export type MeasuredDuration = { readonly t05S: number } | { readonly t01S: number };

/** Below this power the time that a tube takes to light up counts. */
const RISE_COUNTS_BELOW = 1 / 16;

/**
 * What to add to a cut-off pulse below 1/16 power, s. Fitted to one published table of a shoe-mount flash
 * (1/17800, 1/32300, 1/41600 s at 1/32, 1/64, 1/128); makers differ.
 */
export const RISE_FLOOR_S = 12e-6;

/**
 * The pulse of a whole discharge: I = exp(−(t/τ)^k) with k from the ratio (see {@link FlashPulse}) and
 * τ = t0.5/(ln 2)^(1/k) = t0.1/(ln 10)^(1/k).
 *
 * @param measured t0.5 or t0.1 at full power, s, > 0
 * @param ratio r = t0.1/t0.5 as measured, 1 to 100; ln 10/ln 2 for a plain exponential
 * @returns the pulse
 * @throws RangeError when a value is outside its domain
 * @example decayPulse({ t05S: 0.001 }).timeConstantS // 0.0014427
 * @source derivation; the exponential is the usual model of a capacitor that empties
 */
export function decayPulse(measured: MeasuredDuration, ratio: number = EXPONENTIAL_RATIO): FlashPulse {
  const shape = shapeOfRatio(ratio);
  const [durationS, level] = 't05S' in measured ? [measured.t05S, Math.LN2] : [measured.t01S, Math.LN10];
  inDomain('duration in s', durationS, SMALLEST, ANY);
  return { timeConstantS: durationS / level ** (1 / shape), shape, cutOffS: Infinity, riseS: 0 };
}

/**
 * The pulse of a tube that is switched off when it has given its part of the light:
 * T = −τ·ln(1 − p), t0.5 = min(T, τ·ln 2), t0.1 = min(T, τ·ln 10); below 1/16 power T + rise for each.
 *
 * @param measured t0.5 or t0.1 at full power, s, > 0
 * @param power p: share of the full pulse's light, above 0, at most 1
 * @param riseFloorS what to add below 1/16 power, s, ≥ 0
 * @returns the pulse
 * @throws RangeError when a value is outside its domain
 * @example durationAboveS(cutoffPulse({ t05S: 0.001 }, 1 / 8), 0.5) // 0.0001926
 * @source modelling choice: exponential with an instant peak, checked against one published table of durations
 */
export function cutoffPulse(
  measured: MeasuredDuration,
  power: number,
  riseFloorS: number = RISE_FLOOR_S,
): FlashPulse {
  inDomain('power', power, SMALLEST, 1);
  inDomain('riseFloorS', riseFloorS, 0, ANY);
  const whole = decayPulse(measured);
  const cutOffS = -whole.timeConstantS * Math.log1p(-power);
  return { ...whole, cutOffS, riseS: power < RISE_COUNTS_BELOW ? riseFloorS : 0 };
}

/** What decides a pulse. */
export interface PulseSettings {
  readonly control: FlashControl;
  /** p, above 0, at most 1; counts for `cutoff` only */
  readonly power: number;
  /** t0.1/t0.5; counts for the whole discharges, `decay` and `voltage` */
  readonly ratio?: number;
  /** s; counts for `cutoff` only */
  readonly riseFloorS?: number;
}

/**
 * The pulse for a way of control: {@link decayPulse}, {@link cutoffPulse}, or for `voltage` the full discharge,
 * which is the least that it can be at lower power (see {@link isLowerBound}).
 *
 * @param measured t0.5 or t0.1 at full power, s, > 0
 * @param settings control, power, and what belongs to it
 * @returns the pulse
 * @throws RangeError when a value is outside its domain
 * @example durationAboveS(flashPulse({ t05S: 0.001 }, { control: 'voltage', power: 0.25 }), 0.5) // 0.001
 * @source as for the two functions; that less voltage makes a longer pulse from makers' pages
 */
export function flashPulse(measured: MeasuredDuration, settings: PulseSettings): FlashPulse {
  inDomain('power', settings.power, SMALLEST, 1);
  if (settings.control === 'cutoff') return cutoffPulse(measured, settings.power, settings.riseFloorS);
  return decayPulse(measured, settings.ratio);
}

/**
 * Whether a duration is only the least that it can be: a flash that is controlled by voltage burns longer at lower
 * power, by how much only a measurement tells.
 *
 * @example isLowerBound('voltage', 0.5) // true
 * @source makers' pages
 */
export function isLowerBound(control: FlashControl, power: number): boolean {
  return control === 'voltage' && power < 1;
}

/** Time above half of the peak, t0.5, in s; see {@link durationAboveS}. */
export function halfPeakS(pulse: FlashPulse): number {
  return durationAboveS(pulse, 0.5);
}

/** Time above a tenth of the peak, t0.1, in s; see {@link durationAboveS}. */
export function tenthPeakS(pulse: FlashPulse): number {
  return durationAboveS(pulse, 0.1);
}

/**
 * What an open shutter lets through of a pulse that starts when the frame is wholly open, in stops.
 *
 * s = log2(share within the open time), open time = t − T
 *
 * @param pulse see {@link FlashPulse}
 * @param shutterS t: exposure time, s, > 0
 * @param curtainS T: part of it in which the frame is not wholly open, s, ≥ 0 and below t
 * @returns the share (0 to 1) and s (≤ 0 stops)
 * @throws RangeError when a value is outside its domain, or the frame is never wholly open
 * @example clippedBy(decayPulse({ t05S: 0.001 }), 0.002, 0).clippedStops // -0.415
 * @source derivation
 */
export function clippedBy(
  pulse: FlashPulse,
  shutterS: number,
  curtainS: number,
): { readonly share: number; readonly clippedStops: number } {
  inDomain('shutterS', shutterS, SMALLEST, ANY);
  inDomain('curtainS', curtainS, 0, ANY);
  const openS = inDomain('open time in s', shutterS - curtainS, SMALLEST, ANY);
  const share = inDomain('share of the pulse', shareWithin(pulse, openS), SMALLEST, 1);
  // A whole pulse is clipped by 0, and not by the -0 or the last digit that a logarithm leaves.
  return { share, clippedStops: Math.min(0, Math.log2(share)) };
}
