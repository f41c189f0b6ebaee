import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  clippedBy,
  cutoffPulse,
  decayPulse,
  flashPulse,
  halfPeakS,
  isLowerBound,
  RISE_FLOOR_S,
  tenthPeakS,
} from '../../../shared/math/flashDuration';
import { shareWithin } from '../../../shared/math/flashPulse';
import clipping from '../../reference/shutter-clipping.json';
import cutoff from '../../reference/cutoff-pulse.json';
import shoeMount from '../../reference/shoe-mount-durations.json';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const duration = fc.double({ min: Math.log(1e-6), max: Math.log(1), noNaN: true }).map(Math.exp);
const power = fc.double({ min: Math.log(1e-6), max: 0, noNaN: true }).map((n) => Math.min(1, Math.exp(n)));
const ratios = fc.double({ min: 1, max: 20, noNaN: true });

describe('a whole discharge', () => {
  it('has τ = t0.5/ln 2 = t0.1/ln 10', () => {
    expect(decayPulse({ t05S: Math.LN2 }).timeConstantS).toBeCloseTo(1, 14);
    expect(decayPulse({ t01S: Math.LN10 }).timeConstantS).toBeCloseTo(1, 14);
    // t0.5 of 1 ms is a t0.1 of 3.322 ms (project handbook, section 6.3).
    within(tenthPeakS(decayPulse({ t05S: 0.001 })), 0.003322, 5e-7, 't0.1');
  });

  it('ignores the power', () => {
    fc.assert(
      fc.property(duration, power, ratios, (t05S, p, ratio) => {
        const at = (settings: number) => flashPulse({ t05S }, { control: 'decay', power: settings, ratio });
        expect(at(p)).toEqual(at(1));
      }),
    );
  });

  it('with the usual rule of thumb of 3 gives more light inside t0.5 than an exponential', () => {
    const pulse = decayPulse({ t05S: 1 }, 3);
    expect(tenthPeakS(pulse)).toBeCloseTo(3, 12);
    expect(shareWithin(pulse, 1)).toBeGreaterThan(0.5);
  });
});

describe('a pulse that is cut off', () => {
  it('gives the published rows', () => {
    eachRow(cutoff, 9, (row, where) => {
      // τ = 1 s, so that the rise plays no part; it is left out.
      const pulse = cutoffPulse({ t05S: Math.LN2 }, 1 / row.powerParts, 0);
      if (row.cutOff === null) expect(pulse.cutOffS).toBe(Infinity);
      else within(pulse.cutOffS, row.cutOff, cutoff.tolerance, where);
      within(halfPeakS(pulse), row.t05, cutoff.tolerance, where);
      within(tenthPeakS(pulse), row.t01, cutoff.tolerance, where);
      within(tenthPeakS(pulse) / Math.LN10, row.t01OfFull, cutoff.tolerance, where);
    });
  });

  it('meets one published table of durations, fitted to its first value alone', () => {
    eachRow(shoeMount, 8, (row, where) => {
      const of = (rise: number) => 1 / halfPeakS(cutoffPulse({ t05S: 1 / 1050 }, 1 / row.powerParts, rise));
      within(of(0) / row.modelParts, 1, shoeMount.tolerance, where);
      const wanted = row.withRiseParts ?? row.modelParts;
      within(of(RISE_FLOOR_S) / wanted, 1, shoeMount.tolerance, where);
      within(of(RISE_FLOOR_S) / row.publishedParts, 1, shoeMount.publishedWithin, where);
    });
  });

  it('gives off exactly its part of the whole light', () => {
    fc.assert(
      fc.property(duration, power, (t05S, p) => {
        const whole = decayPulse({ t05S });
        const { cutOffS } = cutoffPulse({ t05S }, p);
        if (Number.isFinite(cutOffS)) expect(shareWithin(whole, cutOffS) / p).toBeCloseTo(1, 9);
      }),
    );
  });

  it('is shorter at less power, on either side of where the rise begins to count', () => {
    fc.assert(
      fc.property(duration, power, power, (t05S, a, b) => {
        const [less, more] = [Math.min(a, b), Math.max(a, b)];
        if (less < 1 / 16 && more >= 1 / 16) return;
        const at = (p: number) => cutoffPulse({ t05S }, p);
        expect(halfPeakS(at(less))).toBeLessThanOrEqual(halfPeakS(at(more)) * (1 + 1e-12));
        expect(tenthPeakS(at(less))).toBeLessThanOrEqual(tenthPeakS(at(more)) * (1 + 1e-12));
      }),
    );
  });

  it('loses t0.1 but not t0.5 between full and half power', () => {
    const full = cutoffPulse({ t05S: 0.001 }, 1);
    const half = cutoffPulse({ t05S: 0.001 }, 0.5);
    within(halfPeakS(half) / halfPeakS(full), 1, 1e-12, 't0.5');
    within(tenthPeakS(full) / tenthPeakS(half), 3.322, 0.001, 't0.1');
  });

  it('holds all of its light inside t0.1 up to nine tenths of the power', () => {
    fc.assert(
      fc.property(duration, fc.double({ min: 1e-4, max: 0.9, noNaN: true }), (t05S, p) => {
        const pulse = cutoffPulse({ t05S }, p);
        expect(shareWithin(pulse, tenthPeakS(pulse))).toBeCloseTo(1, 9);
      }),
    );
  });
});

