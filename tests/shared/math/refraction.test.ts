import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dipOfHorizonDeg, dipOfSunriseDeg } from '../../../shared/math/dip';
import { bennettArcmin, saemundssonArcmin, standardRefractionDeg } from '../../../shared/math/refraction';
import dips from '../../reference/dip.json';
import refractions from '../../reference/refraction.json';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

describe('refraction', () => {
  it('agrees with the published rows of both formulas', () => {
    eachRow(refractions, 8, (row, where) => {
      within(bennettArcmin(row.altitudeDeg), row.bennettArcmin, refractions.tolerance, where);
      within(saemundssonArcmin(row.altitudeDeg), row.saemundssonArcmin, refractions.tolerance, where);
    });
  });

  it('has the two formulas agree to 0.1 minute: what one takes from true to apparent the other takes back', () => {
    // "consistent to 0.1′": an encyclopaedia, "Atmospheric refraction".
    fc.assert(
      fc.property(fc.double({ min: 0, max: 90, noNaN: true }), (apparentDeg) => {
        const trueDeg = Math.max(-1, apparentDeg - bennettArcmin(apparentDeg) / 60);
        expect(Math.abs(saemundssonArcmin(trueDeg) - bennettArcmin(apparentDeg))).toBeLessThan(0.11);
      }),
    );
  });

  it('is 34 minutes on the horizon and the definition of sunrise for a limb there', () => {
    expect(standardRefractionDeg(0) * 60).toBeCloseTo(34, 12);
    expect(0 - standardRefractionDeg(0) - 16 / 60).toBeCloseTo(-50 / 60, 12);
  });

  it('is continuous and shrinks with altitude, from far below the level to the zenith', () => {
    fc.assert(
      fc.property(fc.double({ min: -90, max: 89.99, noNaN: true }), (altitudeDeg) => {
        const here = standardRefractionDeg(altitudeDeg);
        const above = standardRefractionDeg(altitudeDeg + 0.01);
        expect(above).toBeLessThanOrEqual(here);
        expect(here - above).toBeLessThan(0.003);
        expect(above).toBeGreaterThanOrEqual(0);
      }),
    );
  });

  it('refuses altitudes that the formulas are not made for', () => {
    for (const bad of [-1.01, 90.01, NaN]) {
      expect(() => bennettArcmin(bad)).toThrow(RangeError);
      expect(() => saemundssonArcmin(bad)).toThrow(RangeError);
    }
  });
});

describe('dip', () => {
  it('agrees with the published rows', () => {
    eachRow(dips, 6, (row, where) => {
      within(dipOfHorizonDeg(row.eyeHeightM) * 60, row.horizonArcmin, dips.tolerance, where);
      within(dipOfSunriseDeg(row.eyeHeightM) * 60, row.sunriseArcmin, dips.tolerance, where);
    });
  });

  it('lies under the dip that an airless earth would show, which the air lifts by a twelfth', () => {
    eachRow(dips, 6, (row, where) => {
      const share = (dipOfHorizonDeg(row.eyeHeightM) * 60) / row.geometricArcmin;
      within(share, 1 - 1 / 12, 0.01, where);
    });
  });

  it('is nothing at the horizon itself and refuses a height below it', () => {
    expect(dipOfHorizonDeg(0)).toBe(0);
    expect(dipOfSunriseDeg(0)).toBe(0);
    for (const bad of [-1, NaN, Infinity]) expect(() => dipOfSunriseDeg(bad)).toThrow(RangeError);
  });
});
