import { inDomain } from './domain';

/**
 * Lamps on the mains pulse at twice its frequency. With light L(x) = 1 + m·cos(2πx), x in cycles of the ripple, an
 * exposure of c cycles collects a mean of 1 + m·sinc(c)·cos φ, where φ is the phase of its middle: a frame or a row
 * differs from the next by up to ±m·|sinc c|. Whole cycles hold no ripple, and that is true for every wave form,
 * since all its overtones then fill whole cycles too. Derivation; the sine is a fair picture of lamps on magnetic
 * ballasts and of filaments (a test laboratory's account), not of lamps that are switched in short pulses.
 */

/** How much unevenness shows. */
export const FLICKER_RISKS = ['none', 'slight', 'clear', 'strong'] as const;
export type FlickerRisk = (typeof FLICKER_RISKS)[number];

/** Upper ends in stops of what does not show, shows a little, shows. Common practice, no source. */
const RISK_ENDS_STOPS = { none: 0.05, slight: 1 / 3, clear: 1 } as const;

/** Counts of cycles this close to a whole number are whole; covers the rounding of 2·f·t. */
const WHOLE = 1e-9;

/**
 * Cycles of ripple in an exposure: c = 2·f·t.
 * @param mainsHz f, hertz, 1 to 10,000
 * @param shutterS t, seconds, 0 to 1e6
 * @returns cycles; 50 Hz for 1/100 s is 1. Throws RangeError outside the domain.
 * Source: power is the square of a sine, which has twice its frequency; derivation.
 */
export function rippleCycles(mainsHz: number, shutterS: number): number {
  return 2 * inDomain('mains in Hz', mainsHz, 1, 1e4) * inDomain('shutter in s', shutterS, 0, 1e6);
}

/** Inverse of `rippleCycles` for the time: t = c/(2f) seconds. One cycle at 60 Hz takes 1/120 s. */
export function ripplePeriodsS(mainsHz: number, cycles: number): number {
  return inDomain('cycles', cycles, 0, 1e12) / (2 * inDomain('mains in Hz', mainsHz, 1, 1e4));
}

/**
 * Part of the ripple that an exposure does not level out: r = |sinc c| = |sin(πc)/(πc)|.
 * @param cycles c, 1e-7 to 1e11
 * @returns dimensionless, 0 (whole cycles) to 1 (an instant); half a cycle leaves 0.6366. Throws RangeError outside
 *   the domain. Source: derivation, the mean of a cosine over c cycles.
 */
export function residualRipple(cycles: number): number {
  const nearest = Math.round(inDomain('cycles', cycles, 1e-7, 1e11));
  // The sine of the rest alone: sin(π·c) of a whole number is not quite 0.
  return Math.abs(Math.sin(Math.PI * (cycles - nearest))) / (Math.PI * cycles);
}

/**
 * How far the brightest and the darkest of many frames lie apart: log2((1 + a)/(1 − a)), a = m·r.
 * @param residual r, from `residualRipple`, 0 to 1
 * @param depth m, (brightest − darkest)/(brightest + darkest) of the lamp's own light, 0 (steady) to 1 (dark between
 *   the pulses); the product m·r below 1
 * @returns stops, 0 or more; half a cycle of a lamp of depth 1 gives 2.17. Throws RangeError outside the domain.
 * Source: derivation; m is the percent flicker of the lighting engineers' vocabulary (ANSI/IES).
 */
export function frameSwingStops(residual: number, depth: number): number {
  return (2 * Math.atanh(amplitude(residual, depth))) / Math.LN2;
}

/**
 * How far the brightest and the darkest row of one frame can lie apart when the rows are exposed one after another.
 * Over n cycles from the first row to the last the phase runs through 2πn. The worst start gives
 * 2·asinh(a·sin(πn)/√(1 − a²))/ln 2 stops with a = m·r; from half a cycle on, the frame holds both extremes.
 * @param residual r, as for `frameSwingStops`
 * @param depth m, as for `frameSwingStops`
 * @param travelCycles n, cycles of ripple from the first row's start to the last row's, 0 or more
 * @returns stops, 0 or more; with n ≥ 1/2 the same as `frameSwingStops`. Throws RangeError outside the domain.
 * Source: derivation: (1 + a·cos(x − πn))/(1 + a·cos(x + πn)) is extreme where cos x = −a·cos(πn).
 */
export function bandSwingStops(residual: number, depth: number, travelCycles: number): number {
  const a = amplitude(residual, depth);
  const half = Math.PI * Math.min(inDomain('cycles of travel', travelCycles, 0, 1e12), 0.5);
  return (2 * Math.asinh((a * Math.sin(half)) / Math.sqrt((1 - a) * (1 + a)))) / Math.LN2;
}

/**
 * The whole numbers of cycles around an exposure.
 * @param cycles c, above 0, up to 1e11
 * @returns those just below and above, or the one that it is; none below 1: 2.5 gives [2, 3], 0.4 gives [1].
 *   Throws RangeError outside the domain. Source: derivation.
 */
export function nearestWholeCycles(cycles: number): number[] {
  const nearest = Math.round(inDomain('cycles', cycles, 1e-7, 1e11));
  if (nearest >= 1 && Math.abs(cycles - nearest) <= WHOLE * nearest) return [nearest];
  const below = Math.floor(cycles);
  return below >= 1 ? [below, below + 1] : [1];
}

/** How much a difference in stops shows: none to 0.05, slight to 1/3, clear to 1, else strong. Common practice. */
export function flickerRisk(swingStops: number): FlickerRisk {
  if (swingStops <= RISK_ENDS_STOPS.none) return 'none';
  if (swingStops <= RISK_ENDS_STOPS.slight) return 'slight';
  return swingStops <= RISK_ENDS_STOPS.clear ? 'clear' : 'strong';
}

function amplitude(residual: number, depth: number): number {
  const a = inDomain('residual ripple', residual, 0, 1) * inDomain('depth of the ripple', depth, 0, 1);
  // At 1 the darkest frame gets no light at all, which is no number of stops.
  return inDomain('what is left of the ripple', a, 0, 1 - Number.EPSILON);
}
