import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addedStops,
  correctedByPower,
  correctedByTable,
  tableFault,
  type ReciprocityPair,
} from '../../../shared/math/reciprocity';
import stops from '../../reference/reciprocity-stops.json';
import times from '../../reference/reciprocity.json';
import { eachRow } from '../../support/eachRow';

const exponent = fc.double({ min: 1, max: 3, noNaN: true });
const metered = fc.double({ min: 1e-6, max: 86_400, noNaN: true });

/** Rising tables that a film could have: steps of metered time, and a growing share of added time. */
const table = fc
  .array(
    fc.tuple(fc.double({ min: 1.01, max: 10, noNaN: true }), fc.double({ min: 0, max: 2, noNaN: true })),
    { minLength: 1, maxLength: 8 },
  )
  .chain((steps) =>
    fc.double({ min: 0.1, max: 20, noNaN: true }).map((start) => {
      let meteredS = start;
      let factor = 1;
      return steps.map(([step, extra]): ReciprocityPair => {
        meteredS *= step;
        factor *= 1 + extra;
        return { meteredS, correctedS: meteredS * factor };
      });
    }),
  )
  .filter((pairs) => tableFault(pairs) === null);

describe('reciprocity by the power law', () => {
  it('gives the corrected times of the handbook', () => {
    eachRow(times, 48, (row, where) => {
      const half = times.tolerance * 10 ** -row.decimals;
      const corrected = correctedByPower(row.meteredS, row.exponent);
      expect(Math.abs(corrected - row.correctedS), where).toBeLessThanOrEqual(half + 1e-9);
    });
  });

  it('gives the added stops of the handbook', () => {
    eachRow(stops, 12, (row, where) =>
      expect(
        Math.abs(addedStops(row.meteredS, correctedByPower(row.meteredS, row.exponent)) - row.stops),
        where,
      ).toBeLessThanOrEqual(stops.tolerance),
    );
  });

  it('needs no correction up to one second, and joins there without a step', () => {
    fc.assert(
      fc.property(exponent, fc.double({ min: 1e-6, max: 1, noNaN: true }), (p, t) => {
        expect(correctedByPower(t, p)).toBe(t);
      }),
    );
    expect(correctedByPower(1 + 1e-12, 3)).toBeCloseTo(1, 10);
  });

  it('is undone by the root of its exponent', () => {
    fc.assert(
      fc.property(exponent, metered, (p, t) => {
        const corrected = correctedByPower(t, p);
        const back = corrected > 1 ? corrected ** (1 / p) : corrected;
        expect(Math.abs(back / t - 1)).toBeLessThan(1e-9);
      }),
    );
  });

  it('rises with time and exponent, and never shortens', () => {
    fc.assert(
      fc.property(exponent, metered, fc.double({ min: 1, max: 10, noNaN: true }), (p, t, longer) => {
        const corrected = correctedByPower(t, p);
        expect(corrected).toBeGreaterThanOrEqual(t);
        expect(correctedByPower(t * longer, p)).toBeGreaterThanOrEqual(corrected);
        expect(correctedByPower(t, 1 + (p - 1) / 2)).toBeLessThanOrEqual(corrected);
      }),
    );
  });

  it('refuses times and exponents outside its domain', () => {
    for (const [t, p] of [
      [0, 1.3],
      [-1, 1.3],
      [NaN, 1.3],
      [10, 0.99],
      [10, 3.01],
      [10, NaN],
    ] as const) {
      expect(() => correctedByPower(t, p), `${t} s, P ${p}`).toThrow(RangeError);
    }
  });
});

