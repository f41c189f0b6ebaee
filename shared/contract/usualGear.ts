import type { MarkedKind } from '../math/marks';
import { note, type Remark } from './answer';
import { USUAL_GEAR } from './limits';
import type { SettingOut } from './settingOut';

/** Room for a setting that stands on a limit's own mark. */
const EDGE = 1 + 1e-9;

/** The value behind the mark: the exact one moved by the residual. */
function markedValue(kind: MarkedKind, { exact, residualStops }: SettingOut): number {
  return exact * 2 ** (kind === 'aperture' ? -residualStops / 2 : residualStops);
}

/** Which end of a range a mark lies beyond, if any. */
function beyond(kind: MarkedKind, setting: SettingOut, low: number, high: number): 'low' | 'high' | null {
  const value = markedValue(kind, setting);
  if (value < low / EDGE) return 'low';
  return value > high * EDGE ? 'high' : null;
}

/** Notes where the mark of a solved setting lies outside what usual gear has. */
export function usualGearNotes(settings: {
  aperture?: SettingOut;
  shutter?: SettingOut;
  iso?: SettingOut;
}): Remark[] {
  const { aperture, shutter, iso } = settings;
  const usual = USUAL_GEAR;
  const notes: Remark[] = [];
  if (aperture && beyond('aperture', aperture, usual.apertureMin, usual.apertureMax))
    notes.push(note('aperture_outside_usual_gear', { mark: aperture.mark }));
  const time = shutter && beyond('shutter', shutter, usual.shutterFastestS, usual.shutterSlowestS);
  if (shutter && time)
    notes.push(note('shutter_outside_usual_gear', { mark: shutter.mark, isLonger: time === 'high' }));
  if (iso && beyond('iso', iso, usual.isoMin, usual.isoMax))
    notes.push(note('iso_outside_usual_gear', { mark: iso.mark }));
  return notes;
}
