import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { crossedLimits } from '../../contract/crossedLimits';
import { defineCalculator } from '../../contract/defineCalculator';
import { exactLimits, limitsIn, usualGearFor } from '../../contract/limits';
import { apertureIn, isoIn, shutterIn } from '../../contract/settingIn';
import { chosenMark, settingOut } from '../../contract/settingOut';
import { exactSettings, readingFields } from '../../contract/settings';
import { equivalentRows, exposurePosition, reachablePosition } from '../../math/equivalents';
import { sceneEv100 } from '../../math/exposure';
import { nearestMark, stepsPerStop } from '../../math/marks';

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
      limits: limitsIn().optional().meta({
        title: 'Limits',
        description: 'what the gear allows; where left out usual gear, widened to the settings given',
      }),
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
    const { scale, limits = {} } = input;
    const { aperture, shutterS, iso } = exactSettings({ ...input, ndStops: 0 }, input);
    const ev100 = sceneEv100(aperture, shutterS, iso);
    const marks = {
      aperture: nearestMark('aperture', scale, aperture),
      shutter: nearestMark('shutter', scale, shutterS),
      iso: nearestMark('iso', scale, iso),
    };
    const keep = input.keep === 'none' ? null : { kind: input.keep, position: marks[input.keep].position };
    const exposure = exposurePosition(ev100, scale);
    const step = reachablePosition(exposure, keep);
    const rows = equivalentRows(step, scale, exactLimits(limits, input, usualGearFor(marks)), keep);
    const notes: Remark[] = [];
    if (Object.values(limits).filter((limit) => limit !== undefined).length < 6)
      notes.push(note('usual_gear_limits'));
    if (Math.abs(exposure - step) > ON_STEP)
      notes.push(note('exposure_moved_to_step', { stops: (exposure - step) / stepsPerStop(scale) }));
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
