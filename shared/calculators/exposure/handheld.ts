import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { defineCalculator } from '../../contract/defineCalculator';
import { focalLengthMm, number } from '../../contract/quantities';
import { shutterIn } from '../../contract/settingIn';
import { exactWithMark, settingOut } from '../../contract/settingOut';
import { exactOf, readingFields } from '../../contract/settings';
import { shakeBlurUm, slowestHandheldS, stopsOverLimit } from '../../math/handheld';

/** A time on the limit is within it; covers rounding. */
const ON_LIMIT_STOPS = 1e-9;

export const exposureHandheld = defineCalculator({
  id: 'exposure/handheld',
  title: 'Hand-held limit',
  summary: 'The slowest shutter for a camera in the hand, and the blur that a given shutter brings.',
  units: 1,
  input: z.strictObject({
    focalLengthMm: focalLengthMm({ description: 'as engraved on the lens' }),
    cropFactor: number({
      title: 'Crop factor',
      description: '43.3 mm over the sensor’s diagonal; 1 for 36 × 24 mm',
      min: 0.1,
      max: 20,
    }).default(1),
    stabilisationStops: number({
      title: 'Stabilisation',
      description: 'what the stabiliser is claimed to gain',
      unit: 'stops',
      min: 0,
      max: 12,
    }).default(0),
    shutter: shutterIn({ description: 'a time to judge, in seconds or as text such as "1/60"' }).optional(),
    ...readingFields,
  }),
  output: z.strictObject({
    slowestShutter: settingOut('Slowest shutter').meta({
      description: 'exact is the rule’s value; the mark is on the safe side',
    }),
    withinLimit: z.boolean().optional().meta({ title: 'Within the limit' }),
    stopsOver: z.number().optional().meta({
      title: 'Over the limit',
      unit: 'stops',
      description: 'how much longer than the limit; negative is in hand',
    }),
    blurUm: z
      .number()
      .optional()
      .meta({ title: 'Blur on the sensor', unit: 'µm', description: 'by a hand that turns by 0.03 rad/s' }),
  }),
  sources: [
    'Reciprocal rule, common practice ("Camera Shake and Image Stabilization", J. A. Wrotniak): t ≤ 1/(f·crop)',
    'CIPA DC-X011, as a test laboratory describes it: stabilisation as log2 of the ratio of times',
    'Blur f·ω·t by derivation; the rule with a circle of 0.030 mm implies ω = 0.03 rad/s',
  ],
  examples: [
    {
      title: '50 mm on a crop factor of 1.5: 1/75, so set 1/80',
      input: { focalLengthMm: 50, cropFactor: 1.5 },
      output: {
        slowestShutter: { exact: 0.013333333333333334, mark: '1/80', residualStops: -0.1045146428374521 },
      },
    },
    {
      title: 'At dusk with 24 mm and five stops of stabilisation, 1 s is still within the limit of 1.3 s',
      input: { focalLengthMm: 24, stabilisationStops: 5, shutter: '1s' },
      output: {
        slowestShutter: { exact: 1.3333333333333333, mark: '1.3s', residualStops: -0.08170416594551054 },
        withinLimit: true,
        stopsOver: -0.4150374992788438,
        blurUm: 22.5,
      },
    },
    {
      title: '200 mm at 1/60 is 1.64 stops too slow and smears over 94 µm',
      input: { focalLengthMm: 200, shutter: '1/60' },
      output: {
        slowestShutter: { exact: 0.005, mark: '1/200', residualStops: -0.022810476891942134 },
        withinLimit: false,
        stopsOver: 1.6438561897747246,
        blurUm: 93.75,
      },
    },
  ],
  compute(input) {
    const { focalLengthMm: focalLength, cropFactor, stabilisationStops } = input;
    const limitS = slowestHandheldS(focalLength, cropFactor, stabilisationStops);
    const slowestShutter = exactWithMark('shutter', input.scale, limitS, 'ceil');
    const notes: Remark[] = [note('handheld_rule_of_thumb')];
    if (stabilisationStops > 0) notes.push(note('stabilisation_as_claimed', { stops: stabilisationStops }));
    if (input.shutter === undefined) return { result: { slowestShutter }, notes };
    const shutterS = exactOf('shutter', input.shutter, input);
    const stopsOver = stopsOverLimit(shutterS, limitS);
    const blurUm = shakeBlurUm(focalLength, shutterS, stabilisationStops);
    return {
      result: { slowestShutter, withinLimit: stopsOver <= ON_LIMIT_STOPS, stopsOver, blurUm },
      notes,
    };
  },
});
