import { ANY, inDomain, SMALLEST } from './domain';
import { sharesOfLight } from './mixing';

/** How much of the trail that ambient light draws beside the frozen subject will be seen. */
export type GhostVisibility = 'none' | 'faint' | 'clear' | 'dominant';

/** A trail at or over the flash, this far under it, or this far under it at the most. */
const CLEAR_ABOVE_STOPS = 3;
const FAINT_ABOVE_STOPS = 6;

/**
 * How far the ambient light on the subject is under the flash: the plain difference f − a.
 *
 * @param flashStops f: how bright the flash alone makes the subject, stops, finite
 * @param ambientStops a: how bright the ambient light alone makes it, stops from the same reference, finite
 * @returns stops; negative where the ambient light is the stronger
 * @throws RangeError when a value is not finite
 * @example stopsBelowFlash(0, -3) // 3
 * @source definition
 */
export function stopsBelowFlash(flashStops: number, ambientStops: number): number {
  return inDomain('flashStops', flashStops, -ANY, ANY) - inDomain('ambientStops', ambientStops, -ANY, ANY);
}

/**
 * The part of the subject's exposure that is ambient light: r = 2^−Δ/(1 + 2^−Δ), Δ = f − a.
 *
 * @param belowFlashStops Δ: how far ambient is under the flash, stops, finite
 * @returns r, 0 to 1, dimensionless
 * @throws RangeError when the value is not finite
 * @example ambientShare(3) // 0.111
 * @source additivity of exposure, derivation
 */
export function ambientShare(belowFlashStops: number): number {
  const [share] = sharesOfLight([-belowFlashStops, 0]);
  return share ?? 0;
}

/**
 * How far the trail is under the flash. A detail of the width w that travels B gives each point of its path w/(w + B)
 * of its light, so D = Δ + log2(1 + B/w).
 *
 * @param belowFlashStops Δ: stops, finite
 * @param trailPx B: pixels, ≥ 0
 * @param detailPx w: pixels, > 0
 * @returns D, stops
 * @throws RangeError when a value is outside its domain
 * @example trailBelowFlashStops(3, 10, 10) // 4
 * @source modelling choice: an even movement
 */
export function trailBelowFlashStops(belowFlashStops: number, trailPx: number, detailPx: number): number {
  inDomain('belowFlashStops', belowFlashStops, -ANY, ANY);
  inDomain('trailPx', trailPx, 0, ANY);
  inDomain('detailPx', detailPx, SMALLEST, ANY);
  return belowFlashStops + Math.log1p(trailPx / detailPx) / Math.LN2;
}

/** A trail beside a subject that a flash has frozen. */
export interface Trail {
  /** Δ: stops, finite */
  readonly belowFlashStops: number;
  /** B: pixels, ≥ 0 */
  readonly trailPx: number;
  /** shorter trails than this don't count, pixels, > 0 */
  readonly tolerancePx: number;
  /** w: width of the details that one looks at, pixels, > 0 */
  readonly detailPx: number;
}

/**
 * Whether the trail will be seen: not at all when it is shorter than the tolerance; else by D of
 * {@link trailBelowFlashStops}: below 0 dominant, below 3 clear, below 6 faint, else not at all.
 *
 * @param trail Δ, B, tolerance and w
 * @returns one of four words
 * @throws RangeError when a value is outside its domain
 * @example ghostVisibility({ belowFlashStops: 3, trailPx: 10, tolerancePx: 1, detailPx: 10 }) // 'faint'
 * @source common practice, no source
 */
export function ghostVisibility(trail: Trail): GhostVisibility {
  inDomain('tolerancePx', trail.tolerancePx, SMALLEST, ANY);
  const below = trailBelowFlashStops(trail.belowFlashStops, trail.trailPx, trail.detailPx);
  if (trail.trailPx < trail.tolerancePx) return 'none';
  if (below < 0) return 'dominant';
  if (below < CLEAR_ABOVE_STOPS) return 'clear';
  return below < FAINT_ABOVE_STOPS ? 'faint' : 'none';
}

/**
 * How bright the background shows through the edge of a subject that moves on. Over the path w + B a detail covers
 * the background for w/(w + B) of the time and leaves it open for the rest: s = b + log2(B/(w + B)).
 *
 * @param backgroundStops b: how bright the background comes out beside the subject, stops, finite
 * @param trailPx B: pixels, ≥ 0
 * @param detailPx w: pixels, > 0
 * @returns s, stops from the same reference; null where nothing moves, so that nothing shows through
 * @throws RangeError when a value is outside its domain
 * @example throughStops(0, 10, 10) // -1
 * @source modelling choice, the counterpart of {@link trailBelowFlashStops}: both shares add up to 1
 */
export function throughStops(backgroundStops: number, trailPx: number, detailPx: number): number | null {
  inDomain('backgroundStops', backgroundStops, -ANY, ANY);
  inDomain('trailPx', trailPx, 0, ANY);
  inDomain('detailPx', detailPx, SMALLEST, ANY);
  return trailPx === 0 ? null : backgroundStops + Math.log2(trailPx) - Math.log2(detailPx + trailPx);
}
