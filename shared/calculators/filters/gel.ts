import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { contradictionAt } from '../../contract/contradictionAt';
import { defineCalculator } from '../../contract/defineCalculator';
import { exactlyOne } from '../../contract/exactlyOne';
import { number } from '../../contract/quantities';
import { GEL_SERIES_NAMES, GEL_STRENGTHS, nearestGels } from '../../math/gels';
import { COLDEST_K, HOTTEST_K, miredShift, shiftedTemperatureK } from '../../math/mired';

/** A miss by more than this shows, in mired. Common practice, no source. */
const SHOWS_MIRED = 10;

const temperatureK = (title: string, description: string) =>
  number({ title, description, unit: 'K', min: COLDEST_K, max: HOTTEST_K });

const fields = z.strictObject({
  sourceK: temperatureK('Light to gel', 'colour temperature of the bare light; flash has 5,000 to 6,000 K'),
  targetK: temperatureK('Light to match', 'colour temperature that the gelled light is to get').optional(),
  miredShift: number({
    title: 'Shift of the gel',
    description: 'positive is warmer, towards amber',
    unit: 'mired',
    min: -1000,
    max: 1000,
  }).optional(),
  otherK: temperatureK(
    'Other light',
    'a light in the picture that is to stay neutral; where left out, one of the colour that the gelled light gets',
  ).optional(),
});
type Given = z.output<typeof fields>;

/** What the gel is to turn the light into; null where that lies beyond the arithmetic's domain. */
function resultOf({ sourceK, targetK, miredShift: shift = 0 }: Given): number | null {
  return targetK ?? shiftedTemperatureK(sourceK, shift);
}

const input = exactlyOne(
  'targetK',
  'miredShift',
)(
  contradictionAt<typeof fields>((given) => {
    if (resultOf(given) !== null) return [];
    const { sourceK, miredShift: shift } = given;
    const [low, high] = [miredShift(sourceK, HOTTEST_K), miredShift(sourceK, COLDEST_K)];
    return [{ code: 'gel_result_out_of_reach', path: ['miredShift'], params: { sourceK, shift, low, high } }];
  })(fields),
);

const shift = (title: string, description: string) => z.number().meta({ title, description, unit: 'mired' });
const kelvin = (title: string, description?: string) => z.number().meta({ title, description, unit: 'K' });

function notesOf(given: Given, wanted: number, misses: readonly number[], cast: number): Remark[] {
  const notes = [note('gels_differ')];
  const errorMired = Math.min(...misses.map(Math.abs));
  if (wanted < 0) notes.push(note('gels_only_warm'));
  else if (errorMired > SHOWS_MIRED) notes.push(note('gel_not_near', { errorMired }));
  notes.push(
    given.otherK === undefined ? note('white_balance_on_gelled') : note('white_balance_on_other', { cast }),
  );
  return notes;
}

export const filtersGel = defineCalculator({
  id: 'filters/gel',
  title: 'Gel for a light',
  summary:
    'The mired shift that matches one light to another, the sheets that come nearest, the white balance.',
  units: 1,
  input,
  output: z.strictObject({
    miredShift: shift('Shift', 'positive is warmer, towards amber'),
    resultK: kelvin('Gelled light'),
    nearest: z
      .array(
        z.strictObject({
          series: z.enum(GEL_SERIES_NAMES).meta({
            title: 'Series',
            description:
              'deep daylight: full turns 6,500 into 3,200 K; daylight: full turns 5,500 into 2,900 K',
          }),
          sheets: z
            .array(z.enum(GEL_STRENGTHS))
            .meta({ title: 'Sheets', description: 'behind each other; empty where none comes nearer' }),
          miredShift: shift('Shift of the sheets', 'positive is warmer'),
          errorMired: shift('Off by', 'positive is too warm'),
          lossStops: z.number().meta({ title: 'Loss', unit: 'stops' }),
          resultK: kelvin('Light behind the sheets', 'null where colder than 1,000 K').nullable(),
        }),
      )
      .meta({ title: 'Nearest sheets in either series' }),
    whiteBalanceK: kelvin('White balance', 'keeps the other light neutral'),
    castMired: shift('Cast of the gelled light', 'at that white balance; positive is warm'),
  }),
  sources: [
    'Encyclopaedia, "Mired": Δ = 10⁶/T2 − 10⁶/T1',
    'The two series of warming gels: common practice, from memory of the trade’s data sheets; no published standard',
  ],
  examples: [
    {
      title: 'Flash of 5500 K to match lamps of 3200 K: +131 mired, three quarters in either series',
      input: { sourceK: 5500, targetK: 3200 },
      output: {
        miredShift: 130.6818181818182,
        resultK: 3200,
        nearest: [
          {
            series: 'deep daylight',
            sheets: ['three quarters'],
            miredShift: 124,
            errorMired: -6.681818181818187,
            lossStops: 0.7131188522118385,
            resultK: 3269.9167657550533,
          },
          {
            series: 'daylight',
            sheets: ['three quarters'],
            miredShift: 131,
            errorMired: 0.318181818181813,
            lossStops: 0.7858751946471527,
            resultK: 3196.745132229003,
          },
        ],
        whiteBalanceK: 3200,
        castMired: 0,
      },
    },
    {
      title: 'Half of a daylight sheet on the flash, white balance kept for a dusk sky of 10,000 K',
      input: { sourceK: 5500, miredShift: 81, otherK: 10000 },
      output: {
        miredShift: 81,
        resultK: 3804.911795226565,
        nearest: [
          {
            series: 'deep daylight',
            sheets: ['quarter'],
            miredShift: 64,
            errorMired: -17,
            lossStops: 0.3400754415976217,
            resultK: 4068.0473372781066,
          },
          {
            series: 'daylight',
            sheets: ['half'],
            miredShift: 81,
            errorMired: 0,
            lossStops: 0.4540316308947075,
            resultK: 3804.911795226565,
          },
        ],
        whiteBalanceK: 10000,
        castMired: 162.8181818181818,
      },
    },
    {
      title: 'Lamps of 3200 K to match daylight need a blue gel, which neither series has',
      input: { sourceK: 3200, targetK: 5600 },
      output: {
        miredShift: -133.92857142857142,
        resultK: 5600,
        nearest: [
          {
            series: 'deep daylight',
            sheets: [],
            miredShift: 0,
            errorMired: 133.92857142857142,
            lossStops: 0,
            resultK: 3200.0,
          },
          {
            series: 'daylight',
            sheets: [],
            miredShift: 0,
            errorMired: 133.92857142857142,
            lossStops: 0,
            resultK: 3200.0,
          },
        ],
        whiteBalanceK: 5600,
        castMired: 0,
      },
    },
  ],
  compute(given) {
    const { sourceK } = given;
    // The schema lets only shifts through that lead to a temperature.
    const resultK = resultOf(given) ?? sourceK;
    const wanted = given.miredShift ?? miredShift(sourceK, resultK);
    const nearest = nearestGels(wanted).map((choice) => ({
      ...choice,
      sheets: [...choice.sheets],
      resultK: shiftedTemperatureK(sourceK, choice.miredShift),
    }));
    const whiteBalanceK = given.otherK ?? resultK;
    const castMired = miredShift(whiteBalanceK, resultK);
    const misses = nearest.map(({ errorMired }) => errorMired);
    return {
      result: { miredShift: wanted, resultK, nearest, whiteBalanceK, castMired },
      notes: notesOf(given, wanted, misses, castMired),
    };
  },
});
