import { describe, expect, it } from 'vitest';
import { filtersGel } from '../../../shared/calculators/filters/gel';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';

describe('filters/gel', () => {
  it('answers alike for a target and for the shift that leads there', () => {
    const byTarget = askCalculator(filtersGel, { sourceK: 5600, targetK: 3000 }).result;
    const byShift = askCalculator(filtersGel, { sourceK: 5600, miredShift: byTarget.miredShift }).result;
    expect(byShift.resultK).toBeCloseTo(3000, 6);
    expect(byShift.nearest.map(({ sheets }) => sheets)).toEqual(byTarget.nearest.map(({ sheets }) => sheets));
  });

  it('refuses a shift that leads beyond 40,000 K or below 1,000 K, and says what is possible', () => {
    const hot = faultsIn(filtersGel, { sourceK: 5000, miredShift: -175 });
    expect(placesOf(hot)).toEqual(['/miredShift gel_result_out_of_reach']);
    // 10^6/40000 − 10^6/5000 = −175 and 10^6/1000 − 10^6/5000 = 800.
    expect(hot[0]?.detail).toMatch(/[−-]175 to 800 mired/);
    const cold = faultsIn(filtersGel, { sourceK: 5000, miredShift: 801 });
    expect(placesOf(cold)).toEqual(['/miredShift gel_result_out_of_reach']);
    expect(faultsIn(filtersGel, { sourceK: 5000, miredShift: -174.9 })).toEqual([]);
  });

  it('blames the source alone where the source is out of range', () => {
    expect(placesOf(faultsIn(filtersGel, { sourceK: 500, miredShift: -900 }))).toEqual([
      '/sourceK out_of_range',
    ]);
  });

  it('wants exactly one of target and shift', () => {
    expect(placesOf(faultsIn(filtersGel, { sourceK: 5500 }))).toEqual(['/targetK exactly']);
    expect(placesOf(faultsIn(filtersGel, { sourceK: 5500, targetK: 3200, miredShift: 130 }))).toEqual([
      '/miredShift exactly',
    ]);
  });

  it('keeps the other light neutral: the gelled colour itself, or the light that was named', () => {
    const matched = askCalculator(filtersGel, { sourceK: 5500, targetK: 3200 });
    expect(matched.result).toMatchObject({ whiteBalanceK: 3200, castMired: 0 });
    expect(codesOf(matched.notes)).toContain('white_balance_on_gelled');
    // The same flash in front of a sky of 10,000 K: 312.5 − 100 = 212.5 mired warm.
    const named = askCalculator(filtersGel, { sourceK: 5500, targetK: 3200, otherK: 10_000 });
    expect(named.result).toMatchObject({ whiteBalanceK: 10_000, castMired: 212.5 });
    expect(codesOf(named.notes)).toContain('white_balance_on_other');
  });

  it('offers no sheet to cool a light, and says when none comes near', () => {
    const cooled = askCalculator(filtersGel, { sourceK: 3200, targetK: 5600 });
    expect(cooled.result.nearest.map(({ sheets }) => sheets)).toEqual([[], []]);
    expect(codesOf(cooled.notes)).toContain('gels_only_warm');
    const far = askCalculator(filtersGel, { sourceK: 10_000, targetK: 1900 });
    // 426 mired are wanted; two full sheets of the stronger series give 334.
    expect(far.result.nearest.map(({ miredShift }) => miredShift)).toEqual([318, 334]);
    expect(codesOf(far.notes)).toContain('gel_not_near');
  });

  it('gives null where even the sheets lead below 1,000 K', () => {
    const { nearest } = askCalculator(filtersGel, { sourceK: 1005, targetK: 1000 }).result;
    for (const { sheets, resultK } of nearest)
      expect([sheets, resultK]).toEqual([[], expect.closeTo(1005, 6)]);
    const beyond = askCalculator(filtersGel, { sourceK: 1014, targetK: 1000 }).result.nearest;
    expect(beyond[1]).toMatchObject({ sheets: ['eighth'], resultK: null });
  });
});
