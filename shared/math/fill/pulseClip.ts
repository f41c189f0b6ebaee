import { flashPulse } from '../flashDuration';
import { shareWithin } from '../flashPulse';
import type { FillFlash } from './fillTypes';

/** A pulse that the shutter hides wholly counts as this little light, so that stops stay finite. */
const HIDDEN_STOPS = -60;

/**
 * What the open shutter lets through of a flash's pulse, in stops.
 *
 * s = log2(share within t − T), at least −60
 *
 * @param flash its t0.5 at full power and its way of control
 * @param power fraction of full power, above 0, at most 1
 * @param shutterS t: exposure time, s, > 0
 * @param shutCurtainS T: part of it in which the frame is not wholly open, s, ≥ 0
 * @returns s, stops, 0 or less; 0 where no duration is known
 * @throws RangeError when a value is outside its domain
 * @example a decay of t0.5 = 1 ms behind 1/1000 s: −1
 * @source derivation; project handbook, section 6.3
 */
export function pulseClipStops(
  flash: Pick<FillFlash, 't05S' | 'control'>,
  power: number,
  shutterS: number,
  shutCurtainS: number,
): number {
  if (flash.t05S === null) return 0;
  const openS = shutterS - shutCurtainS;
  if (openS <= 0) return HIDDEN_STOPS;
  const share = shareWithin(flashPulse({ t05S: flash.t05S }, { control: flash.control, power }), openS);
  return Math.max(HIDDEN_STOPS, Math.min(0, Math.log2(share)));
}