describe('reciprocity by a table', () => {
  it('meets each of its pairs', () => {
    fc.assert(
      fc.property(table, (pairs) => {
        for (const pair of pairs) {
          expect(correctedByTable(pair.meteredS, pairs) / pair.correctedS).toBeCloseTo(1, 9);
        }
      }),
    );
  });

  it('agrees with the power law where its pairs come from one, between, below and beyond them', () => {
    fc.assert(
      fc.property(
        exponent,
        metered,
        fc.uniqueArray(fc.integer({ min: 2, max: 600 }), { minLength: 1, maxLength: 8 }),
        (p, t, at) => {
          const pairs = at
            .sort((a, b) => a - b)
            .map((meteredS) => ({ meteredS, correctedS: correctedByPower(meteredS, p) }));
          expect(correctedByTable(t, pairs) / correctedByPower(t, p)).toBeCloseTo(1, 8);
        },
      ),
    );
  });

  it('takes the middle of two pairs in log-log as the roots of their products', () => {
    const pairs = [
      { meteredS: 10, correctedS: 15 },
      { meteredS: 40, correctedS: 120 },
    ];
    // Middle of 10 and 40 is √400 = 20, of 15 and 120 is √1800 = 42.43.
    expect(correctedByTable(20, pairs)).toBeCloseTo(Math.sqrt(1800), 9);
  });

  it('holds the first added stops below a first pair of up to 1 s, and is joined to 1 s above that', () => {
    const early = [
      { meteredS: 0.5, correctedS: 1 },
      { meteredS: 5, correctedS: 20 },
    ];
    expect(correctedByTable(0.01, early)).toBeCloseTo(0.02, 12);
    const late = [{ meteredS: 4, correctedS: 8 }];
    expect(correctedByTable(0.5, late)).toBe(0.5);
    expect(correctedByTable(1, late)).toBe(1);
    // From (1, 1) to (4, 8) the exponent is log 8/log 4 = 1.5: 2^1.5.
    expect(correctedByTable(2, late)).toBeCloseTo(2 ** 1.5, 9);
  });

  it('goes on beyond the last pair with the last slope, at least 1 and at most 3', () => {
    const at = (correctedS: number) =>
      correctedByTable(100, [
        { meteredS: 1, correctedS: 5 },
        { meteredS: 10, correctedS },
      ]);
    expect(at(20)).toBeCloseTo(200, 6); // slope log 4/log 10 = 0.60 counts as 1: 20 · 10
    expect(at(500)).toBeCloseTo(50_000, 3); // slope 2: 500 · 10²
    expect(at(50_000)).toBeCloseTo(5e7, 0); // slope 4 counts as 3: 50,000 · 10³
    expect(correctedByTable(9, [{ meteredS: 1, correctedS: 2 }])).toBeCloseTo(18, 9);
  });

  it('rises with time, never shortens, and stays finite', () => {
    fc.assert(
      fc.property(table, metered, fc.double({ min: 1, max: 10, noNaN: true }), (pairs, t, longer) => {
        const corrected = correctedByTable(t, pairs);
        expect(Number.isFinite(corrected)).toBe(true);
        expect(corrected).toBeGreaterThanOrEqual(t * (1 - 1e-12));
        expect(correctedByTable(t * longer, pairs)).toBeGreaterThanOrEqual(corrected * (1 - 1e-12));
      }),
    );
  });

  it('names what is wrong with a table, and refuses to use it', () => {
    const pair = (meteredS: number, correctedS: number) => ({ meteredS, correctedS });
    const faults = [
      [[], { kind: 'empty' }],
      [[pair(2, 1)], { kind: 'shorter', index: 0 }],
      [[pair(0, 1)], { kind: 'shorter', index: 0 }],
      [[pair(2, NaN)], { kind: 'shorter', index: 0 }],
      [[pair(2, 3), pair(2, 4)], { kind: 'notRising', index: 1 }],
      [[pair(2, 9), pair(4, 9)], { kind: 'notRising', index: 1 }],
      [[pair(2, 3), pair(4, 8), pair(3, 9)], { kind: 'notRising', index: 2 }],
    ] as const;
    for (const [pairs, fault] of faults) {
      expect(tableFault(pairs)).toEqual(fault);
      expect(() => correctedByTable(10, pairs)).toThrow(RangeError);
    }
    expect(tableFault([pair(1, 1), pair(10, 20)])).toBeNull();
  });
});
