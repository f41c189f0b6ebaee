import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { defineCalculator } from '../../contract/defineCalculator';
import { exactlyOne } from '../../contract/exactlyOne';
import { number } from '../../contract/quantities';
import { reciprocityTableIn } from '../../contract/reciprocityTableIn';
import { exactWithMark, settingOut } from '../../contract/settingOut';
import { readingFields } from '../../contract/settings';
import {
  addedStops,
  correctedByPower,
  correctedByTable,
  RECIPROCITY_BREAK_S,
  RECIPROCITY_TRUSTED_S,
  STEEPEST_EXPONENT,
} from '../../math/reciprocity';

const input = exactlyOne(
  'exponent',
  'table',
)(
  z.strictObject({
    meteredS: number({
      title: 'Metered time',
      description: 'what the meter asks for, in seconds as they are',
      unit: 's',
      min: 1e-6,
      max: 86_400,
    }),
    exponent: number({
      title: 'Film’s exponent',
      description:
        'P of the maker’s sheet: beyond 1 s expose for the metered time to the power P; 1.2 to 1.5',
      min: 1,
      max: STEEPEST_EXPONENT,
      step: 0.01,
    }).optional(),
    table: reciprocityTableIn().optional().meta({
      title: 'Film’s table',
      description: 'pairs of metered time and time to expose, rising; straight lines in log-log between them',
    }),
    scale: readingFields.scale,
  }),
);

/** What was assumed around the table, and where the answer leaves it. */
function notesOf({ meteredS, table }: z.output<typeof input>, added: number): Remark[] {
  const notes = [note('reciprocity_is_for_film')];
  const [first, last] = [table?.[0], table?.at(-1)];
  const trustedS = Math.min(RECIPROCITY_TRUSTED_S, last?.meteredS ?? RECIPROCITY_TRUSTED_S);
  const isExtrapolated = meteredS > trustedS && meteredS > RECIPROCITY_BREAK_S;
  if (isExtrapolated) notes.push(note('reciprocity_extrapolated', { meteredS, trustedS }));
  if (table?.length === 1) notes.push(note('reciprocity_of_one_pair'));
  if (first && meteredS < first.meteredS && first.meteredS > RECIPROCITY_BREAK_S) {
    notes.push(note('reciprocity_joined_to_break', { firstS: first.meteredS }));
  }
  if (added > 0) notes.push(note('reciprocity_shifts_colour'));
  return notes;
}

export const exposureLong = defineCalculator({
  id: 'exposure/long',
  title: 'Long exposure on film',
  summary: 'How much longer film needs than the meter says, by the film’s exponent or its table.',
  units: 1,
  input,
  output: z.strictObject({
    correctedS: z.number().meta({ title: 'Time to expose', unit: 's' }),
    addedStops: z.number().meta({
      title: 'Added',
      unit: 'stops',
      description: 'how much longer, as log2 of the two times’ ratio',
    }),
    correctedShutter: settingOut('Time to set'),
  }),
  sources: [
    'A film maker’s fact sheet: Tc = Tm^P beyond 1 s, no correction up to 1 s (10 s at P 1.31 is 20.4 s)',
    'Schwarzschild’s law with P = 1/p, encyclopaedia, "Reciprocity (photography)"',
    'Interpolation of tables in log-log, and what holds outside them: derivation and modelling choice',
  ],
  examples: [
    {
      title: 'Film of exponent 1.31: a metered 10 s becomes 20.4 s, a good stop more',
      input: { meteredS: 10, exponent: 1.31 },
      output: {
        correctedS: 20.417379446695296,
        addedStops: 1.0297977094150823,
        correctedShutter: { exact: 20.417379446695296, mark: '20s', residualStops: -0.018392470969111743 },
      },
    },
    {
      title: 'Half a second needs no correction, whatever the film',
      input: { meteredS: 0.5, exponent: 1.48 },
      output: {
        correctedS: 0.5,
        addedStops: 0,
        correctedShutter: { exact: 0.5, mark: '0.5s', residualStops: 0 },
      },
    },
    {
      title: 'A sheet says 10 s to 15 s and 40 s to 120 s: a metered 20 s needs 42.4 s',
      input: {
        meteredS: 20,
        table: [
          { meteredS: 10, correctedS: 15 },
          { meteredS: 40, correctedS: 120 },
        ],
      },
      output: {
        correctedS: 42.42640687119285,
        addedStops: 1.0849625007211563,
        correctedShutter: { exact: 42.42640687119285, mark: '42s', residualStops: -0.014573172829758336 },
      },
    },
  ],
  compute(given) {
    const { meteredS, exponent, table } = given;
    const correctedS = table ? correctedByTable(meteredS, table) : correctedByPower(meteredS, exponent ?? 1);
    const added = addedStops(meteredS, correctedS);
    const correctedShutter = exactWithMark('shutter', given.scale, correctedS);
    return { result: { correctedS, addedStops: added, correctedShutter }, notes: notesOf(given, added) };
  },
});
