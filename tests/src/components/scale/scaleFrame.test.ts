import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  heldWithin,
  numberedEvery,
  pxPerStop,
  spanAround,
  ticksOf,
  xOf,
  type ScaleFrame,
} from '../../../../src/components/scale/scaleFrame';

const frame: ScaleFrame = { fromStops: -6, toStops: 16, widthPx: 924, padPx: 22 };

describe('the axis', () => {
  it('stands its ends inside the padding and each stop the same distance on', () => {
    expect(pxPerStop(frame)).toBe(40);
    expect(xOf(frame, -6)).toBe(22);
    expect(xOf(frame, 16)).toBe(902);
    expect(xOf(frame, 0)).toBe(262);
  });

  it('holds what lies beyond at its end, and says so', () => {
    expect(heldWithin(frame, 20)).toEqual({ stops: 16, isBeyond: true });
    expect(heldWithin(frame, -7)).toEqual({ stops: -6, isBeyond: true });
    expect(heldWithin(frame, 3.3)).toEqual({ stops: 3.3, isBeyond: false });
  });

  it('rules thirds where there is room for them, and stops alone where there is not', () => {
    const wide = ticksOf(frame);
    expect(wide).toHaveLength(22 * 3 + 1);
    expect(wide.filter(({ rank }) => rank === 'third')).toHaveLength(44);
    const narrow = ticksOf({ ...frame, widthPx: 328 });
    expect(narrow).toHaveLength(23);
    expect(narrow.some(({ rank }) => rank === 'third')).toBe(false);
  });

  it('numbers no two ticks closer than 40 px, at any width and span', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 200, max: 2000 }),
        fc.integer({ min: -40, max: 20 }),
        fc.integer({ min: 1, max: 60 }),
        (widthPx, fromStops, length) => {
          const any = { fromStops, toStops: fromStops + length, widthPx, padPx: 22 };
          const numbered = ticksOf(any).filter(({ rank }) => rank === 'numbered');
          numbered.slice(1).forEach(({ xPx }, i) => {
            expect(xPx - (numbered[i]?.xPx ?? 0)).toBeGreaterThanOrEqual(39.999);
          });
        },
      ),
    );
  });

  it('numbers every stop, second, fifth or tenth, never an odd distance', () => {
    expect(numberedEvery(frame)).toBe(1);
    expect(numberedEvery({ ...frame, widthPx: 600 })).toBe(2);
    expect(numberedEvery({ ...frame, widthPx: 328 })).toBe(5);
    // Long numbers stand farther apart, short ones no nearer.
    expect(numberedEvery({ ...frame, widthPx: 600 }, 90)).toBe(5);
    expect(numberedEvery({ ...frame, widthPx: 600 }, 10)).toBe(2);
  });
});

describe('the span around values', () => {
  it('is whole, holds every value with its margin, and is no shorter than asked', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -50, max: 50, noNaN: true }), { minLength: 1, maxLength: 8 }),
        fc.integer({ min: 1, max: 30 }),
        (values, least) => {
          const { fromStops, toStops } = spanAround(values, least);
          expect(Number.isInteger(fromStops) && Number.isInteger(toStops)).toBe(true);
          expect(toStops - fromStops).toBeGreaterThanOrEqual(least);
          for (const value of values) {
            expect(fromStops).toBeLessThanOrEqual(value - 1 + 1e-9);
            expect(toStops).toBeGreaterThanOrEqual(value + 1 - 1e-9);
          }
        },
      ),
    );
  });

  it('stands on zero where no value is known', () => {
    expect(spanAround([], 4)).toEqual({ fromStops: -2, toStops: 2 });
    expect(spanAround([Number.NaN], 4)).toEqual({ fromStops: -2, toStops: 2 });
  });
});
