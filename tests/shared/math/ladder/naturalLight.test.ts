import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { naturalLight, smoothSkyLux } from '../../../../shared/math/ladder/naturalLight';
import { moonPosition } from '../../../../shared/math/moonPosition';
import { skyLight } from '../../../../shared/math/skyLight';
import { sunPosition } from '../../../../shared/math/sunPosition';
import { within } from '../../../support/within';

const HOUR_MS = 3_600_000;

describe('the natural light of a ladder', () => {
  it('is the model’s sky, but for the steps where its ranges meet, under 0.02 stop', () => {
    fc.assert(
      fc.property(fc.double({ min: -90, max: 90, noNaN: true }), (altitudeDeg) => {
        const stops = Math.log2(smoothSkyLux(altitudeDeg) / skyLight(altitudeDeg).illuminanceLux);
        within(stops, 0, 0.015, 'difference');
        const isByJoin = [20, 5, -0.8, -5, -12].some((join) => Math.abs(join - altitudeDeg) < 0.05);
        if (!isByJoin) expect(stops).toBe(0);
      }),
    );
  });

  it('never rises while the sun falls', () => {
    const altitudes = fc.oneof(
      fc.double({ min: -17.99, max: 90, noNaN: true }),
      fc
        .tuple(fc.constantFrom(20, 5, -0.8, -5, -12), fc.double({ min: -0.1, max: 0.1, noNaN: true }))
        .map(([join, off]) => join + off),
    );
    fc.assert(
      fc.property(altitudes, fc.double({ min: 1e-6, max: 0.2, noNaN: true }), (altitudeDeg, step) => {
        expect(smoothSkyLux(altitudeDeg - step)).toBeLessThan(smoothSkyLux(altitudeDeg));
      }),
      { numRuns: 1000 },
    );
  });

  it('adds the moon as the moon’s own position gives it', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -65, max: 65, noNaN: true }),
        fc.integer({ min: Date.UTC(2000, 0, 1), max: Date.UTC(2050, 0, 1) }),
        fc.double({ min: 0, max: 5, noNaN: true }),
        (latitude, fromMs, hours) => {
          const place = { latitude, longitude: 20 };
          const light = naturalLight(place, fromMs, fromMs + 5 * HOUR_MS);
          const atMs = Math.round(fromMs + hours * HOUR_MS);
          const moon = moonPosition(place, atMs);
          const skyLux = smoothSkyLux(sunPosition(place, atMs).altitudeDeg);
          const both = Math.log2((skyLux + moon.illuminanceLux) / 2.5);
          // Its rise and set are sudden in the model; a hundredth of a degree decides.
          if (Math.abs(moon.altitudeDeg + 0.8) < 0.02) return;
          within(light.ev100At(atMs), both, 0.02, 'EV');
        },
      ),
    );
  });

  it('owes stops to a full moon after dusk, nothing to it by day, nor to a new one', () => {
    const place = { latitude: 45, longitude: 0 };
    // 3 March 2026, full moon at 11:38 UTC; sunset near 17:50, moonrise near 18:00, moonset of the 4th near 6:40.
    const stopsAt = (day: number, hour: number) => {
      const atMs = Date.UTC(2026, 2, day, hour);
      return naturalLight(place, atMs - HOUR_MS, atMs + HOUR_MS).moonStopsAt(atMs);
    };
    expect(stopsAt(3, 21)).toBeGreaterThan(5);
    expect(stopsAt(4, 12)).toBe(0);
    expect(stopsAt(3, 17)).toBeLessThan(0.001);
    expect(stopsAt(19, 20)).toBeLessThan(0.01);
  });
});
