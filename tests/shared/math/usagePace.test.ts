import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { usagePace } from '../../../shared/math/usagePace';

const DAY = 86_400_000;
const START = Date.UTC(2026, 10, 1);
const END = Date.UTC(2026, 11, 1);
const at = (days: number) => START + days * DAY;

describe('the pace of a month', () => {
  it('carries the units on evenly: 3,000 of 10,000 after 6 days of 30 are 15,000, used up after 20 days', () => {
    // Derivation: 500 a day; 30 · 500 = 15,000; 10,000 / 500 = 20.
    const { forecast, runsOutAtMs } = usagePace(3000, 10_000, START, END, at(6));
    expect(forecast).toBeCloseTo(15_000, 9);
    expect(runsOutAtMs).toBeCloseTo(at(20), 0);
  });

  it('lets a month last that is used exactly', () => {
    expect(usagePace(2000, 10_000, START, END, at(6)).runsOutAtMs).toBeNull();
  });

  it('takes the first day as whole, so that one busy hour foretells no flood', () => {
    expect(usagePace(100, 10_000, START, END, at(1 / 24)).forecast).toBeCloseTo(3000, 9);
  });

  it('is over now where nothing is left, also where the limit is nothing', () => {
    expect(usagePace(10_000, 10_000, START, END, at(12)).runsOutAtMs).toBe(at(12));
    expect(usagePace(0, 0, START, END, at(12))).toEqual({ forecast: 0, runsOutAtMs: at(12) });
  });

  it('never foretells an end outside what is left of the month, nor less than is used', () => {
    fc.assert(
      fc.property(
        fc.nat(1_000_000),
        fc.nat(1_000_000),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (used, limit, share) => {
          const now = START + share * (END - START);
          const { forecast, runsOutAtMs } = usagePace(used, limit, START, END, now);
          expect(forecast).toBeGreaterThanOrEqual(used * (1 - 1e-12));
          if (runsOutAtMs === null) expect(forecast).toBeLessThanOrEqual(limit);
          else {
            expect(runsOutAtMs).toBeGreaterThanOrEqual(now);
            expect(runsOutAtMs).toBeLessThanOrEqual(END + 1);
          }
        },
      ),
    );
  });
});
