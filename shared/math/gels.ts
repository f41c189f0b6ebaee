import { stopsOfTransmittance } from './density';
import { inDomain } from './domain';

export const GEL_STRENGTHS = ['eighth', 'quarter', 'half', 'three quarters', 'full'] as const;
export const GEL_SERIES_NAMES = ['deep daylight', 'daylight'] as const;

/** One sheet of warming (orange) gel as it is sold: its shift, the light it lets through, and what that costs. */
interface GelStrength {
  readonly strength: (typeof GEL_STRENGTHS)[number];
  readonly miredShift: number;
  readonly transmittance: number;
  readonly lossStops: number;
}

/** A maker's series; sheets of different series share their names but not their shifts. */
export interface GelSeries {
  readonly series: (typeof GEL_SERIES_NAMES)[number];
  /** What the full sheet is made to turn into what, in kelvin. */
  readonly nominalFromK: number;
  readonly nominalToK: number;
  readonly strengths: readonly GelStrength[];
}

/** Sheets of one series behind each other; none where no sheet is nearer than any. */
export interface GelChoice {
  readonly series: GelSeries['series'];
  readonly sheets: readonly GelStrength['strength'][];
  readonly miredShift: number;
  readonly lossStops: number;
  /** The sheets' shift less the wanted one: positive is too warm. */
  readonly errorMired: number;
}

/** A second sheet is worth it only for a difference that shows, about this many mired. Common practice, no source. */
const WORTH_A_SHEET_MIRED = 10;

const sheet = (
  strength: GelStrength['strength'],
  miredShift: number,
  transmittance: number,
): GelStrength => ({ strength, miredShift, transmittance, lossStops: stopsOfTransmittance(transmittance) });

/**
 * The two families of warming gels in use. Shifts and transmittances are common practice, from memory of the
 * trade's data sheets; no standard is published, and makers differ under equal names.
 */
export const GEL_SERIES: readonly GelSeries[] = [
  {
    series: 'deep daylight',
    nominalFromK: 6500,
    nominalToK: 3200,
    strengths: [
      sheet('eighth', 26, 0.85),
      sheet('quarter', 64, 0.79),
      sheet('half', 109, 0.71),
      sheet('three quarters', 124, 0.61),
      sheet('full', 159, 0.55),
    ],
  },
  {
    series: 'daylight',
    nominalFromK: 5500,
    nominalToK: 2900,
    strengths: [
      sheet('eighth', 20, 0.92),
      sheet('quarter', 42, 0.81),
      sheet('half', 81, 0.73),
      sheet('three quarters', 131, 0.58),
      sheet('full', 167, 0.47),
    ],
  },
];

/**
 * The sheets of each series that come nearest to a wanted shift: none, one, or two where the second brings the
 * result nearer by a difference that shows. Behind each other shifts add, transmittances multiply.
 * @param wantedMired Δ, mired, −1,000 to 1,000; the series only warm, so what cools is met by no sheet
 * @returns one choice for each series, in the order of `GEL_SERIES`; +131 is 'three quarters' (+124) and 'three
 *   quarters' (+131). Throws RangeError outside the domain.
 * Source: derivation from the series above; that shifts of sheets add is an approximation.
 */
export function nearestGels(wantedMired: number): GelChoice[] {
  inDomain('wanted shift in mired', wantedMired, -1000, 1000);
  return GEL_SERIES.map(({ series, strengths }) => {
    const single = nearest([[], ...strengths.map((one) => [one])], wantedMired);
    const pair = nearest(pairsOf(strengths), wantedMired);
    const gain = Math.abs(single.errorMired) - Math.abs(pair.errorMired);
    return { series, ...(gain > WORTH_A_SHEET_MIRED ? pair : single) };
  });
}

function pairsOf(strengths: readonly GelStrength[]): GelStrength[][] {
  return strengths.flatMap((one, index) => strengths.slice(index).map((other) => [other, one]));
}

function nearest(
  candidates: readonly (readonly GelStrength[])[],
  wantedMired: number,
): Omit<GelChoice, 'series'> {
  const choices = candidates.map((sheets) => {
    const miredShift = sheets.reduce((sum, one) => sum + one.miredShift, 0);
    const lossStops = sheets.reduce((sum, one) => sum + one.lossStops, 0);
    const names = sheets.map((one) => one.strength);
    return { sheets: names, miredShift, lossStops, errorMired: miredShift - wantedMired };
  });
  // Of two as near, the one that costs less light.
  return choices.reduce((best, one) => {
    const nearer = Math.abs(best.errorMired) - Math.abs(one.errorMired);
    return nearer > 0 || (nearer === 0 && one.lossStops < best.lossStops) ? one : best;
  });
}
