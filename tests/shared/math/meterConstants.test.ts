import { describe, expect, it } from 'vitest';
import {
  ev100OfIlluminance,
  ev100OfLuminance,
  illuminanceOfEv100,
  luminanceOfEv100,
} from '../../../shared/math/exposure';
import table from '../../reference/luminance-illuminance.json';
import constants from '../../reference/meter-constants.json';
import reflectances from '../../reference/meter-reflectance.json';
import { eachRow } from '../../support/eachRow';

describe('luminance and illuminance against EV at ISO 100', () => {
  it('gives every column of the table, and finds its way back', () => {
    eachRow(table, 24, (row, where) => {
      const alike = (value: number, wanted: number) =>
        expect(Math.abs(value / wanted - 1), where).toBeLessThanOrEqual(table.tolerance);
      alike(luminanceOfEv100(row.ev100, 12.5), row.luminanceK12p5);
      alike(luminanceOfEv100(row.ev100, 14), row.luminanceK14);
      alike(illuminanceOfEv100(row.ev100, 250), row.illuminanceC250);
      alike(illuminanceOfEv100(row.ev100, 330), row.illuminanceC330);
      alike(illuminanceOfEv100(row.ev100, 340), row.illuminanceC340);
      expect(ev100OfLuminance(row.luminanceK14, 14), where).toBeCloseTo(row.ev100, 4);
      expect(ev100OfIlluminance(row.illuminanceC330, 330), where).toBeCloseTo(row.ev100, 4);
    });
  });

  it('differs between meter constants by the stops that the handbook gives', () => {
    eachRow(constants, 5, (row, where) => {
      const ev100 = (constant: number) =>
        row.constant === 'k' ? ev100OfLuminance(100, constant) : ev100OfIlluminance(100, constant);
      const tolerance = Math.max(constants.tolerance, row.stops > 1 ? 0.005 : 0);
      expect(Math.abs(ev100(row.low) - ev100(row.high) - row.stops), where).toBeLessThanOrEqual(tolerance);
    });
  });

  it('implies the reflectance of a matt surface that both ways of metering agree on', () => {
    eachRow(reflectances, 6, (row, where) => {
      const reflectance = (Math.PI * luminanceOfEv100(7, row.k)) / illuminanceOfEv100(7, row.c);
      expect(Math.abs(reflectance - row.reflectance), where).toBeLessThanOrEqual(reflectances.tolerance);
    });
  });
});
