import { flashStops } from '../flashExposure';
import type { Stair } from './staircase';

/** The flash on the subject, and what the subject gets besides it. */
export interface LadderFlash {
  /** Guide number, f-number times metres, ISO 100, full power. */
  readonly guideNumberM: number;
  readonly distanceM: number;
  /** Modifier and gel, stops that take light away. */
  readonly lossStops: number;
  /** Smallest fraction of full power. */
  readonly minPower: number;
  /** Between two powers that can be set, stops. */
  readonly stepStops: number;
  /** How far the subject's own ambient light lies under the background's, stops. */
  readonly belowBackgroundStops: number;
}

/** How bright background and subject are to come out, stops from a middle tone. */
export interface LadderAim {
  readonly backgroundStops: number;
  readonly subjectStops: number;
}

/** The power for a rung: on a step, within the flash's range. */
export interface RungPower {
  /** Fraction of full power. */
  readonly power: number;
  /** Whether the step wished for lies within the range. */
  readonly isInRange: boolean;
}

/**
 * The flash power that keeps the subject at its aim with a rung's settings.
 *
 * 2^f = 2^subject − 2^(background − below); p = 2^(f − s), s the stops that full power gives; p to the nearest step. The
 * rung's middle counts, where the background is exactly at its aim, so the power only moves with aperture and ISO.
 *
 * @param flash what it can do, and k, how far the subject's ambient lies under the background
 * @param aim background and subject, stops from a middle tone
 * @param stair the rung's settings
 * @param ndStops filter on the lens, stops that take light away
 * @returns the power; null where the ambient light alone is at the aim or over it
 * @throws RangeError when the flash's numbers are outside their domain
 * @example rungPower(flash, { backgroundStops: 0, subjectStops: 0 }, stair, 0) // with 1 stop below: half of the light
 * @source additivity of light; ISO 1230:2007 (GN = N·d); the rest by derivation
 */
export function rungPower(
  flash: LadderFlash,
  aim: LadderAim,
  { aperture, iso }: Stair,
  ndStops: number,
): RungPower | null {
  const missing = 2 ** aim.subjectStops - 2 ** (aim.backgroundStops - flash.belowBackgroundStops);
  if (!(missing > 0)) return null;
  const { guideNumberM, distanceM, lossStops, minPower, stepStops } = flash;
  const atFull = flashStops(
    { guideNumberM, distanceM, aperture, iso, power: 1 },
    { lossStops: lossStops + ndStops },
  );
  const wishedStops = Math.log2(missing) - atFull;
  const steps = Math.round(wishedStops / stepStops);
  // A range that is no whole number of steps ends at its own end.
  const lowest = Math.ceil(Math.log2(minPower) / stepStops - 1e-9);
  const clamped = Math.max(lowest, Math.min(0, steps));
  return { power: 2 ** (clamped * stepStops), isInRange: clamped === steps };
}
