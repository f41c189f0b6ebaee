import { note, type Remark } from './answer';
import { USUAL_GEAR } from './limits';
import type { SettingOut } from './settingOut';

/** Room for a setting that stands on a limit's own mark. */
const EDGE = 1 + 1e-9;

const outside = (value: number, low: number, high: number) => value < low / EDGE || value > high * EDGE;

/** Notes where a solved setting lies outside what usual gear has. */
export function usualGearNotes(settings: {
  aperture?: SettingOut;
  shutter?: SettingOut;
  iso?: SettingOut;
}): Remark[] {
  const { aperture, shutter, iso } = settings;
  const notes: Remark[] = [];
  if (aperture && outside(aperture.exact, USUAL_GEAR.apertureMin, USUAL_GEAR.apertureMax))
    notes.push(note('aperture_outside_usual_gear', { mark: aperture.mark }));
  if (shutter && outside(shutter.exact, USUAL_GEAR.shutterFastestS, USUAL_GEAR.shutterSlowestS))
    notes.push(note('shutter_outside_usual_gear', { mark: shutter.mark }));
  if (iso && outside(iso.exact, USUAL_GEAR.isoMin, USUAL_GEAR.isoMax))
    notes.push(note('iso_outside_usual_gear', { mark: iso.mark }));
  return notes;
}
