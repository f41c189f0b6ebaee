import { z } from 'zod';
import { contradictionAt, type FoundContradiction } from '../../contract/contradictionAt';
import { defineCalculator } from '../../contract/defineCalculator';
import { exactlyOne } from '../../contract/exactlyOne';
import { ev100In, stops } from '../../contract/quantities';
import { addStops, sharesOfLight } from '../../math/mixing';

const part = z.strictObject({
  stops: stops({ title: 'Light', description: 'against any common reference' }).optional(),
  ev100: ev100In().optional(),
});
const partsIn = z.array(exactlyOne('stops', 'ev100')(part)).min(1).max(100);

const unitOf = (one: z.output<typeof part> | undefined) => (one?.stops === undefined ? 'ev100' : 'stops');

/** Every part that is not in the first one's unit. */
function mixedUnits(parts: z.output<typeof partsIn>): FoundContradiction[] {
  const first = unitOf(parts[0]);
  return parts.flatMap((one, index) => {
    const given = unitOf(one);
    return given === first ? [] : [{ code: 'units_mixed', path: [index, given], params: { first, given } }];
  });
}

export const lightAdd = defineCalculator({
  id: 'light/add',
  title: 'Adding light',
  summary: 'The sum of several lights on one surface, in stops or EV, and each one’s share of it.',
  units: 1,
  input: z.strictObject({
    parts: contradictionAt<typeof partsIn>(mixedUnits)(partsIn).meta({
      title: 'Lights',
      description: 'each alone on the same surface; all in stops, or all as EV at ISO 100',
    }),
  }),
  output: z.strictObject({
    stops: z.number().optional().meta({ title: 'Sum', unit: 'stops' }),
    ev100: z.number().optional().meta({ title: 'Sum, EV at ISO 100', unit: 'stops' }),
    parts: z
      .array(
        z.strictObject({
          stops: z.number().optional().meta({ title: 'Light', unit: 'stops' }),
          ev100: z.number().optional().meta({ title: 'EV at ISO 100', unit: 'stops' }),
          share: z.number().meta({ title: 'Share of the sum' }),
        }),
      )
      .meta({ title: 'Lights' }),
  }),
  sources: ['Light adds linearly: s = log2(Σ 2^si), derivation'],
  examples: [
    {
      title: 'Fill a stop under the daylight lifts the lit side by 0.58 of a stop',
      input: { parts: [{ stops: 0 }, { stops: -1 }] },
      output: {
        stops: 0.5849625007211562,
        parts: [
          { stops: 0, share: 0.6666666666666666 },
          { stops: -1, share: 0.3333333333333333 },
        ],
      },
    },
    {
      title: 'Two small lamps and one of twice their light make a whole: −2, −2 and −1 add up to 0',
      input: { parts: [{ stops: -2 }, { stops: -2 }, { stops: -1 }] },
      output: {
        stops: 0,
        parts: [
          { stops: -2, share: 0.25 },
          { stops: -2, share: 0.25 },
          { stops: -1, share: 0.5 },
        ],
      },
    },
    {
      title: 'When the street lamps give as much as the sky, EV 5 becomes EV 6',
      input: { parts: [{ ev100: 5 }, { ev100: 5 }] },
      output: {
        ev100: 6,
        parts: [
          { ev100: 5, share: 0.5 },
          { ev100: 5, share: 0.5 },
        ],
      },
    },
  ],
  compute({ parts }) {
    const unit = unitOf(parts[0]);
    const amounts = parts.map((one) => one[unit] ?? 0);
    const shares = sharesOfLight(amounts);
    return {
      result: {
        [unit]: addStops(amounts),
        parts: amounts.map((amount, i) => ({ [unit]: amount, share: shares[i] ?? 0 })),
      },
    };
  },
});
