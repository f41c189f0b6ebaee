import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { defineCalculator } from '../../contract/defineCalculator';
import { exactly, exactlyOne } from '../../contract/exactlyOne';
import { lightEv100 } from '../../contract/light';
import { ev100In, illuminanceIn, luminanceIn, meterConstants, stops } from '../../contract/quantities';
import { sceneIn } from '../../contract/sceneIn';
import { apertureIn, isoIn, shutterIn } from '../../contract/settingIn';
import { exactWithMark, settingOut } from '../../contract/settingOut';
import { exactOf, ndStopsIn, readingFields } from '../../contract/settings';
import { usualGearNotes } from '../../contract/usualGear';
import { solveSetting } from '../../math/exposure';
import { SCENES, sceneMiddleEv100 } from '../../math/scenes';

const LIGHT = ['ev100', 'luminanceCdM2', 'illuminanceLux', 'scene'] as const;
const SETTINGS = ['aperture', 'shutter', 'iso'] as const;

const input = exactlyOne(...LIGHT)(
  exactly(
    2,
    SETTINGS,
  )(
    z.strictObject({
      ev100: ev100In().optional(),
      luminanceCdM2: luminanceIn().optional(),
      illuminanceLux: illuminanceIn().optional(),
      scene: sceneIn().optional(),
      aperture: apertureIn().optional(),
      shutter: shutterIn().optional(),
      iso: isoIn().optional(),
      brightnessStops: stops({
        title: 'Brightness wanted',
        description: 'how much brighter than a middle tone the metered part is to come out',
      }).default(0),
      ndStops: ndStopsIn().default(0),
      ...readingFields,
      ...meterConstants,
    }),
  ),
);

/** The light's EV at ISO 100, and a note where a scene's middle stood in for a meter. */
function lightOf(given: z.output<typeof input>): { ev100: number; notes: Remark[] } {
  const scene = SCENES.find(({ code }) => code === given.scene);
  if (!scene) return { ev100: lightEv100(given), notes: [] };
  const middle = sceneMiddleEv100(scene.code);
  const told = { scene: scene.title, low: scene.ev100Low, high: scene.ev100High, middle };
  return { ev100: middle, notes: [note('scene_middle_used', told)] };
}

export const exposureSolve = defineCalculator({
  id: 'exposure/solve',
  title: 'Missing setting',
  summary: 'The aperture, shutter or ISO that renders a given light as bright as wanted.',
  units: 1,
  input,
  output: z.strictObject({
    unknown: z.enum(SETTINGS).meta({ title: 'Solved for' }),
    aperture: settingOut('Aperture'),
    shutter: settingOut('Shutter'),
    iso: settingOut('ISO'),
    brightnessAtMarkStops: z.number().meta({
      title: 'Brightness with the marks set',
      unit: 'stops',
      description: 'how much brighter than a middle tone the metered part comes out',
    }),
  }),
  sources: [
    'Derivation from EV100 = log2(N²/t) − log2(S/100) + nd, brightness = scene − settings',
    'Scene list: ANSI PH2.7-1973 and PH2.7-1986, second-hand; for camera settings, not for illuminance',
  ],
  examples: [
    {
      title: 'EV 13 at f/8 and ISO 100 needs 1/125',
      input: { ev100: 13, aperture: 'f/8', iso: 100 },
      output: {
        unknown: 'shutter',
        aperture: { exact: 8, mark: 'f/8', residualStops: 0 },
        shutter: { exact: 0.0078125, mark: '1/125', residualStops: 0 },
        iso: { exact: 100, mark: '100', residualStops: 0 },
        brightnessAtMarkStops: 0,
      },
    },
    {
      title: 'A dusk sky of EV 5 kept one stop darker at f/4 and 1/30: ISO 800',
      input: { ev100: 5, aperture: 'f/4', shutter: '1/30', brightnessStops: -1 },
      output: {
        unknown: 'iso',
        aperture: { exact: 4, mark: 'f/4', residualStops: 0 },
        shutter: { exact: 0.03125, mark: '1/30', residualStops: 0 },
        iso: { exact: 800, mark: '800', residualStops: 0 },
        brightnessAtMarkStops: -1,
      },
    },
  ],
  compute(given) {
    const { ev100, notes } = lightOf(given);
    const unknown = SETTINGS.find((name) => given[name] === undefined) ?? 'shutter';
    const exact = {
      aperture: exactOf('aperture', given.aperture ?? 1, given),
      shutterS: exactOf('shutter', given.shutter ?? 1, given),
      iso: exactOf('iso', given.iso ?? 100, given),
    };
    // The settings' own EV100 lies below the scene's by the brightness wanted; a filter takes its part first.
    const settingsEv100 = ev100 - given.brightnessStops - given.ndStops;
    exact[unknown === 'shutter' ? 'shutterS' : unknown] = solveSetting(unknown, settingsEv100, exact);
    const marked = {
      aperture: exactWithMark('aperture', given.scale, exact.aperture),
      shutter: exactWithMark('shutter', given.scale, exact.shutterS),
      iso: exactWithMark('iso', given.scale, exact.iso),
    };
    const residual = SETTINGS.reduce((sum, name) => sum + marked[name].residualStops, 0);
    return {
      result: { unknown, ...marked, brightnessAtMarkStops: given.brightnessStops + residual },
      notes: [...notes, ...usualGearNotes({ [unknown]: marked[unknown] })],
    };
  },
});
