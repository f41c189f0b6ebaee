import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { contradictionAt } from '../../contract/contradictionAt';
import { defineCalculator } from '../../contract/defineCalculator';
import { distancesIn, listOfDistances, spanFaults, spanFields } from '../../contract/distancesIn';
import { exactlyOne } from '../../contract/exactlyOne';
import { distanceM, number } from '../../contract/quantities';
import { together } from '../../contract/together';
import { evenZone, falloffStops } from '../../math/falloff';

const fields = z.strictObject({
  distanceM: distancesIn().optional(),
  ...spanFields,
  referenceM: distanceM({ title: 'Reference distance', description: 'where the light is measured' }),
  toleranceStops: number({
    title: 'Tolerance',
    description: 'how much brighter or darker still counts as even, either way',
    unit: 'stops',
    min: 0,
    max: 20,
  }).default(0.5),
  sourceDiameterM: number({
    title: 'Diameter of the light',
    description: 'of a softbox or umbrella that glows evenly; 0 for a small light',
    unit: 'm',
    min: 0,
    max: 100,
  }).default(0),
});

const input = contradictionAt<typeof fields>(spanFaults)(
  together<typeof fields>('nearM', 'farM', 'steps')(exactlyOne('distanceM', 'nearM')(fields)),
);

export const flashFalloff = defineCalculator({
  id: 'flash/falloff',
  title: 'Falloff of a light',
  summary: 'How much brighter or darker a light is at other distances, and how deep it stays even.',
  units: 1,
  input,
  output: z.strictObject({
    rows: z
      .array(
        z.strictObject({
          distanceM: z.number().meta({ title: 'Distance', unit: 'm' }),
          stops: z.number().meta({ title: 'Against the reference', unit: 'stops' }),
        }),
      )
      .meta({ title: 'Distances', description: 'in the order asked for' }),
    even: z
      .strictObject({
        nearM: z
          .number()
          .meta({ title: 'Even from', unit: 'm', description: '0: from the light’s own surface on' }),
        farM: z.number().meta({ title: 'Even to', unit: 'm' }),
        depthM: z.number().meta({ title: 'Even over', unit: 'm' }),
      })
      .meta({ title: 'Even light', description: 'where the light stays within the tolerance' }),
  }),
  sources: [
    'Inverse square law, for a light that is small against the distance',
    'A disc that glows evenly, on its axis: E goes with 1/(d² + R²), by derivation',
  ],
  examples: [
    {
      title:
        'Half the distance is two stops brighter, twice the distance two stops darker; half a stop holds over 70 cm at 2 m',
      input: { distanceM: [1, 2, 4], referenceM: 2 },
      output: {
        rows: [
          { distanceM: 1, stops: 2 },
          { distanceM: 2, stops: 0 },
          { distanceM: 4, stops: -2 },
        ],
        even: { nearM: 1.681792830507429, farM: 2.378414230005442, depthM: 0.696621399498013 },
      },
    },
    {
      title: 'A group in two rows: at 8 m the light is even to a third of a stop over almost 2 m',
      input: { nearM: 7, farM: 9, steps: 2, referenceM: 8, toleranceStops: 0.3333333333333333 },
      output: {
        rows: [
          { distanceM: 7, stops: 0.38529015588479165 },
          { distanceM: 8, stops: 0 },
          { distanceM: 9, stops: -0.3398500028846243 },
        ],
        even: { nearM: 7.127189745122715, farM: 8.979696386474984, depthM: 1.852506641352269 },
      },
    },
    {
      title:
        'A softbox of 1.2 m close to a face falls off more gently: 0.7 stops from 0.5 m to 0.8 m and not 1.4',
      input: { distanceM: [0.5, 0.8, 1.2], referenceM: 0.5, sourceDiameterM: 1.2 },
      output: {
        rows: [
          { distanceM: 0.5, stops: 0 },
          { distanceM: 0.8, stops: -0.7131188522118381 },
          { distanceM: 1.2, stops: -1.561115758766788 },
        ],
        even: { nearM: 0.26708638401048074, farM: 0.7089924351130892, depthM: 0.44190605110260844 },
      },
    },
  ],
  compute(given) {
    const { referenceM, toleranceStops, sourceDiameterM } = given;
    const notes: Remark[] = sourceDiameterM === 0 ? [note('small_source_assumed')] : [];
    return {
      result: {
        rows: listOfDistances(given).map((distance) => ({
          distanceM: distance,
          stops: falloffStops(distance, referenceM, sourceDiameterM),
        })),
        even: evenZone(referenceM, toleranceStops, sourceDiameterM),
      },
      notes,
    };
  },
});
