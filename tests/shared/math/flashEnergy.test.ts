import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  beamCandelaSeconds,
  beamOfGuideNumber,
  coneReflectorFactor,
  guideNumberOfBeam,
  guideNumberOfEnergy,
  lightOutputLmS,
} from '../../../shared/math/flashEnergy';
import { guideNumberFeet } from '../../../shared/math/guideNumber';
import beams from '../../reference/beam-guide-number.json';
import energies from '../../reference/energy-guide-number.json';
import feet from '../../reference/feet-constants.json';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const energyWs = fc.double({ min: 1e-3, max: 1e6, noNaN: true });
const efficacyLmSPerWs = fc.double({ min: 0.1, max: 500, noNaN: true });

describe('from light to guide number', () => {
  it('gives the published beams', () => {
    eachRow(beams, 8, ({ beamCdS, incidentC, guideNumberM }, where) => {
      within(guideNumberOfBeam(beamCdS, incidentC), guideNumberM, beams.tolerance, where);
      within(beamOfGuideNumber(guideNumberM, incidentC) / beamCdS, 1, 6e-5, where);
    });
  });

  it('gives the constants of the formulas in feet', () => {
    eachRow(feet, 4, ({ incidentC, k }, where) => {
      // GN_ft² = k·B·S at B = 1 cd·s and ISO 1.
      const guideNumber = guideNumberFeet(guideNumberOfBeam(1, incidentC, 1));
      within(guideNumber ** 2, k, feet.tolerance, where);
    });
    within(guideNumberFeet(guideNumberOfBeam(10_000)), 207.5, 0.006, '10,000 cd·s in feet');
  });

  it('gives the published energies, bare and in a hemisphere', () => {
    eachRow(energies, 6, (row, where) => {
      const flash = { energyWs: row.energyWs, efficacyLmSPerWs: row.efficacyLmSPerWs };
      const light = lightOutputLmS(row.energyWs, row.efficacyLmSPerWs);
      within(light, row.lightLmS, 1e-9, where);
      within(beamCandelaSeconds(light, 1), row.isotropicCdS, 0.06, where);
      within(guideNumberOfEnergy({ ...flash, reflectorFactor: 1 }), row.bareM, energies.tolerance, where);
      const half = { ...flash, reflectorFactor: coneReflectorFactor(90) };
      within(guideNumberOfEnergy(half), row.hemisphereM, energies.tolerance, where);
    });
  });

  it('goes back from guide number to beam', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 1e4, noNaN: true }),
        fc.double({ min: 10, max: 5000, noNaN: true }),
        fc.double({ min: 1, max: 1e7, noNaN: true }),
        (gn, c, iso) => {
          expect(guideNumberOfBeam(beamOfGuideNumber(gn, c, iso), c, iso) / gn).toBeCloseTo(1, 12);
        },
      ),
    );
  });

  it('takes four times the energy for twice the guide number', () => {
    fc.assert(
      fc.property(energyWs, efficacyLmSPerWs, (energy, efficacy) => {
        const of = (ws: number) =>
          guideNumberOfEnergy({ energyWs: ws, efficacyLmSPerWs: efficacy, reflectorFactor: 1 });
        expect(of(4 * energy) / of(energy)).toBeCloseTo(2, 12);
      }),
    );
  });

  it('spreads the same light: intensity over a cone adds up to all of it', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 180, noNaN: true }), (halfAngleDeg) => {
        const solidAngle = 2 * Math.PI * (1 - Math.cos((halfAngleDeg * Math.PI) / 180));
        expect(beamCandelaSeconds(1000, coneReflectorFactor(halfAngleDeg)) * solidAngle).toBeCloseTo(1000, 4);
      }),
    );
    expect(coneReflectorFactor(180)).toBe(1);
  });

  it('refuses numbers outside the domain by name', () => {
    for (const bad of [0, -1, NaN, Infinity]) {
      expect(() => lightOutputLmS(bad, 40)).toThrow(/energyWs/);
      expect(() => lightOutputLmS(400, bad)).toThrow(/efficacy/);
      expect(() => beamCandelaSeconds(1, bad)).toThrow(/reflectorFactor/);
      expect(() => guideNumberOfBeam(bad)).toThrow(/beamCdS/);
      expect(() => guideNumberOfBeam(1, bad)).toThrow(/incidentC/);
    }
    expect(() => coneReflectorFactor(181)).toThrow(/halfAngleDeg/);
  });
});
