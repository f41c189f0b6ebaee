import { listed, readable } from '../format';

export const fillNotes = {
  no_mark_within_limits: (p: { settings: readonly string[] }) =>
    `No marking of the scale lies within the limits of ${listed(p.settings, 'and')}; widen them, or take another scale.`,
  pixel_pitch_assumed: (p: { pitchUm: number }) =>
    `A pixel pitch of ${readable(Number(p.pitchUm.toPrecision(3)))} µm was assumed, that of 6,000 pixels across the sensor.`,
  view_needed: () =>
    'Blur, ghost and hand-held limit follow from the view; give focal length and distance to know them.',
  duration_needed: () =>
    'What the flash freezes follows from its duration; give t05S of each flash on the front to know it.',
  flash_moved_in_steps: () =>
    'Distances of flashes that may be moved are exact; a tape measure is near enough, as a hundredth of the distance is 0.03 stops.',
} as const;
