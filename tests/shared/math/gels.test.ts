import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { stopsOfTransmittance } from '../../../shared/math/density';
import { GEL_SERIES, nearestGels, type GelSeries } from '../../../shared/math/gels';
import gels from '../../reference/gels.json';
import { eachRow } from '../../support/eachRow';

const strengthsOf = (series: string): GelSeries['strengths'] =>
  GEL_SERIES.find((one) => one.series === series)?.strengths ?? [];

describe('the two series of warming gels', () => {
  it('holds the strengths of the table, with the loss that their transmittance gives', () => {
    eachRow(gels, 10, (row, where) => {
      const sheet = strengthsOf(row.series).find((one) => one.strength === row.strength);
      expect(sheet, where).toMatchObject({ miredShift: row.miredShift, transmittance: row.transmittance });
      expect(Math.abs((sheet?.lossStops ?? NaN) - row.lossStops), where).toBeLessThanOrEqual(gels.tolerance);
    });
    expect(GEL_SERIES.flatMap((one) => one.strengths)).toHaveLength(10);
  });

  it('turns, with its full sheet, about what it is made for into what it is made for', () => {
    for (const { nominalFromK, nominalToK, strengths } of GEL_SERIES) {
      const full = strengths.at(-1)?.miredShift ?? NaN;
      // Makers round their nominal temperatures: within 5 mired (159 against 158.7, 167 against 163.0).
      expect(Math.abs(full - (1e6 / nominalToK - 1e6 / nominalFromK))).toBeLessThan(5);
    }
  });
});

describe('the nearest gels', () => {
  it('names the sheet itself, without error, for each sheet of a series', () => {
    for (const { series, strengths } of GEL_SERIES) {
      for (const { strength, miredShift, lossStops } of strengths) {
        const choice = nearestGels(miredShift).find((one) => one.series === series);
        expect(choice).toEqual({ series, sheets: [strength], miredShift, lossStops, errorMired: 0 });
      }
    }
  });

  it('takes two sheets where one misses by more than shows', () => {
    // 'daylight': 131 + 20 = 151 against a wanted 150; the nearest single sheet is 167.
    const choice = nearestGels(150)[1];
    expect(choice).toMatchObject({ sheets: ['three quarters', 'eighth'], miredShift: 151, errorMired: 1 });
    expect(choice?.lossStops).toBeCloseTo(stopsOfTransmittance(0.58 * 0.92), 12);
  });

  it('keeps one sheet where a second would gain little', () => {
    // 'deep daylight': full misses 150 by 9, three quarters and eighth meet it; 9 mired are not worth a sheet.
    expect(nearestGels(150)[0]).toMatchObject({ sheets: ['full'], errorMired: 9 });
  });

  it('takes no sheet for a shift that cools or hardly warms', () => {
    for (const wanted of [-1000, -80, 0, 5]) {
      for (const choice of nearestGels(wanted)) {
        expect(choice).toMatchObject({ sheets: [], miredShift: 0, lossStops: 0, errorMired: 0 - wanted });
      }
    }
  });

  it('is never further off than the best single sheet, and within one and two sheets of it', () => {
    fc.assert(
      fc.property(fc.double({ min: -1000, max: 1000, noNaN: true }), (wanted) => {
        nearestGels(wanted).forEach((choice) => {
          const strengths = strengthsOf(choice.series);
          const single = Math.min(
            Math.abs(wanted),
            ...strengths.map((one) => Math.abs(one.miredShift - wanted)),
          );
          expect(Math.abs(choice.errorMired)).toBeLessThanOrEqual(single);
          expect(choice.sheets.length).toBeLessThanOrEqual(2);
          const sum = choice.sheets.reduce(
            (total, name) => total + (strengths.find((one) => one.strength === name)?.miredShift ?? NaN),
            0,
          );
          expect(choice.miredShift).toBe(sum);
          expect(choice.errorMired).toBe(sum - wanted);
        });
      }),
    );
  });

  it('refuses a shift that is no number or beyond its domain', () => {
    expect(() => nearestGels(NaN)).toThrow(RangeError);
    expect(() => nearestGels(1001)).toThrow(RangeError);
  });
});
