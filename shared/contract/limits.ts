import { z } from 'zod';
import type { SettingLimits } from '../math/equivalents';
import type { Mark } from '../math/marks';
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

/** Usual gear, widened so that it holds the settings in use: who sets ISO 25 has a camera that offers it. */
export function usualGearFor(used: { aperture: Mark; shutter: Mark; iso: Mark }): SettingLimits {
  return {
    apertureMin: Math.min(USUAL_GEAR.apertureMin, used.aperture.exact),
    apertureMax: Math.max(USUAL_GEAR.apertureMax, used.aperture.exact),
    shutterFastestS: Math.min(USUAL_GEAR.shutterFastestS, used.shutter.exact),
    shutterSlowestS: Math.max(USUAL_GEAR.shutterSlowestS, used.shutter.exact),
    isoMin: Math.min(USUAL_GEAR.isoMin, used.iso.exact),
    isoMax: Math.max(USUAL_GEAR.isoMax, used.iso.exact),
  };
}

/** Limits as exact values, those of usual gear where a limit is not given. */
export function exactLimits(
  given: Given,
  reading: Reading,
  usual: SettingLimits = USUAL_GEAR,
): SettingLimits {
  const read = (kind: 'aperture' | 'shutter' | 'iso', value: SettingIn | undefined, otherwise: number) =>
    value === undefined ? otherwise : exactOf(kind, value, reading);
  return {
    apertureMin: read('aperture', given.apertureMin, usual.apertureMin),
    apertureMax: read('aperture', given.apertureMax, usual.apertureMax),
    shutterFastestS: read('shutter', given.shutterFastest, usual.shutterFastestS),
    shutterSlowestS: read('shutter', given.shutterSlowest, usual.shutterSlowestS),
    isoMin: read('iso', given.isoMin, usual.isoMin),
    isoMax: read('iso', given.isoMax, usual.isoMax),
  };
}
