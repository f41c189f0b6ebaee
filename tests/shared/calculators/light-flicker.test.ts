import { describe, expect, it } from 'vitest';
import { lightFlicker } from '../../../shared/calculators/light/flicker';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';

const on50 = (shutter: number, more: object = {}) =>
  askCalculator(lightFlicker, { mainsHz: 50, shutter, readAs: 'exact', ...more });

describe('light/flicker', () => {
  it('finds nothing in whole cycles, for either mains', () => {
    for (const [mainsHz, shutter] of [
      [50, 1 / 100],
      [50, 1 / 50],
      [50, 1 / 25],
      [60, 1 / 120],
      [60, 1 / 60],
      [60, 1 / 30],
    ]) {
      const { result } = askCalculator(lightFlicker, { mainsHz, shutter, readAs: 'exact' });
      expect([result.bands.risk, result.brightness.risk]).toEqual(['none', 'none']);
      expect(result.brightness.swingStops).toBeCloseTo(0, 9);
      expect(result.wholeCycles).toHaveLength(1);
    }
  });

  it('names the whole cycles on both sides, with their times and marks', () => {
    const { wholeCycles } = on50(1 / 40).result;
    expect(wholeCycles.map(({ cycles, shutter }) => [cycles, shutter.exact, shutter.mark])).toEqual([
      [2, 0.02, '1/50'],
      [3, 0.03, '1/30'],
    ]);
    // The mark 1/30 is 1/32 s, 3.125 cycles of a hundredth: it leaves a little.
    expect(wholeCycles[1]?.atMark.risk).toBe('slight');
  });

  it('has no bands where all rows start together, but uneven frames all the same', () => {
    const { result } = on50(1 / 1000, { curtainS: 0 });
    expect(result.bands).toEqual({ swingStops: 0, risk: 'none' });
    expect(result.brightness.risk).toBe('strong');
  });

  it('lets the slow rows of an electronic shutter show as much as frame to frame', () => {
    const { bands, brightness } = on50(1 / 250, { curtainS: 1 / 20 }).result;
    expect(bands.swingStops).toBeCloseTo(brightness.swingStops, 9);
    expect(on50(1 / 250).result.bands.swingStops).toBeLessThan(brightness.swingStops);
  });

  it('is calm for a steady lamp, and for an exposure of many cycles', () => {
    expect(on50(1 / 1000, { rippleDepth: 0 }).result.brightness).toEqual({ swingStops: 0, risk: 'none' });
    expect(on50(2.0055).result.brightness.risk).toBe('none');
  });

  it('stays finite at the shortest exposure under a lamp that goes dark', () => {
    const { result, notes } = askCalculator(lightFlicker, { mainsHz: 10, shutter: 1e-6, curtainS: 1 });
    expect(Number.isFinite(result.brightness.swingStops)).toBe(true);
    expect(codesOf(notes)).toEqual(['ripple_of_mains_only', 'ripple_worst_case', 'ripple_under_one_cycle']);
  });

  it('refuses a mains that is none', () => {
    const faults = faultsIn(lightFlicker, { mainsHz: 5, shutter: '1/50' });
    expect(placesOf(faults)).toEqual(['/mainsHz out_of_range']);
    expect(faults[0]?.detail).toMatch(/10.*500 Hz/);
  });
});
