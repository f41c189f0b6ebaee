import { describe, expect, it } from 'vitest';
import { exposureDifference } from '../../../shared/calculators/exposure/difference';
import { askCalculator, faultsIn, placesOf } from '../../support/askCalculator';

const from = { aperture: 'f/8', shutter: '1/125', iso: 100 };
const ask = (to: object, more: object = {}) =>
  askCalculator(exposureDifference, { from, to, ...more }).result;

describe('exposure/difference', () => {
  it('is nothing between equals, and the part that was changed otherwise', () => {
    expect(ask(from)).toEqual({
      stops: 0,
      byApertureStops: 0,
      byShutterStops: 0,
      byIsoStops: 0,
      byNdStops: 0,
    });
    const changes: [object, string, number][] = [
      [{ aperture: 'f/11' }, 'byApertureStops', -1],
      [{ shutter: '1/60' }, 'byShutterStops', 1],
      [{ iso: 50 }, 'byIsoStops', -1],
      [{ ndStops: 3 }, 'byNdStops', -3],
    ];
    for (const [change, part, stops] of changes) {
      const given: Record<string, number> = { ...ask({ ...from, ...change }) };
      for (const [name, value] of Object.entries(given))
        expect(value, `${part} ${name}`).toBeCloseTo(name === 'stops' || name === part ? stops : 0, 12);
    }
  });

  it('reads both sides by marks, or literally', () => {
    const to = { ...from, aperture: 'f/5.6', shutter: 30 };
    expect(ask(to).stops).toBeCloseTo(1 + 12, 12);
    expect(ask(to, { readAs: 'exact' }).stops).toBeCloseTo(2 * Math.log2(8 / 5.6) + Math.log2(30 * 125), 12);
    expect(ask({ ...from, aperture: 'f/13' }).byApertureStops).toBeCloseTo(-4 / 3, 12);
    expect(ask({ ...from, aperture: 'f/13' }, { scale: 'half' }).byApertureStops).toBeCloseTo(-1.5, 12);
  });

  it('names a fault on either side by its place', () => {
    expect(
      placesOf(faultsIn(exposureDifference, { from: { ...from, iso: 0 }, to: { aperture: 8 } })).sort(),
    ).toEqual(['/from/iso out_of_range', '/to/iso missing', '/to/shutter missing']);
    expect(placesOf(faultsIn(exposureDifference, {}))).toEqual(['/from missing', '/to missing']);
  });
});
