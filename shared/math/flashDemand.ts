import type { DaylightScene } from './daylightWays';
import { sceneEv100, type ExactSettings } from './exposure';
import { flashStops } from './flashExposure';
import { stopsStillNeeded } from './mixing';

/** Light that differs by less is the same; what is left between is rounding and no work for a flash. */
const SAME_LIGHT_STOPS = 1e-9;

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
  const room = scene.subjectStops - ambientStops;
  const needed = room > SAME_LIGHT_STOPS ? stopsStillNeeded(scene.subjectStops, ambientStops) : null;
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
