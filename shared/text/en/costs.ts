import { stopsOf } from './stopsOf';

/** What a way to a wide aperture in daylight costs, by code. */
export const costs = {
  focus_deepens: (stops: number) =>
    `The aperture closes by ${stopsOf(stops)}, so more of the depth is sharp.`,
  flash_loses_by_aperture: (stops: number) =>
    `The smaller aperture takes ${stopsOf(stops)} of the flash as well.`,
  flash_loses_by_filter: (stops: number) => `The filter takes ${stopsOf(stops)} of the flash as well.`,
  finder_darkens: (stops: number) =>
    `An optical finder darkens by ${stopsOf(stops)}; focus before the filter goes on. Strong filters tint.`,
  filter_too_weak: (stops: number) =>
    `The strongest filter is ${stopsOf(stops)} too weak; the aperture closes by that.`,
  filter_stronger_than_needed: (stops: number) =>
    `The filter is ${stopsOf(stops)} stronger than needed; the shutter is slower by that. A higher ISO instead would give the flash as much back.`,
  flash_loses_by_spreading: (stops: number) =>
    `The light is spread over curtain and exposure, which takes ${stopsOf(stops)} of it.`,
  reach_not_known: (stops: number) =>
    `Whether the flash reaches is not known: at the most loss it is ${stopsOf(stops)} short.`,
  no_freezing_pulse: () => 'The flash no longer freezes; the shutter does.',
  more_heat: () => 'High-speed sync drains the battery and heats the head more than one pulse.',
} as const;
