import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addStops,
  differenceOfRatio,
  litOverShadowStops,
  ratioOfStops,
  sharesOfLight,
  stopsStillNeeded,
} from '../../../shared/math/mixing';
import ambientShare from '../../reference/ambient-share.json';
import fillInSun from '../../reference/fill-in-sun.json';
import ratiosInverse from '../../reference/lighting-ratios-inverse.json';
import ratios from '../../reference/lighting-ratios.json';
import needed from '../../reference/mixing-needed.json';
import totals from '../../reference/mixing-totals.json';
import { eachRow } from '../../support/eachRow';

function within(actual: number | null, expected: number, tolerance: number, where: string): void {
  expect(Math.abs((actual ?? NaN) - expected), where).toBeLessThanOrEqual(tolerance);
}

const anyStops = fc.double({ min: -1e308, max: 1e308, noNaN: true });
const usualStops = fc.double({ min: -40, max: 40, noNaN: true });

describe('adding light', () => {
  it('gives the totals of the handbook', () => {
    eachRow(totals, 8, (row, where) =>
      within(addStops([row.ambientStops, row.flashStops]), row.totalStops, totals.tolerance, where),
    );
  });

  it('gives the rows of fill in the sun, on the lit and on the shadow side', () => {
    eachRow(fillInSun, 6, (row, where) => {
      const lit = addStops([0, row.fillStops]);
      const shadow = addStops([row.shadowStops, row.fillStops]);
      within(lit, row.litStops, fillInSun.tolerance, where);
      within(shadow, row.shadowWithFillStops, fillInSun.tolerance, where);
      within(lit - shadow, row.differenceStops, fillInSun.tolerance, where);
      within(2 ** (lit - shadow), row.ratio, 0.006, where);
    });
  });

  it('equals the plain sum of factors wherever that can be computed', () => {
    fc.assert(
      fc.property(fc.array(usualStops, { minLength: 1, maxLength: 30 }), (stops) => {
        const plain = Math.log2(stops.reduce((sum, part) => sum + 2 ** part, 0));
        expect(Math.abs(addStops(stops) - plain)).toBeLessThan(1e-9);
      }),
    );
  });

  it('never loses to its brightest part, and n equal parts are log2 n above one', () => {
    fc.assert(
      fc.property(fc.array(anyStops, { minLength: 1, maxLength: 30 }), (stops) => {
        const total = addStops(stops);
        expect(Number.isFinite(total)).toBe(true);
        expect(total).toBeGreaterThanOrEqual(Math.max(...stops));
      }),
    );
    for (const n of [1, 2, 3, 64])
      within(addStops(Array<number>(n).fill(7)), 7 + Math.log2(n), 1e-12, `${n}`);
  });

  it('does not mind the order, and adds in groups as well as at once', () => {
    fc.assert(
      fc.property(usualStops, usualStops, usualStops, (a, b, c) => {
        within(addStops([a, b, c]), addStops([c, b, a]), 1e-12, 'order');
        within(addStops([a, b, c]), addStops([addStops([a, b]), c]), 1e-12, 'groups');
      }),
    );
  });

  it('refuses an empty list and numbers that are not finite', () => {
    expect(() => addStops([])).toThrow(RangeError);
    expect(() => addStops([0, NaN])).toThrow(RangeError);
    expect(() => sharesOfLight([Infinity])).toThrow(RangeError);
  });
});

describe('shares of light', () => {
  it('gives the ambient share that the handbook lists', () => {
    eachRow(ambientShare, 8, (row, where) =>
      within(
        sharesOfLight([row.ambientOverFlashStops, 0])[0] ?? NaN,
        row.share,
        ambientShare.tolerance,
        where,
      ),
    );
  });

  it('adds up to one and says how far each part is below the sum', () => {
    fc.assert(
      fc.property(fc.array(usualStops, { minLength: 1, maxLength: 30 }), (stops) => {
        const shares = sharesOfLight(stops);
        within(
          shares.reduce((sum, share) => sum + share, 0),
          1,
          1e-12,
          'sum',
        );
        const total = addStops(stops);
        shares.forEach((share, i) => within(Math.log2(share), (stops[i] ?? NaN) - total, 1e-9, `${i}`));
      }),
    );
  });

  it('stays between 0 and 1 for absurd differences', () => {
    expect(sharesOfLight([1e308, -1e308])).toEqual([1, 0]);
  });
});

