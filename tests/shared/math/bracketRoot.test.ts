import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bracketRoot } from '../../../shared/math/bracketRoot';
import { quarticThrough, slopeOfQuartic, valueOfQuartic } from '../../../shared/math/quartic';
import { within } from '../../support/within';

describe('a root between two points', () => {
  it('is found for curves whose root is known', () => {
    within(
      bracketRoot((x) => x * x - 2, 0, 2, 1e-12),
      Math.SQRT2,
      1e-12,
      'square root',
    );
    within(
      bracketRoot((x) => Math.cos(x), 0, 3, 1e-12),
      Math.PI / 2,
      1e-12,
      'cosine',
    );
    expect(bracketRoot((x) => x, 0, 1, 1e-9)).toBe(0);
  });

  it('is found whatever the curve, flat, steep or stepped, in a bounded number of looks', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1, max: 1, noNaN: true }),
        fc.constantFrom(1, 3, 9, 1 / 3, 0),
        fc.boolean(),
        (root, power, falls) => {
          let looks = 0;
          const curve = (x: number): number => {
            looks += 1;
            const size = power === 0 ? 1 : Math.abs(x - root) ** power;
            return (x < root ? -size : size) * (falls ? -1 : 1);
          };
          within(bracketRoot(curve, -1.5, 1.5, 1e-9), root, 1e-9, `power ${power}`);
          expect(looks).toBeLessThan(120);
        },
      ),
    );
  });
});

describe('a quartic', () => {
  const coefficient = fc.double({ min: -100, max: 100, noNaN: true });

  it('is found again from five of its points', () => {
    fc.assert(
      fc.property(fc.tuple(coefficient, coefficient, coefficient, coefficient, coefficient), (quartic) => {
        const values = [-1, -0.5, 0, 0.5, 1].map((u) => valueOfQuartic(quartic, u));
        quarticThrough(values).forEach((c, index) => within(c, quartic[index] ?? NaN, 1e-10, `c${index}`));
      }),
    );
    expect(() => quarticThrough([1, 2, 3, 4])).toThrow(RangeError);
  });

  it('has the slope of its own curve', () => {
    fc.assert(
      fc.property(
        fc.tuple(coefficient, coefficient, coefficient, coefficient, coefficient),
        fc.double({ min: -1.2, max: 1.2, noNaN: true }),
        (quartic, u) => {
          const rise = valueOfQuartic(quartic, u + 1e-5) - valueOfQuartic(quartic, u - 1e-5);
          within(slopeOfQuartic(quartic, u), rise / 2e-5, 1e-4, 'slope');
        },
      ),
    );
  });
});
