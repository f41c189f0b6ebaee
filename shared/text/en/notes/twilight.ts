import { readable, signedStops } from '../format';

export const twilightNotes = {
  zone_looked_up: (p: { timeZone: string }) =>
    `Times are in ${p.timeZone}, the zone in force at these coordinates. Beside a border that may be the neighbour’s; give timeZone where you know it.`,
  standard_refraction: () =>
    'Sunrise and sunset take the usual refraction of 34′ at the horizon. The weather shifts them by some tens of seconds, in high latitudes by minutes, and hills or buildings by more; give horizonDeg or a skyline for those.',
  bands_by_practice: () =>
    'Golden and blue hour have no standard; these limits are common practice and can be given.',
  sun_grazes: () =>
    'The sun’s path only grazes one of these altitudes on this day, so that refraction and a minute of arc decide over many minutes.',
  sky_model_clear: () =>
    'The light is that on a level surface under a clear sky, by a published model. Cloud takes one to four stops, and a scene is set by what the camera sees, not by this.',
  sky_model_clamped: () =>
    'The sun is below −18°, where the model ends: stars, airglow and lamps count from there on.',
  lamps_unknown: () =>
    'One frame can’t tell sky from lamps. Where lamps or windows light the scene, the fall will stop at them: add a frame once the sun is below −6°.',
  lamps_undetermined: (p: { lowEv100: number | null; highEv100: number | null }) =>
    `The frames lie too close together to tell how much of the light is lamps: anything from ${p.lowEv100 === null ? 'none' : `EV ${readable(p.lowEv100)}`} to ${p.highEv100 === null ? 'none' : `EV ${readable(p.highEv100)}`} would fit. Add a frame later in the evening.`,
  frame_below_lamps: (p: { sceneEv100: number; lampFloorEv100: number }) =>
    `A test frame shows EV ${readable(p.sceneEv100)}, no brighter than the lamps alone at EV ${readable(p.lampFloorEv100)}, so nothing is left for the sky. Lower lampFloorEv100, or look at the frame again.`,
  lamps_came_on: (p: { at: string }) =>
    `The frame of ${p.at} is brighter than an earlier one although the sky fell: lamps are taken to have come on by then. Give lamps.onAt where you know it.`,
  frame_before_sunset: () =>
    'A frame was taken before sunset. In sunlight the light on level ground says little of the sky that a picture shows, so the ladder may be two stops off; frames from sunset on are far better.',
  check_clock: (p: { offsetStops: number }) =>
    `The scene came out ${signedStops(p.offsetStops)} stops from what a clear sky gives at that time and place. Few scenes differ by more than three: check the frame’s clock, time zone and place.`,
  moon_counts: () => 'The moon’s light is within reach of the sky’s on this evening, and is added to it.',
  lights_fixed_to_key: () =>
    'The power is the key’s. Other flashes keep their ratio to it if they are moved by the same steps.',
} as const;
