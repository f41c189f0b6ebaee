import { describe, expect, it } from 'vitest';
import { flashFalloff } from '../../../shared/calculators/flash/falloff';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';

const ask = (body: unknown) => askCalculator(flashFalloff, body);
const places = (body: unknown) => placesOf(faultsIn(flashFalloff, body));

describe('flash/falloff', () => {
  it('takes a distance, a list, a span as an object and a span as fields, and gives the same rows', () => {
    const list = ask({ distanceM: [1, 2, 3], referenceM: 2 }).result.rows;
    expect(ask({ distanceM: { nearM: 1, farM: 3, steps: 2 }, referenceM: 2 }).result.rows).toEqual(list);
    expect(ask({ nearM: 1, farM: 3, steps: 2, referenceM: 2 }).result.rows).toEqual(list);
    expect(ask({ distanceM: 1, referenceM: 2 }).result.rows).toEqual(list.slice(0, 1));
    // 2·log2(2/3) = −1.1699.
    expect(list[2]?.stops).toBeCloseTo(-1.1699, 4);
  });

  it('keeps the order asked for', () => {
    const { rows } = ask({ distanceM: [4, 1, 2], referenceM: 2 }).result;
    expect(rows.map(({ stops }) => stops)).toEqual([-2, 2, 0]);
  });

  it('says that a light is taken as small until its diameter is given', () => {
    expect(codesOf(ask({ distanceM: 1, referenceM: 2 }).notes)).toEqual(['small_source_assumed']);
    expect(ask({ distanceM: 1, referenceM: 2, sourceDiameterM: 1 }).notes).toEqual([]);
  });

  it('has no tolerance, no depth', () => {
    expect(ask({ distanceM: 1, referenceM: 2, toleranceStops: 0 }).result.even.depthM).toBe(0);
  });

  it('wants one way to say the distances, and a span whole', () => {
    expect(places({ referenceM: 2 })).toEqual(['/distanceM exactly']);
    expect(places({ referenceM: 2, distanceM: 1, nearM: 1, farM: 2, steps: 3 })).toEqual(['/nearM exactly']);
    expect(places({ referenceM: 2, nearM: 1 })).toEqual(['/farM needed_together', '/steps needed_together']);
  });

  it('points at what is wrong inside a list or a span', () => {
    expect(places({ referenceM: 2, distanceM: [1, 0] })).toEqual(['/distanceM/1 out_of_range']);
    expect(places({ referenceM: 2, distanceM: [] })).toEqual(['/distanceM too_few_items']);
    expect(places({ referenceM: 2, distanceM: { nearM: 1, farM: 0.001, steps: 2 } })).toContain(
      '/distanceM/farM out_of_range',
    );
    expect(places({ referenceM: 2, distanceM: { nearM: 1, farM: 2 } })).toEqual(['/distanceM/steps missing']);
    expect(places({ referenceM: 2, distanceM: { nearM: 3, farM: 2, steps: 2 } })).toEqual([
      '/distanceM/farM far_before_near',
    ]);
    expect(places({ referenceM: 2, nearM: 3, farM: 2, steps: 2 })).toEqual(['/farM far_before_near']);
    expect(places({ referenceM: 2, distanceM: 'near' })).toHaveLength(1);
    expect(places({ referenceM: 2, distanceM: Array(501).fill(1) })).toEqual(['/distanceM too_many_items']);
  });
});
