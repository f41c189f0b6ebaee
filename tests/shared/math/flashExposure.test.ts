import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  flashRemedies,
  flashStops,
  reachOf,
  solveFlash,
  type FlashSetup,
  type FlashUnknown,
} from '../../../shared/math/flashExposure';
import { addGuideNumbers, guideNumberFeet, scaleGuideNumber } from '../../../shared/math/guideNumber';
import byAperture from '../../reference/guide-number-aperture.json';
import published from '../../reference/guide-number-published.json';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const UNKNOWNS: FlashUnknown[] = ['guideNumberM', 'distanceM', 'aperture', 'iso', 'power'];

/** Numbers spread evenly over the ratios of a range, ends included: the API's ranges. */
const inRatio = (low: number, high: number) =>
  fc
    .double({ min: Math.log(low), max: Math.log(high), noNaN: true })
    .map((n) => Math.min(high, Math.max(low, Math.exp(n))));
const setups: fc.Arbitrary<FlashSetup> = fc.record({
  guideNumberM: inRatio(0.01, 10_000),
  distanceM: inRatio(0.01, 10_000),
  aperture: inRatio(0.5, 256),
  iso: inRatio(1, 1e7),
  power: inRatio(1e-6, 1),
});
const conditions = fc.record({
  count: fc.integer({ min: 1, max: 1000 }),
  lossStops: fc.double({ min: -60, max: 80, noNaN: true }),
});
const wishes = fc.double({ min: -60, max: 60, noNaN: true });

describe('how bright a flash makes a subject', () => {
  it('is a middle tone at f-number times distance', () => {
    eachRow(byAperture, 6, ({ guideNumberM, distanceM, aperture }, where) => {
      const setup = { guideNumberM, distanceM, aperture, iso: 100, power: 1 };
      within(flashStops(setup), 0, byAperture.tolerance, where);
      within(solveFlash('aperture', setup, 0), aperture, byAperture.tolerance, where);
    });
  });

  it('gives the printed examples, whatever the unit of length', () => {
    eachRow(published, 4, (row, where) => {
      const feet = guideNumberFeet(1);
      const [guideNumberM, distanceM] =
        row.unit === 'ft' ? [row.guideNumber / feet, row.distance / feet] : [row.guideNumber, row.distance];
      const setup = { guideNumberM, distanceM, aperture: 1, iso: 100, power: 1 };
      within(solveFlash('aperture', setup, 0), row.aperture, published.tolerance, where);
    });
  });

  it('is the same by the scaled guide number, a second way to the same figure', () => {
    fc.assert(
      fc.property(setups, conditions, (setup, given) => {
        const scaled = scaleGuideNumber(setup.guideNumberM, { iso: setup.iso, power: setup.power, ...given });
        const plain = 2 * Math.log2(scaled / (setup.aperture * setup.distanceM));
        expect(flashStops(setup, given)).toBeCloseTo(plain, 8);
      }),
    );
  });

  it('falls with distance and f-number and rises with everything else', () => {
    fc.assert(
      fc.property(setups, inRatio(1.001, 100), (setup, factor) => {
        for (const name of UNKNOWNS) {
          const more = flashStops({ ...setup, [name]: setup[name] * factor }) - flashStops(setup);
          const perDoubling = more / Math.log2(factor);
          const wanted = { guideNumberM: 2, distanceM: -2, aperture: -2, iso: 1, power: 1 }[name];
          expect(perDoubling).toBeCloseTo(wanted, 5);
        }
      }),
    );
  });

  it('is the same for two pops at half power as for one pop at full power', () => {
    fc.assert(
      fc.property(setups, (setup) => {
        const half = flashStops({ ...setup, power: setup.power / 2 }, { count: 2 });
        expect(half).toBeCloseTo(flashStops(setup), 9);
      }),
    );
  });

  it('is the same for n equal guns in a list as for a count of n', () => {
    fc.assert(
      fc.property(setups, fc.integer({ min: 1, max: 50 }), (setup, n) => {
        const guideNumberM = addGuideNumbers(Array<number>(n).fill(setup.guideNumberM));
        expect(flashStops({ ...setup, guideNumberM })).toBeCloseTo(flashStops(setup, { count: n }), 9);
      }),
    );
  });
});

