import { z } from 'zod';
import { exactOfMarking, type Scale } from '../math/marks';
import type { ExactSettings } from '../math/exposure';
import { number } from './quantities';
import { apertureIn, isoIn, numberOfSetting, shutterIn, type SettingIn } from './settingIn';
import { settingOut } from './settingOut';

/** How settings are read and on which scale marks are given; part of every calculator that takes a setting. */
export const readingFields = {
  readAs: z.enum(['mark', 'exact']).default('mark').meta({
    title: 'Read settings as',
    description:
      'mark: a number that is a marking on the scale means the exact value behind it (f/5.6 is 4√2, 1/125 s is 1/128 s); exact: every number means itself',
    advanced: true,
  }),
  scale: z
    .enum(['full', 'half', 'third'])
    .default('third')
    .meta({ title: 'Scale', description: 'the steps of the camera’s dials, in stops', advanced: true }),
};

export const ndStopsIn = () =>
  number({
    title: 'Neutral density',
    unit: 'stops',
    min: 0,
    max: 40,
    description: 'light that filters take away',
  });

/** Camera settings as an object in a request. */
export const settingsIn = () =>
  z.strictObject({
    aperture: apertureIn(),
    shutter: shutterIn(),
    iso: isoIn(),
    ndStops: ndStopsIn().default(0),
  });

/** Camera settings in an answer. */
export const settingsOut = () =>
  z.strictObject({
    aperture: settingOut('Aperture'),
    shutter: settingOut('Shutter'),
    iso: settingOut('ISO'),
    ndStops: z.number().meta({ title: 'Neutral density', unit: 'stops' }),
  });

/** What a request says about reading its settings. */
export interface Reading {
  readonly readAs: 'mark' | 'exact';
  readonly scale: Scale;
}

/** The exact value that a setting in the request means. */
export function exactOf(
  kind: 'aperture' | 'shutter' | 'iso' | 'power',
  value: SettingIn,
  { readAs, scale }: Reading,
): number {
  const literal = numberOfSetting(kind, value);
  return kind === 'power' || readAs === 'exact' ? literal : exactOfMarking(kind, scale, literal);
}

/** All of a camera's settings as exact values: f-number, seconds, ISO, stops of filter. */
export function exactSettings(
  given: { aperture: SettingIn; shutter: SettingIn; iso: SettingIn; ndStops: number },
  reading: Reading,
): ExactSettings {
  return {
    aperture: exactOf('aperture', given.aperture, reading),
    shutterS: exactOf('shutter', given.shutter, reading),
    iso: exactOf('iso', given.iso, reading),
    ndStops: given.ndStops,
  };
}
