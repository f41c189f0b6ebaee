import { ANY, inDomain, SMALLEST } from './domain';
import { GUIDE_NUMBER_ISO } from './guideNumber';

/** A flash, a subject and the camera's settings: the five quantities of which one may be the unknown. */
export interface FlashSetup {
  /** GN: f-number times metres at ISO 100 and full power, > 0 */
  readonly guideNumberM: number;
  /** d: from the flash to the subject, m, > 0 */
  readonly distanceM: number;
  /** N: f-number, > 0 */
  readonly aperture: number;
  /** S: arithmetic speed, > 0 */
  readonly iso: number;
  /** p: fraction of full power, > 0; above 1 is more than the flash has */
  readonly power: number;
}

export type FlashUnknown = keyof FlashSetup;

/** What else changes the exposure, without being asked for. */
export interface FlashConditions {
  /** n: equal pops times equal heads, > 0; default 1 */
  readonly count?: number;
  /** everything that takes flash away: modifier, gel, filter on the lens, high-speed sync; stops, default 0 */
  readonly lossStops?: number;
}

/** Stops that each quantity adds per doubling. */
const STOPS_PER_DOUBLING: Record<FlashUnknown, number> = {
  guideNumberM: 2,
  distanceM: -2,
  aperture: -2,
  iso: 1,
  power: 1,
};

/**
 * How bright a subject comes out that only the flash lights.
 *
 * s = 2·log2(GN / (N·d)) + log2(S/100) + log2(p) + log2(n) − loss
 *
 * @param setup GN, d, N, S and p
 * @param conditions n and loss
 * @returns s, stops over (+) or under (−) the middle tone that the guide number promises
 * @throws RangeError when a value is outside its domain
 * @example flashStops({ guideNumberM: 40, distanceM: 5, aperture: 8, iso: 100, power: 1 }) // 0
 * @source ISO 1230:2007, introduction (GN = N·d); the rest by derivation
 */
export function flashStops(setup: FlashSetup, conditions: FlashConditions = {}): number {
  const { count = 1, lossStops = 0 } = conditions;
  for (const name of Object.keys(STOPS_PER_DOUBLING) as FlashUnknown[])
    inDomain(name, setup[name], SMALLEST, ANY);
  inDomain('count', count, SMALLEST, ANY);
  inDomain('lossStops', lossStops, -1000, 1000);
  const { guideNumberM, distanceM, aperture, iso, power } = setup;
  // Sums of logarithms, so that no product of extremes overflows.
  const reach = 2 * (Math.log2(guideNumberM) - Math.log2(aperture) - Math.log2(distanceM));
  return reach + Math.log2(iso / GUIDE_NUMBER_ISO) + Math.log2(power) + Math.log2(count) - lossStops;
}

/**
 * The one quantity that makes the flash light the subject as bright as wished.
 *
 * Each quantity x enters the brightness as c·log2(x), with c = 2 (GN), −2 (d, N) or 1 (S, p), so
 * x = 2^((wish − s(x = 1)) / c)
 *
 * @param unknown which quantity to find
 * @param known the other four; the unknown's own value is ignored
 * @param brightnessStops wish: stops over (+) or under (−) a middle tone, finite
 * @param conditions n and loss, as for {@link flashStops}
 * @returns the unknown in its own unit; a power above 1 is more than the flash has
 * @throws RangeError when a value is outside its domain
 * @example solveFlash('aperture', { guideNumberM: 40, distanceM: 5, aperture: 1, iso: 100, power: 1 }, 0) // 8
 * @source derivation from {@link flashStops}
 */
export function solveFlash(
  unknown: FlashUnknown,
  known: FlashSetup,
  brightnessStops: number,
  conditions: FlashConditions = {},
): number {
  inDomain('brightnessStops', brightnessStops, -1000, 1000);
  const atOne = flashStops({ ...known, [unknown]: 1 }, conditions);
  return inDomain(unknown, 2 ** ((brightnessStops - atOne) / STOPS_PER_DOUBLING[unknown]), SMALLEST, ANY);
}

/** Whether a flash has the power that it is asked for. */
export interface FlashReach {
  readonly withinPower: boolean;
  /** stops that full power lacks; 0 where it reaches */
  readonly shortByStops: number;
  /** stops from the power up to full; negative where full is not enough */
  readonly reserveStops: number;
}

/** Light that differs by less is the same. */
const SAME_LIGHT_STOPS = 1e-9;

/**
 * How a power stands to full power: reserve = −log2(p).
 *
 * @param power p: fraction of full power, > 0; above 1 is more than the flash has
 * @returns reserve and lack, stops
 * @throws RangeError when the value is outside its domain
 * @example reachOf(4) // short by 2 stops
 * @source definition of the stop
 */
export function reachOf(power: number): FlashReach {
  inDomain('power', power, SMALLEST, ANY);
  // Not -log2, which would give -0 at full power.
  const reserveStops = 0 - Math.log2(power);
  const withinPower = reserveStops >= -SAME_LIGHT_STOPS;
  return { withinPower, shortByStops: withinPower ? 0 : -reserveStops, reserveStops };
}

/** Ways to make up for a flash that falls short; each alone is enough. */
export interface FlashRemedies {
  /** move the flash to this share of its distance */
  readonly distanceFactor: number;
  /** use this many times as many equal heads (or pops, on a still subject in the dark) */
  readonly headsFactor: number;
  /** divide the f-number by this */
  readonly apertureFactor: number;
  /** multiply the ISO speed by this */
  readonly isoFactor: number;
  /** or take this much loss (modifier, gel, filter) away, stops */
  readonly lessLossStops: number;
}

/**
 * What would bring a flash up that is so many stops short.
 *
 * distance·2^(−s/2), heads·2^s, f-number / 2^(s/2), ISO·2^s, or s stops less loss
 *
 * @param shortByStops s: stops that are missing at full power, 0 to 1000
 * @returns the factors; dimensionless but for the loss in stops
 * @throws RangeError when the value is outside its domain
 * @example flashRemedies(2).distanceFactor // 0.5
 * @source derivation from {@link flashStops}
 */
export function flashRemedies(shortByStops: number): FlashRemedies {
  inDomain('shortByStops', shortByStops, 0, 1000);

  return {
    distanceFactor: 2 ** (-shortByStops / 2),
    headsFactor: 2 ** shortByStops,
    apertureFactor: 2 ** (shortByStops / 2),
    isoFactor: 2 ** shortByStops,
    lessLossStops: shortByStops,
  };
}
