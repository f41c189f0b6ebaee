import { ANY, inDomain, SMALLEST } from '../domain';

/** Steps this close to a whole number are on it; covers rounding of log2 and pow. */
const ON_STEP = 1e-9;
/** Parts of a stop that have a name of their own on flashes. */
const PARTS = [
  { stops: 1 / 3, label: '+1/3' },
  { stops: 1 / 2, label: '+1/2' },
  { stops: 2 / 3, label: '+2/3' },
];

/**
 * The powers that a flash can be set to: p = 2^(−k·step), k = 0, 1, 2, ... down to the smallest.
 *
 * @param minPower smallest fraction of full power, above 0, at most 1
 * @param stepStops between two powers, stops, > 0
 * @returns fractions of full power, falling; full power is always there
 * @throws RangeError when a value is outside its domain
 * @example powersOf(1 / 4, 1) // [1, 0.5, 0.25]
 * @source definition of the stop
 */
export function powersOf(minPower: number, stepStops: number): readonly number[] {
  inDomain('minPower', minPower, SMALLEST, 1);
  inDomain('stepStops', stepStops, SMALLEST, ANY);
  const steps = Math.floor(-Math.log2(minPower) / stepStops + ON_STEP);
  return Array.from({ length: steps + 1 }, (_, k) => 2 ** -(k * stepStops));
}

/**
 * How a power is named on a flash: the next whole stop below, with the part of a stop above it.
 *
 * @param power fraction of full power, above 0, at most 1
 * @returns "1/16", "1/16+1/3", or "1/16+0.3" where the part has no name of its own
 * @throws RangeError when the value is outside its domain
 * @example powerLabel(2 ** (-11 / 3)) // "1/16+1/3"
 * @source common practice, no source
 */
export function powerLabel(power: number): string {
  const below = -Math.log2(inDomain('power', power, SMALLEST, 1));
  const stops = Math.max(0, Math.ceil(below - ON_STEP));
  const over = stops - below;
  if (over < ON_STEP) return `1/${2 ** stops}`;
  const part = PARTS.find((one) => Math.abs(one.stops - over) < ON_STEP);
  return `1/${2 ** stops}${part?.label ?? `+${Number(over.toFixed(2))}`}`;
}
