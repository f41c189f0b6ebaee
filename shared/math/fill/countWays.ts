import { positionOf } from '../marks';
import type { FillWish, FlashRole } from './fillTypes';
import { isClippedAlike, wholeFromS } from './flashLevels';
import { powersOf } from './powerSteps';
import { MOST_WAYS } from './roleSums';

/** Ways of one role over all shutters that clip its pulses differently from power to power. */
const MOST_CLIPPED_WAYS = 12_500;

/** How many ways there are to set the flashes of a role, and how many may be. */
export interface Ways {
  readonly role: FlashRole;
  readonly ways: number;
  readonly mostWays: number;
}

/** The shutters in normal sync that clip a pulse of these flashes. */
function clippingShutters({ camera }: FillWish, fromS: number): number {
  const { scale, syncSpeedS, shutterSlowestS, shutterFastestS } = camera;
  const fastest = positionOf('shutter', scale, Math.max(syncSpeedS, shutterFastestS));
  const slowest = positionOf('shutter', scale, Math.min(shutterSlowestS, fromS));
  return Math.max(0, Math.ceil(fastest - slowest));
}

/**
 * The roles whose flashes can be set in more ways than are gone through.
 *
 * @param wish a request
 * @returns each such role with its ways and what is allowed
 * @example three flashes of one role with 22 powers each, thirds from 1/1 to 1/128: 23³ = 12,167 ways, which is allowed
 */
export function rolesWithTooManyWays(wish: FillWish): Ways[] {
  const roles: FlashRole[] = ['key', 'fill', 'rim'];
  return roles.flatMap((role) => {
    const flashes = wish.flashes.filter((flash) => flash.role === role);
    const ways = flashes.reduce(
      (product, { minPower, powerStepStops }) => product * (powersOf(minPower, powerStepStops).length + 1),
      1,
    );
    const fromS = wholeFromS(flashes, wish.camera.shutCurtainS);
    const shutters = isClippedAlike(flashes) ? 0 : clippingShutters(wish, fromS);
    const mostWays =
      shutters === 0 ? MOST_WAYS : Math.min(MOST_WAYS, Math.floor(MOST_CLIPPED_WAYS / shutters));
    return ways > mostWays ? [{ role, ways, mostWays }] : [];
  });
}
