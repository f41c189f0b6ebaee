import { residualStops } from '../marks';
import { onAimStops } from './fillScore';
import type { FillCamera, FillRecipe } from './fillTypes';

export type TradeCode =
  | 'on_aim'
  | 'background_off_aim'
  | 'subject_off_aim'
  | 'ratio_off_aim'
  | 'ratio_absent'
  | 'rim_off_aim'
  | 'rim_absent'
  | 'widest_aperture'
  | 'smallest_aperture'
  | 'shallower_than_first'
  | 'deeper_than_first'
  | 'lowest_iso'
  | 'iso_raised'
  | 'no_flash'
  | 'at_sync_speed'
  | 'high_speed_sync'
  | 'filter_in_use'
  | 'pulse_clipped'
  | 'over_handheld_limit'
  | 'ghost_none'
  | 'ghost_faint'
  | 'ghost_clear'
  | 'ghost_dominant'
  | 'nothing_in_reserve'
  | 'little_in_reserve'
  | 'much_in_reserve';

/** One thing that a recipe gains or costs, in stops where it has an amount. */
export interface Trade {
  readonly code: TradeCode;
  readonly stops: number | null;
}

/** Within a step of a third of a limit a setting stands at it. */
const AT_LIMIT_STOPS = 1 / 3 + 1e-9;
/** A clipped pulse of less is none. */
const LEAST_CLIP_STOPS = 0.005;
const LITTLE_RESERVE_STOPS = 1;
const MUCH_RESERVE_STOPS = 3;

const trade = (code: TradeCode, stops: number | null = null): Trade => ({ code, stops });

function aimTrades({ outcome }: FillRecipe, camera: FillCamera): Trade[] {
  const { misses, missStops } = outcome;
  const allowed = onAimStops(camera.scale);
  if (missStops <= allowed) return [trade('on_aim', missStops)];
  const off: Trade[] = [];
  const add = (code: TradeCode, stops: number | null | undefined, absent?: TradeCode) => {
    if (stops === null && absent) off.push(trade(absent));
    else if (typeof stops === 'number' && Math.abs(stops) > allowed) off.push(trade(code, stops));
  };
  add('background_off_aim', misses.backgroundStops);
  add('subject_off_aim', misses.subjectStops);
  add('ratio_off_aim', misses.ratioStops, 'ratio_absent');
  add('rim_off_aim', misses.rimStops, 'rim_absent');
  return off;
}

function apertureTrades({ aperture }: FillRecipe, camera: FillCamera, first: FillRecipe): Trade[] {
  const closed = residualStops('aperture', aperture.exact, camera.apertureMin);
  const room = residualStops('aperture', camera.apertureMax, aperture.exact);
  const found: Trade[] = [];
  if (closed < AT_LIMIT_STOPS) found.push(trade('widest_aperture'));
  else if (room < AT_LIMIT_STOPS) found.push(trade('smallest_aperture'));
  const wider = residualStops('aperture', first.aperture.exact, aperture.exact);
  if (wider > AT_LIMIT_STOPS) found.push(trade('shallower_than_first', wider));
  if (wider < -AT_LIMIT_STOPS) found.push(trade('deeper_than_first', -wider));
  return found;
}

function isoTrade({ iso }: FillRecipe, camera: FillCamera): Trade {
  const raised = Math.log2(iso.exact / camera.isoMin);
  return raised < AT_LIMIT_STOPS ? trade('lowest_iso') : trade('iso_raised', raised);
}

function syncTrades({ sync, shutter, ndStops, outcome }: FillRecipe, camera: FillCamera): Trade[] {
  const found: Trade[] = [];
  const slower = Math.log2(shutter.exact / camera.syncSpeedS);
  if (sync === 'none') found.push(trade('no_flash'));
  if (sync === 'highSpeed') found.push(trade('high_speed_sync', outcome.highSpeedLossStops));
  if (sync === 'normal' && slower < AT_LIMIT_STOPS) found.push(trade('at_sync_speed'));
  if (ndStops > 0) found.push(trade('filter_in_use', ndStops));
  const clipped = -(outcome.clippedStops ?? 0);
  if (clipped >= LEAST_CLIP_STOPS) found.push(trade('pulse_clipped', clipped));
  return found;
}

function motionTrades({ outcome }: FillRecipe): Trade[] {
  const over = outcome.handheld?.overStops ?? 0;
  const found = over > 0 ? [trade('over_handheld_limit', over)] : [];
  return outcome.ghost ? [...found, trade(`ghost_${outcome.ghost.visibility}`)] : found;
}

function reserveTrades({ outcome: { reserveStops } }: FillRecipe): Trade[] {
  if (reserveStops === null) return [];
  if (reserveStops < 1e-9) return [trade('nothing_in_reserve')];
  if (reserveStops < LITTLE_RESERVE_STOPS) return [trade('little_in_reserve', reserveStops)];
  return reserveStops >= MUCH_RESERVE_STOPS ? [trade('much_in_reserve', reserveStops)] : [];
}

/**
 * What a recipe gains and what it costs, in the order in which it matters: the aim, the aperture, ISO, shutter, sync
 * and filter, movement, power.
 *
 * @param recipe which
 * @param camera its limits, against which a setting stands at an end or not
 * @param first the best recipe, against which the others are told
 * @returns codes, with stops where there is an amount
 */
export function tradeOffs(recipe: FillRecipe, camera: FillCamera, first: FillRecipe): Trade[] {
  return [
    ...aimTrades(recipe, camera),
    ...apertureTrades(recipe, camera, first),
    isoTrade(recipe, camera),
    ...syncTrades(recipe, camera),
    ...motionTrades(recipe),
    ...reserveTrades(recipe),
  ];
}
