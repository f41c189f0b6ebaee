import { aimsAsTheyAre, aimsGivenUp } from './aimsGivenUp';
import { isOnAim, type FillSearch } from './fillSearch';
import { gearGivenUp, gearThatHelps } from './gearGivenUp';
import type { FillLimit, LimitInTheWay } from './limitInTheWay';
import { missingFlashes } from './missingFlashes';

/** Of two limits in the way that are short by the same, the one that costs less to give up. */
const CHEAPEST_FIRST: readonly FillLimit[] = [
  'shutter_slowest',
  'shutter_fastest',
  'iso_max',
  'iso_min',
  'nd_stops',
  'aperture_max',
  'aperture_min',
  'key_least',
  'fill_least',
  'rim_least',
  'key_power',
  'fill_power',
  'rim_power',
  'front_power',
  'ambient_too_bright',
  'aim_rim',
  'aim_ratio',
  'aim_subject',
  'aim_background',
  'high_speed_sync',
  'sync_speed',
  'key_missing',
  'fill_missing',
  'rim_missing',
];

function cheapestFirst(all: readonly LimitInTheWay[]): LimitInTheWay[] {
  const order = (one: LimitInTheWay) => CHEAPEST_FIRST.indexOf(one.limit);
  const short = (one: LimitInTheWay) => one.shortByStops ?? Infinity;
  return [...all].sort((a, b) => a.leavesStops - b.leavesStops || short(a) - short(b) || order(a) - order(b));
}

const present = (all: readonly (LimitInTheWay | null)[]) => all.filter((one) => one !== null);

/**
 * What stands in the way of the aim: each limit that by itself, moved as little as it takes, brings the best recipe to
 * within half a step of the aim; where no limit of the gear is enough alone, those that bring it nearer. None where
 * the best recipe is there already.
 *
 * @param search what {@link startSearch} found
 * @returns limits, the cheapest to give up first
 * @source exhaustive search with the limit moved; tested against going through every combination
 */
export function whyNot(search: FillSearch): LimitInTheWay[] {
  const { problem } = search;
  const missing = missingFlashes(search);
  if (isOnAim(search)) return missing;
  const enough = present(gearGivenUp(problem));
  const nearer = enough.length > 0 ? [] : present(gearThatHelps(search));
  const all = [...enough, ...nearer, ...present(aimsGivenUp(search)), ...missing];
  return cheapestFirst(all.length > 0 ? all : aimsAsTheyAre(search));
}
