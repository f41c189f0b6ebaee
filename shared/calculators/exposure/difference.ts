import { z } from 'zod';
import { defineCalculator } from '../../contract/defineCalculator';
import { exactSettings, readingFields, settingsIn } from '../../contract/settings';
import { exposureDifference as differenceOf } from '../../math/exposure';

const stops = (title: string, description: string) => z.number().meta({ title, description, unit: 'stops' });

export const exposureDifference = defineCalculator({
  id: 'exposure/difference',
  title: 'Difference of two settings',
  summary: 'How much brighter one set of settings comes out than another, and what each dial adds.',
  units: 1,
  input: z.strictObject({
    from: settingsIn().meta({ title: 'From' }),
    to: settingsIn().meta({ title: 'To' }),
    ...readingFields,
  }),
  output: z.strictObject({
    stops: stops('Difference', 'how much brighter “to” comes out'),
    byApertureStops: stops('By the aperture', 'part of the difference'),
    byShutterStops: stops('By the shutter', 'part of the difference'),
    byIsoStops: stops('By the ISO', 'part of the difference'),
    byNdStops: stops('By the filter', 'part of the difference'),
  }),
  sources: ['Derivation: a picture’s brightness goes with t·S/(N²·2^nd)'],
  examples: [
    {
      title: 'Two stops opened and three stops slower: five stops brighter',
      input: {
        from: { aperture: 'f/8', shutter: '1/125', iso: 100 },
        to: { aperture: 'f/4', shutter: '1/15', iso: 100 },
      },
      output: { stops: 5, byApertureStops: 2, byShutterStops: 3, byIsoStops: 0, byNdStops: 0 },
    },
    {
      title: 'A six-stop filter against a longer shutter and a higher ISO: two stops are still missing',
      input: {
        from: { aperture: 5.6, shutter: '1/60', iso: 100 },
        to: { aperture: 5.6, shutter: '1/15', iso: 400, ndStops: 6 },
      },
      output: { stops: -2, byApertureStops: 0, byShutterStops: 2, byIsoStops: 2, byNdStops: -6 },
    },
  ],
  compute(input) {
    return { result: differenceOf(exactSettings(input.from, input), exactSettings(input.to, input)) };
  },
});