describe('light still needed', () => {
  it('gives the flash that the handbook lists for a subject below the aim', () => {
    eachRow(needed, 7, (row, where) =>
      within(stopsStillNeeded(0, -row.belowStops), row.flashStops, needed.tolerance, where),
    );
  });

  it('adds up to the wanted total again', () => {
    fc.assert(
      fc.property(usualStops, fc.double({ min: 1e-9, max: 60, noNaN: true }), (total, room) => {
        const missing = stopsStillNeeded(total, total - room);
        within(addStops([total - room, missing ?? NaN]), total, 1e-9, 'sum');
      }),
    );
  });

  it('is finite however little room there is, and null when there is none', () => {
    expect(stopsStillNeeded(0, -1e-300)).toBeCloseTo(Math.log2(1e-300 * Math.LN2), 9);
    expect(stopsStillNeeded(1e308, -1e308)).toBe(1e308);
    for (const level of [-3, 0, 12]) expect(stopsStillNeeded(level, level)).toBeNull();
    fc.assert(
      fc.property(anyStops, anyStops, (total, already) => {
        const missing = stopsStillNeeded(total, already);
        if (already >= total) expect(missing).toBeNull();
        else expect(Number.isFinite(missing)).toBe(true);
      }),
    );
  });
});

describe('lighting ratios', () => {
  it('gives the ratios of the handbook, and the stops from the lit to the shadow side', () => {
    eachRow(ratios, 8, (row, where) => {
      within(ratioOfStops(row.differenceStops, 0), row.ratio, ratios.tolerance, where);
      within(2 ** row.differenceStops, row.strength, ratios.tolerance, where);
      within(litOverShadowStops(row.differenceStops), row.litOverShadowStops, ratios.tolerance, where);
    });
  });

  it('gives the key over the fill for a ratio', () => {
    eachRow(ratiosInverse, 3, (row, where) => {
      within(differenceOfRatio(row.ratio), row.differenceStops, ratiosInverse.tolerance, where);
      within(2 ** differenceOfRatio(row.ratio), row.strength, 1e-9, where);
    });
  });

  it('goes there and back', () => {
    fc.assert(
      fc.property(usualStops, fc.double({ min: -20, max: 900, noNaN: true }), (fill, difference) =>
        within(differenceOfRatio(ratioOfStops(fill + difference, fill)), difference, 1e-8, 'difference'),
      ),
    );
  });

  it('agrees with adding the lights one by one', () => {
    fc.assert(
      fc.property(usualStops, usualStops, (key, fill) => {
        within(litOverShadowStops(key - fill), addStops([key, fill]) - fill, 1e-9, 'sum');
        within(litOverShadowStops(key - fill), Math.log2(ratioOfStops(key, fill)), 1e-9, 'ratio');
      }),
    );
  });

  it('keeps the digits of a key far below the fill, and stays finite for one far above', () => {
    expect(litOverShadowStops(-80) / (2 ** -80 / Math.LN2)).toBeCloseTo(1, 12);
    expect(litOverShadowStops(1e300)).toBe(1e300);
  });

  it('refuses a ratio of 1 or less, and a key that no number can hold', () => {
    for (const ratio of [1, 0.5, 0, -3, NaN, Infinity]) {
      expect(() => differenceOfRatio(ratio), `${ratio}`).toThrow(RangeError);
    }
    expect(() => ratioOfStops(2000, 0)).toThrow(RangeError);
  });
});
