import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { contradictionAt } from '../../contract/contradictionAt';
import { defineCalculator } from '../../contract/defineCalculator';
import { atMostOne } from '../../contract/exactlyOne';
import { dateAt, geographicFields, yearFaults, zoneFaults, zoneOf } from '../../contract/geographicIn';
import { number } from '../../contract/quantities';
import { dayLengthS } from '../../math/dayLength';
import { directSun } from '../../math/directSun';
import { solarDay } from '../../math/solarDay';
import { BLUE_HOUR, GOLDEN_HOUR, sunBands, type BandLimits } from '../../math/sunBands';
import { sunEvents } from '../../math/sunEvents';
import { civilDay, formatCivilDate, parseCivilDate } from '../../time/civilDate';
import { formatInstant } from '../../time/instant';
import { isTimeZone } from '../../time/zone';
import { dayMidsummer } from './examples/dayMidsummer';
import { dayMidnightSun } from './examples/dayMidnightSun';
import { dayCourtyard } from './examples/dayCourtyard';

const altitude = (title: string) => number({ title, unit: '°', min: -30, max: 60 });

const band = (title: string, { fromDeg, toDeg }: BandLimits) =>
  contradictionAt<ReturnType<typeof limits>>((given) =>
    given.fromDeg < given.toDeg ? [] : [{ code: 'band_upside_down', path: ['toDeg'], params: { ...given } }],
  )(limits(fromDeg, toDeg))
    .prefault({})
    .meta({ title, description: 'of the sun’s centre; common practice, no standard', advanced: true });

function limits(fromDeg: number, toDeg: number) {
  return z.strictObject({
    fromDeg: altitude('From').default(fromDeg),
    toDeg: altitude('To').default(toDeg),
  });
}

const horizonDeg = (title: string, description: string) =>
  number({ title, description, unit: '°', min: -10, max: 89 });

const fields = z.strictObject({
  ...geographicFields,
  date: z.iso.date().optional().meta({
    title: 'Date',
    description: 'by the calendar of the place; today there where left out',
  }),
  eyeHeightM: number({
    title: 'Eye height',
    description: 'above the visible horizon, not above the sea',
    unit: 'm',
    min: 0,
    max: 10_000,
    advanced: true,
  }).default(0),
  horizonDeg: horizonDeg(
    'Horizon',
    'how high it stands all around, for direct sun; 0 where left out',
  ).optional(),
  skyline: z
    .array(
      z.strictObject({
        azimuthDeg: number({ title: 'Azimuth', description: 'from true north', unit: '°', min: 0, max: 360 }),
        altitudeDeg: horizonDeg('Altitude', 'as seen from the subject'),
      }),
    )
    .min(1)
    .max(360)
    .optional()
    .meta({
      title: 'Skyline',
      description: 'corners of buildings and hills, joined by lines',
      advanced: true,
    }),
  goldenHour: band('Golden hour', GOLDEN_HOUR),
  blueHour: band('Blue hour', BLUE_HOUR),
});

export const twilightDayIn = contradictionAt<typeof fields>(
  (given) => {
    const faults = [...zoneFaults(given), ...yearFaults(given.date, ['date'])];
    const date = given.date === undefined ? null : parseCivilDate(given.date);
    const timeZone = given.timeZone !== undefined && !isTimeZone(given.timeZone) ? null : zoneOf(given);
    if (faults.length > 0 || !date || !timeZone || civilDay(date, timeZone)) return faults;
    return [{ code: 'date_skipped', path: ['date'], params: { timeZone, given: given.date } }];
  },
  ['latitude', 'longitude', 'timeZone', 'date'],
)(atMostOne('horizonDeg', 'skyline')(fields));

const moment = (title: string) => z.string().meta({ title });
const EVENTS = [
  'astronomicalDawn',
  'nauticalDawn',
  'civilDawn',
  'sunrise',
  'solarNoon',
  'sunset',
  'civilDusk',
  'nauticalDusk',
  'astronomicalDusk',
] as const;
const BANDS = [
  'goldenHour',
  'blueHour',
  'civilTwilight',
  'nauticalTwilight',
  'astronomicalTwilight',
] as const;

