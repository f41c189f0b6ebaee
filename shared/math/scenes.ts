/** A kind of scene and the settings that suit it, as EV at ISO 100 of the whole picture. */
export interface Scene {
  /** Stable name, snake_case. */
  readonly code: string;
  readonly group: SceneGroup;
  readonly title: string;
  readonly ev100Low: number;
  readonly ev100High: number;
}

/** Groups of scenes, in the list's order. */
export const SCENE_GROUPS = [
  'day',
  'sky_at_sunset',
  'moon_and_aurora',
  'town_after_dark',
  'grounds_after_dark',
  'indoors',
] as const;

type SceneGroup = (typeof SCENE_GROUPS)[number];

/** Where the numbers come from; grouping, codes and words are our own. */
export const SCENE_SOURCE =
  'ANSI PH2.7-1973 and ANSI PH2.7-1986, as tabulated in an encyclopaedia (article "Exposure value"); the standards themselves were not seen';

function scene<Code extends string>(
  code: Code,
  group: SceneGroup,
  title: string,
  ev100Low: number,
  ev100High = ev100Low,
): Scene & { readonly code: Code } {
  return { code, group, title, ev100Low, ev100High };
}

/**
 * Guide to camera settings, EV100, brightest groups first. It says how whole scenes are usually rendered. It is no
 * table of illuminance: at sunset it speaks of the bright sky, and by moonlight it asks for more light than a meter
 * would. The rows in direct sun hold from about two hours after sunrise to two hours before sunset and for light
 * from the front; from the side subtract 1, from behind 2.
 */
export const SCENES = [
  scene('sunny_snow_or_sand', 'day', 'Snow or pale sand in the sun, crisp shadows', 16),
  scene('sunny', 'day', 'Ordinary subject in the sun, crisp shadows', 15),
  scene('hazy_sun', 'day', 'Ordinary subject in veiled sun, shadows with soft edges', 14),
  scene('bright_cloud', 'day', 'Light cloud, shadows gone', 13),
  scene('heavy_cloud', 'day', 'Thick, dark cloud', 12),
  scene('open_shade', 'day', 'In the shade while the sun shines all around', 12),
  scene('rainbow_clear_sky', 'day', 'Rainbow on clear sky', 15),
  scene('rainbow_cloudy_sky', 'day', 'Rainbow on cloud', 14),
  scene('sky_before_sunset', 'sky_at_sunset', 'Sky or skyline in the last minutes of sun', 12, 14),
  scene('sky_at_sunset', 'sky_at_sunset', 'Sky or skyline as the sun goes down', 12),
  scene('sky_after_sunset', 'sky_at_sunset', 'Sky or skyline in the first minutes after', 9, 11),
  scene('moon_full', 'moon_and_aurora', 'The disc of a full moon, over 40° up', 15),
  scene('moon_gibbous', 'moon_and_aurora', 'The disc of a moon more than half lit, over 40° up', 14),
  scene('moon_half', 'moon_and_aurora', 'The disc of a half moon, over 40° up', 13),
  scene('moon_crescent', 'moon_and_aurora', 'A thin moon, over 40° up', 12),
  scene('land_full_moon', 'moon_and_aurora', 'Land under a full moon, over 40° up', -3, -2),
  scene('land_gibbous_moon', 'moon_and_aurora', 'Land under a moon more than half lit, over 40° up', -4),
  scene('land_half_moon', 'moon_and_aurora', 'Land under a half moon, over 40° up', -6),
  scene('aurora_bright', 'moon_and_aurora', 'Strong aurora', -4, -3),
  scene('aurora_medium', 'moon_and_aurora', 'Aurora of middling strength', -6, -5),
  scene('lit_signs', 'town_after_dark', 'Neon and other lit signs', 9, 10),
  scene('bright_street', 'town_after_dark', 'Street full of lights', 8),
  scene('street_and_windows', 'town_after_dark', 'Ordinary street after dark, shop windows', 7, 8),
  scene('road_traffic', 'town_after_dark', 'Cars on a road after dark', 5),
  scene('festive_tree_lights', 'town_after_dark', 'Tree hung with small lights', 4, 5),
  scene('floodlit_building', 'town_after_dark', 'Building, statue or fountain under floodlights', 3, 5),
  scene('far_lit_buildings', 'town_after_dark', 'Lit buildings from afar, a city at full dark', 2),
  scene('sports_ground', 'grounds_after_dark', 'Sport under floodlights', 9),
  scene('fire', 'grounds_after_dark', 'Bonfire or burning house', 9),
  scene('fairground', 'grounds_after_dark', 'Fair or amusement park', 7),
  scene('gallery', 'indoors', 'Gallery', 8, 11),
  scene('ice_show', 'indoors', 'Show on ice under floodlights', 9),
  scene('sports_hall_or_stage', 'indoors', 'Sport in a hall, show on a stage', 8, 9),
  scene('circus', 'indoors', 'Circus under floodlights', 8),
  scene('workplace', 'indoors', 'Office or workshop', 7, 8),
  scene('home', 'indoors', 'Rooms at home', 5, 7),
] as const;

export type SceneCode = (typeof SCENES)[number]['code'];

/** Codes of all scenes, in the list's order. */
export const SCENE_CODES: readonly SceneCode[] = SCENES.map((one) => one.code);

/**
 * The middle of a scene's range: (low + high)/2.
 * @param code one of `SCENE_CODES`
 * @returns EV100, stops; 'land_full_moon' is −2.5. Source: as for `SCENES`; the middle is our choice.
 */
export function sceneMiddleEv100(code: SceneCode): number {
  const found = SCENES.find((one) => one.code === code) as Scene;
  return (found.ev100Low + found.ev100High) / 2;
}
