import type { z } from 'zod';
import type { flashDaylightOut } from '../../../../shared/calculators/flash/daylight';
import type { flashMeasured } from '../../../../shared/calculators/flash/measured';
import { formatSignedStops, formatStops } from '../../../text/formatQuantity';
import type { Peg, Span } from '../../scale/lightScale';
import { spanAround } from '../../scale/scaleFrame';
import type { PicturesOf } from './scalePicture';

type MeasuredIn = z.output<typeof flashMeasured.input>;
type Measured = z.output<typeof flashMeasured.output>;

/** Where flash and ambient light stand alone, and the result that both made. */
export const measuredPictures: PicturesOf = (given, answer) => {
  const { resultStops, ambientStops } = given as MeasuredIn;
  const { flashStops } = answer as Measured;
  const pegs: Peg[] = [
    { id: 'result', title: 'Result', stops: resultStops, kind: 'subject' },
    { id: 'flash', title: 'Flash alone', stops: flashStops, kind: 'flash' },
  ];
  const spans: Span[] = [];
  if (ambientStops !== undefined) {
    const label = `the flash adds ${formatSignedStops(resultStops - ambientStops)}`;
    pegs.push({ id: 'ambient', title: 'Ambient alone', stops: ambientStops, kind: 'light' });
    spans.push({
      id: 'adds',
      title: label,
      label,
      fromStops: ambientStops,
      toStops: resultStops,
      isLit: true,
    });
  }
  return [
    {
      title: 'The test frame',
      unit: 'stops from a middle tone',
      ...spanAround([-4, 4, ...pegs.map(({ stops }) => stops)], 10, 1),
      middleStops: 0,
      pegs,
      spans,
      caption: 'The band shows how bright each comes out.',
    },
  ];
};

type Daylight = z.output<typeof flashDaylightOut>;
type Part = NonNullable<Daylight['asWanted']> & Partial<Pick<Daylight['ways'][number], 'reserveRange'>>;

const WAY_TITLES = {
  smallerAperture: 'smaller aperture',
  neutralDensity: 'filter',
  highSpeedSync: 'high-speed sync',
} as const;

/** From the power that the way needs up to full power, or past it; at most loss where the loss is not measured. */
function barsOf(title: string, { reserveStops, reserveRange }: Part): Span[] {
  if (reserveStops === null) return [];
  const bar = (id: string, name: string, reserve: number): Span => {
    const label = `${name} ${formatSignedStops(reserve)}`;
    return { id, title: label, label, fromStops: -reserve, toStops: 0, isLit: reserve >= 0 };
  };
  const own = bar(title, title, reserveStops);
  if (!reserveRange) return [own];
  return [own, bar(`${title} at most loss`, `${title}, most loss`, reserveRange.lowStops)];
}

function settingsText(title: string, { settings, power }: Part): string {
  const { aperture, shutter, iso, ndStops } = settings;
  const filter = ndStops > 0 ? `, ${formatStops(ndStops)} stops of filter` : '';
  const flash = power === null ? 'no flash' : `power ${power.mark}`;
  return `${title}: ${aperture.mark}, ${shutter.mark}, ISO ${iso.mark}${filter}, ${flash}`;
}

/** The ways out of a wide aperture in daylight side by side, by what each leaves the flash. */
export const daylightPictures: PicturesOf = (_, answer) => {
  const { asWanted, ways } = answer as Daylight;
  const parts: (readonly [string, Part])[] = asWanted
    ? [['as wanted', asWanted]]
    : ways.map((way) => [WAY_TITLES[way.way], way]);
  const spans = parts.flatMap(([title, part]) => barsOf(title, part));
  return [
    {
      title: 'What each way leaves the flash',
      unit: 'stops of flash from full power',
      ...spanAround([0, -6, ...spans.map(({ fromStops }) => fromStops)], 10, 1),
      towards: 'more power to the right',
      pegs: [{ id: 'full', title: 'Full power', stops: 0, kind: 'flash' }],
      spans,
      caption:
        'Filled bars reach from the power needed up to full: the reserve. Hatched ones are what the flash lacks. ' +
        `${parts.map(([title, part]) => settingsText(title, part)).join('; ')}.`,
    },
  ];
};
