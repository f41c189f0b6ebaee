import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addGuideNumbers,
  closeUpLossStops,
  guideNumberFeet,
  inverseSquareStops,
  scaleGuideNumber,
} from '../../../shared/math/guideNumber';
import addingGuns from '../../reference/adding-guns.json';
import closeUp from '../../reference/close-up.json';
import byIso from '../../reference/guide-number-iso.json';
import byPower from '../../reference/guide-number-power.json';
import inverseSquare from '../../reference/inverse-square.json';
import pops from '../../reference/pops.json';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const guideNumber = fc.double({ min: 0.1, max: 10_000, noNaN: true });
const distance = fc.double({ min: 0.01, max: 10_000, noNaN: true });

describe('the guide number', () => {
  it('gives the published speeds', () => {
    eachRow(byIso, 8, ({ guideNumberM, iso, scaledM }, where) =>
      within(scaleGuideNumber(guideNumberM, { iso }), scaledM, byIso.tolerance, where),
    );
  });

  it('gives the published powers', () => {
    eachRow(byPower, 10, ({ guideNumberM, powerStops, scaledM }, where) =>
      within(scaleGuideNumber(guideNumberM, { power: 2 ** powerStops }), scaledM, byPower.tolerance, where),
    );
  });

  it('is converted to feet by the international foot', () => {
    // GN 40 m is 131.23 ft and 5 m are 16.404 ft, computed with CPython doubles (project handbook, section 5.1).
    within(guideNumberFeet(40), 131.23, 0.006, 'GN 40 m');
    within(guideNumberFeet(5), 16.404, 0.0006, '5 m');
  });

  it('doubles with two stops of speed and is taken back by two stops of loss', () => {
    fc.assert(
      fc.property(guideNumber, fc.double({ min: 0, max: 40, noNaN: true }), (gn, loss) => {
        expect(scaleGuideNumber(gn, { iso: 100 * 2 ** loss, lossStops: loss }) / gn).toBeCloseTo(1, 12);
      }),
    );
  });

  it('is the same for two pops at half power as for one at full power', () => {
    fc.assert(
      fc.property(guideNumber, (gn) => {
        expect(scaleGuideNumber(gn, { power: 0.5, count: 2 })).toBe(scaleGuideNumber(gn, {}));
      }),
    );
  });
});

describe('adding guns', () => {
  it('takes the root of the sum of squares', () => {
    eachRow(addingGuns, 4, ({ first, second, together }, where) =>
      within(addGuideNumbers([first, second]), together, addingGuns.tolerance, where),
    );
  });

  it('gives the published rows for several pops, as equal guns and as a count', () => {
    eachRow(pops, 8, (row, where) => {
      within(addGuideNumbers(Array(row.pops).fill(8)), row.aperture, pops.tolerance, where);
      within(scaleGuideNumber(8, { count: row.pops }), row.aperture, pops.tolerance, where);
      within(2 * Math.log2(row.aperture / 8), row.stops, pops.tolerance, where);
    });
  });

  it('does not depend on order or grouping, and never falls below the strongest', () => {
    const guns = fc.array(guideNumber, { minLength: 2, maxLength: 10 });
    fc.assert(
      fc.property(guns, (list) => {
        const all = addGuideNumbers(list);
        const [first, ...rest] = list as [number, ...number[]];
        expect(addGuideNumbers([...list].reverse()) / all).toBeCloseTo(1, 12);
        expect(addGuideNumbers([first, addGuideNumbers(rest)]) / all).toBeCloseTo(1, 12);
        expect(all).toBeGreaterThanOrEqual(Math.max(...list) * (1 - 1e-15));
      }),
    );
  });

  it('is not the circulating shortcut, which is right for equal guns only', () => {
    const shortcut = (a: number, b: number) => (a + b) / Math.SQRT2;
    expect(shortcut(22, 22)).toBeCloseTo(addGuideNumbers([22, 22]), 12);
    // A dictionary prints 41.4 for 22 and 36 (with 1.4 for the root of 2); the squares give 42.19.
    expect((22 + 36) / 1.4).toBeCloseTo(41.4, 1);
    expect(shortcut(22, 36)).toBeLessThan(41.1);
    expect(addGuideNumbers([22, 36])).toBeGreaterThan(42.1);
  });

  it('refuses an empty list', () => {
    expect(() => addGuideNumbers([])).toThrow(RangeError);
  });
});

describe('distance and extension', () => {
  it('follows the inverse square', () => {
    eachRow(inverseSquare, 5, ({ distanceRatio, darkerStops }, where) =>
      within(-inverseSquareStops(1, distanceRatio), darkerStops, inverseSquare.tolerance, where),
    );
  });

  it('goes back and forth, and adds along a way', () => {
    fc.assert(
      fc.property(distance, distance, distance, (a, b, c) => {
        expect(inverseSquareStops(a, b) + inverseSquareStops(b, a)).toBeCloseTo(0, 9);
        expect(inverseSquareStops(a, b) + inverseSquareStops(b, c)).toBeCloseTo(inverseSquareStops(a, c), 9);
      }),
    );
  });

  it('takes light in close-ups', () => {
    eachRow(closeUp, 3, ({ magnification, lossStops }, where) =>
      within(closeUpLossStops(magnification), lossStops, closeUp.tolerance, where),
    );
  });
});

describe('numbers outside the domain', () => {
  it('are refused by name and never become NaN', () => {
    for (const bad of [0, -1, NaN, Infinity]) {
      expect(() => scaleGuideNumber(bad, {})).toThrow(/guideNumberM/);
      expect(() => scaleGuideNumber(40, { iso: bad })).toThrow(/iso/);
      expect(() => scaleGuideNumber(40, { power: bad })).toThrow(/power/);
      expect(() => addGuideNumbers([40, bad])).toThrow(/guideNumberM/);
      expect(() => inverseSquareStops(bad, 1)).toThrow(/fromM/);
      expect(() => guideNumberFeet(bad)).toThrow(RangeError);
    }
    expect(() => closeUpLossStops(-0.1)).toThrow(/magnification/);
  });
});