export const twilightDayOut = z.strictObject({
  timeZone: z.string().meta({ title: 'Time zone' }),
  date: z.string().meta({ title: 'Date' }),
  events: z
    .array(
      z.strictObject({
        name: z.enum(EVENTS).meta({ title: 'Event' }),
        at: z.string().nullable().meta({ title: 'At', description: 'null where it does not happen' }),
        sunAltitudeDeg: z.number().meta({
          title: 'Sun’s altitude',
          unit: '°',
          description: 'of the centre, without refraction',
        }),
        azimuthDeg: z
          .number()
          .nullable()
          .meta({ title: 'Azimuth', unit: '°', description: 'from true north' }),
        reason: z.enum(['sun_stays_above', 'sun_stays_below']).optional().meta({ title: 'Why not' }),
      }),
    )
    .meta({ title: 'Events', description: 'in the order of an ordinary day' }),
  directSun: z
    .array(z.strictObject({ from: moment('From'), to: moment('To') }))
    .meta({ title: 'Direct sun', description: 'the upper limb over horizon and skyline' }),
  bands: z
    .array(
      z.strictObject({
        name: z.enum(BANDS).meta({ title: 'Band' }),
        part: z.enum(['morning', 'evening']).meta({ title: 'Part of the day' }),
        from: moment('From'),
        to: moment('To'),
      }),
    )
    .meta({ title: 'Bands of light' }),
  dayLengthS: z.number().meta({ title: 'Day length', unit: 's', description: 'from sunrise to sunset' }),
});

export type TwilightDayOut = z.output<typeof twilightDayOut>;

export const twilightDay = defineCalculator({
  id: 'twilight/day',
  title: 'Light of a day',
  summary:
    'When the sun rises and sets at a place, when it lights the subject, and when each twilight begins and ends.',
  units: 1,
  input: twilightDayIn,
  output: twilightDayOut,
  sources: [
    'Sunrise, sunset and twilights: definitions of the US Naval Observatory (upper limb at −50′; centre at −6°, −12°, −18°)',
    'Positions: astronomy-engine (VSOP87, truncated), interpolated; dip 2.12′·√m at sunrise and sunset',
    'Golden and blue hour: common practice, no standard',
  ],
  examples: [dayMidsummer, dayMidnightSun, dayCourtyard],
  compute(given, { now }) {
    const timeZone = zoneOf(given);
    const date = (given.date === undefined ? null : parseCivilDate(given.date)) ?? dateAt(now, timeZone);
    const local = civilDay(date, timeZone) ?? { startMs: now.getTime(), endMs: now.getTime() };
    const day = solarDay(given, (local.startMs + local.endMs) / 2);
    const say = (ms: number) => formatInstant(ms, timeZone);
    const horizon = given.skyline ? { skyline: given.skyline } : { horizonDeg: given.horizonDeg ?? 0 };
    const sun = directSun(day, horizon, given.eyeHeightM);
    const events = sunEvents(day, given.eyeHeightM);
    const rises = events.some(({ name, atMs }) => atMs !== null && (name === 'sunrise' || name === 'sunset'));
    const notes: Remark[] = [
      ...(given.timeZone === undefined ? [note('zone_looked_up', { timeZone })] : []),
      ...(rises ? [note('standard_refraction')] : []),
      note('bands_by_practice'),
    ];
    return {
      result: {
        timeZone,
        date: formatCivilDate(date),
        events: events.map(({ name, atMs, sunAltitudeDeg, azimuthDeg, reason }) => ({
          name,
          at: atMs === null ? null : say(atMs),
          sunAltitudeDeg,
          azimuthDeg,
          ...(reason && { reason }),
        })),
        directSun: sun.map(({ fromMs, toMs }) => ({ from: say(fromMs), to: say(toMs) })),
        bands: sunBands(day, given.eyeHeightM, given.goldenHour, given.blueHour).map(
          ({ name, part, fromMs, toMs }) => ({ name, part, from: say(fromMs), to: say(toMs) }),
        ),
        dayLengthS: dayLengthS(day, given.eyeHeightM),
      },
      notes,
      cautions:
        sun.length > 0 ? (['sun_and_optics', 'night_and_place'] as const) : (['night_and_place'] as const),
    };
  },
});
