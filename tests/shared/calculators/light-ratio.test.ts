import { describe, expect, it } from 'vitest';
import { lightRatio } from '../../../shared/calculators/light/ratio';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';

describe('light/ratio', () => {
  it('finds its way back from every ratio', () => {
    for (const ratio of [1.0001, 1.5, 2, 3, 5, 9, 1000]) {
      const wanted = askCalculator(lightRatio, { ratio }).result;
      const set = askCalculator(lightRatio, { keyStops: wanted.differenceStops - 2, fillStops: -2 }).result;
      expect(set.ratio).toBeCloseTo(ratio, 9);
      expect(set.litOverShadowStops).toBeCloseTo(wanted.litOverShadowStops, 9);
      expect(set.litOverShadowStops).toBeCloseTo(Math.log2(ratio), 9);
    }
  });

  it('refuses a ratio of 1 or less: the lit side always has the fill as well', () => {
    for (const ratio of [1, 0.5, 0, -2]) {
      expect(placesOf(faultsIn(lightRatio, { ratio }))).toEqual(['/ratio out_of_range']);
    }
  });

  it('wants key and fill, or the ratio', () => {
    expect(placesOf(faultsIn(lightRatio, { keyStops: 1 }))).toEqual(['/fillStops exactly']);
    expect(placesOf(faultsIn(lightRatio, { fillStops: 1 }))).toEqual(['/keyStops exactly']);
    expect(placesOf(faultsIn(lightRatio, { keyStops: 1, ratio: 3 }))).toEqual(['/ratio exactly']);
    expect(placesOf(faultsIn(lightRatio, {})).sort()).toEqual(['/fillStops exactly', '/keyStops exactly']);
  });

  it('names the convention, and says so where the fill outshines the key', () => {
    const notes = (input: object) => codesOf(askCalculator(lightRatio, input).notes);
    expect(notes({ ratio: 2 })).toEqual(['ratio_counts_both']);
    expect(notes({ ratio: 1.5 })).toEqual(['ratio_counts_both', 'fill_outshines_key']);
    expect(notes({ keyStops: -1, fillStops: 0 })).toContain('fill_outshines_key');
  });
});
