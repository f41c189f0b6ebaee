import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { saemundssonArcmin } from '../../../shared/math/refraction';
import { sunFitAt } from '../../../shared/math/sunFit';
import { sunPosition } from '../../../shared/math/sunPosition';
import { engineSun } from '../../support/engineSun';
import { meeusAltitudeDeg } from '../../support/meeusSun';
import { within } from '../../support/within';

const FROM_MS = Date.UTC(1900, 0, 1);
const TO_MS = Date.UTC(2101, 0, 1);

const places = fc.record({
  latitude: fc.double({ min: -90, max: 90, noNaN: true }),
  longitude: fc.double({ min: -180, max: 180, noNaN: true }),
});
const instants = fc.integer({ min: FROM_MS, max: TO_MS });

describe('the position of the sun', () => {
  const boulder = { latitude: 39.742476, longitude: -105.1786 };
  const exampleMs = Date.UTC(2003, 9, 17, 19, 30, 30);

  it('agrees with the example of NREL’s solar position algorithm', () => {
    // Printed: zenith 50.111622 with refraction at 820 mbar and 11 °C, azimuth 194.340241 (NREL spa_tester.c).
    const { altitudeDeg, azimuthDeg } = sunPosition(boulder, exampleMs);
    const refractionDeg = ((saemundssonArcmin(altitudeDeg) / 60) * (820 / 1010) * 283) / (273 + 11);
    within(90 - altitudeDeg - refractionDeg, 50.111622, 2e-4, 'zenith');
    within(azimuthDeg, 194.340241, 2e-4, 'azimuth');
  });

  it('agrees with ephem 4.1.4 without air', () => {
    const { altitudeDeg, azimuthDeg } = sunPosition(boulder, exampleMs);
    within(90 - altitudeDeg, 50.127951, 1.5e-4, 'zenith');
    within(azimuthDeg, 194.340233, 1.5e-4, 'azimuth');
  });

  it('is astronomy-engine’s own to 0.02 arc seconds, at any place in two centuries', () => {
    fc.assert(
      fc.property(places, instants, (place, atMs) => {
        const own = sunPosition(place, atMs);
        const engine = engineSun(place, atMs);
        within(own.altitudeDeg, engine.altitudeDeg, 0.02 / 3600, 'altitude');
        const turn = Math.abs(own.azimuthDeg - engine.azimuthDeg);
        const along = Math.min(turn, 360 - turn) * Math.cos((own.altitudeDeg * Math.PI) / 180);
        within(along, 0, 0.02 / 3600, 'azimuth');
      }),
      { numRuns: 400 },
    );
  });

  it('is astronomia’s to three arc seconds, which the sun passes in a fifth of a second', () => {
    fc.assert(
      fc.property(places, instants, (place, atMs) => {
        within(sunPosition(place, atMs).altitudeDeg, meeusAltitudeDeg(place, atMs), 3 / 3600, 'altitude');
      }),
      { numRuns: 100 },
    );
  });

  it('climbs as fast as its altitude grows from one second to the next', () => {
    fc.assert(
      fc.property(places, instants, (place, atMs) => {
        const before = sunPosition(place, atMs - 500).altitudeDeg;
        const after = sunPosition(place, atMs + 500).altitudeDeg;
        const { climbDegPerMinute, altitudeDeg } = sunPosition(place, atMs);
        fc.pre(Math.abs(altitudeDeg) < 89.9);
        within(climbDegPerMinute, (after - before) * 60, 3e-5, 'climb');
      }),
    );
  });

  it('does not jump at midnight UTC, where one day’s polynomials hand over to the next’s', () => {
    fc.assert(
      fc.property(places, fc.integer({ min: -25_566, max: 47_800 }), (place, day) => {
        const midnightMs = day * 86_400_000;
        expect(sunFitAt(midnightMs - 1)).not.toBe(sunFitAt(midnightMs));
        const before = sunPosition(place, midnightMs - 1).altitudeDeg;
        const after = sunPosition(place, midnightMs).altitudeDeg;
        // The sun itself moves by 0.015″ in a millisecond.
        within(after, before, 0.025 / 3600, 'altitude');
      }),
    );
  });

  it('takes 180 degrees east and west for the same meridian', () => {
    fc.assert(
      fc.property(fc.double({ min: -90, max: 90, noNaN: true }), instants, (latitude, atMs) => {
        const east = sunPosition({ latitude, longitude: 180 }, atMs);
        const west = sunPosition({ latitude, longitude: -180 }, atMs);
        within(east.altitudeDeg, west.altitudeDeg, 1e-10, 'altitude');
      }),
    );
  });

  it('is finite, with azimuth in [0, 360), at poles, at the zenith and far from our time', () => {
    const extremes = fc.constantFrom(-90, -89.999999, -23.44, 0, 23.44, 66.56, 89.999999, 90);
    const far = fc.integer({ min: Date.UTC(1000, 0, 1), max: Date.UTC(3000, 0, 1) });
    fc.assert(
      fc.property(extremes, fc.constantFrom(-180, 0, 180), far, (latitude, longitude, atMs) => {
        const { altitudeDeg, azimuthDeg, climbDegPerMinute } = sunPosition({ latitude, longitude }, atMs);
        expect(Math.abs(altitudeDeg)).toBeLessThanOrEqual(90);
        expect(azimuthDeg).toBeGreaterThanOrEqual(0);
        expect(azimuthDeg).toBeLessThan(360);
        expect(Math.abs(climbDegPerMinute)).toBeLessThan(0.26);
      }),
    );
  });

  it('refuses places and instants that are none', () => {
    expect(() => sunPosition({ latitude: 90.1, longitude: 0 }, 0)).toThrow(RangeError);
    expect(() => sunPosition({ latitude: 0, longitude: -180.1 }, 0)).toThrow(RangeError);
    expect(() => sunPosition({ latitude: NaN, longitude: 0 }, 0)).toThrow(RangeError);
    expect(() => sunPosition({ latitude: 0, longitude: 0 }, NaN)).toThrow(RangeError);
  });
});
