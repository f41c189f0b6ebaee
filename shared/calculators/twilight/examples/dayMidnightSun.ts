import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { twilightDayIn, twilightDayOut } from '../day';

export const dayMidnightSun: Example<z.input<typeof twilightDayIn>, z.output<typeof twilightDayOut>> = {
  title: 'Midnight sun: half of the events do not happen, and it says why',
  input: {
    latitude: 69.6492,
    longitude: 18.9553,
    date: '2026-06-21',
  },
  output: {
    timeZone: 'Europe/Oslo',
    date: '2026-06-21',
    events: [
      {
        name: 'astronomicalDawn',
        at: null,
        sunAltitudeDeg: -18,
        azimuthDeg: null,
        reason: 'sun_stays_above',
      },
      {
        name: 'nauticalDawn',
        at: null,
        sunAltitudeDeg: -12,
        azimuthDeg: null,
        reason: 'sun_stays_above',
      },
      {
        name: 'civilDawn',
        at: null,
        sunAltitudeDeg: -6,
        azimuthDeg: null,
        reason: 'sun_stays_above',
      },
      {
        name: 'sunrise',
        at: null,
        sunAltitudeDeg: -0.8333333333333334,
        azimuthDeg: null,
        reason: 'sun_stays_above',
      },
      {
        name: 'solarNoon',
        at: '2026-06-21T12:45:59+02:00',
        sunAltitudeDeg: 43.78706077877824,
        azimuthDeg: 180.00000000003504,
      },
      {
        name: 'sunset',
        at: null,
        sunAltitudeDeg: -0.8333333333333334,
        azimuthDeg: null,
        reason: 'sun_stays_above',
      },
      {
        name: 'civilDusk',
        at: null,
        sunAltitudeDeg: -6,
        azimuthDeg: null,
        reason: 'sun_stays_above',
      },
      {
        name: 'nauticalDusk',
        at: null,
        sunAltitudeDeg: -12,
        azimuthDeg: null,
        reason: 'sun_stays_above',
      },
      {
        name: 'astronomicalDusk',
        at: null,
        sunAltitudeDeg: -18,
        azimuthDeg: null,
        reason: 'sun_stays_above',
      },
    ],
    directSun: [
      {
        from: '2026-06-21T00:45:52+02:00',
        to: '2026-06-22T00:46:06+02:00',
      },
    ],
    bands: [
      {
        name: 'goldenHour',
        part: 'morning',
        from: '2026-06-21T00:45:52+02:00',
        to: '2026-06-21T02:56:54+02:00',
      },
      {
        name: 'goldenHour',
        part: 'evening',
        from: '2026-06-21T22:35:04+02:00',
        to: '2026-06-22T00:46:06+02:00',
      },
    ],
    dayLengthS: 86400,
  },
};
