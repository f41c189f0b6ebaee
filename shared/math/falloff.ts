import { ANY, inDomain, SMALLEST } from './domain';

/**
 * How fast a light falls off. A source of the diameter D that glows evenly gives on its axis
 * E = π·L·R² / (R² + d²), R = D/2, so the plain inverse square is the case D = 0.
 */

/**
 * Brightness at a distance against the brightness at a reference distance.
 *
 * s = log2((d_ref² + R²) / (d² + R²)); for a small source 2·log2(d_ref / d)
 *
 * @param distanceM d: from the light, m, > 0
 * @param referenceM d_ref: where s is 0, m, > 0
 * @param sourceDiameterM D = 2·R: of an evenly glowing disc, m, ≥ 0; 0 for a small source
 * @returns s, stops; positive nearer than the reference
 * @throws RangeError when a value is outside its domain
 * @example falloffStops(4, 2) // -2
 * @source inverse square law; the disc by derivation (uniform Lambertian disc, on its axis)
 */
export function falloffStops(distanceM: number, referenceM: number, sourceDiameterM = 0): number {
  inDomain('distanceM', distanceM, SMALLEST, ANY);
  inDomain('referenceM', referenceM, SMALLEST, ANY);
  inDomain('sourceDiameterM', sourceDiameterM, 0, ANY);
  const radiusM = sourceDiameterM / 2;
  return 2 * (Math.log2(Math.hypot(referenceM, radiusM)) - Math.log2(Math.hypot(distanceM, radiusM)));
}

/** The zone in which a light is even enough. */
export interface EvenZone {
  /** nearest distance, m; 0 when even the light's own surface is within the tolerance */
  readonly nearM: number;
  readonly farM: number;
  readonly depthM: number;
}

/**
 * The zone over which the light stays within a tolerance of the brightness at the reference distance.
 *
 * d = √((d_ref² + R²)·2^(−s) − R²) at s = +tolerance (near) and s = −tolerance (far); for a small source
 * d_ref·2^(−s/2)
 *
 * @param referenceM d_ref: where the light is measured, m, > 0
 * @param toleranceStops how much brighter or darker is allowed, stops either way, ≥ 0
 * @param sourceDiameterM D: as for {@link falloffStops}
 * @returns near and far end and the depth between them, m
 * @throws RangeError when a value is outside its domain
 * @example evenZone(2, 0.5) // near 1.682, far 2.378, depth 0.696
 * @source derivation, the inverse of {@link falloffStops}
 */
export function evenZone(referenceM: number, toleranceStops: number, sourceDiameterM = 0): EvenZone {
  inDomain('referenceM', referenceM, SMALLEST, ANY);
  inDomain('toleranceStops', toleranceStops, 0, ANY);
  inDomain('sourceDiameterM', sourceDiameterM, 0, ANY);
  const radiusM = sourceDiameterM / 2;
  const distanceAt = (stops: number): number => {
    // (ref^2 + R^2) * 2^-s - R^2 without subtracting two nearly equal squares.
    const square = referenceM ** 2 * 2 ** -stops + radiusM ** 2 * Math.expm1(-stops * Math.LN2);
    return Math.sqrt(Math.max(0, square));
  };
  const nearM = distanceAt(toleranceStops);
  const farM = distanceAt(-toleranceStops);
  return { nearM, farM, depthM: farM - nearM };
}

/**
 * Distances in equal steps, both ends included.
 *
 * @param nearM first distance, m, > 0
 * @param farM last distance, m, ≥ nearM
 * @param steps number of steps between them, whole, ≥ 1
 * @returns steps + 1 distances, m, rising
 * @throws RangeError when a value is outside its domain
 * @example distancesBetween(1, 3, 4) // [1, 1.5, 2, 2.5, 3]
 * @source derivation
 */
export function distancesBetween(nearM: number, farM: number, steps: number): number[] {
  inDomain('nearM', nearM, SMALLEST, ANY);
  inDomain('farM', farM, SMALLEST, ANY);
  if (farM < nearM) throw new RangeError('farM is not nearer than nearM.');
  if (!Number.isInteger(steps) || steps < 1) throw new RangeError('steps is a whole number, 1 or above.');
  return Array.from({ length: steps + 1 }, (_, i) => nearM + ((farM - nearM) * i) / steps);
}
