import { ANY, inDomain, SMALLEST } from './domain';
import { sceneEv100, type ExactSettings } from './exposure';
import { flashStops } from './flashExposure';
import { highSpeedSyncLossStops } from './highSpeedSync';
import { stopsStillNeeded } from './mixing';

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
  if (way === 'highSpeedSync') return { aperture, shutterS: syncSpeedS * 2 ** -conflict, iso, ndStops: 0 };
  const ndStops = filterFor(conflict, ownedNdStops);
  const over = ndStops - conflict;
  return over >= 0
    ? { aperture, shutterS: syncSpeedS * 2 ** over, iso, ndStops }
    : { aperture: closed(aperture, -over), shutterS: syncSpeedS, iso, ndStops };
}

function closed(aperture: number, stops: number): number {
  return aperture * 2 ** (stops / 2);
}

/** A flash on the subject. */
export interface DaylightFlash {
  /** GN: f-number times metres at ISO 100 and full power, > 0 */
  readonly guideNumberM: number;
  /** d: m, > 0 */
  readonly distanceM: number;
  /** by modifier and gel, stops that take light away */
  readonly lossStops: number;
}

/** What the flash has to do and can do. */
export interface FlashDemand {
  /** ambient light on the subject with these settings, stops from a middle tone */
  readonly ambientStops: number;
  /** what the flash has to add; null where ambient light alone is as bright as wished, or brighter */
  readonly flashStops: number | null;
  /** fraction of full power that does it, above 1 where the flash has not enough; null with `flashStops` */
  readonly power: number | null;
  /** stops between that and full power, negative where the flash has not enough; null with `flashStops` */
  readonly reserveStops: number | null;
}

/**
 * What a flash has to do with given settings, and what it has left.
 *
 * a = subject's EV100 − settings' EV100, f = log2(2^wish − 2^a), reserve = (flash at full power) − f,
 * p = 2^(−reserve)
 *
 * @param settings exact settings
 * @param scene the light and the wish
 * @param flash GN, d and loss
 * @param highSpeedLossStops what high-speed sync takes, stops; 0 for one ordinary pulse
 * @returns ambient and flash on the subject, power and reserve
 * @throws RangeError when a value is outside its domain
 * @example GN 40 at 5 m, f/8, ISO 100, ambient one stop under the wish: flash −1, power 1/2, reserve 1
 * @source derivation from the additivity of exposure and GN = N·d
 */
export function flashDemand(
  settings: ExactSettings,
  scene: DaylightScene,
  flash: DaylightFlash,
  highSpeedLossStops: number,
): FlashDemand {
  const { aperture, shutterS, iso, ndStops } = settings;
  const ambientStops = scene.subjectEv100 - sceneEv100(aperture, shutterS, iso, ndStops);
  const needed = stopsStillNeeded(scene.subjectStops, ambientStops);
  if (needed === null) return { ambientStops, flashStops: null, power: null, reserveStops: null };
  const { guideNumberM, distanceM, lossStops } = flash;
  const setup = { guideNumberM, distanceM, aperture, iso, power: 1 };
  const reserveStops = flashStops(setup, { lossStops: lossStops + ndStops + highSpeedLossStops }) - needed;
  return { ambientStops, flashStops: needed, power: 2 ** -reserveStops, reserveStops };
}

/** Extra loss by high-speed sync beyond the energy model, where nobody has measured it: from none to this, stops. */
export const UNMEASURED_EXTRA_STOPS = 1.5;

/** A reserve that is known only within bounds, stops. */
export interface ReserveRange {
  readonly lowStops: number;
  readonly highStops: number;
}

/**
 * Which of the two ways that keep the wanted aperture leaves the flash more in reserve; neither while the reserve
 * of high-speed sync is known too loosely to tell.
 *
 * @param filterReserveStops with the filter, stops
 * @param highSpeed with high-speed sync, stops, from its most to its least loss
 * @returns the better one, or null while the ranges overlap
 * @example betterForFlash(1, { lowStops: 0.2, highStops: 1.7 }) // null
 * @source derivation
 */
export function betterForFlash(
  filterReserveStops: number,
  highSpeed: ReserveRange,
): 'neutralDensity' | 'highSpeedSync' | null {
  if (filterReserveStops > highSpeed.highStops) return 'neutralDensity';
  return filterReserveStops < highSpeed.lowStops ? 'highSpeedSync' : null;
}

/**
 * The loss of high-speed sync for the settings of that way; see {@link highSpeedSyncLossStops}. None where the
 * shutter is no faster than the sync speed, because one ordinary pulse then lights the whole frame.
 */
export function lossOfWay(
  way: DaylightWay,
  settings: ExactSettings,
  highSpeed: { readonly curtainS: number; readonly extraLossStops: number },
): number {
  if (way !== 'highSpeedSync') return 0;
  return highSpeedSyncLossStops(settings.shutterS, highSpeed.curtainS, highSpeed.extraLossStops);
}
