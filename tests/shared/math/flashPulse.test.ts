import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decayPulse } from '../../../shared/math/flashDuration';
import {
  durationAboveS,
  EXPONENTIAL_RATIO,
  intensityAt,
  shapeOfRatio,
  shareWithin,
  type FlashPulse,
} from '../../../shared/math/flashPulse';
import { gammaOnePlus } from '../../../shared/math/gamma';
import shapes from '../../reference/pulse-shapes.json';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const ratios = fc.double({ min: 1.02, max: 20, noNaN: true });
const pulses: fc.Arbitrary<FlashPulse> = fc
  .tuple(ratios, fc.double({ min: 0.05, max: 5, noNaN: true }), fc.double({ min: 0, max: 0.5, noNaN: true }))
  .map(([ratio, cut, rise]) => {
    const whole = decayPulse({ t05S: 0.001 }, ratio);
    return { ...whole, cutOffS: cut * whole.timeConstantS, riseS: rise * whole.timeConstantS };
  });

/** Light up to a time by adding up the intensity (Simpson's rule on s² = t, which calms the start). */
function lightUpTo(pulse: FlashPulse, endS: number): number {
  const n = 4000;
  const top = Math.sqrt(endS);
  let sum = 0;
  for (let i = 0; i <= n; i++) {
    const s = (i / n) * top;
    const weight = i === 0 || i === n ? 1 : i % 2 ? 4 : 2;
    sum += weight * intensityAt(pulse, s * s * (1 - 1e-12)) * 2 * s;
  }
  return (sum * top) / n / 3;
}

/** When the intensity falls through a level, by halving. */
function fallsThrough(pulse: FlashPulse, level: number): number {
  let [low, high] = [0, 1000];
  for (let i = 0; i < 200; i++) {
    const middle = (low + high) / 2;
    if (intensityAt(pulse, middle) > level) low = middle;
    else high = middle;
  }
  return low;
}

describe('the family of pulses', () => {
  it('keeps the published share of light inside t0.5 and t0.1, exactly or within what is said beside it', () => {
    eachRow(shapes, 8, (row, where) => {
      const pulse = decayPulse({ t05S: 1 }, row.ratio);
      const inside = (level: number) => 100 * shareWithin(pulse, durationAboveS(pulse, level));
      within(inside(0.5), row.insideT05Pct, row.withinPct, where);
      within(inside(0.1), row.insideT01Pct, row.withinPct, where);
      expect(row.withinPct).toBeGreaterThanOrEqual(shapes.tolerance);
    });
  });

  it('has the ratio of t0.1 and t0.5 that was measured, whichever of the two was given', () => {
    fc.assert(
      fc.property(ratios, fc.double({ min: 1e-6, max: 1, noNaN: true }), (ratio, seconds) => {
        for (const measured of [{ t05S: seconds }, { t01S: seconds }]) {
          const pulse = decayPulse(measured, ratio);
          const [half, tenth] = [durationAboveS(pulse, 0.5), durationAboveS(pulse, 0.1)];
          expect(tenth / half / ratio).toBeCloseTo(1, 9);
          expect(('t05S' in measured ? half : tenth) / seconds).toBeCloseTo(1, 9);
        }
      }),
    );
  });

  it('is the exponential at ln 10/ln 2 and the rectangle at 1', () => {
    expect(shapeOfRatio(EXPONENTIAL_RATIO)).toBe(1);
    expect(shapeOfRatio(1)).toBe(Infinity);
    const box = decayPulse({ t01S: 0.002 }, 1);
    expect(durationAboveS(box, 0.5)).toBe(0.002);
    expect(intensityAt(box, 0.0019)).toBe(1);
    expect(intensityAt(box, 0.002)).toBe(0);
    expect(shareWithin(box, 0.0005)).toBeCloseTo(0.25, 12);
    expect(shareWithin(box, 0.1)).toBe(1);
  });

  it('comes close to the rectangle when the ratio comes close to 1', () => {
    const almost = decayPulse({ t05S: 1 }, 1.0001);
    for (const t of [0.1, 0.5, 0.9]) within(shareWithin(almost, t), t, 2e-4, `${t}`);
  });
});

describe('durations', () => {
  it('are where the intensity falls through the level, found by halving', () => {
    fc.assert(
      fc.property(pulses, fc.double({ min: 0.02, max: 0.98, noNaN: true }), (pulse, level) => {
        const found = fallsThrough(pulse, level);
        expect(durationAboveS(pulse, level) / found).toBeCloseTo(1, 9);
      }),
    );
  });

  it('are longer above a lower level', () => {
    fc.assert(
      fc.property(pulses, fc.double({ min: 0.02, max: 0.9, noNaN: true }), (pulse, level) => {
        expect(durationAboveS(pulse, level)).toBeGreaterThanOrEqual(durationAboveS(pulse, level + 0.05));
      }),
    );
  });
});

