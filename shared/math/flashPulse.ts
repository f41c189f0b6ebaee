import { ANY, inDomain, SMALLEST } from './domain';
import { gammaOnePlus } from './gamma';

/**
 * The pulse of light of a flash tube, as far as two figures can tell it.
 *
 * Intensity over time after the peak, as a share of the peak: I(t) = exp(−(t/τ)^k), until the tube is switched
 * off. k = 1 is a capacitor that empties through the tube (an exponential), k = 2 half a Gaussian, k without
 * bound a rectangle, k < 1 a pulse with a long tail. A measured ratio r = t0.1/t0.5 decides k, because
 * I = 1/2 at τ·(ln 2)^(1/k) and I = 1/10 at τ·(ln 10)^(1/k), so r = (ln 10/ln 2)^(1/k).
 *
 * Why this family: it holds for every r above 1, it is exact for the exponential, the Gaussian and the rectangle,
 * and for exponentials with a rise of up to a fifth of τ (r = 2.38 to 3.08, what real tubes show) its share of
 * light inside t0.5 and t0.1 agrees with theirs to within 1.1 % of the light.
 */
export interface FlashPulse {
  /** τ, s */
  readonly timeConstantS: number;
  /** k, dimensionless, > 0; Infinity for a rectangle */
  readonly shape: number;
  /** T, s after the peak at which the tube is switched off; Infinity where it burns out by itself */
  readonly cutOffS: number;
  /** how much longer than T the whole pulse is because the tube takes time to light up, s; it stretches the pulse */
  readonly riseS: number;
}

/** t0.1/t0.5 of an exponential, ln 10/ln 2 = 3.3219. Derivation. */
export const EXPONENTIAL_RATIO = Math.LN10 / Math.LN2;

/**
 * The shape k of a pulse whose t0.1 is r times its t0.5: k = ln(ln 10/ln 2) / ln r.
 *
 * @param ratio r = t0.1/t0.5, dimensionless, 1 to 100
 * @returns k, dimensionless; Infinity for r = 1
 * @throws RangeError when the value is outside its domain
 * @example shapeOfRatio(EXPONENTIAL_RATIO) // 1
 * @source derivation, see {@link FlashPulse}
 */
export function shapeOfRatio(ratio: number): number {
  inDomain('ratio', ratio, 1, 100);
  return ratio === 1 ? Infinity : Math.log(EXPONENTIAL_RATIO) / Math.log(ratio);
}

/**
 * How long the pulse is above a share of its peak: min(T, τ·(−ln level)^(1/k)), stretched by (T + rise)/T.
 *
 * @param pulse τ, k, T and the rise
 * @param level share of the peak, above 0 and below 1: 0.5 gives t0.5, 0.1 gives t0.1
 * @returns s
 * @throws RangeError when the level is outside its domain
 * @example durationAboveS({ timeConstantS: 0.001, shape: 1, cutOffS: Infinity, riseS: 0 }, 0.5) // 0.000693
 * @source working definition of t0.5 and t0.1 as the trade gives it (time above half and a tenth of the peak; no
 *   clause of a standard was seen); the formula by derivation
 */
export function durationAboveS(pulse: FlashPulse, level: number): number {
  inDomain('level', level, SMALLEST, 1 - Number.EPSILON);
  const uncutS = pulse.timeConstantS * (-Math.log(level)) ** (1 / pulse.shape);
  return Math.min(pulse.cutOffS, uncutS) * stretchOf(pulse);
}

/**
 * Intensity at a moment as a share of the peak: exp(−(t/τ)^k) until the tube is off, then 0.
 *
 * @param pulse τ, k, T and the rise
 * @param timeS t: after the start, s, ≥ 0
 * @returns 0 to 1, dimensionless
 * @throws RangeError when the time is outside its domain
 * @example intensityAt({ timeConstantS: 0.001, shape: 1, cutOffS: Infinity, riseS: 0 }, 0.001) // 0.368
 * @source modelling choice, see {@link FlashPulse}
 */
export function intensityAt(pulse: FlashPulse, timeS: number): number {
  inDomain('timeS', timeS, 0, ANY);
  const t = timeS / stretchOf(pulse);
  if (t >= pulse.cutOffS) return 0;
  if (pulse.shape === Infinity) return t < pulse.timeConstantS ? 1 : 0;
  return Math.exp(-((t / pulse.timeConstantS) ** pulse.shape));
}

/**
 * The share of the pulse's light that is given off up to a moment: P(t)/P(T), where
 * P(t) = ∫₀ᵗ I / ∫₀^∞ I is the incomplete gamma function P(1/k, (t/τ)^k); for k = 1 it is 1 − exp(−t/τ).
 *
 * @param pulse τ, k, T and the rise
 * @param timeS t: after the start, s, ≥ 0
 * @returns 0 to 1, dimensionless
 * @throws RangeError when the time is outside its domain
 * @example shareWithin({ timeConstantS: 0.001, shape: 1, cutOffS: Infinity, riseS: 0 }, 0.002) // 0.865
 * @source derivation: the integral of {@link intensityAt}
 */
export function shareWithin(pulse: FlashPulse, timeS: number): number {
  inDomain('timeS', timeS, 0, ANY);
  const t = timeS / stretchOf(pulse);
  if (t >= pulse.cutOffS) return 1;
  const whole = shareOfUncut(pulse.cutOffS / pulse.timeConstantS, pulse.shape);
  return Math.min(1, shareOfUncut(t / pulse.timeConstantS, pulse.shape) / whole);
}

/** A tube that lights up slowly is as bright for longer: the whole time axis is stretched. */
function stretchOf(pulse: FlashPulse): number {
  return pulse.riseS > 0 ? 1 + pulse.riseS / pulse.cutOffS : 1;
}

/**
 * P(a, x) for a = 1/k, x = u^k, with u^1 for x^a so that no power of u underflows: the series below the
 * maximum, Legendre's continued fraction above it (both textbook forms of the incomplete gamma function).
 */
function shareOfUncut(u: number, shape: number): number {
  if (shape === Infinity) return Math.min(1, u);
  if (shape === 1) return -Math.expm1(-u);
  const a = 1 / shape;
  const x = u ** shape;
  const factor = (u * Math.exp(-x)) / gammaOnePlus(a);
  if (x === Infinity || factor === 0) return u < 1 ? 0 : 1;
  return x < a + 1 ? factor * gammaSeries(a, x) : 1 - factor * a * gammaFraction(a, x);
}

/** 1 + x/(a+1) + x²/((a+1)(a+2)) + ... */
function gammaSeries(a: number, x: number): number {
  let term = 1;
  let sum = 1;
  for (let n = 1; n < 500 && term > sum * Number.EPSILON; n++) {
    term *= x / (a + n);
    sum += term;
  }
  return sum;
}

/** 1/(x + 1 − a − 1(1 − a)/(x + 3 − a − 2(2 − a)/(x + 5 − a − ...))), evaluated from its far end. */
function gammaFraction(a: number, x: number): number {
  const depth = Math.ceil(40 + 400 / x);
  let tail = 0;
  for (let n = depth; n >= 1; n--) tail = (n * (n - a)) / (x + 2 * n + 1 - a - tail);
  return 1 / (x + 1 - a - tail);
}
