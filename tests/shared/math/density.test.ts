import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  densityOfStops,
  factorOfStops,
  stackedStops,
  stopsOfDensity,
  stopsOfFactor,
  stopsOfPolarisers,
  stopsOfTransmittance,
  transmittanceOfStops,
} from '../../../shared/math/density';
import times from '../../reference/density-times.json';
import densities from '../../reference/density.json';
import polarisers from '../../reference/polarisers.json';
import { eachRow } from '../../support/eachRow';

const stops = fc.double({ min: 0, max: 900, noNaN: true });

describe('neutral density', () => {
  it('gives stops and factors of the labels in use', () => {
    eachRow(densities, 19, (row, where) => {
      if (row.density !== null) {
        expect(Math.abs(stopsOfDensity(row.density) - row.stops), where).toBeLessThanOrEqual(
          densities.tolerance,
        );
        expect(factorOfStops(stopsOfDensity(row.density)) / row.factor, where).toBeCloseTo(1, 4);
        expect(densityOfStops(row.stops), where).toBeCloseTo(row.density, 4);
      }
      expect(stopsOfFactor(row.factor), where).toBeCloseTo(row.stops, 3);
    });
  });

  it('makes density 3.0 a thousandfold, which is not ten stops', () => {
    expect(stopsOfDensity(3)).toBeCloseTo(9.965784284662087, 12);
    expect(stopsOfFactor(1024)).toBe(10);
  });

  it('lengthens exposures as the handbook works them', () => {
    eachRow(times, 4, (row, where) => {
      const taken = row.stops ?? stopsOfDensity(row.density ?? NaN);
      expect((row.shutterS * factorOfStops(taken)) / row.filteredS, where).toBeCloseTo(1, 9);
    });
  });

  it('gives what crossed polarisers take by the law of Malus', () => {
    eachRow(polarisers, 3, (row, where) =>
      expect(Math.abs(stopsOfPolarisers(row.angleDeg) - row.stops), where).toBeLessThanOrEqual(
        polarisers.tolerance,
      ),
    );
    expect(stopsOfPolarisers(0)).toBe(0);
  });

  it('takes more the further polarisers are turned', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 89, noNaN: true }), (angle) => {
        expect(stopsOfPolarisers(angle)).toBeGreaterThanOrEqual(stopsOfPolarisers(angle / 2));
        expect(2 ** -stopsOfPolarisers(angle)).toBeCloseTo(Math.cos((angle * Math.PI) / 180) ** 2, 12);
      }),
    );
  });

  it('goes there and back in every unit, and never leaves the numbers', () => {
    fc.assert(
      fc.property(stops, (s) => {
        const close = (value: number) => expect(Math.abs(value - s)).toBeLessThan(1e-9);
        close(stopsOfDensity(densityOfStops(s)));
        close(stopsOfFactor(factorOfStops(s)));
        close(stopsOfTransmittance(transmittanceOfStops(s)));
        expect(factorOfStops(s) * transmittanceOfStops(s)).toBeCloseTo(1, 12);
        for (const value of [densityOfStops(s), factorOfStops(s)]) expect(Number.isFinite(value)).toBe(true);
      }),
    );
  });

  it('adds stops of a stack where factors multiply and densities add', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: 0, max: 20, noNaN: true }), { maxLength: 10 }), (stack) => {
        const product = stack.reduce((factor, one) => factor * factorOfStops(one), 1);
        const sum = stack.reduce((density, one) => density + densityOfStops(one), 0);
        expect(Math.abs(stackedStops(stack) - stopsOfFactor(product))).toBeLessThan(1e-9);
        expect(Math.abs(stackedStops(stack) - stopsOfDensity(sum))).toBeLessThan(1e-9);
      }),
    );
    expect(stackedStops([])).toBe(0);
  });

  it('takes nothing for a clear filter, without a minus sign', () => {
    expect(stopsOfTransmittance(1)).toBe(0);
    expect(stopsOfPolarisers(0)).toBe(0);
    expect(stopsOfFactor(1)).toBe(0);
  });

  it('refuses filters that would add light, and angles where nothing passes', () => {
    for (const fault of [
      () => stopsOfDensity(-0.1),
      () => stopsOfFactor(0.5),
      () => stopsOfTransmittance(1.01),
      () => stopsOfTransmittance(0),
      () => stopsOfPolarisers(90),
      () => factorOfStops(NaN),
      () => stackedStops([600, 600]),
    ]) {
      expect(fault).toThrow(RangeError);
    }
  });
});
