import { describe, expect, it } from 'vitest';
import { lightConvert } from '../../../shared/calculators/light/convert';
import table from '../../reference/luminance-illuminance.json';
import { askCalculator, faultsIn, placesOf } from '../../support/askCalculator';
import { eachRow } from '../../support/eachRow';

const ask = (input: object) => askCalculator(lightConvert, input).result;

describe('light/convert', () => {
  it('gives the published table from any of its columns', () => {
    eachRow(table, 24, ({ ev100, luminanceK14, illuminanceC330 }, where) => {
      const constants = { reflectedK: 14, incidentC: 330 };
      for (const light of [{ ev100 }, { luminanceCdM2: luminanceK14 }, { illuminanceLux: illuminanceC330 }]) {
        const all = ask({ ...light, ...constants });
        expect(Math.abs(all.luminanceCdM2 / luminanceK14 - 1), where).toBeLessThanOrEqual(
          2 * table.tolerance,
        );
        expect(Math.abs(all.illuminanceLux / illuminanceC330 - 1), where).toBeLessThanOrEqual(
          2 * table.tolerance,
        );
        expect(all.ev100, where).toBeCloseTo(ev100, 4);
      }
    });
  });

  it('gives back what was given, to the last digit', () => {
    expect(ask({ luminanceCdM2: 0.1 }).luminanceCdM2).toBe(0.1);
    expect(ask({ illuminanceLux: 333 }).illuminanceLux).toBe(333);
    expect(ask({ ev100: -3.3 }).ev100).toBe(-3.3);
  });

  it('stays finite at every end of its ranges', () => {
    for (const light of [{ ev100: -30 }, { ev100: 40 }, { luminanceCdM2: 1e-9 }, { illuminanceLux: 1e10 }])
      for (const constants of [
        { reflectedK: 1, incidentC: 5000 },
        { reflectedK: 100, incidentC: 10 },
      ])
        for (const number of Object.values(ask({ ...light, ...constants })))
          expect(Number.isFinite(number)).toBe(true);
  });

  it('refuses darkness, which has no exposure value, and two lights at once', () => {
    expect(placesOf(faultsIn(lightConvert, { luminanceCdM2: 0 }))).toEqual(['/luminanceCdM2 out_of_range']);
    expect(placesOf(faultsIn(lightConvert, { ev100: 1, illuminanceLux: 5 }))).toEqual([
      '/illuminanceLux exactly',
    ]);
    expect(placesOf(faultsIn(lightConvert, {}))).toEqual(['/ev100 exactly']);
  });
});
