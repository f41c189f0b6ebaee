import { z } from 'zod';
import { defineCalculator } from '../../contract/defineCalculator';
import { fillGiven } from '../../contract/fillExact';
import { fillCheckIn } from '../../contract/fillIn';
import { fillCautions, motionNotes } from '../../contract/fillNotes';
import { fillOutcomeOut, shapeOutcome } from '../../contract/fillOutcomeOut';
import { exactSettings } from '../../contract/settings';
import { fillOutcome } from '../../math/fill/fillOutcome';
import { checkExamples } from './examples/checkExamples';

export const fillCheckOut = z.strictObject({
  outcome: fillOutcomeOut.meta({ title: 'Outcome' }),
  onSubject: z
    .array(
      z.strictObject({
        name: z.string().meta({ title: 'Flash' }),
        stops: z.number().meta({ title: 'On the subject', unit: 'stops', description: 'this flash alone' }),
      }),
    )
    .meta({ title: 'Flashes' }),
});

export const fillCheck = defineCalculator({
  id: 'fill/check',
  title: 'Outcome of given settings',
  summary: 'How background, subject, shadow side and rim come out with settings and flashes as they stand.',
  units: 1,
  input: fillCheckIn,
  output: fillCheckOut,
  sources: [
    'Additivity of exposure; lighting ratio as (key + fill):fill, the cinematographers’ definition',
    'ISO 1230:2007, introduction (guide number = f-number times distance); EV100 = log2(N²/t) − log2(S/100) + nd',
    'High-speed sync, ghost, hand-held limit and flash duration as in flash/exposure, flash/motion and flash/duration',
  ],
  examples: checkExamples,
  compute(given) {
    const { setup, used } = fillGiven(given);
    const sync = used.length === 0 ? 'none' : given.sync;
    const outcome = fillOutcome(setup, exactSettings(given.settings, given), sync, used);
    return {
      result: {
        outcome: shapeOutcome(outcome, given.scale),
        onSubject: used.map(({ flash }, i) => ({
          name: flash.name,
          stops: outcome.onSubjectStops[i] ?? 0,
        })),
      },
      notes: motionNotes(given, setup, [{ sync, flashes: used, outcome }]),
      cautions: fillCautions(setup, used.length > 0),
    };
  },
});
