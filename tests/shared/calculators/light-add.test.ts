import { describe, expect, it } from 'vitest';
import { lightAdd } from '../../../shared/calculators/light/add';
import { askCalculator, faultsIn, placesOf } from '../../support/askCalculator';

describe('light/add', () => {
  it('sums a single light as itself', () => {
    expect(askCalculator(lightAdd, { parts: [{ ev100: -3 }] }).result).toEqual({
      ev100: -3,
      parts: [{ ev100: -3, share: 1 }],
    });
  });

  it('gives the sum in the unit of the parts, and the same sum in either', () => {
    const inStops = askCalculator(lightAdd, { parts: [{ stops: 5 }, { stops: 3 }] }).result;
    const inEv = askCalculator(lightAdd, { parts: [{ ev100: 5 }, { ev100: 3 }] }).result;
    expect(inStops.stops).toBe(inEv.ev100);
    expect(inStops).not.toHaveProperty('ev100');
    expect(inEv).not.toHaveProperty('stops');
  });

  it('points at every part in another unit than the first', () => {
    const parts = [{ stops: 0 }, { ev100: 5 }, { stops: -1 }, { ev100: 4 }];
    const faults = faultsIn(lightAdd, { parts });
    expect(placesOf(faults)).toEqual(['/parts/1/ev100 units_mixed', '/parts/3/ev100 units_mixed']);
  });

  it('refuses parts that say nothing, both units, or nothing at all', () => {
    const places = (parts: unknown) => placesOf(faultsIn(lightAdd, { parts }));
    expect(places([])).toEqual(['/parts too_few_items']);
    expect(places([{}])).toEqual(['/parts/0/stops exactly']);
    expect(places([{ stops: 0, ev100: 0 }])).toEqual(['/parts/0/ev100 exactly']);
    expect(places(Array(101).fill({ stops: 0 }))).toEqual(['/parts too_many_items']);
  });

  it('keeps a light that is far too weak to count, with a share of next to nothing', () => {
    const { stops, parts } = askCalculator(lightAdd, { parts: [{ stops: 60 }, { stops: -60 }] }).result;
    expect(stops).toBe(60);
    expect(parts[1]?.share).toBeGreaterThan(0);
    expect(parts[1]?.share).toBeLessThan(1e-35);
  });
});
