import { readable, signedStops } from '../format';

export const exposureNotes = {
  scene_middle_used: (p: { scene: string; low: number; high: number; middle: number }) =>
    `“${p.scene}” covers EV ${readable(p.low)} to ${readable(p.high)} at ISO 100; the middle, ${readable(p.middle)}, was used. A meter knows better.`,
  aperture_outside_usual_gear: (p: { mark: string }) =>
    `${p.mark} lies outside usual lenses (f/1 to f/32); change the shutter or the ISO.`,
  shutter_outside_usual_gear: (p: { mark: string }) =>
    `${p.mark} lies outside the marked times of usual cameras (1/8000 to 30s); a longer time needs a remote release and a watch, a shorter one less light.`,
  iso_outside_usual_gear: (p: { mark: string }) =>
    `ISO ${p.mark} lies outside usual cameras (50 to 102,400); open the aperture or lengthen the shutter.`,
  usual_gear_limits: () =>
    'Where no limits were given, usual ones hold: f/1 to f/32, 1/8000 to 30s, ISO 50 to 102,400.',
  exposure_moved_to_step: (p: { stops: number }) =>
    `The settings do not stand on marks of this scale; the rows give the nearest exposure that does, ${signedStops(p.stops)} stops away.`,
  no_equivalents: () =>
    'No combination of marks within the limits gives this exposure; widen a limit, or keep another setting.',
} as const;
