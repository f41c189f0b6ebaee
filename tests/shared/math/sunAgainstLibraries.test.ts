import fc from 'fast-check';
import { getTimes } from 'suncalc';
import { describe, expect, it } from 'vitest';
import { dayCrossings } from '../../../shared/math/dayCrossings';
import { instantOf, solarDay } from '../../../shared/math/solarDay';
import { sunCrossings } from '../../../shared/math/sunCrossings';
import { sunPosition } from '../../../shared/math/sunPosition';
import { meeusAltitudeDeg } from '../../support/meeusSun';
import { within } from '../../support/within';

/** Altitudes for which suncalc 2 has names; its sunrise is at −0.833°, not −50′, so it is compared there. */
const NAMES = [
  [-0.833, 'sunrise', 'sunset'],
  [-0.3, 'sunriseEnd', 'sunsetStart'],
  [-6, 'dawn', 'dusk'],
  [-12, 'nauticalDawn', 'nauticalDusk'],
  [-18, 'nightEnd', 'night'],
  [6, 'goldenHourEnd', 'goldenHour'],
] as const;

/** suncalc's positions are good to 0.01°; where the sun climbs slower than this, that is more than ten seconds. */
const STEEP_DEG_PER_MINUTE = 0.07;

/** Places and dates spread evenly, the same in every run: a hundred years, up to 60 degrees. */
const SAMPLES = Array.from({ length: 2000 }, (_, index) => ({
  latitude: -60 + 120 * ((index * 0.754877666) % 1),
  longitude: -180 + 360 * ((index * 0.569840291) % 1),
  nearMs: Date.UTC(1950, 0, 1) + Math.floor(((index * 0.381966011) % 1) * 36_500) * 86_400_000,
}));

describe('a day of sun events against suncalc', () => {
  it('differs by a second in the median and by ten at most, in 23,000 events of 2,000 days', () => {
    const differencesS: number[] = [];
    for (const { latitude, longitude, nearMs } of SAMPLES) {
      const times = getTimes(new Date(nearMs), latitude, longitude);
      const day = solarDay({ latitude, longitude }, times.solarNoon.getTime());
      for (const [altitudeDeg, morningName, eveningName] of NAMES) {
        const { morning, evening } = dayCrossings(day, altitudeDeg);
        for (const [own, other] of [
          [morning, times[morningName]],
          [evening, times[eveningName]],
        ] as const) {
          if (typeof own === 'string' || !(other instanceof Date)) continue;
          const atMs = instantOf(day, own);
          const { climbDegPerMinute } = sunPosition({ latitude, longitude }, atMs);
          const differenceS = Math.abs(atMs - other.getTime()) / 1000;
          differencesS.push(differenceS);
          const where = `${latitude} ${longitude} ${altitudeDeg} ${other.toISOString()}`;
          if (Math.abs(climbDegPerMinute) > STEEP_DEG_PER_MINUTE) within(differenceS, 0, 10, where);
        }
      }
    }
    differencesS.sort((a, b) => a - b);
    expect(differencesS.length).toBeGreaterThan(23_000);
    expect(differencesS[Math.floor(differencesS.length / 2)]).toBeLessThan(1.5);
  });

  it('names the same events as missing, but for those that the sun comes within 0.25 degrees of', () => {
    let missing = 0;
    for (const { latitude, longitude, nearMs } of SAMPLES) {
      const times = getTimes(new Date(nearMs), latitude, longitude);
      const day = solarDay({ latitude, longitude }, times.solarNoon.getTime());
      for (const [altitudeDeg, morningName, eveningName] of NAMES) {
        const { morning, evening } = dayCrossings(day, altitudeDeg);
        for (const [own, name, low] of [
          [morning, morningName, day.lowBefore],
          [evening, eveningName, day.lowAfter],
        ] as const) {
          const turningsDeg = [low, day.high].map(({ sine }) => (Math.asin(sine) * 180) / Math.PI);
          // suncalc decides with the declination of noon, which drifts by up to 0.2° until midnight.
          if (Math.min(...turningsDeg.map((deg) => Math.abs(deg - altitudeDeg))) < 0.25) continue;
          expect(typeof own === 'string', `${latitude} ${longitude} ${altitudeDeg}`).toBe(
            times[name] === null,
          );
          if (typeof own === 'string') missing += 1;
        }
      }
    }
    expect(missing).toBeGreaterThan(200);
  });

  it('puts solar noon within four seconds of it', () => {
    for (const { latitude, longitude, nearMs } of SAMPLES) {
      const noonMs = getTimes(new Date(nearMs), latitude, longitude).solarNoon.getTime();
      const day = solarDay({ latitude, longitude }, noonMs);
      within(instantOf(day, day.noonU) / 1000, noonMs / 1000, 4, `${latitude} ${longitude}`);
    }
  });
});

describe('crossings against astronomia', () => {
  it('are where its altitude of the sun is the wanted one, to three arc seconds, at any latitude', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -90, max: 90, noNaN: true }),
        fc.double({ min: -180, max: 180, noNaN: true }),
        fc.constantFrom(-18, -12, -6, -4, -50 / 60, 6),
        fc.integer({ min: Date.UTC(1900, 0, 1), max: Date.UTC(2100, 0, 1) }),
        (latitude, longitude, altitudeDeg, fromMs) => {
          const place = { latitude, longitude };
          for (const { atMs } of sunCrossings(place, altitudeDeg, fromMs, fromMs + 86_400_000)) {
            within(meeusAltitudeDeg(place, atMs), altitudeDeg, 3 / 3600, 'altitude');
          }
        },
      ),
      { numRuns: 100 },
    );
  });
});
