import { signedStops } from './format';
import { stopsOf } from './stopsOf';

/** What a recipe trades, by code. */
export const fillTrades = {
  on_aim: (stops: number) =>
    stops < 0.005
      ? 'Every part comes out as aimed.'
      : `Every part comes out within ${stopsOf(stops)} of the aim, which is less than half a step.`,
  background_off_aim: (stops: number) => `The background comes out ${signedStops(stops)} stops from the aim.`,
  subject_off_aim: (stops: number) => `The subject comes out ${signedStops(stops)} stops from the aim.`,
  ratio_off_aim: (stops: number) =>
    `The lit side stands ${signedStops(stops)} stops from where the ratio would have it.`,
  ratio_absent: () => 'Key and fill are not both in use, so there is no ratio.',
  rim_off_aim: (stops: number) => `The rim comes out ${signedStops(stops)} stops from the aim.`,
  rim_absent: () => 'No rim flash is in use.',
  widest_aperture: () =>
    'The lens is wide open: focus is as shallow as it gets, and the flash needs least power.',
  smallest_aperture: () =>
    'The aperture is as small as it goes: focus is deep, and the flash needs most power.',
  shallower_than_first: (stops: number) =>
    `The aperture is ${stopsOf(stops)} wider than in the first recipe, so focus is shallower.`,
  deeper_than_first: (stops: number) =>
    `The aperture is ${stopsOf(stops)} smaller than in the first recipe, so focus is deeper.`,
  lowest_iso: () => 'ISO is the lowest that the camera has, so there is least noise.',
  iso_raised: (stops: number) => `ISO is ${stopsOf(stops)} over the camera’s lowest, which adds noise.`,
  no_flash: () => 'Ambient light does it alone; no flash is used.',
  at_sync_speed: () =>
    'The shutter is at the sync speed: of all normal settings this gives the flash most against the ambient light.',
  high_speed_sync: (stops: number) =>
    `High-speed sync takes ${stopsOf(stops)} of the flash, and the shutter, not the pulse, freezes.`,
  filter_in_use: (stops: number) =>
    `The filter takes ${stopsOf(stops)} from flash and ambient light alike and darkens an optical finder.`,
  pulse_clipped: (stops: number) => `The shutter clips the pulse by ${stopsOf(stops)}.`,
  over_handheld_limit: (stops: number) =>
    `The shutter is ${stopsOf(stops)} slower than the hand-held limit; rest the camera on something.`,
  ghost_none: () => 'No ghost will be seen beside the moving subject.',
  ghost_faint: () => 'A faint ghost may be seen beside the moving subject on a plain dark background.',
  ghost_clear: () => 'A clear ghost will be seen beside the moving subject.',
  ghost_dominant: () => 'Ambient light draws the moving subject more than the flash does.',
  nothing_in_reserve: () => 'A flash works at full power, with nothing in reserve and the longest recycling.',
  little_in_reserve: (stops: number) => `The flash that works hardest has ${stopsOf(stops)} in reserve.`,
  much_in_reserve: (stops: number) =>
    `Even the flash that works hardest has ${stopsOf(stops)} in reserve, so batteries last.`,
} as const;
