import { assumedCurtainS, isCurtainPossible } from '../math/highSpeedSync';
import type { FoundContradiction } from './contradictionAt';
import { number } from './quantities';
import { numberOfSetting, type SettingIn } from './settingIn';
import { exactOf, type Reading } from './settings';

/** What a request may say about high-speed sync beside the shutter. */
export const highSpeedSyncFields = {
  curtainS: number({
    title: 'Curtain travel',
    description: 'of one curtain; the shorter of 1/300 s and the sync speed where left out',
    unit: 's',
    min: 0,
    max: 1,
    advanced: true,
  }).optional(),
  extraLossStops: number({
    title: 'Extra loss',
    description: 'what high-speed sync loses beyond the energy model, as measured; 0 where left out',
    unit: 'stops',
    min: 0,
    max: 10,
    advanced: true,
  }).optional(),
};

export interface HighSpeedSyncIn {
  readonly curtainS?: number;
  readonly extraLossStops?: number;
}

/** High-speed sync with its defaults, and whether its loss was measured. */
export function exactHighSpeedSync(given: HighSpeedSyncIn, syncSpeedS: number) {
  return {
    curtainS: given.curtainS ?? assumedCurtainS(syncSpeedS),
    extraLossStops: given.extraLossStops ?? 0,
    isMeasured: given.extraLossStops !== undefined,
  };
}

/**
 * The fault of a curtain that is slower than the sync speed, at the given place. The sync speed counts as read, too:
 * a curtain of 0.004 s goes with a mark of 1/250, though the mark stands for 1/256 s.
 */
export function curtainFaults(
  given: HighSpeedSyncIn | undefined,
  syncSpeed: SettingIn,
  reading: Reading,
  path: readonly string[],
): FoundContradiction[] {
  const curtainS = given?.curtainS;
  const syncSpeedS = Math.max(numberOfSetting('shutter', syncSpeed), exactOf('shutter', syncSpeed, reading));
  if (curtainS === undefined || isCurtainPossible(curtainS, syncSpeedS)) return [];
  return [{ code: 'curtain_slower_than_sync', path, params: { curtainS, syncSpeedS } }];
}
