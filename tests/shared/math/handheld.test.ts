import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  HAND_TURN_RAD_PER_S,
  shakeBlurUm,
  slowestHandheldS,
  stopsOverLimit,
} from '../../../shared/math/handheld';
import blurs from '../../reference/handheld-blur.json';
import limits from '../../reference/handheld.json';
import { eachRow } from '../../support/eachRow';

const focal = fc.double({ min: 1, max: 3000, noNaN: true });
const crop = fc.double({ min: 0.2, max: 10, noNaN: true });
const gain = fc.double({ min: 0, max: 10, noNaN: true });
const shutter = fc.double({ min: 1e-6, max: 86_400, noNaN: true });

describe('the hand-held limit', () => {
  it('gives the limits of the handbook', () => {
    eachRow(limits, 9, (row, where) => {
      const limit = slowestHandheldS(row.focalLengthMm, row.cropFactor, row.stabilisationStops);
      expect(Math.abs(limit / row.limitS - 1), where).toBeLessThanOrEqual(limits.tolerance);
    });
  });

  it('is as far off as the stabiliser gains, and as the picture is enlarged', () => {
    fc.assert(
      fc.property(focal, crop, gain, (f, c, s) => {
        expect(stopsOverLimit(slowestHandheldS(f, c, s), slowestHandheldS(f, c))).toBeCloseTo(s, 9);
        expect(slowestHandheldS(f, c, s) / slowestHandheldS(f * c, 1, s)).toBeCloseTo(1, 12);
      }),
    );
  });

  it('is passed by positive stops, reached by none', () => {
    expect(stopsOverLimit(1 / 25, 1 / 50)).toBe(1);
    expect(stopsOverLimit(1 / 200, 1 / 50)).toBe(-2);
    expect(stopsOverLimit(0.5, 0.5)).toBe(0);
    fc.assert(
      fc.property(shutter, shutter, (a, b) => {
        expect(stopsOverLimit(a, b)).toBeCloseTo(-stopsOverLimit(b, a), 9);
        if (a > b) expect(stopsOverLimit(a, b)).toBeGreaterThanOrEqual(0);
      }),
    );
  });
});

describe('blur by the turning of a hand', () => {
  it('gives the blur that the handbook works out', () => {
    eachRow(blurs, 1, (row, where) => {
      const blur = shakeBlurUm(row.focalLengthMm, row.shutterS, 0, (row.turnDegPerS * Math.PI) / 180);
      expect(Math.abs(blur - row.blurUm), where).toBeLessThanOrEqual(blurs.tolerance);
    });
  });

  it('is one circle of confusion at the limit, whatever lens, sensor and stabiliser', () => {
    // The rule on 36 × 24 mm with 0.030 mm; a smaller sensor's circle is smaller by the crop factor.
    fc.assert(
      fc.property(focal, crop, gain, (f, c, s) => {
        expect(shakeBlurUm(f, slowestHandheldS(f, c, s), s) * c).toBeCloseTo(30, 6);
      }),
    );
  });

  it('is the image of a turn: f·tan of the angle, as long as angles are small', () => {
    fc.assert(
      fc.property(focal, fc.double({ min: 1e-6, max: 0.5, noNaN: true }), (f, t) => {
        const exact = 1000 * f * Math.tan(HAND_TURN_RAD_PER_S * t);
        expect(Math.abs(shakeBlurUm(f, t) / exact - 1)).toBeLessThan(1e-4);
      }),
    );
  });

  it('doubles with the time, halves with a stop of stabilisation, and stays finite', () => {
    fc.assert(
      fc.property(focal, shutter, gain, (f, t, s) => {
        const blur = shakeBlurUm(f, t, s);
        expect(Number.isFinite(blur)).toBe(true);
        expect(shakeBlurUm(f, 2 * t, s) / blur).toBeCloseTo(2, 9);
        expect(shakeBlurUm(f, t, s + 1) / blur).toBeCloseTo(0.5, 9);
      }),
    );
  });

  it('refuses lenses, times and gains outside its domain', () => {
    for (const fault of [
      () => slowestHandheldS(0),
      () => slowestHandheldS(50, 0),
      () => slowestHandheldS(50, 1, -1),
      () => slowestHandheldS(50, 1, NaN),
      () => shakeBlurUm(50, 0),
      () => shakeBlurUm(NaN, 1),
      () => stopsOverLimit(0, 1),
      () => stopsOverLimit(1, Infinity),
    ]) {
      expect(fault).toThrow(RangeError);
    }
  });
});
