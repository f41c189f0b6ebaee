import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { contradiction } from '../../contract/contradiction';
import { defineCalculator } from '../../contract/defineCalculator';
import { flashPowerIn } from '../../contract/flashIn';
import { distanceM, stops } from '../../contract/quantities';
import { apertureIn, isoIn, shutterIn } from '../../contract/settingIn';
import { exactOf, ndStopsIn, readingFields } from '../../contract/settings';
import { measureFlash, type MeasuredFlash } from '../../math/flashMeasured';

/** A result that is less than this over the ambient light says nothing about the flash. */
const LEAST_ROOM_STOPS = 1e-6;

const fields = z.strictObject({
  aperture: apertureIn(),
  shutter: shutterIn({
    description: 'plays no part; taken so that a frame’s settings can be sent whole',
  }).optional(),
  iso: isoIn(),
  ndStops: ndStopsIn().default(0),
  distanceM: distanceM({ title: 'Flash to subject' }),
  power: flashPowerIn(),
  resultStops: stops({
    title: 'Result',
    description: 'how bright the subject came out on the test frame, against a middle tone',
  }),
  ambientStops: stops({
    title: 'Ambient light',
    description: 'how bright the same frame came out without flash; none where left out',
  }).optional(),
  ...readingFields,
});

const input = contradiction<typeof fields, 'ambient_explains_result'>(
  'ambient_explains_result',
  ['ambientStops'],
  ({ ambientStops, resultStops }) =>
    ambientStops !== undefined && resultStops - ambientStops < LEAST_ROOM_STOPS,
  (given) => given,
)(fields);

function notesOn(given: z.output<typeof fields>, measured: MeasuredFlash): Remark[] {
  const notes: Remark[] = [];
  if (given.ambientStops === undefined) notes.push(note('ambient_taken_as_none'));
  if (measured.ambientShare > 1 / 2)
    notes.push(
      note('ambient_dominates', { share: measured.ambientShare, errorFactor: measured.errorFactor }),
    );
  if (given.shutter !== undefined) notes.push(note('shutter_plays_no_part'));
  return notes;
}

export const flashMeasured = defineCalculator({
  id: 'flash/measured',
  title: 'Guide number from a test frame',
  summary: 'What a flash with its modifier really gives, from one frame: what no data sheet says.',
  units: 1,
  input,
  output: z.strictObject({
    guideNumberM: z.number().meta({
      title: 'Guide number',
      unit: 'm',
      description:
        'at ISO 100 and full power, with the modifier and its loss in it; use it with no loss added',
    }),
    flashStops: z.number().meta({
      title: 'By the flash',
      unit: 'stops',
      description: 'how bright the flash alone made the subject, against a middle tone',
    }),
    ambientShare: z.number().meta({ title: 'Ambient share', description: 'of the subject’s light, 0 to 1' }),
    errorFactor: z.number().meta({
      title: 'Growth of errors',
      description: 'stops by which the flash is misjudged for each stop by which the result is',
    }),
  }),
  sources: [
    'Derivation: the flash’s part is 2^result − 2^ambient, then guide number = f-number times distance at ISO 100',
    'ISO 1230:2007, introduction: f-number times distance is constant for an ISO speed',
  ],
  examples: [
    {
      title: 'A middle tone at f/8, 3 m and full power, in the dark: guide number 24, whatever the box says',
      input: { aperture: 'f/8', iso: 100, distanceM: 3, power: 1, resultStops: 0 },
      output: { guideNumberM: 24, flashStops: 0, ambientShare: 0, errorFactor: 1 },
    },
    {
      title:
        'A softbox at dusk: half a stop over with flash, two stops under without, so 18 % of the light is not the flash’s',
      input: { aperture: 'f/5.6', iso: 200, distanceM: 2, power: '1/8', resultStops: 0.5, ambientStops: -2 },
      output: {
        guideNumberM: 24.414695245589794,
        flashStops: 0.2193557293076735,
        ambientShare: 0.17677669529663687,
        errorFactor: 1.214737233854593,
      },
    },
  ],
  compute(given) {
    const measured = measureFlash({
      ...given,
      aperture: exactOf('aperture', given.aperture, given),
      iso: exactOf('iso', given.iso, given),
      power: exactOf('power', given.power, given),
    });
    if (measured === null) throw new RangeError('the input lets through a frame without flash');
    return { result: measured, notes: notesOn(given, measured), cautions: ['flash_and_eyes'] };
  },
});
