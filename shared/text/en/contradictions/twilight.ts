import { quoted, readable, seconds } from '../format';

export const twilightContradictions = {
  time_zone_unknown: (p: Record<string, unknown>) =>
    `There is no time zone ${quoted(p.given)}. Give a name of the IANA database, such as “Europe/London”, or leave it out.`,
  year_out_of_range: (p: Record<string, unknown>) =>
    `Years from ${String(p.first)} to ${String(p.last)} are answered; ${quoted(p.given)} lies outside.`,
  date_skipped: (p: Record<string, unknown>) =>
    `The calendar of ${String(p.timeZone)} never had the date ${quoted(p.given)}; it was skipped when the zone changed sides of the date line.`,
  band_upside_down: (p: Record<string, unknown>) =>
    `The upper limit must lie above the lower one of ${readable(Number(p.fromDeg))}°; ${readable(Number(p.toDeg))}° was given.`,
  frames_too_far_apart: (p: Record<string, unknown>) =>
    `All test frames belong to one evening or one dawn, within ${String(p.hours)} hours; this one lies ${readable(Number(p.given))} hours from the first.`,
  ladder_far_from_frames: (p: Record<string, unknown>) =>
    `The ladder starts and ends within ${String(p.hours)} hours of the first test frame; this lies ${readable(Number(p.given))} hours from it.`,
  ladder_ends_before_start: () =>
    'The ladder must end after it starts; without “from” it starts at the first test frame.',
  hold_beyond_limit: (p: Record<string, unknown>) =>
    `What is held must lie within the limits: ${String(p.what)} ${quoted(p.held)} is beyond ${quoted(p.limit)}.`,
  sync_leaves_no_shutter: (p: Record<string, unknown>) =>
    `With a flash the shutter is no faster than its sync speed of ${seconds(Number(p.syncSpeedS))}, yet it may be no slower than ${seconds(Number(p.slowestS))}.`,
  lamps_off_before_on: () => 'The lamps must go off after they come on.',
  gives_way_twice: (p: Record<string, unknown>) =>
    `Each may give way once; ${quoted(p.given)} stands there twice.`,
  subject_without_flash: () =>
    'How far the subject lies under the background is asked for the flash’s power; give the flash as well.',
} as const;
