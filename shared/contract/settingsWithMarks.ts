import type { z } from 'zod';
import type { ExactSettings } from '../math/exposure';
import type { Scale } from '../math/marks';
import type { settingsOut } from './settings';
import { exactWithMark } from './settingOut';

/** Exact settings as an answer gives them: each with the mark that comes nearest and the residual. */
export function settingsWithMarks(
  exact: ExactSettings,
  scale: Scale,
): z.output<ReturnType<typeof settingsOut>> {
  return {
    aperture: exactWithMark('aperture', scale, exact.aperture),
    shutter: exactWithMark('shutter', scale, exact.shutterS),
    iso: exactWithMark('iso', scale, exact.iso),
    ndStops: exact.ndStops,
  };
}
