import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  bandSwingStops,
  flickerRisk,
  frameSwingStops,
  nearestWholeCycles,
  residualRipple,
  rippleCycles,
  ripplePeriodsS,
} from '../../../shared/math/flicker';

const mains = fc.double({ min: 10, max: 1000, noNaN: true });
const cycles = fc.double({ min: 1e-6, max: 1e6, noNaN: true });
const depth = fc.double({ min: 0, max: 0.999, noNaN: true });
const share = fc.double({ min: 0, max: 1, noNaN: true });

/** Light of a lamp over an exposure that starts at a phase, by adding up: the long way round. */
function collected(c: number, start: number, m: number): number {
  const steps = 20_000;
  let sum = 0;
  for (let i = 0; i < steps; i += 1) sum += 1 + m * Math.cos(2 * Math.PI * (start + ((i + 0.5) / steps) * c));
  return sum / steps;
}

describe('ripple in an exposure', () => {
  it('counts two cycles for each of the mains', () => {
    expect(rippleCycles(50, 1 / 100)).toBe(1);
    expect(rippleCycles(60, 1 / 60)).toBe(2);
    expect(rippleCycles(50, 1 / 128)).toBe(0.78125);
    expect(ripplePeriodsS(60, 1)).toBe(1 / 120);
    fc.assert(
      fc.property(mains, fc.double({ min: 1e-3, max: 1e6, noNaN: true }), (hz, c) => {
        expect(rippleCycles(hz, ripplePeriodsS(hz, c)) / c).toBeCloseTo(1, 12);
      }),
    );
  });

  it('leaves nothing in whole cycles, all in an instant, 2/π in half a cycle', () => {
    for (const whole of [1, 2, 3, 100, 1e6]) expect(residualRipple(whole)).toBe(0);
    expect(residualRipple(1e-6)).toBeCloseTo(1, 11);
    expect(residualRipple(0.5)).toBeCloseTo(2 / Math.PI, 12);
    expect(residualRipple(1.5)).toBeCloseTo(2 / (3 * Math.PI), 12);
  });

  it('stays from 0 to 1, and under 1/(πc) however long the exposure', () => {
    fc.assert(
      fc.property(cycles, (c) => {
        const left = residualRipple(c);
        expect(left).toBeGreaterThanOrEqual(0);
        expect(left).toBeLessThanOrEqual(Math.min(1, 1 / (Math.PI * c)));
      }),
    );
  });

  it('agrees with adding up the light of many frames', () => {
    for (const c of [0.3, 0.5, 0.78125, 1, 1.3, 2.5]) {
      const m = 0.8;
      const frames = Array.from({ length: 200 }, (_, i) => collected(c, i / 200, m));
      const swing = Math.log2(Math.max(...frames) / Math.min(...frames));
      expect(Math.abs(frameSwingStops(residualRipple(c), m) - swing), `${c} cycles`).toBeLessThan(1e-3);
    }
  });
});

describe('brightness from frame to frame', () => {
  it('is log2 of brightest over darkest', () => {
    expect(frameSwingStops(0.5, 1)).toBeCloseTo(Math.log2(3), 12);
    expect(frameSwingStops(1, 0.6)).toBeCloseTo(2, 12);
    expect(frameSwingStops(0, 1)).toBe(0);
    // Half a cycle of a lamp that goes dark: (1 + 2/π)/(1 − 2/π) = 4.504, 2.171 stops.
    expect(frameSwingStops(residualRipple(0.5), 1)).toBeCloseTo(2.1712, 4);
  });

  it('grows with ripple and depth and is finite, down to the shortest exposure of the API', () => {
    fc.assert(
      fc.property(share, depth, (r, m) => {
        expect(Number.isFinite(frameSwingStops(r, m))).toBe(true);
        expect(frameSwingStops(r, m / 2)).toBeLessThanOrEqual(frameSwingStops(r, m));
      }),
    );
    expect(Number.isFinite(frameSwingStops(residualRipple(rippleCycles(10, 1e-6)), 1))).toBe(true);
  });

  it('refuses a frame without any light', () => {
    expect(() => frameSwingStops(1, 1)).toThrow(RangeError);
    expect(() => frameSwingStops(0.5, 1.1)).toThrow(RangeError);
    expect(() => frameSwingStops(NaN, 0.5)).toThrow(RangeError);
  });
});

describe('bands within a frame', () => {
  it('has none when all rows start together, and the full swing from half a cycle on', () => {
    fc.assert(
      fc.property(share, depth, fc.double({ min: 0.5, max: 100, noNaN: true }), (r, m, n) => {
        expect(bandSwingStops(r, m, 0)).toBe(0);
        expect(Math.abs(bandSwingStops(r, m, n) - frameSwingStops(r, m))).toBeLessThan(1e-9);
      }),
    );
  });

  it('grows with the travel and never passes the swing of frames', () => {
    fc.assert(
      fc.property(share, depth, fc.double({ min: 0, max: 2, noNaN: true }), (r, m, n) => {
        const bands = bandSwingStops(r, m, n);
        expect(Number.isFinite(bands)).toBe(true);
        expect(bands).toBeLessThanOrEqual(frameSwingStops(r, m) + 1e-12);
        expect(bandSwingStops(r, m, n / 2)).toBeLessThanOrEqual(bands + 1e-12);
      }),
    );
  });

  it('agrees with trying every start and every pair of rows', () => {
    for (const [a, n] of [
      [0.9, 0.1],
      [0.9, 0.33],
      [0.4, 0.2],
      [0.99, 0.05],
    ] as const) {
      let worst = 0;
      for (let start = 0; start < 1; start += 1e-4) {
        const first = 1 + a * Math.cos(2 * Math.PI * start);
        const last = 1 + a * Math.cos(2 * Math.PI * (start + n));
        worst = Math.max(worst, Math.abs(Math.log2(first / last)));
      }
      expect(Math.abs(bandSwingStops(a, 1, n) - worst), `a ${a}, n ${n}`).toBeLessThan(1e-4);
    }
  });
});

describe('whole cycles near an exposure', () => {
  it('gives the counts around it, or the one that it is', () => {
    expect(nearestWholeCycles(2.5)).toEqual([2, 3]);
    expect(nearestWholeCycles(0.4)).toEqual([1]);
    expect(nearestWholeCycles(1)).toEqual([1]);
    expect(nearestWholeCycles(3 - 1e-12)).toEqual([3]);
    expect(nearestWholeCycles(rippleCycles(60, 1 / 40))).toEqual([3]);
  });

  it('always holds the exposure between them, each without ripple', () => {
    fc.assert(
      fc.property(cycles, (c) => {
        const around = nearestWholeCycles(c);
        const [low, high] = [around[0] ?? NaN, around.at(-1) ?? NaN];
        expect(high).toBeGreaterThanOrEqual(c * (1 - 1e-8));
        if (low > 1) expect(low).toBeLessThanOrEqual(c * (1 + 1e-8));
        for (const k of around) expect(residualRipple(k)).toBe(0);
      }),
    );
  });
});

describe('the risk in words', () => {
  it('rises with the swing', () => {
    expect([0, 0.05, 0.06, 1 / 3, 0.4, 1, 1.01, 30].map(flickerRisk)).toEqual([
      'none',
      'none',
      'slight',
      'slight',
      'clear',
      'clear',
      'strong',
      'strong',
    ]);
  });
});
