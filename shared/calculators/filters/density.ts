import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { contradictionAt } from '../../contract/contradictionAt';
import { defineCalculator } from '../../contract/defineCalculator';
import { exactlyOne } from '../../contract/exactlyOne';
import { FILTER_WAYS, filterFields, MOST_FILTER_STOPS, stopsOfFilter } from '../../contract/filterIn';
import { exactSettings, readingFields, settingsIn, settingsOut } from '../../contract/settings';
import { settingsWithMarks } from '../../contract/settingsWithMarks';
import { usualGearNotes } from '../../contract/usualGear';
import { densityOfStops, factorOfStops, stackedStops, transmittanceOfStops } from '../../math/density';
import { sceneEv100, solveSetting } from '../../math/exposure';
import { RECIPROCITY_BREAK_S } from '../../math/reciprocity';
import type { CautionCode } from '../../text';

/** A density this near to whole stops is sold as them, in stops; and this far off it is not quite them. */
const NEAR_WHOLE_STOPS = [1e-3, 0.06] as const;

/** From here on a filter is strong enough to tempt people into looking at the sun, in stops. Our choice. */
const TEMPTING_STOPS = 13;

const filters = z
  .array(exactlyOne(...FILTER_WAYS)(z.strictObject(filterFields)))
  .min(1)
  .max(10);

const stackIn = contradictionAt<typeof filters>((stack) => {
  const total = stackedStops(stack.map(stopsOfFilter));
  if (total <= MOST_FILTER_STOPS) return [];
  return [{ code: 'stack_too_dense', path: [], params: { stops: total, most: MOST_FILTER_STOPS } }];
})(filters);

const input = exactlyOne(
  ...FILTER_WAYS,
  'stack',
)(
  z.strictObject({
    ...filterFields,
    stack: stackIn.optional().meta({ title: 'Stack', description: 'several filters behind each other' }),
    settings: settingsIn()
      .optional()
      .meta({ title: 'Settings without it', description: 'to be corrected for the filter' }),
    move: z
      .enum(['shutter', 'iso', 'aperture'])
      .default('shutter')
      .meta({ title: 'Correct by', description: 'the setting that makes up for the filter' }),
    ...readingFields,
  }),
);
type Given = z.output<typeof input>;

/** The settings with one of them moved so that the picture stays as bright behind the filter. */
function corrected(given: Given, settings: NonNullable<Given['settings']>, filterStops: number) {
  const exact = exactSettings(settings, given);
  const moved = { ...exact, ndStops: exact.ndStops + filterStops };
  // What the settings alone have to suit lies below the scene by all filters in front of the lens.
  const settingsEv100 = sceneEv100(exact.aperture, exact.shutterS, exact.iso, exact.ndStops) - moved.ndStops;
  moved[given.move === 'shutter' ? 'shutterS' : given.move] = solveSetting(given.move, settingsEv100, exact);
  return moved;
}

function notesOf(given: Given, filterStops: number): Remark[] {
  const notes: Remark[] = [];
  const whole = Math.round(filterStops);
  const off = Math.abs(filterStops - whole);
  if (given.density !== undefined && off > NEAR_WHOLE_STOPS[0] && off < NEAR_WHOLE_STOPS[1]) {
    notes.push(note('density_near_whole_stops', { density: given.density, stops: filterStops, whole }));
  }
  const all = given.stack ?? [given];
  if (all.some(({ polariserDeg }) => polariserDeg !== undefined)) notes.push(note('polarisers_are_ideal'));
  return notes;
}

export const filtersDensity = defineCalculator({
  id: 'filters/density',
  title: 'Neutral density',
  summary: 'Stops, density, factor and transmittance of a filter or a stack, and the settings behind it.',
  units: 1,
  input,
  output: z.strictObject({
    stops: z.number().meta({ title: 'Stops', unit: 'stops', description: 'light taken away' }),
    density: z.number().meta({ title: 'Density' }),
    factor: z.number().meta({ title: 'Factor' }),
    transmittance: z.number().meta({ title: 'Transmittance', description: 'share of the light that passes' }),
    settings: settingsOut().optional().meta({ title: 'Settings with it' }),
  }),
  sources: [
    'Density D = −log10 τ (ISO 5-1), stops D·log2 10, factor 10^D; densities and stops add, factors multiply',
    'Malus’s law for crossed polarisers: τ = cos² α',
    'Correction by derivation from EV100 = log2(N²/t) − log2(S/100) + nd',
  ],
  examples: [
    {
      title: 'Density 3.0 before f/8, 1/125 and ISO 100: a thousandfold, 7.8 s, so set 8 s',
      input: { density: 3, settings: { aperture: 'f/8', shutter: '1/125', iso: 100 } },
      output: {
        stops: 9.965784284662087,
        density: 3.0,
        factor: 1000.0,
        transmittance: 0.001,
        settings: {
          aperture: { exact: 8, mark: 'f/8', residualStops: 0 },
          shutter: { exact: 7.8125, mark: '8s', residualStops: 0.03421571533791298 },
          iso: { exact: 100, mark: '100', residualStops: 0 },
          ndStops: 9.965784284662087,
        },
      },
    },
    {
      title: 'ND8, a factor of 8, takes three stops and has a density of 0.9',
      input: { factor: 8 },
      output: { stops: 3, density: 0.9030899869919435, factor: 8, transmittance: 0.125 },
    },
    {
      title: 'Six stops, ND8 and polarisers crossed by 60° behind each other take eleven stops',
      input: { stack: [{ stops: 6 }, { factor: 8 }, { polariserDeg: 60 }] },
      output: { stops: 11, density: 3.3113299523037933, factor: 2048, transmittance: 0.00048828125 },
    },
    {
      title: 'Three stops of density at the sync speed open f/4 to f/1.4 and keep the time',
      input: { stops: 3, settings: { aperture: 'f/4', shutter: '1/60', iso: 100 }, move: 'aperture' },
      output: {
        stops: 3,
        density: 0.9030899869919435,
        factor: 8,
        transmittance: 0.125,
        settings: {
          aperture: { exact: 1.4142135623730951, mark: 'f/1.4', residualStops: 0 },
          shutter: { exact: 0.015625, mark: '1/60', residualStops: 0 },
          iso: { exact: 100, mark: '100', residualStops: 0 },
          ndStops: 3,
        },
      },
    },
  ],
  compute(given) {
    const stops = stackedStops((given.stack ?? [given]).map(stopsOfFilter));
    const notes = notesOf(given, stops);
    const filter = {
      stops,
      density: densityOfStops(stops),
      factor: factorOfStops(stops),
      transmittance: transmittanceOfStops(stops),
    };
    const cautions: CautionCode[] = stops >= TEMPTING_STOPS ? ['sun_and_optics'] : [];
    if (!given.settings) return { result: filter, notes, cautions };
    const exact = corrected(given, given.settings, stops);
    const settings = settingsWithMarks(exact, given.scale);
    if (exact.shutterS > RECIPROCITY_BREAK_S) notes.push(note('film_needs_more_time'));
    return { result: { ...filter, settings }, notes: [...notes, ...usualGearNotes(settings)], cautions };
  },
});
