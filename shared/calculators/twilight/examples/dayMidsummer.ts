import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { twilightDayIn, twilightDayOut } from '../day';

export const dayMidsummer: Example<z.input<typeof twilightDayIn>, z.output<typeof twilightDayOut>> = {
  title: 'London at midsummer: nautical twilight lasts all night',
  input: {
    latitude: 51.5074,
    longitude: -0.1278,
    date: '2026-06-21',
  },
  output: {
    timeZone: 'Europe/London',
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
        at: '2026-06-21T02:40:40+01:00',
        sunAltitudeDeg: -12,
        azimuthDeg: 22.99238079598313,
      },
      {
        name: 'civilDawn',
        at: '2026-06-21T03:55:20+01:00',
        sunAltitudeDeg: -6,
        azimuthDeg: 39.223574782450584,
      },
      {
        name: 'sunrise',
        at: '2026-06-21T04:43:06+01:00',
        sunAltitudeDeg: -0.8333333333333334,
        azimuthDeg: 48.90133640363636,
      },
      {
        name: 'solarNoon',
        at: '2026-06-21T13:02:20+01:00',
        sunAltitudeDeg: 61.92942027314073,
        azimuthDeg: 179.99999999992576,
      },
      {
        name: 'sunset',
        at: '2026-06-21T21:21:33+01:00',
        sunAltitudeDeg: -0.8333333333333334,
        azimuthDeg: 311.0972584071426,
      },
      {
        name: 'civilDusk',
        at: '2026-06-21T22:09:19+01:00',
        sunAltitudeDeg: -6,
        azimuthDeg: 320.7745805434624,
      },
      {
        name: 'nauticalDusk',
        at: '2026-06-21T23:23:58+01:00',
        sunAltitudeDeg: -12,
        azimuthDeg: 337.0041688727243,
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
        from: '2026-06-21T04:43:06+01:00',
        to: '2026-06-21T21:21:33+01:00',
      },
    ],
    bands: [
      {
        name: 'astronomicalTwilight',
        part: 'morning',
        from: '2026-06-21T01:02:13+01:00',
        to: '2026-06-21T02:40:40+01:00',
      },
      {
        name: 'nauticalTwilight',
        part: 'morning',
        from: '2026-06-21T02:40:40+01:00',
        to: '2026-06-21T03:55:20+01:00',
      },
      {
        name: 'blueHour',
        part: 'morning',
        from: '2026-06-21T03:55:20+01:00',
        to: '2026-06-21T04:14:50+01:00',
      },
      {
        name: 'civilTwilight',
        part: 'morning',
        from: '2026-06-21T03:55:20+01:00',
        to: '2026-06-21T04:43:06+01:00',
      },
      {
        name: 'goldenHour',
        part: 'morning',
        from: '2026-06-21T04:14:50+01:00',
        to: '2026-06-21T05:37:21+01:00',
      },
      {
        name: 'goldenHour',
        part: 'evening',
        from: '2026-06-21T20:27:18+01:00',
        to: '2026-06-21T21:49:49+01:00',
      },
      {
        name: 'civilTwilight',
        part: 'evening',
        from: '2026-06-21T21:21:33+01:00',
        to: '2026-06-21T22:09:19+01:00',
      },
      {
        name: 'blueHour',
        part: 'evening',
        from: '2026-06-21T21:49:49+01:00',
        to: '2026-06-21T22:09:19+01:00',
      },
      {
        name: 'nauticalTwilight',
        part: 'evening',
        from: '2026-06-21T22:09:19+01:00',
        to: '2026-06-21T23:23:58+01:00',
      },
      {
        name: 'astronomicalTwilight',
        part: 'evening',
        from: '2026-06-21T23:23:58+01:00',
        to: '2026-06-22T01:02:26+01:00',
      },
    ],
    dayLengthS: 59907.41991577148,
  },
};
