import { readable, signedStops } from '../format';
import { stopsOf } from '../stopsOf';

/** Three digits are enough for a sentence. */
const digits = (value: number) => readable(Number(value.toPrecision(3)));

/** Whole heads, rounded up but for rounding errors. */
const heads = (count: number) => `${digits(Math.ceil(count - 1e-9))} equal heads`;

export const flashNotes = {
  flash_too_weak: (p: {
    stops: number;
    distanceM: number;
    heads: number;
    aperture: string;
    iso: string;
    lessLossStops: number | null;
  }) =>
    `Full power is ${stopsOf(p.stops)} short. Each of these alone makes up for it: the flash at ${digits(p.distanceM)} m, ${heads(p.heads)}, ${p.aperture}, ISO ${p.iso}${
      p.lessLossStops === null ? '' : ', or as much less loss by modifier, gel and filter'
    }.`,
  flash_outshone: (p: {
    stops: number;
    roomStops: number;
    distanceM: number;
    heads: number;
    lessLossStops: number | null;
  }) =>
    `Full power is at least ${stopsOf(p.stops)} short. ${
      p.roomStops > 0.01
        ? `A wider aperture or a higher ISO helps by up to ${stopsOf(p.roomStops)}, with the shutter brought up to the sync speed; beyond that they change`
        : 'Aperture, ISO and filter change'
    } flash and sun alike and don’t help. Each of these alone does: the flash at ${digits(p.distanceM)} m, ${heads(p.heads)}${
      p.lessLossStops === null ? '' : ', as much less loss by modifier and gel'
    }; or let the background come out brighter, or wait until it is darker.`,
  power_below_usual: (p: { mark: string }) =>
    `Power ${p.mark} lies below what usual flashes go down to (1/128 to 1/256); move the flash away or put something before it.`,
  flash_very_near: () =>
    'This near, the flash is no small source: light falls off more slowly than by the inverse square, and the figure is too bright.',
  guide_number_outside_usual: (p: { guideNumberM: number }) =>
    `Guide number ${digits(p.guideNumberM)} lies beyond single portable flashes (about 10 to 80 m); use several, or a studio pack.`,
  guide_number_from_energy: () =>
    'The guide number was worked out from energy, efficacy and reflector; rated ones follow other constants and often a light-walled room, up to a stop apart. Measure it with flash/measured.',
  guns_aimed_alike: () =>
    'Several guns add as the root of the sum of squares, provided they stand together and are aimed alike.',
  pops_need_still_subject: () =>
    'Several pops add up only on a subject that stays still, with full recycling between them, and ambient light adds up too.',
  hss_not_needed: () =>
    'The shutter is no faster than the sync speed; one ordinary pulse lights the whole frame, and high-speed sync takes nothing.',
  hss_as_continuous: () =>
    'In high-speed sync the flash counts as continuous light: the shutter, not the flash, decides what is frozen, and a faster shutter costs the flash as much as the ambient light.',
  hss_loss_unmeasured: (p: { extraStops: number; lowStops?: number; highStops?: number }) =>
    `The loss of high-speed sync beyond the energy model is not measured for this gear; it can be up to ${stopsOf(p.extraStops)} more.${
      p.lowStops === undefined || p.highStops === undefined
        ? ''
        : ` Its reserve lies between ${signedStops(p.lowStops)} and ${signedStops(p.highStops)} stops.`
    } Compare one frame each way.`,
  hss_and_filter_overlap: () =>
    'Within what is known, filter and high-speed sync leave the flash about the same; neither is named the better one.',
  small_source_assumed: () =>
    'This holds for a light that is small against the distance: give the diameter of a softbox or umbrella, or stay five diameters away.',
  ambient_taken_as_none: () =>
    'No ambient light was given, so all of the result is counted as flash. In daylight take a frame without flash too.',
  ambient_dominates: (p: { share: number; errorFactor: number }) =>
    `${readable(Math.round(100 * p.share))} % of the subject’s light is ambient, so an error in the result grows ${readable(Number(p.errorFactor.toPrecision(2)))} times. Darken the ambient light and measure again.`,
  shutter_plays_no_part: () =>
    'The shutter plays no part in the flash as long as it is no faster than the sync speed and longer than the pulse.',
  power_ignored: () => 'A whole discharge lasts equally long at every power, so the power plays no part.',
  ratio_ignored: () =>
    'The ratio belongs to a whole discharge; a pulse that is cut off follows from the exponential, so the ratio plays no part.',
  ratio_assumed: () =>
    'The other duration follows from an exponential (t0.1 is 3.32 times t0.5). Real pulses with a rise have 2.4 to 3.1; give the measured ratio where there is one.',
  rise_added: (p: { riseUs: number }) =>
    `Below 1/16 power the tube’s rise counts: ${digits(p.riseUs)} µs were added, fitted to one published flash.`,
  duration_only_measurable: () =>
    'Controlled by voltage, a flash burns longer at less power, by how much can only be measured. The durations are those of full power: the least they can be.',
  pulse_clipped: (p: { stops: number }) =>
    `The shutter closes before the pulse is over and takes ${stopsOf(-p.stops)} of it.`,
  movement_along_axis: () =>
    'Movement along the lens axis shifts nothing in the middle of the picture; it only makes the subject larger, by its distance from the middle times speed times time over distance.',
  visibility_by_practice: () =>
    'How visible a ghost is follows common practice, without a source: a trail three stops under the flash is faint, six stops under it is gone. A dark plain background shows more.',
  shake_is_a_model: () =>
    'Shake is that of a hand that turns by 1.7° a second, on which the hand-held rule rests; hands differ.',
  shake_needs_shutter: () => 'Shake follows from the shutter; give the ambient light’s shutter to know it.',
  ambient_too_bright: (p: { stops: number }) =>
    `The ambient light alone makes the subject ${stopsOf(p.stops)} brighter than wished, and no flash darkens: shade the subject by so much, or lower everything.`,
  no_flash_needed: () => 'The ambient light alone makes the subject as bright as wished; no flash is needed.',
  aperture_needs_no_way_out: () =>
    'At the wanted aperture the shutter is no faster than the sync speed, so neither a filter nor high-speed sync is needed.',
  energy_goes_with_power: () =>
    'Energy is taken to go with power. A battery in the cold, an old one and a modelling lamp give less.',
  charge_too_small: () => 'One charge is not enough for a single frame at this power.',
  flash_too_slow: (p: { burstFrames: number }) =>
    `The flash is not ready for every frame: from full, frame ${readable(p.burstFrames + 1)} comes too early. Lower the power or the frame rate.`,
  heat_of_many_pops: () =>
    'Many pops in a row heat tube and modifier; keep to the maker’s limits and pauses.',
} as const;
