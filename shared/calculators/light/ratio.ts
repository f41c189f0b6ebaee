import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { defineCalculator } from '../../contract/defineCalculator';
import { exactlyOne } from '../../contract/exactlyOne';
import { number, stops } from '../../contract/quantities';
import { differenceOfRatio, litOverShadowStops, ratioOfStops } from '../../math/mixing';

const fields = z.strictObject({
  keyStops: stops({
    title: 'Key',
    description: 'at the subject, alone, against any common reference',
  }).optional(),
  fillStops: stops({
    title: 'Fill',
    description: 'at the subject, alone, against the same reference',
  }).optional(),
  ratio: number({
    title: 'Ratio wanted',
    description: '(key + fill):fill, so 3 means 3:1',
    min: 1,
    max: 1_000_000,
    above: true,
  }).optional(),
});

export const lightRatio = defineCalculator({
  id: 'light/ratio',
  title: 'Key to fill',
  summary: 'The lighting ratio of key and fill, or the difference between them that a ratio needs.',
  units: 1,
  // Key and fill, or the ratio: whichever is there, each of the two lights is either given or follows.
  input: exactlyOne('keyStops', 'ratio')(exactlyOne('fillStops', 'ratio')(fields)),
  output: z.strictObject({
    ratio: z.number().meta({ title: 'Ratio', description: '(key + fill):fill' }),
    differenceStops: z.number().meta({
      title: 'Key over fill',
      unit: 'stops',
      description: 'by the strength of each alone; negative where the fill is stronger',
    }),
    litOverShadowStops: z.number().meta({
      title: 'Lit side over shadow side',
      unit: 'stops',
      description: 'what a spot meter finds between the two sides of a face',
    }),
  }),
  sources: [
    'Encyclopaedia, "Lighting ratio": (key + fill):fill; 200 and 100 fc are 3:1, 800 and 200 fc are 5:1',
    'The rule "ratio = 2 × stops" is wrong by that definition: 3:1 is one stop of difference, 5:1 two',
  ],
  examples: [
    {
      title: 'A key one stop over the fill is 3:1, and the lit side is 1.58 stops brighter',
      input: { keyStops: 1, fillStops: 0 },
      output: { ratio: 3, differenceStops: 1, litOverShadowStops: 1.584962500721156 },
    },
    {
      title: 'For 4:1 the key has to be three times the fill, 1.58 stops over it',
      input: { ratio: 4 },
      output: { ratio: 4, differenceStops: 1.584962500721156, litOverShadowStops: 2 },
    },
    {
      title: 'Two stops between the lamps are 5:1, not 4:1',
      input: { keyStops: 0, fillStops: -2 },
      output: { ratio: 5, differenceStops: 2, litOverShadowStops: 2.321928094887362 },
    },
  ],
  compute({ keyStops, fillStops, ratio: wanted }) {
    const ratio = wanted ?? ratioOfStops(keyStops ?? 0, fillStops ?? 0);
    const differenceStops =
      wanted === undefined ? (keyStops ?? 0) - (fillStops ?? 0) : differenceOfRatio(wanted);
    const notes: Remark[] = [note('ratio_counts_both')];
    if (differenceStops < 0) notes.push(note('fill_outshines_key'));
    return {
      result: { ratio, differenceStops, litOverShadowStops: litOverShadowStops(differenceStops) },
      notes,
    };
  },
});