describe('the missing quantity of a flash exposure', () => {
  it('put back gives the brightness wished for, whichever it is, over the whole range', () => {
    fc.assert(
      fc.property(setups, conditions, wishes, fc.constantFrom(...UNKNOWNS), (setup, given, wish, unknown) => {
        const value = solveFlash(unknown, setup, wish, given);
        expect(Number.isFinite(value) && value > 0).toBe(true);
        expect(flashStops({ ...setup, [unknown]: value }, given)).toBeCloseTo(wish, 8);
      }),
    );
  });

  it('is the value that was left out, where the wish is what that value gave', () => {
    fc.assert(
      fc.property(setups, conditions, fc.constantFrom(...UNKNOWNS), (setup, given, unknown) => {
        const value = solveFlash(unknown, setup, flashStops(setup, given), given);
        expect(value / setup[unknown]).toBeCloseTo(1, 9);
      }),
    );
  });

  it('ignores what stands in its own place', () => {
    const setup = { guideNumberM: 40, distanceM: 5, aperture: 8, iso: 100, power: 1 };
    expect(solveFlash('iso', { ...setup, iso: NaN }, 0)).toBe(solveFlash('iso', setup, 0));
  });

  it('is refused where the light would be beyond all numbers', () => {
    const setup = { guideNumberM: 40, distanceM: 5, aperture: 8, iso: 100, power: 1 };
    expect(() => solveFlash('iso', setup, 1000, { lossStops: 1000 })).toThrow(RangeError);
    expect(() => solveFlash('iso', { ...setup, power: 0 }, 0)).toThrow(/power/);
    expect(() => flashStops(setup, { count: 0 })).toThrow(/count/);
    expect(() => flashStops(setup, { lossStops: NaN })).toThrow(/lossStops/);
    expect(() => solveFlash('iso', setup, NaN)).toThrow(/brightnessStops/);
  });
});

describe('what helps a flash that falls short', () => {
  it('makes up for exactly what is missing, each by itself', () => {
    fc.assert(
      fc.property(setups, fc.double({ min: 0, max: 40, noNaN: true }), (setup, short) => {
        const help = flashRemedies(short);
        const before = flashStops(setup);
        const after = [
          flashStops({ ...setup, distanceM: setup.distanceM * help.distanceFactor }),
          flashStops(setup, { count: help.headsFactor }),
          flashStops({ ...setup, aperture: setup.aperture / help.apertureFactor }),
          flashStops({ ...setup, iso: setup.iso * help.isoFactor }),
          flashStops(setup, { lossStops: -help.lessLossStops }),
        ];
        for (const stops of after) expect(stops - before).toBeCloseTo(short, 8);
      }),
    );
  });

  it('is nothing where nothing is missing, and is refused where there is a reserve', () => {
    expect(flashRemedies(0)).toEqual({
      distanceFactor: 1,
      headsFactor: 1,
      apertureFactor: 1,
      isoFactor: 1,
      lessLossStops: 0,
    });
    expect(() => flashRemedies(-1)).toThrow(RangeError);
  });
});

describe('reach', () => {
  it('is full power with nothing short at 1, and counts stops on either side', () => {
    expect(reachOf(1)).toEqual({ withinPower: true, shortByStops: 0, reserveStops: 0 });
    expect(reachOf(1 / 8)).toEqual({ withinPower: true, shortByStops: 0, reserveStops: 3 });
    expect(reachOf(4)).toEqual({ withinPower: false, shortByStops: 2, reserveStops: -2 });
    // A rounding error over full power is full power.
    expect(reachOf(1 + 1e-12).withinPower).toBe(true);
    expect(() => reachOf(0)).toThrow(/power/);
  });
});
