import { z } from 'zod';
import { defineCalculator } from '../../contract/defineCalculator';
import { meterConstants } from '../../contract/quantities';
import { apertureIn, isoIn, shutterIn } from '../../contract/settingIn';
import { exactSettings, ndStopsIn, readingFields, settingsOut } from '../../contract/settings';
import { settingsWithMarks } from '../../contract/settingsWithMarks';
import {
  apexOf,
  exposureValue as valueOfSettings,
  illuminanceOfEv100,
  luminanceOfEv100,
  sceneEv100,
} from '../../math/exposure';

const stops = (title: string, description: string) => z.number().meta({ title, description, unit: 'stops' });

export const exposureValue = defineCalculator({
  id: 'exposure/value',
  title: 'Exposure value of settings',
  summary: 'What light a camera’s settings suit: EV, EV at ISO 100, luminance, illuminance, APEX.',
  units: 1,
  input: z.strictObject({
    aperture: apertureIn(),
    shutter: shutterIn(),
    iso: isoIn().default(100),
    ndStops: ndStopsIn().default(0),
    ...readingFields,
    ...meterConstants,
  }),
  output: z.strictObject({
    ev: stops('EV', 'of the settings: log2(N²/t)'),
    ev100: stops('EV at ISO 100', 'of the scene that these settings render as a middle tone'),
    luminanceCdM2: z.number().meta({ title: 'Luminance', unit: 'cd/m²' }),
    illuminanceLux: z.number().meta({ title: 'Illuminance', unit: 'lx' }),
    reflectedK: z.number().meta({ title: 'Meter constant K' }),
    incidentC: z.number().meta({ title: 'Meter constant C' }),
    apex: z
      .strictObject({
        av: stops('Av', 'aperture value'),
        tv: stops('Tv', 'time value'),
        sv: stops('Sv', 'speed value'),
        bv: stops('Bv', 'brightness value of the scene'),
        ev: stops('Ev', 'exposure value, Av + Tv'),
      })
      .meta({ title: 'APEX' }),
    settings: settingsOut().meta({ title: 'Settings as understood' }),
  }),
  sources: [
    'APEX (ASA PH2.5-1960): Ev = Av + Tv = log2(N²/t)',
    'ISO 2720:1974 for the meter constants’ usual ranges (K 10.6–13.4, C 240–400), second-hand',
    'ISO 517 and ISO 516 for marks: f/5.6 stands for 4√2, 1/125 s for 1/128 s',
  ],
  examples: [
    {
      title: 'f/8 at 1/125 and ISO 100 suits a cloudy bright scene, EV 13',
      input: { aperture: 8, shutter: '1/125', iso: 100 },
      output: {
        ev: 13,
        ev100: 13,
        luminanceCdM2: 1024,
        illuminanceLux: 20480,
        reflectedK: 12.5,
        incidentC: 250,
        apex: { av: 6, tv: 7, sv: 5, bv: 8, ev: 13 },
        settings: {
          aperture: { exact: 8, mark: 'f/8', residualStops: 0 },
          shutter: { exact: 0.0078125, mark: '1/125', residualStops: 0 },
          iso: { exact: 100, mark: '100', residualStops: 0 },
          ndStops: 0,
        },
      },
    },
    {
      title: 'Dusk at f/2.8, 1/30 and ISO 400 suits EV 6; a lower ISO would need more light',
      input: { aperture: 'f/2.8', shutter: '1/30', iso: 400 },
      output: {
        ev: 8,
        ev100: 6,
        luminanceCdM2: 8,
        illuminanceLux: 160,
        reflectedK: 12.5,
        incidentC: 250,
        apex: { av: 3, tv: 5, sv: 7, bv: 1, ev: 8 },
        settings: {
          aperture: { exact: 2.8284271247461903, mark: 'f/2.8', residualStops: 0 },
          shutter: { exact: 0.03125, mark: '1/30', residualStops: 0 },
          iso: { exact: 400, mark: '400', residualStops: 0 },
          ndStops: 0,
        },
      },
    },
  ],
  compute(input) {
    const exact = exactSettings(input, input);
    const ev100 = sceneEv100(exact.aperture, exact.shutterS, exact.iso, exact.ndStops);
    return {
      result: {
        ev: valueOfSettings(exact.aperture, exact.shutterS),
        ev100,
        luminanceCdM2: luminanceOfEv100(ev100, input.reflectedK),
        illuminanceLux: illuminanceOfEv100(ev100, input.incidentC),
        reflectedK: input.reflectedK,
        incidentC: input.incidentC,
        apex: apexOf(exact.aperture, exact.shutterS, exact.iso, exact.ndStops),
        settings: settingsWithMarks(exact, input.scale),
      },
    };
  },
});
