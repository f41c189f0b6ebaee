import { describe, expect, it } from 'vitest';
import { flashExposure } from '../../../shared/calculators/flash/exposure';
import { flashMeasured } from '../../../shared/calculators/flash/measured';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';
import { isFiniteThroughout } from '../../support/closeTo';

const frame = { aperture: 'f/8', iso: 100, distanceM: 3, power: 1, resultStops: 0 };
const ask = (body: unknown) => askCalculator(flashMeasured, body);

describe('flash/measured', () => {
  it('hands a guide number on that gives the same frame again', () => {
    const dusk = {
      aperture: 'f/5.6',
      iso: 200,
      distanceM: 2,
      power: '1/8',
      resultStops: 0.5,
      ambientStops: -2,
    };
    const { guideNumberM, flashStops } = ask(dusk).result;
    // By hand: 2^0.5 − 2^−2 = 1.1642, log2 is 0.2194; GN = 4√2·2·√(1.1642·8/2) = 24.41.
    expect(flashStops).toBeCloseTo(0.2194, 4);
    expect(guideNumberM).toBeCloseTo(24.41, 2);
    const again = { guideNumberM, distanceM: 2, aperture: 'f/5.6', iso: 200, brightnessStops: flashStops };
    expect(askCalculator(flashExposure, again).result.power.exact).toBeCloseTo(1 / 8, 9);
  });

  it('reads the filter as light that the flash had to make up for', () => {
    expect(ask({ ...frame, ndStops: 2 }).result.guideNumberM).toBeCloseTo(48, 9);
  });

  it('says what it took for granted', () => {
    expect(codesOf(ask(frame).notes)).toEqual(['ambient_taken_as_none']);
    expect(codesOf(ask({ ...frame, ambientStops: -8 }).notes)).toEqual([]);
    expect(codesOf(ask({ ...frame, ambientStops: -8, shutter: '1/125' }).notes)).toEqual([
      'shutter_plays_no_part',
    ]);
  });

  it('warns where ambient light carries the frame, with the growth of errors', () => {
    const { result, notes } = ask({ ...frame, ambientStops: -0.5 });
    // Ambient is 2^−0.5 = 70.7 % of the light; 1/(1 − 0.7071) = 3.41.
    expect(result.ambientShare).toBeCloseTo(0.7071, 4);
    expect(result.errorFactor).toBeCloseTo(3.414, 3);
    expect(notes[0]?.message).toMatch(/71 %.*3\.4 times/);
  });

  it('refuses a frame that the ambient light explains', () => {
    for (const ambientStops of [0, 1, -1e-7])
      expect(placesOf(faultsIn(flashMeasured, { ...frame, ambientStops }))).toEqual([
        '/ambientStops ambient_explains_result',
      ]);
  });

  it('stays finite at the corners of its ranges', () => {
    for (const aperture of [0.5, 256])
      for (const iso of [1, 1e7])
        for (const distanceM of [0.01, 10_000])
          for (const power of [1.0001e-9, 1])
            for (const [resultStops, ambientStops] of [
              [60, -60],
              [-60, undefined],
              [0, -1e-5],
            ] as const) {
              const answer = ask({ aperture, iso, distanceM, power, resultStops, ambientStops, ndStops: 40 });
              expect(isFiniteThroughout(answer)).toBe(true);
              expect(answer.result.guideNumberM).toBeGreaterThan(0);
            }
  });
});
