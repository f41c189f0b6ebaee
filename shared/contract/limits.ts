import { z } from 'zod';
import type { SettingLimits } from '../math/equivalents';
import type { FieldMeta } from './field';
import { exactOf, type Reading } from './settings';
import { apertureIn, isoIn, shutterIn, type SettingIn } from './settingIn';

/** Limits that usual gear has, used where a request names none. Common practice, no source. */
export const USUAL_GEAR: SettingLimits = {
  apertureMin: 1,
  apertureMax: 32,
  shutterFastestS: 2 ** -13,
  shutterSlowestS: 32,
  isoMin: 50,
  isoMax: 102_400,
};

const as = (title: string): FieldMeta => ({ title });

/** What the gear allows, each limit by itself. */
export const limitsIn = () =>
  z.strictObject({
    apertureMin: apertureIn(as('Widest aperture')).optional(),
    apertureMax: apertureIn(as('Smallest aperture')).optional(),
    shutterFastest: shutterIn(as('Fastest shutter')).optional(),
    shutterSlowest: shutterIn(as('Slowest shutter')).optional(),
    isoMin: isoIn(as('Lowest ISO')).optional(),
    isoMax: isoIn(as('Highest ISO')).optional(),
  });

type Given = Partial<
  Record<'apertureMin' | 'apertureMax' | 'shutterFastest' | 'shutterSlowest' | 'isoMin' | 'isoMax', SettingIn>
>;

/** Limits as exact values, usual gear where a limit is not given. */
export function exactLimits(given: Given, reading: Reading): SettingLimits {
  const read = (kind: 'aperture' | 'shutter' | 'iso', value: SettingIn | undefined, usual: number) =>
    value === undefined ? usual : exactOf(kind, value, reading);
  return {
    apertureMin: read('aperture', given.apertureMin, USUAL_GEAR.apertureMin),
    apertureMax: read('aperture', given.apertureMax, USUAL_GEAR.apertureMax),
    shutterFastestS: read('shutter', given.shutterFastest, USUAL_GEAR.shutterFastestS),
    shutterSlowestS: read('shutter', given.shutterSlowest, USUAL_GEAR.shutterSlowestS),
    isoMin: read('iso', given.isoMin, USUAL_GEAR.isoMin),
    isoMax: read('iso', given.isoMax, USUAL_GEAR.isoMax),
  };
}
