import type { z } from 'zod';
import type { Example } from '../../../contract/defineCalculator';
import type { twilightDayIn, twilightDayOut } from '../day';

export const dayCourtyard: Example<z.input<typeof twilightDayIn>, z.output<typeof twilightDayOut>> = {
  title: 'Houses of 20° all around: direct sun comes two hours late and leaves two hours early',
  input: {
    latitude: 48.2082,
    longitude: 16.3738,
    date: '2026-10-04',
    horizonDeg: 20,
  },
  output: {
    timeZone: 'Europe/Vienna',
    date: '2026-10-04',
    events: [
      {
        name: 'astronomicalDawn',
        at: '2026-10-04T05:13:54+02:00',
        sunAltitudeDeg: -18,
        azimuthDeg: 75.84447601003305,
      },
      {
        name: 'nauticalDawn',
        at: '2026-10-04T05:50:35+02:00',
        sunAltitudeDeg: -12,
        azimuthDeg: 82.99944608992041,
      },
      {
        name: 'civilDawn',
        at: '2026-10-04T06:26:44+02:00',
        sunAltitudeDeg: -6,
        azimuthDeg: 89.80981359747985,
      },
      {
        name: 'sunrise',
        at: '2026-10-04T06:57:49+02:00',
        sunAltitudeDeg: -0.8333333333333334,
        azimuthDeg: 95.6008826832193,
      },
      {
        name: 'solarNoon',
        at: '2026-10-04T12:43:14+02:00',
        sunAltitudeDeg: 37.34750456239225,
        azimuthDeg: 179.9999999996229,
      },
      {
        name: 'sunset',
        at: '2026-10-04T18:27:49+02:00',
        sunAltitudeDeg: -0.8333333333333334,
        azimuthDeg: 264.1214256397897,
      },
      {
        name: 'civilDusk',
        at: '2026-10-04T18:58:50+02:00',
        sunAltitudeDeg: -6,
        azimuthDeg: 269.8873890471657,
      },
      {
        name: 'nauticalDusk',
        at: '2026-10-04T19:34:53+02:00',
        sunAltitudeDeg: -12,
        azimuthDeg: 276.6607303791827,
      },
      {
        name: 'astronomicalDusk',
        at: '2026-10-04T20:11:26+02:00',
        sunAltitudeDeg: -18,
        azimuthDeg: 283.7661616189073,
      },
    ],
    directSun: [
      {
        from: '2026-10-04T09:08:43+02:00',
        to: '2026-10-04T16:17:04+02:00',
      },
    ],
    bands: [
      {
        name: 'astronomicalTwilight',
        part: 'morning',
        from: '2026-10-04T05:13:54+02:00',
        to: '2026-10-04T05:50:35+02:00',
      },
      {
        name: 'nauticalTwilight',
        part: 'morning',
        from: '2026-10-04T05:50:35+02:00',
        to: '2026-10-04T06:26:44+02:00',
      },
      {
        name: 'blueHour',
        part: 'morning',
        from: '2026-10-04T06:26:44+02:00',
        to: '2026-10-04T06:38:45+02:00',
      },
      {
        name: 'civilTwilight',
        part: 'morning',
        from: '2026-10-04T06:26:44+02:00',
        to: '2026-10-04T06:57:49+02:00',
      },
      {
        name: 'goldenHour',
        part: 'morning',
        from: '2026-10-04T06:38:45+02:00',
        to: '2026-10-04T07:39:29+02:00',
      },
      {
        name: 'goldenHour',
        part: 'evening',
        from: '2026-10-04T17:46:13+02:00',
        to: '2026-10-04T18:46:51+02:00',
      },
      {
        name: 'civilTwilight',
        part: 'evening',
        from: '2026-10-04T18:27:49+02:00',
        to: '2026-10-04T18:58:50+02:00',
      },
      {
        name: 'blueHour',
        part: 'evening',
        from: '2026-10-04T18:46:51+02:00',
        to: '2026-10-04T18:58:50+02:00',
      },
      {
        name: 'nauticalTwilight',
        part: 'evening',
        from: '2026-10-04T18:58:50+02:00',
        to: '2026-10-04T19:34:53+02:00',
      },
      {
        name: 'astronomicalTwilight',
        part: 'evening',
        from: '2026-10-04T19:34:53+02:00',
        to: '2026-10-04T20:11:26+02:00',
      },
    ],
    dayLengthS: 41399.86852612305,
  },
};