describe('the ways of control', () => {
  it('go opposite ways: cut off never longer at less power, voltage never shorter', () => {
    fc.assert(
      fc.property(duration, fc.double({ min: 1e-6, max: 0.899, noNaN: true }), (t05S, p) => {
        const at = (control: 'cutoff' | 'voltage', power: number) =>
          tenthPeakS(flashPulse({ t05S }, { control, power, riseFloorS: 0 }));
        expect(at('cutoff', p)).toBeLessThan(at('cutoff', 1));
        expect(at('voltage', p)).toBeGreaterThanOrEqual(at('voltage', 1));
        expect(isLowerBound('voltage', p)).toBe(true);
        expect(isLowerBound('cutoff', p)).toBe(false);
      }),
    );
    expect(isLowerBound('voltage', 1)).toBe(false);
    expect(isLowerBound('decay', 0.1)).toBe(false);
  });

  it('are finite and above zero over the whole range', () => {
    fc.assert(
      fc.property(
        duration,
        power,
        ratios,
        fc.constantFrom('decay' as const, 'cutoff' as const, 'voltage' as const),
        (t01S, p, ratio, control) => {
          const pulse = flashPulse({ t01S }, { control, power: p, ratio });
          for (const value of [halfPeakS(pulse), tenthPeakS(pulse)]) {
            expect(Number.isFinite(value)).toBe(true);
            expect(value).toBeGreaterThan(0);
          }
          expect(halfPeakS(pulse)).toBeLessThanOrEqual(tenthPeakS(pulse) * (1 + 1e-12));
        },
      ),
    );
  });
});

describe('a shutter that clips the pulse', () => {
  it('lets the published shares through', () => {
    eachRow(clipping, 3, (row, where) => {
      const { share, clippedStops } = clippedBy(decayPulse({ t05S: row.t05S }), row.openS, 0);
      within(share, row.share, clipping.tolerance, where);
      within(clippedStops, row.stops, clipping.tolerance, where);
    });
  });

  it('lets less through the faster it is and the more of it the curtain takes', () => {
    fc.assert(
      fc.property(
        duration,
        power,
        duration,
        fc.double({ min: 0, max: 0.9, noNaN: true }),
        (t05S, p, t, part) => {
          const pulse = cutoffPulse({ t05S }, p);
          const whole = clippedBy(pulse, t, 0);
          const curtained = clippedBy(pulse, t, part * t);
          const faster = clippedBy(pulse, t / 2, 0);
          expect(whole.clippedStops).toBeLessThanOrEqual(0);
          expect(curtained.clippedStops).toBeLessThanOrEqual(whole.clippedStops + 1e-12);
          expect(faster.clippedStops).toBeLessThanOrEqual(whole.clippedStops + 1e-12);
          expect(Number.isFinite(faster.clippedStops)).toBe(true);
          expect(2 ** whole.clippedStops).toBeCloseTo(whole.share, 9);
        },
      ),
    );
  });

  it('clips a pulse that has been cut off less than a whole one', () => {
    const open = 0.002;
    const whole = clippedBy(decayPulse({ t05S: 0.001 }), open, 0);
    const cut = clippedBy(cutoffPulse({ t05S: 0.001 }, 0.25), open, 0);
    expect(cut.clippedStops).toBe(0);
    expect(whole.clippedStops).toBeLessThan(cut.clippedStops);
  });

  it('is refused where the frame is never wholly open', () => {
    const pulse = decayPulse({ t05S: 0.001 });
    expect(() => clippedBy(pulse, 1 / 1000, 1 / 300)).toThrow(/open time/);
    expect(() => clippedBy(pulse, 1 / 300, 1 / 300)).toThrow(/open time/);
    expect(() => clippedBy(pulse, 1 / 300, -1)).toThrow(/curtainS/);
    expect(() => decayPulse({ t05S: 0 })).toThrow(/duration/);
    for (const bad of [0, 1.01, NaN]) {
      expect(() => cutoffPulse({ t05S: 1 }, bad)).toThrow(/power/);
      expect(() => flashPulse({ t05S: 1 }, { control: 'decay', power: bad })).toThrow(/power/);
    }
  });
});
