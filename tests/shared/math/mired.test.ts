import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { COLDEST_K, HOTTEST_K, miredOf, miredShift, shiftedTemperatureK } from '../../../shared/math/mired';
import gelled from '../../reference/gelled-flash.json';
import shifts from '../../reference/mired-shifts.json';
import values from '../../reference/mired-values.json';
import sources from '../../reference/source-temperatures.json';
import { eachRow } from '../../support/eachRow';

const kelvin = fc.double({ min: COLDEST_K, max: HOTTEST_K, noNaN: true });

describe('mired', () => {
  it('gives the values of the published grid', () => {
    eachRow(values, 14, (row, where) => {
      const half = values.tolerance * 10 ** -row.decimals;
      expect(Math.abs(miredOf(row.temperatureK) - row.mired), where).toBeLessThanOrEqual(half + 1e-12);
    });
  });

  it('gives the shifts of the handbook', () => {
    eachRow(shifts, 10, (row, where) =>
      expect(Math.abs(miredShift(row.fromK, row.toK) - row.miredShift), where).toBeLessThanOrEqual(
        shifts.tolerance,
      ),
    );
  });

  it('gives the light of a gelled flash', () => {
    eachRow(gelled, 10, (row, where) =>
      expect(
        Math.abs((shiftedTemperatureK(row.sourceK, row.miredShift) ?? NaN) - row.resultK),
        where,
      ).toBeLessThanOrEqual(gelled.tolerance),
    );
  });

  it('can name every source in the published lists', () => {
    eachRow(sources, 16, (row, where) => {
      for (const end of [row.lowK, row.highK ?? HOTTEST_K]) {
        const shift = miredShift(5500, end);
        if (end < HOTTEST_K) expect(shiftedTemperatureK(5500, shift), where).toBeCloseTo(end, 6);
      }
      expect(row.lowK, where).toBeLessThanOrEqual(row.highK ?? HOTTEST_K);
    });
  });

  it('shifts there and back, and shifts add', () => {
    fc.assert(
      fc.property(kelvin, kelvin, kelvin, (a, b, c) => {
        expect(miredShift(a, b)).toBeCloseTo(-miredShift(b, a), 9);
        expect(miredShift(a, b) + miredShift(b, c)).toBeCloseTo(miredShift(a, c), 9);
        const back = shiftedTemperatureK(a, miredShift(a, b));
        if (back !== null) expect(Math.abs(back / b - 1)).toBeLessThan(1e-9);
        else expect(b > 39_999.9 || b < 1000.001).toBe(true);
      }),
    );
  });

  it('warms with a positive shift, and answers null exactly beyond 1,000 K and 40,000 K', () => {
    fc.assert(
      fc.property(kelvin, fc.double({ min: -1000, max: 1000, noNaN: true }), (source, shift) => {
        const result = shiftedTemperatureK(source, shift);
        const mired = 1e6 / source + shift;
        if (result === null) expect(mired <= 25 || mired > 1000).toBe(true);
        else {
          expect(result).toBeGreaterThanOrEqual(COLDEST_K);
          expect(result).toBeLessThan(HOTTEST_K * (1 + 1e-12));
          expect(Math.sign(source - result) * Math.sign(shift)).toBeGreaterThanOrEqual(0);
        }
      }),
    );
    expect(shiftedTemperatureK(5000, -175)).toBeNull();
    expect(shiftedTemperatureK(5000, -174.9)).toBeCloseTo(39_840.6, 1);
    expect(shiftedTemperatureK(5000, 800)).toBe(1000);
    expect(shiftedTemperatureK(5000, 800.1)).toBeNull();
  });

  it('refuses temperatures outside its domain', () => {
    for (const bad of [0, 999, 40_001, NaN, Infinity]) expect(() => miredOf(bad)).toThrow(RangeError);
    expect(() => shiftedTemperatureK(5000, NaN)).toThrow(RangeError);
  });
});
