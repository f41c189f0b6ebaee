import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  ambientShare,
  ghostVisibility,
  stopsBelowFlash,
  throughStops,
  trailBelowFlashStops,
} from '../../../shared/math/ghost';
import { addStops } from '../../../shared/math/mixing';
import share from '../../reference/ambient-share.json';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const stops = fc.double({ min: -60, max: 60, noNaN: true });
const trail = fc.double({ min: 0, max: 1e6, noNaN: true });
const detail = fc.double({ min: 0.1, max: 1000, noNaN: true });
const ORDER = ['none', 'faint', 'clear', 'dominant'];

describe('ambient light under the flash', () => {
  it('gives the published shares of the exposure', () => {
    eachRow(share, 8, (row, where) =>
      within(ambientShare(-row.ambientOverFlashStops), row.share, share.tolerance, where),
    );
  });

  it('is the plain difference, and its share is what adding the lights gives', () => {
    fc.assert(
      fc.property(stops, stops, (flash, ambient) => {
        const below = stopsBelowFlash(flash, ambient);
        expect(below).toBe(flash - ambient);
        expect(ambientShare(below)).toBeCloseTo(2 ** (ambient - addStops([flash, ambient])), 9);
      }),
    );
  });
});

describe('the trail', () => {
  it('is as far under the flash as the ambient light where nothing moves, and fades as it grows', () => {
    fc.assert(
      fc.property(stops, trail, detail, (below, px, width) => {
        expect(trailBelowFlashStops(below, 0, width)).toBeCloseTo(below, 12);
        expect(trailBelowFlashStops(below, px, width)).toBeGreaterThanOrEqual(below);
        expect(trailBelowFlashStops(below, width, width)).toBeCloseTo(below + 1, 9);
      }),
    );
  });

  it('agrees with a bar that is moved over a line of sensor points', () => {
    // A bar of 10 points moves 30 points; the middle of its path sees it for w/B of the time, the whole path of
    // w + B points for w/(w + B) of the time on average.
    const [width, travel, steps] = [10, 30, 3000];
    const seen = Array<number>(width + travel).fill(0);
    for (let i = 0; i < steps; i++) {
      const from = ((i + 0.5) / steps) * travel;
      for (let x = 0; x < seen.length; x++)
        seen[x] = (seen[x] ?? 0) + Math.max(0, Math.min(x + 1, from + width) - Math.max(x, from)) / steps;
    }
    const mean = seen.reduce((sum, value) => sum + value, 0) / seen.length;
    within(-trailBelowFlashStops(0, travel, width), Math.log2(mean), 1e-6, 'trail');
    within(throughStops(0, travel, width), Math.log2(1 - mean), 1e-6, 'background');
  });

  it('is told by the rule of the API at its borders', () => {
    const at = (below: number, trailPx = 10, tolerancePx = 1) =>
      ghostVisibility({ belowFlashStops: below, trailPx, tolerancePx, detailPx: 10 });
    // trail = detail adds one stop: D = below + 1.
    expect(at(-1.001)).toBe('dominant');
    expect(at(-1)).toBe('clear');
    expect(at(1.999)).toBe('clear');
    expect(at(2)).toBe('faint');
    expect(at(4.999)).toBe('faint');
    expect(at(5)).toBe('none');
    // A trail under the tolerance is none, however bright; one that reaches it counts.
    expect(at(-10, 0.999)).toBe('none');
    expect(at(-10, 1)).toBe('dominant');
    expect(at(-10, 10, 10.001)).toBe('none');
  });

  it('is never more visible under a stronger flash', () => {
    fc.assert(
      fc.property(
        stops,
        fc.double({ min: 0, max: 20, noNaN: true }),
        trail,
        detail,
        (below, more, px, width) => {
          const at = (belowFlashStops: number) =>
            ORDER.indexOf(ghostVisibility({ belowFlashStops, trailPx: px, tolerancePx: 1, detailPx: width }));
          expect(at(below + more)).toBeLessThanOrEqual(at(below));
        },
      ),
    );
  });
});

describe('a background that shows through', () => {
  it('and the trail share the time between them', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 1e5, noNaN: true }), detail, (px, width) => {
        const open = 2 ** (throughStops(0, px, width) ?? NaN);
        const covered = 2 ** -trailBelowFlashStops(0, px, width);
        expect(open + covered).toBeCloseTo(1, 9);
      }),
    );
  });

  it('is never brighter than beside the subject, and is nothing where nothing moves', () => {
    fc.assert(
      fc.property(stops, trail, detail, (background, px, width) => {
        const through = throughStops(background, px, width);
        if (px === 0) expect(through).toBeNull();
        else expect(through).toBeLessThanOrEqual(background + 1e-12);
      }),
    );
    expect(throughStops(3, 0, 10)).toBeNull();
    expect(Number.isFinite(throughStops(3, 5e-324, 1000))).toBe(true);
  });
});

describe('numbers outside the domain', () => {
  it('are refused', () => {
    expect(() => stopsBelowFlash(NaN, 0)).toThrow(/flashStops/);
    expect(() => ambientShare(NaN)).toThrow(RangeError);
    expect(() => trailBelowFlashStops(0, -1, 10)).toThrow(/trailPx/);
    expect(() => trailBelowFlashStops(0, 1, 0)).toThrow(/detailPx/);
    expect(() => throughStops(Infinity, 1, 1)).toThrow(/backgroundStops/);
    expect(() => ghostVisibility({ belowFlashStops: 0, trailPx: 1, tolerancePx: 0, detailPx: 1 })).toThrow(
      /tolerancePx/,
    );
  });
});
