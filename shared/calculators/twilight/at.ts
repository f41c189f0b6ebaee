import { z } from 'zod';
import { note, type Remark } from '../../contract/answer';
import { contradictionAt } from '../../contract/contradictionAt';
import { defineCalculator } from '../../contract/defineCalculator';
import {
  geographicFields,
  instantIn,
  msOf,
  yearFaults,
  zoneFaults,
  zoneOf,
} from '../../contract/geographicIn';
import { meterConstants } from '../../contract/quantities';
import { ev100OfIlluminance } from '../../math/exposure';
import { lightBand } from '../../math/lightBand';
import { moonPosition } from '../../math/moonPosition';
import { fallStopsPerMinute, skyLight } from '../../math/skyLight';
import { sunPosition } from '../../math/sunPosition';
import { formatInstant } from '../../time/instant';
import { atBlueHour } from './examples/atBlueHour';
import { atMoonlight } from './examples/atMoonlight';

const fields = z.strictObject({
  ...geographicFields,
  at: instantIn('At'),
  incidentC: meterConstants.incidentC,
});

export const twilightAtIn = contradictionAt<typeof fields>(
  (given) => [...zoneFaults(given), ...yearFaults(given.at, ['at'])],
  ['timeZone', 'at'],
)(fields);

const lux = (title: string, description: string) => z.number().meta({ title, unit: 'lx', description });
const TWILIGHTS = ['day', 'civilTwilight', 'nauticalTwilight', 'astronomicalTwilight', 'night'] as const;

export const twilightAtOut = z.strictObject({
  timeZone: z.string().meta({ title: 'Time zone' }),
  at: z.string().meta({ title: 'At' }),
  sunAltitudeDeg: z
    .number()
    .meta({ title: 'Sun’s altitude', unit: '°', description: 'of the centre, without refraction' }),
  azimuthDeg: z.number().meta({ title: 'Sun’s azimuth', unit: '°', description: 'from true north' }),
  illuminanceLux: lux('Light of the sky', 'with the sun, on level ground, clear sky'),
  ev100: z.number().meta({ title: 'EV at ISO 100', unit: 'stops', description: 'incident, of that light' }),
  incidentC: z.number().meta({ title: 'Meter constant C' }),
  fallStopsPerMinute: z
    .number()
    .meta({ title: 'Fall', unit: 'stops/min', description: 'negative while the light rises' }),
  band: z
    .strictObject({
      twilight: z.enum(TWILIGHTS).meta({ title: 'Twilight' }),
      hour: z
        .enum(['goldenHour', 'blueHour'])
        .nullable()
        .meta({ title: 'Hour', description: 'by common practice' }),
    })
    .meta({ title: 'Band of light' }),
  moon: z
    .strictObject({
      altitudeDeg: z.number().meta({ title: 'Altitude', unit: '°', description: 'without refraction' }),
      phaseAngleDeg: z
        .number()
        .meta({ title: 'Phase angle', unit: '°', description: '0 at full moon, 180 at new moon' }),
      illuminanceLux: lux('Light of the moon', 'on level ground, clear sky'),
    })
    .meta({ title: 'Moon' }),
});

export const twilightAt = defineCalculator({
  id: 'twilight/at',
  title: 'Light at a moment',
  summary:
    'Where sun and moon stand at a place and moment, how bright a clear sky is, and how fast it falls.',
  units: 1,
  input: twilightAtIn,
  output: twilightAtOut,
  sources: [
    'Sky and moon light: Explanatory Supplement to the Astronomical Almanac (1992), p. 491',
    'Positions: astronomy-engine (VSOP87 and ELP, truncated)',
    'E = EV by incident light, C = 250 (ISO 2720:1974)',
  ],
  examples: [atBlueHour, atMoonlight],
  compute(given) {
    const { latitude, longitude, incidentC } = given;
    const place = { latitude, longitude };
    const atMs = msOf(given.at);
    const timeZone = zoneOf(given);
    const { altitudeDeg, azimuthDeg, climbDegPerMinute } = sunPosition(place, atMs);
    const sky = skyLight(altitudeDeg);
    const moon = moonPosition(place, atMs);
    const notes: Remark[] = [
      ...(given.timeZone === undefined ? [note('zone_looked_up', { timeZone })] : []),
      note('sky_model_clear'),
      ...(sky.isClamped ? [note('sky_model_clamped')] : []),
    ];
    return {
      result: {
        timeZone,
        at: formatInstant(atMs, timeZone),
        sunAltitudeDeg: altitudeDeg,
        azimuthDeg,
        illuminanceLux: sky.illuminanceLux,
        ev100: ev100OfIlluminance(sky.illuminanceLux, incidentC),
        incidentC,
        fallStopsPerMinute: fallStopsPerMinute(altitudeDeg, climbDegPerMinute),
        band: lightBand(altitudeDeg),
        moon: {
          altitudeDeg: moon.altitudeDeg,
          phaseAngleDeg: moon.phaseAngleDeg,
          illuminanceLux: moon.illuminanceLux,
        },
      },
      notes,
      ...(altitudeDeg > -1 && { cautions: ['sun_and_optics'] as const }),
    };
  },
});