describe('the share of light', () => {
  it('agrees with adding up the intensity, for whole, cut and stretched pulses', () => {
    fc.assert(
      fc.property(pulses, fc.double({ min: 0.01, max: 1, noNaN: true }), (pulse, part) => {
        const endS = pulse.cutOffS + pulse.riseS;
        const share = shareWithin(pulse, part * endS);
        expect(share).toBeCloseTo(lightUpTo(pulse, part * endS) / lightUpTo(pulse, endS), 5);
      }),
      { numRuns: 60 },
    );
  });

  it('grows with time from 0 to 1', () => {
    fc.assert(
      fc.property(ratios, fc.double({ min: 0, max: 50, noNaN: true }), (ratio, t) => {
        const pulse = decayPulse({ t05S: 1 }, ratio);
        const share = shareWithin(pulse, t);
        expect(share).toBeGreaterThanOrEqual(0);
        expect(share).toBeLessThanOrEqual(1);
        expect(shareWithin(pulse, t + 0.01)).toBeGreaterThanOrEqual(share - 1e-14);
      }),
    );
  });

  it('is the error function for half a Gaussian, an independent closed form', () => {
    // erf by its Maclaurin series; k = 2 gives I = exp(−(t/τ)²).
    const erf = (x: number) => {
      let [term, sum] = [x, x];
      for (let n = 1; n < 200; n++) {
        term *= (-x * x) / n;
        sum += term / (2 * n + 1);
      }
      return (2 / Math.sqrt(Math.PI)) * sum;
    };
    const pulse = { timeConstantS: 1, shape: 2, cutOffS: Infinity, riseS: 0 };
    for (const t of [1e-9, 0.01, 0.3, 1, 1.2, 1.3, 2, 3])
      within(shareWithin(pulse, t), erf(t), 1e-12, `${t}`);
  });

  it('has a closed form for k = 1/2 that the general one meets', () => {
    // ∫ exp(−√t) = 2·(1 − (1 + √t)·e^(−√t)), whole 2.
    const pulse = { timeConstantS: 1, shape: 0.5, cutOffS: Infinity, riseS: 0 };
    for (const t of [1e-6, 0.1, 1, 5, 8.9, 9.1, 50, 400])
      within(shareWithin(pulse, t), 1 - (1 + Math.sqrt(t)) * Math.exp(-Math.sqrt(t)), 1e-12, `${t}`);
  });

  it('is finite at both ends of everything', () => {
    for (const ratio of [1, 1 + 1e-15, 1.0001, 2, 100])
      for (const t of [0, 5e-324, 1e-6, 1, 1e300]) {
        const share = shareWithin(decayPulse({ t05S: 0.001 }, ratio), t);
        expect(share >= 0 && share <= 1, `${ratio} ${t} ${share}`).toBe(true);
      }
  });
});

describe('the gamma function', () => {
  it('gives factorials and the half-integer values', () => {
    let factorial = 1;
    for (let n = 0; n <= 20; n++) {
      factorial *= Math.max(1, n);
      expect(gammaOnePlus(n) / factorial).toBeCloseTo(1, 13);
    }
    // Γ(3/2) = √π/2 and Γ(5/2) = 3√π/4.
    expect(gammaOnePlus(0.5)).toBeCloseTo(Math.sqrt(Math.PI) / 2, 14);
    expect(gammaOnePlus(1.5)).toBeCloseTo((3 * Math.sqrt(Math.PI)) / 4, 14);
  });

  it('grows by its own rule: Γ(1 + a) = a·Γ(a)', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 100, noNaN: true }), (a) => {
        expect(gammaOnePlus(a) / (a * gammaOnePlus(a - 1))).toBeCloseTo(1, 11);
      }),
    );
  });
});

describe('numbers outside the domain', () => {
  it('are refused by name', () => {
    const pulse = decayPulse({ t05S: 0.001 });
    for (const bad of [0, 1, -1, NaN]) expect(() => durationAboveS(pulse, bad)).toThrow(/level/);
    for (const bad of [-1, NaN, Infinity]) {
      expect(() => shareWithin(pulse, bad)).toThrow(/timeS/);
      expect(() => intensityAt(pulse, bad)).toThrow(/timeS/);
    }
    for (const bad of [0.99, 101, NaN]) expect(() => shapeOfRatio(bad)).toThrow(/ratio/);
    expect(() => gammaOnePlus(-1)).toThrow(RangeError);
  });
});
