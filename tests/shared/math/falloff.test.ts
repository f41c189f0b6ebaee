import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { distancesBetween, evenZone, falloffStops } from '../../../shared/math/falloff';
import { inverseSquareStops } from '../../../shared/math/guideNumber';
import disc from '../../reference/disc-source.json';
import inverseSquare from '../../reference/inverse-square.json';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const distance = fc.double({ min: 0.01, max: 10_000, noNaN: true });
const diameter = fc.double({ min: 0, max: 10, noNaN: true });
const tolerance = fc.double({ min: 0, max: 10, noNaN: true });

describe('falloff', () => {
  it('gives the published rows of the inverse square', () => {
    eachRow(inverseSquare, 5, ({ distanceRatio, darkerStops }, where) =>
      within(-falloffStops(distanceRatio, 1), darkerStops, inverseSquare.tolerance, where),
    );
  });

  it('gives the published departure of a disc from the inverse square', () => {
    eachRow(disc, 4, ({ distanceOverDiameter, belowFarFieldStops }, where) => {
      // Against a reference so far away that the disc is a point there.
      const fromFar = falloffStops(distanceOverDiameter, 1e8, 1) - falloffStops(distanceOverDiameter, 1e8);
      within(fromFar, belowFarFieldStops, disc.tolerance, where);
    });
  });

  it('of a disc agrees with adding up the light of its rings', () => {
    // A ring of radius r on a Lambertian disc gives dE = 2πL·d²·r·dr/(r² + d²)², on the axis.
    const illuminance = (d: number, radius: number) => {
      const n = 20_000;
      let sum = 0;
      for (let i = 0; i < n; i++) {
        const r = ((i + 0.5) * radius) / n;
        sum += (2 * Math.PI * d * d * r) / (r * r + d * d) ** 2;
      }
      return (sum * radius) / n;
    };
    for (const [d, ref, size] of [
      [0.5, 2, 1.2],
      [3, 1, 1.5],
      [1, 1.5, 0.3],
    ] as const)
      within(
        falloffStops(d, ref, size),
        Math.log2(illuminance(d, size / 2) / illuminance(ref, size / 2)),
        1e-6,
        `${d}`,
      );
  });

  it('is the plain inverse square for a small source', () => {
    fc.assert(
      fc.property(distance, distance, (d, ref) => {
        expect(falloffStops(d, ref)).toBeCloseTo(inverseSquareStops(ref, d), 9);
      }),
    );
  });

  it('is gentler for a larger source, and always darker further away', () => {
    fc.assert(
      fc.property(distance, distance, diameter, (d, ref, size) => {
        const small = falloffStops(d, ref);
        const large = falloffStops(d, ref, size);
        expect(Math.abs(large)).toBeLessThanOrEqual(Math.abs(small) + 1e-12);
        expect(falloffStops(d * 1.01, ref, size)).toBeLessThan(large + 1e-12);
      }),
    );
  });
});

describe('the zone of even light', () => {
  it('ends where the light is off by the tolerance', () => {
    fc.assert(
      fc.property(distance, tolerance, diameter, (ref, allowed, size) => {
        const zone = evenZone(ref, allowed, size);
        expect(falloffStops(zone.farM, ref, size)).toBeCloseTo(-allowed, 6);
        if (zone.nearM > 0) expect(falloffStops(zone.nearM, ref, size)).toBeCloseTo(allowed, 6);
        else expect(falloffStops(1e-9, ref, size)).toBeLessThanOrEqual(allowed);
        expect(zone.depthM).toBeGreaterThanOrEqual(0);
        expect(zone.nearM).toBeLessThanOrEqual(ref * (1 + 1e-12));
        expect(zone.farM).toBeGreaterThanOrEqual(ref * (1 - 1e-12));
      }),
    );
  });

  it('is deeper from further away: ten times the distance, ten times the depth', () => {
    fc.assert(
      fc.property(distance, tolerance, (ref, allowed) => {
        const near = evenZone(ref, allowed);
        const far = evenZone(ref * 10, allowed);
        expect(Math.abs(far.depthM - 10 * near.depthM)).toBeLessThanOrEqual(1e-9 * far.farM);
      }),
    );
  });

  it('is half a stop each way from 1.68 m to 2.38 m at 2 m, by hand', () => {
    // 2·2^(−1/4) = 1.6818 and 2·2^(1/4) = 2.3784.
    const zone = evenZone(2, 0.5);
    within(zone.nearM, 1.6818, 5e-5, 'near');
    within(zone.farM, 2.3784, 5e-5, 'far');
    within(zone.depthM, 0.6966, 5e-5, 'depth');
  });

  it('reaches to the light itself where even its surface is within the tolerance', () => {
    // At the disc E = πL; at 0.5 m of a 2 m disc it is 1/(1 + 0.25) of that, a third of a stop less.
    expect(evenZone(0.5, 0.5, 2).nearM).toBe(0);
  });
});

describe('distances in equal steps', () => {
  it('start and end where asked and rise evenly', () => {
    fc.assert(
      fc.property(distance, distance, fc.integer({ min: 1, max: 200 }), (a, b, steps) => {
        const [near, far] = [Math.min(a, b), Math.max(a, b)];
        const list = distancesBetween(near, far, steps);
        expect(list.length).toBe(steps + 1);
        expect(list[0]).toBe(near);
        expect(list[steps]).toBeCloseTo(far, 9);
        list.slice(1).forEach((d, i) => expect(d).toBeGreaterThanOrEqual(list[i] ?? NaN));
      }),
    );
    expect(distancesBetween(1, 3, 4)).toEqual([1, 1.5, 2, 2.5, 3]);
  });

  it('refuse what makes no list', () => {
    expect(() => distancesBetween(3, 1, 4)).toThrow(RangeError);
    expect(() => distancesBetween(1, 3, 0)).toThrow(RangeError);
    expect(() => distancesBetween(1, 3, 1.5)).toThrow(RangeError);
    expect(() => falloffStops(0, 1)).toThrow(/distanceM/);
    expect(() => evenZone(1, -1)).toThrow(/toleranceStops/);
  });
});
