import { amount, readable } from '../format';

export const exposureNotes = {
  scene_middle_used: (p: { scene: string; low: number; high: number; middle: number }) =>
    p.low === p.high
      ? `“${p.scene}” stands for EV ${readable(p.middle)} at ISO 100. A meter knows better.`
      : `“${p.scene}” covers EV ${readable(p.low)} to ${readable(p.high)} at ISO 100; the middle, ${readable(p.middle)}, was used. A meter knows better.`,
  aperture_outside_usual_gear: (p: { mark: string }) =>
    `${p.mark} lies outside usual lenses (f/1 to f/32); choose another shutter or ISO.`,
  shutter_outside_usual_gear: (p: { mark: string; isLonger: boolean }) =>
    p.isLonger
      ? `${p.mark} is longer than the slowest marking of usual cameras (30s); it takes a remote release and a watch, or a wider aperture or a higher ISO.`
      : `${p.mark} is shorter than the fastest time of usual cameras (1/8000); close the aperture, lower the ISO or add a filter.`,
  iso_outside_usual_gear: (p: { mark: string }) =>
    `ISO ${p.mark} lies outside usual cameras (50 to 102,400); choose another aperture or shutter.`,
  usual_gear_limits: () =>
    'Limits that were not given are those of usual gear, f/1 to f/32, 1/8000 to 30s and ISO 50 to 102,400, widened to your own settings.',
  exposure_moved_to_step: (p: { stops: number }) =>
    `The exposure does not fall on marks of this scale; the rows give the nearest that does, ${amount(Number(Math.abs(p.stops).toPrecision(2)), 'stops')} ${p.stops < 0 ? 'darker' : 'brighter'}.`,
  no_equivalents: () =>
    'No combination of marks within the limits gives this exposure; widen a limit, or keep another setting.',
  reciprocity_is_for_film: () =>
    'This is for film. A sensor needs no correction: expose for the metered time.',
  reciprocity_shifts_colour: () =>
    'Colour film also changes its colours at such times; the maker’s sheet names the filter, if any.',
  reciprocity_extrapolated: (p: { meteredS: number; trustedS: number }) =>
    `${readable(p.meteredS)} s lies beyond ${readable(p.trustedS)} s, the longest time with data behind it; this is extrapolation. Bracket.`,
  reciprocity_joined_to_break: (p: { firstS: number }) =>
    `Below its first pair, at ${readable(p.firstS)} s, the table is joined to no correction at 1 s.`,
  reciprocity_of_one_pair: () =>
    'One pair gives one point of the film’s curve only; the rest follows from the assumption that no correction is needed up to 1 s.',
  handheld_rule_of_thumb: () =>
    'A rule of thumb for hands that turn by 1.7° a second, and for a print looked at as a whole; it says nothing about a subject that moves. For sharp single pixels take a fifth of the time.',
  stabilisation_as_claimed: (p: { stops: number }) =>
    `Stabilisation is counted as claimed, ${amount(p.stops, 'stops')}; close up and with long lenses it gains less.`,
  circle_assumed: (p: { circleUm: number }) =>
    `Neither a circle of confusion nor a sensor was given; ${readable(p.circleUm)} µm was used, for 36 × 24 mm.`,
  background_at_infinity: () =>
    'No background distance was given; the background is taken to be at infinity.',
  background_in_front: () =>
    'The background lies nearer than the focus, so the blur is that of a foreground.',
  diffraction_over_circle: () =>
    'Diffraction alone is wider than the circle of confusion here; a smaller aperture makes nothing sharper.',
  close_up_lens_matters: () =>
    'This close, the lens’s own construction counts, and distances count from its entrance pupil, not from the sensor.',
} as const;
