import { sceneMiddleEv100, type SceneCode } from '../../../shared/math/scenes';
import type { Landmark } from './lightScale';

/** Scenes that most people have seen, in short words; the first ones keep their place where room is short. */
const KNOWN: readonly (readonly [SceneCode, string])[] = [
  ['sunny', 'full sun'],
  ['sky_at_sunset', 'sky at sunset'],
  ['home', 'room at home'],
  ['far_lit_buildings', 'city from afar'],
  ['land_full_moon', 'moonlit land'],
  ['bright_street', 'street of lights'],
  ['floodlit_building', 'floodlit wall'],
  ['open_shade', 'open shade'],
];

/** Captions for an axis in EV at ISO 100. */
export const lightLandmarks: readonly Landmark[] = KNOWN.map(([code, title]) => ({
  title,
  stops: sceneMiddleEv100(code),
}));
