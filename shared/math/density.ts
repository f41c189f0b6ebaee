import { inDomain } from './domain';

/** Stops in one unit of density: log2(10) = 3.3219. */
const STOPS_PER_DENSITY = Math.log2(10);

/** More than any filter or stack takes away; keeps every factor a finite number. */
const MOST_STOPS = 1000;

/**
 * Stops that a filter of a density takes away: s = D·log2(10).
 * @param density D = −log10 τ, dimensionless, 0 to 300
 * @returns stops, 0 or more; D 3.0 is 9.966, not 10. Throws RangeError outside the domain.
 * Source: definition of density, as in ISO 5-1; derivation.
 */
export function stopsOfDensity(density: number): number {
  return inDomain('density', density, 0, 300) * STOPS_PER_DENSITY;
}

/** Inverse of `stopsOfDensity`: D = s/log2(10), s 0 to 1,000 stops. 10 stops are D 3.0103. */
export function densityOfStops(stops: number): number {
  return inDomain('filter in stops', stops, 0, MOST_STOPS) / STOPS_PER_DENSITY;
}

/**
 * Stops that a filter factor takes away: s = log2(F).
 * @param factor F, how many times longer the exposure gets, dimensionless, 1 to 2^1000
 * @returns stops, 0 or more; factor 8 is 3. Throws RangeError outside the domain.
 * Source: definition of the filter factor, derivation.
 */
export function stopsOfFactor(factor: number): number {
  return Math.log2(inDomain('filter factor', factor, 1, 2 ** MOST_STOPS));
}

/** Inverse of `stopsOfFactor`: F = 2^s, s 0 to 1,000 stops. 3 stops are factor 8. */
export function factorOfStops(stops: number): number {
  return 2 ** inDomain('filter in stops', stops, 0, MOST_STOPS);
}

/**
 * Share of the light that passes: τ = 2^(−s) = 10^(−D) = 1/F.
 * @param stops s, 0 to 1,000
 * @returns τ, dimensionless, above 0, at most 1; 1 stop is 0.5. Throws RangeError outside the domain.
 * Source: definition of density, as in ISO 5-1; derivation.
 */
export function transmittanceOfStops(stops: number): number {
  return 2 ** -inDomain('filter in stops', stops, 0, MOST_STOPS);
}

/**
 * Stops that a share of the light takes away, the inverse of `transmittanceOfStops`: s = −log2 τ.
 * @param transmittance τ, dimensionless, 2^−1000 to 1
 * @returns stops, 0 or more; 0.55 is 0.862. Throws RangeError outside the domain. Source: as there.
 */
export function stopsOfTransmittance(transmittance: number): number {
  // 0 − x, as a clear filter takes away 0 stops and not −0.
  return 0 - Math.log2(inDomain('transmittance', transmittance, 2 ** -MOST_STOPS, 1));
}

/**
 * Stops that two polarisers take away when one is turned against the other: s = −2·log2(cos α), counted from their
 * parallel position.
 * @param angleDeg α, degrees, 0 to 89
 * @returns stops, 0 or more; 60° is 2. Throws RangeError outside the domain.
 * Source: Malus's law, τ = cos² α; real pairs tint and stop short of black.
 */
export function stopsOfPolarisers(angleDeg: number): number {
  const angle = (inDomain('angle in degrees', angleDeg, 0, 89) * Math.PI) / 180;
  return 0 - 2 * Math.log2(Math.cos(angle));
}

/**
 * Stops that filters behind each other take away: densities and stops add, factors multiply.
 * @param stops each filter, stops, 0 to 1,000 in all; an empty list is no filter
 * @returns stops, 0 or more; [3, 6] is 9. Throws RangeError outside the domain.
 * Source: definition of density (transmittances multiply), derivation.
 */
export function stackedStops(stops: readonly number[]): number {
  const total = stops.reduce((sum, one) => sum + inDomain('filter in stops', one, 0, MOST_STOPS), 0);
  return inDomain('stack in stops', total, 0, MOST_STOPS);
}
