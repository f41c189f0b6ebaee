import { ANY, inDomain, SMALLEST } from './domain';
import { sceneEv100, type ExactSettings } from './exposure';

/** Three ways to take a picture in daylight at an aperture that is too wide for the sync speed. */
export type DaylightWay = 'smallerAperture' | 'neutralDensity' | 'highSpeedSync';

/** The light, the wish, and the camera. */
export interface DaylightScene {
  /** B: of the background, stops */
  readonly backgroundEv100: number;
  /** of the ambient light on the subject, stops */
  readonly subjectEv100: number;
  /** b: how bright the background is to come out, stops from a middle tone */
  readonly backgroundStops: number;
  /** how bright the subject is to come out, stops from a middle tone */
  readonly subjectStops: number;
  /** N: the wish, f-number, > 0 */
  readonly aperture: number;
  /** S: arithmetic speed, > 0 */
  readonly iso: number;
  /** s, > 0 */
  readonly syncSpeedS: number;
}

/**
 * How much too much light the wanted aperture lets in at the sync speed, filters left aside.
 *
 * c = (B − b) − EV100(N, sync speed, S)
 *
 * @param scene the light, the wish and the camera
 * @returns c, stops; 0 or less where the wanted aperture needs no way out
 * @throws RangeError when a value is outside its domain
 * @example f/2, 1/256 s, ISO 100 is EV100 10; a background of 15 is 5 stops too bright
 * @source derivation
 */
export function syncConflictStops(scene: DaylightScene): number {
  const { backgroundEv100, backgroundStops, aperture, iso, syncSpeedS } = scene;
  for (const stops of [backgroundEv100, backgroundStops]) inDomain('light in stops', stops, -1000, 1000);
  for (const setting of [aperture, iso, syncSpeedS]) inDomain('setting', setting, SMALLEST, ANY);
  return backgroundEv100 - backgroundStops - sceneEv100(aperture, syncSpeedS, iso);
}

/**
 * The filter for a conflict: the weakest owned one that is strong enough, else the strongest owned one.
 *
 * @param conflictStops c: stops to take away, > 0
 * @param ownedStops strengths at hand, stops, each ≥ 0; left out: any strength
 * @returns stops
 * @throws RangeError when a value is outside its domain
 * @example filterFor(3.3, [2, 4, 6]) // 4
 * @source derivation
 */
export function filterFor(conflictStops: number, ownedStops?: readonly number[]): number {
  inDomain('conflictStops', conflictStops, 0, 1000);
  if (ownedStops === undefined) return conflictStops;
  for (const stops of ownedStops) inDomain('ndStops', stops, 0, 1000);
  const enough = ownedStops.filter((stops) => stops >= conflictStops - 1e-9);
  return enough.length > 0 ? Math.min(...enough) : Math.max(0, ...ownedStops);
}

/**
 * The settings that put the background where it is wanted at the wanted aperture, without a filter:
 * t = sync speed·2^(−c). Slower than the sync speed where c is below 0, so that nothing stands in the way; faster
 * above it, where only high-speed sync can follow.
 *
 * @param scene the light, the wish and the camera
 * @returns exact settings
 * @throws RangeError when a value is outside its domain
 * @example two stops to spare at a sync speed of 1/256 s: 1/64 s
 * @source derivation
 */
export function settingsAsWanted(scene: DaylightScene): ExactSettings {
  const { aperture, iso, syncSpeedS } = scene;
  return { aperture, shutterS: syncSpeedS * 2 ** -syncConflictStops(scene), iso, ndStops: 0 };
}

/**
 * The settings that put the background where it is wanted, by one of the three ways.
 *
 * smaller aperture: N·2^(c/2). Neutral density: the filter; what it takes too much goes to a longer time, what it
 * takes too little to a smaller aperture. High-speed sync: sync speed·2^(−c).
 *
 * @param way which
 * @param scene the light, the wish and the camera
 * @param ownedNdStops filters at hand, as for {@link filterFor}
 * @returns exact settings
 * @throws RangeError when a value is outside its domain or there is no conflict
 * @example five stops over at f/2 and 1/256 s: f/11.3; or 5 stops of filter; or 1/8192 s
 * @source derivation
 */
export function settingsOfWay(
  way: DaylightWay,
  scene: DaylightScene,
  ownedNdStops?: readonly number[],
): ExactSettings {
  const conflict = inDomain('conflict in stops', syncConflictStops(scene), 0, 1000);
  const { aperture, iso, syncSpeedS } = scene;
  if (way === 'smallerAperture')
    return { aperture: closed(aperture, conflict), shutterS: syncSpeedS, iso, ndStops: 0 };
  if (way === 'highSpeedSync') return settingsAsWanted(scene);
  const ndStops = filterFor(conflict, ownedNdStops);
  const over = ndStops - conflict;
  return over >= 0
    ? { aperture, shutterS: syncSpeedS * 2 ** over, iso, ndStops }
    : { aperture: closed(aperture, -over), shutterS: syncSpeedS, iso, ndStops };
}

function closed(aperture: number, stops: number): number {
  return aperture * 2 ** (stops / 2);
}
