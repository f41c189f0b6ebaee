import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { crossedLimits } from '../../contract/crossedLimits';
import { defineCalculator } from '../../contract/defineCalculator';
import { exactLimits, limitsIn } from '../../contract/limits';
import { apertureIn, isoIn, shutterIn } from '../../contract/settingIn';
import { chosenMark, settingOut } from '../../contract/settingOut';
import { exactSettings, readingFields } from '../../contract/settings';
import { equivalentRows, exposurePosition } from '../../math/equivalents';
import { sceneEv100 } from '../../math/exposure';
import { positionOf, stepsPerStop } from '../../math/marks';

/** Closer to a step than this is on it: rounding of log2, far below anything a camera could show. */
const ON_STEP = 1e-6;

export const exposureEquivalents = defineCalculator({
  id: 'exposure/equivalents',
  title: 'Equivalent settings',
  summary: 'All combinations of marks that give the same exposure, within what the gear allows.',
  units: 1,
  input: crossedLimits(
    z.strictObject({
      aperture: apertureIn(),
      shutter: shutterIn(),
      iso: isoIn(),
      limits: limitsIn()
        .optional()
        .meta({ title: 'Limits', description: 'what the gear allows; usual gear where left out' }),
      keep: z
        .enum(['iso', 'aperture', 'shutter', 'none'])
        .default('iso')
        .meta({ title: 'Keep', description: 'the setting that stays at its mark' }),
      ...readingFields,
    }),
  ),
  output: z.strictObject({
    ev100: z.number().meta({ title: 'EV at ISO 100', unit: 'stops' }),
    rows: z
      .array(
        z.strictObject({
          aperture: settingOut('Aperture'),
          shutter: settingOut('Shutter'),
          iso: settingOut('ISO'),
        }),
      )
      .meta({
        title: 'Equivalents',
        description: 'in order of aperture, then ISO; all of exactly one exposure',
      }),
  }),
  sources: [
    'Derivation from APEX: positions on the scales add, Av + Tv − log2(S/100) is the same in every row',
  ],
  examples: [
    {
      title: 'The same exposure as f/8, 1/125 and ISO 100, from f/4 to f/11 in full stops',
      input: {
        aperture: 'f/8',
        shutter: '1/125',
        iso: 100,
        limits: { apertureMin: 'f/4', apertureMax: 'f/11' },
        scale: 'full',
      },
      output: {
        ev100: 13,
        rows: [
          {
            aperture: { exact: 4, mark: 'f/4', residualStops: 0 },
            shutter: { exact: 0.001953125, mark: '1/500', residualStops: 0 },
            iso: { exact: 100, mark: '100', residualStops: 0 },
          },
          {
            aperture: { exact: 5.656854249492381, mark: 'f/5.6', residualStops: 0 },
            shutter: { exact: 0.00390625, mark: '1/250', residualStops: 0 },
            iso: { exact: 100, mark: '100', residualStops: 0 },
          },
          {
            aperture: { exact: 8, mark: 'f/8', residualStops: 0 },
            shutter: { exact: 0.0078125, mark: '1/125', residualStops: 0 },
            iso: { exact: 100, mark: '100', residualStops: 0 },
          },
          {
            aperture: { exact: 11.313708498984761, mark: 'f/11', residualStops: 0 },
            shutter: { exact: 0.015625, mark: '1/60', residualStops: 0 },
            iso: { exact: 100, mark: '100', residualStops: 0 },
          },
        ],
      },
    },
  ],
  compute(input) {
    const exact = exactSettings({ ...input, ndStops: 0 }, input);
    const ev100 = sceneEv100(exact.aperture, exact.shutterS, exact.iso);
    const kept = { aperture: exact.aperture, shutter: exact.shutterS, iso: exact.iso };
    const keep =
      input.keep === 'none'
        ? null
        : { kind: input.keep, position: Math.round(positionOf(input.keep, input.scale, kept[input.keep])) };
    const exposure = exposurePosition(ev100, input.scale);
    const step = Math.round(exposure);
    const rows = equivalentRows(step, input.scale, exactLimits(input.limits ?? {}, input), keep);
    const notes: Remark[] = [];
    if (Object.keys(input.limits ?? {}).length < 6) notes.push(note('usual_gear_limits'));
    if (Math.abs(exposure - step) > ON_STEP) {
      notes.push(note('exposure_moved_to_step', { stops: (exposure - step) / stepsPerStop(input.scale) }));
    }
    if (rows.length === 0) notes.push(note('no_equivalents'));
    return {
      result: {
        ev100,
        rows: rows.map((row) => ({
          aperture: chosenMark(row.aperture),
          shutter: chosenMark(row.shutter),
          iso: chosenMark(row.iso),
        })),
      },
      notes,
    };
  },
});
