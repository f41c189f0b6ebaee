import { describe, expect, it } from 'vitest';
import { exposureHandheld } from '../../../shared/calculators/exposure/handheld';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';

describe('exposure/handheld', () => {
  it('names a mark that is never slower than the rule', () => {
    for (const scale of ['full', 'half', 'third']) {
      for (const focalLengthMm of [8, 24, 50, 64, 85, 135, 400]) {
        const { slowestShutter } = askCalculator(exposureHandheld, { focalLengthMm, scale }).result;
        expect(slowestShutter.exact).toBeCloseTo(1 / focalLengthMm, 12);
        expect(slowestShutter.residualStops, `${focalLengthMm} mm, ${scale}`).toBeLessThanOrEqual(1e-9);
      }
    }
  });

  it('says nothing of blur without a shutter', () => {
    expect(Object.keys(askCalculator(exposureHandheld, { focalLengthMm: 50 }).result)).toEqual([
      'slowestShutter',
    ]);
  });

  it('takes a time on the limit as within it', () => {
    const at = (shutter: number) =>
      askCalculator(exposureHandheld, { focalLengthMm: 64, shutter, readAs: 'exact' }).result;
    expect(at(1 / 64)).toMatchObject({ withinLimit: true, stopsOver: 0 });
    expect(at(1 / 63).withinLimit).toBe(false);
    // On the limit the blur is the circle that the rule assumes, 0.030 mm.
    expect(at(1 / 64).blurUm).toBeCloseTo(30, 9);
  });

  it('judges the mark 1/60 as the 1/64 s behind it, and as 1/60 s where asked to', () => {
    const input = { focalLengthMm: 60, shutter: '1/60' };
    expect(askCalculator(exposureHandheld, input).result.stopsOver).toBeCloseTo(Math.log2(60 / 64), 12);
    expect(askCalculator(exposureHandheld, { ...input, readAs: 'exact' }).result.stopsOver).toBeCloseTo(
      0,
      12,
    );
  });

  it('doubts a stabiliser only where one is counted', () => {
    const notes = (stabilisationStops: number) =>
      codesOf(askCalculator(exposureHandheld, { focalLengthMm: 50, stabilisationStops }).notes);
    expect(notes(0)).toEqual(['handheld_rule_of_thumb']);
    expect(notes(4)).toEqual(['handheld_rule_of_thumb', 'stabilisation_as_claimed']);
  });

  it('tells every fault at once', () => {
    const faults = faultsIn(exposureHandheld, { focalLengthMm: 0, cropFactor: 'big', shutter: 'fast' });
    expect(placesOf(faults)).toEqual([
      '/focalLengthMm out_of_range',
      '/cropFactor wrong_type',
      '/shutter not_a_setting',
    ]);
  });
});
