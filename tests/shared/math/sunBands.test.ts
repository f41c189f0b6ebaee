import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lightBand } from '../../../shared/math/lightBand';
import { instantOf, solarDay } from '../../../shared/math/solarDay';
import { sunriseAltitudeDeg } from '../../../shared/math/sunAltitudes';
import { sunBands, type SunBand } from '../../../shared/math/sunBands';
import { sunPosition } from '../../../shared/math/sunPosition';
import { within } from '../../support/within';

const LIMITS = {
  astronomicalTwilight: [-18, -12],
  nauticalTwilight: [-12, -6],
  civilTwilight: [-6, sunriseAltitudeDeg(0)],
  blueHour: [-6, -4],
  goldenHour: [-4, 6],
} as const;

const places = fc.record({
  latitude: fc.oneof(
    fc.double({ min: -90, max: 90, noNaN: true }),
    fc.constantFrom(-90, -89.97, 66.56, 89.95, 90),
  ),
  longitude: fc.double({ min: -180, max: 180, noNaN: true }),
});
const instants = fc.integer({ min: Date.UTC(1900, 0, 1), max: Date.UTC(2100, 11, 31) });

function spans(bands: readonly SunBand[], name: string, part: string) {
  return bands.filter((band) => band.name === name && band.part === part);
}

describe('the bands of a day', () => {
  it('begin and end where ephem 4.1.4 has the altitudes, in London at midsummer', () => {
    const day = solarDay({ latitude: 51.5074, longitude: -0.1278 }, Date.UTC(2026, 5, 21, 12));
    const [golden] = spans(sunBands(day, 0), 'goldenHour', 'evening');
    const [blue] = spans(sunBands(day, 0), 'blueHour', 'evening');
    within((golden?.fromMs ?? NaN) / 1000, Date.UTC(2026, 5, 21, 19, 27, 18) / 1000, 2, 'golden from');
    within((golden?.toMs ?? NaN) / 1000, Date.UTC(2026, 5, 21, 20, 49, 49) / 1000, 2, 'golden to');
    within((blue?.fromMs ?? NaN) / 1000, Date.UTC(2026, 5, 21, 20, 49, 49) / 1000, 2, 'blue from');
    within((blue?.toMs ?? NaN) / 1000, Date.UTC(2026, 5, 21, 21, 9, 19) / 1000, 2, 'blue to');
  });

  it('hold all of the day between their limits and nothing else, seen every three minutes', () => {
    fc.assert(
      fc.property(places, instants, (place, nearMs) => {
        const day = solarDay(place, nearMs);
        const bands = sunBands(day, 0);
        const fromMs = instantOf(day, day.lowBefore.u);
        const toMs = instantOf(day, day.lowAfter.u);
        const wrong: string[] = [];
        for (let atMs = fromMs; atMs < toMs; atMs += 180_000) {
          const { altitudeDeg } = sunPosition(place, atMs);
          for (const [name, [low, high]] of Object.entries(LIMITS)) {
            if (Math.min(Math.abs(altitudeDeg - low), Math.abs(altitudeDeg - high)) < 1e-5) continue;
            const isIn = bands.some((band) => band.name === name && band.fromMs <= atMs && atMs <= band.toMs);
            if (isIn !== (altitudeDeg > low && altitudeDeg < high)) wrong.push(`${name} at ${altitudeDeg}`);
          }
        }
        expect(wrong).toEqual([]);
      }),
      { numRuns: 100 },
    );
  });

  it('are in order of time and never end before they begin', () => {
    fc.assert(
      fc.property(places, instants, (place, nearMs) => {
        const bands = sunBands(solarDay(place, nearMs), 0);
        bands.forEach((band, index) => {
          expect(band.toMs).toBeGreaterThan(band.fromMs);
          expect(band.fromMs).toBeGreaterThanOrEqual(bands[index - 1]?.fromMs ?? -Infinity);
        });
      }),
    );
  });

  it('meet at noon in the polar night, when the golden light has no sun in it', () => {
    const day = solarDay({ latitude: 69.6492, longitude: 18.9553 }, Date.UTC(2026, 11, 21, 11));
    const [morning] = spans(sunBands(day, 0), 'goldenHour', 'morning');
    const [evening] = spans(sunBands(day, 0), 'goldenHour', 'evening');
    expect(morning?.toMs).toBe(evening?.fromMs);
    within((morning?.fromMs ?? NaN) / 1000, Date.UTC(2026, 11, 21, 9, 29, 35) / 1000, 15, 'from, ephem');
    within((evening?.toMs ?? NaN) / 1000, Date.UTC(2026, 11, 21, 11, 54, 51) / 1000, 15, 'to, ephem');
  });

  it('take the caller’s limits for golden and blue hour', () => {
    const day = solarDay({ latitude: 40, longitude: 0 }, Date.UTC(2026, 2, 20, 12));
    const bands = sunBands(day, 0, { fromDeg: 0, toDeg: 6 }, { fromDeg: -8, toDeg: -4 });
    const [golden] = spans(bands, 'goldenHour', 'evening');
    const [blue] = spans(bands, 'blueHour', 'evening');
    within(sunPosition({ latitude: 40, longitude: 0 }, golden?.toMs ?? NaN).altitudeDeg, 0, 1e-6, 'golden');
    within(sunPosition({ latitude: 40, longitude: 0 }, blue?.toMs ?? NaN).altitudeDeg, -8, 1e-6, 'blue');
    expect(() => sunBands(day, 0, { fromDeg: 6, toDeg: -4 })).toThrow(RangeError);
  });
});

describe('the band at an instant', () => {
  it('is named by the limits, the lower one included', () => {
    expect(lightBand(10)).toEqual({ twilight: 'day', hour: null });
    expect(lightBand(3)).toEqual({ twilight: 'day', hour: 'goldenHour' });
    expect(lightBand(-0.84)).toEqual({ twilight: 'civilTwilight', hour: 'goldenHour' });
    expect(lightBand(-4)).toEqual({ twilight: 'civilTwilight', hour: 'goldenHour' });
    expect(lightBand(-5)).toEqual({ twilight: 'civilTwilight', hour: 'blueHour' });
    expect(lightBand(-6)).toEqual({ twilight: 'civilTwilight', hour: 'blueHour' });
    expect(lightBand(-7)).toEqual({ twilight: 'nauticalTwilight', hour: null });
    expect(lightBand(-13)).toEqual({ twilight: 'astronomicalTwilight', hour: null });
    expect(lightBand(-19)).toEqual({ twilight: 'night', hour: null });
  });
});
