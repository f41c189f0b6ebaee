import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { flashStops } from '../../../shared/math/flashExposure';
import { measureFlash } from '../../../shared/math/flashMeasured';
import { addStops } from '../../../shared/math/mixing';
import needed from '../../reference/mixing-needed.json';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const camera = fc.record({
  distanceM: fc.double({ min: 0.01, max: 10_000, noNaN: true }),
  aperture: fc.double({ min: 0.5, max: 256, noNaN: true }),
  iso: fc.double({ min: 1, max: 1e7, noNaN: true }),
  power: fc.double({ min: 1e-6, max: 1, noNaN: true }),
});

describe('a flash measured by a test frame', () => {
  it('gives back the guide number that lit the frame, through ambient light and filter', () => {
    fc.assert(
      fc.property(
        camera,
        fc.double({ min: 0.1, max: 1000, noNaN: true }),
        fc.double({ min: -20, max: 10, noNaN: true }),
        fc.double({ min: 0, max: 10, noNaN: true }),
        (setup, guideNumberM, ambientOverFlash, ndStops) => {
          const flash = flashStops({ ...setup, guideNumberM }, { lossStops: ndStops });
          const ambientStops = flash + ambientOverFlash;
          const resultStops = addStops([flash, ambientStops]);
          const measured = measureFlash({ ...setup, ndStops, ambientStops, resultStops });
          expect((measured?.guideNumberM ?? NaN) / guideNumberM).toBeCloseTo(1, 6);
          expect(measured?.ambientShare).toBeCloseTo(2 ** (ambientStops - resultStops), 6);
        },
      ),
    );
  });

  it('without ambient light is the plain guide number of the settings', () => {
    // f/8 at 3 m and full power, a middle tone: 24.
    const frame = { distanceM: 3, aperture: 8, iso: 100, power: 1 };
    expect(measureFlash({ ...frame, resultStops: 0 })).toEqual({
      guideNumberM: 24,
      flashStops: 0,
      ambientShare: 0,
      errorFactor: 1,
    });
    // A stop brighter at a quarter power: three stops more, 24·2^1.5.
    const brighter = measureFlash({ ...frame, resultStops: 1, power: 0.25 });
    within(brighter?.guideNumberM ?? NaN, 67.882, 0.0006, 'quarter power');
  });

  it('takes the published part of the ambient light away', () => {
    eachRow(needed, 7, (row, where) => {
      const frame = { distanceM: 1, aperture: 1, iso: 100, power: 1, resultStops: 0 };
      const measured = measureFlash({ ...frame, ambientStops: -row.belowStops });
      within(measured?.flashStops ?? NaN, row.flashStops, needed.tolerance, where);
    });
  });

  it('is nothing where ambient light alone explains the frame', () => {
    const frame = { distanceM: 1, aperture: 1, iso: 100, power: 1, resultStops: -1 };
    expect(measureFlash({ ...frame, ambientStops: -1 })).toBeNull();
    expect(measureFlash({ ...frame, ambientStops: 2 })).toBeNull();
  });

  it('says how much an error of the reading grows: the slope of the answer, found by trying', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -3, max: 3, noNaN: true }),
        fc.double({ min: 0.3, max: 8, noNaN: true }),
        (resultStops, below) => {
          const of = (by: number) =>
            measureFlash({
              distanceM: 1,
              aperture: 1,
              iso: 100,
              power: 1,
              resultStops: resultStops + by,
              ambientStops: resultStops - below,
            });
          const slope = ((of(1e-5)?.flashStops ?? NaN) - (of(-1e-5)?.flashStops ?? NaN)) / 2e-5;
          expect((of(0)?.errorFactor ?? NaN) / slope).toBeCloseTo(1, 5);
        },
      ),
    );
  });

  it('stays finite when next to nothing is left for the flash', () => {
    const frame = { distanceM: 1, aperture: 1, iso: 100, power: 1, ambientStops: 0 };
    const measured = measureFlash({ ...frame, resultStops: 1e-15 });
    expect(Number.isFinite(measured?.guideNumberM)).toBe(true);
    expect(Number.isFinite(measured?.errorFactor)).toBe(true);
  });
});
