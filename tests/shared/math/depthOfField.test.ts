import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  airyDiscUm,
  blurDiscUm,
  circleOfConfusionUm,
  depthLimits,
  hyperfocalM,
  type Focus,
} from '../../../shared/math/depthOfField';
import blurs from '../../reference/blur-disc.json';
import circles from '../../reference/circle-of-confusion.json';
import depths from '../../reference/depth-of-field.json';
import diffraction from '../../reference/diffraction.json';
import { eachRow } from '../../support/eachRow';

/** The whole range that the API allows, wherever the lens can focus there. */
const focus = fc
  .record({
    focalLengthMm: fc.double({ min: 1, max: 3000, noNaN: true }),
    aperture: fc.double({ min: 0.5, max: 256, noNaN: true }),
    distanceM: fc.double({ min: 0.01, max: 10_000, noNaN: true }),
    circleOfConfusionUm: fc.double({ min: 0.5, max: 500, noNaN: true }),
  })
  .filter((one): one is Focus => one.distanceM > (one.focalLengthMm / 1000) * 1.001);

const blurOf = (one: Focus, pointM: number) =>
  blurDiscUm(one.focalLengthMm, one.aperture, one.distanceM, pointM);

describe('depth of field', () => {
  it('gives hyperfocal distance, limits and depth of the handbook', () => {
    eachRow(depths, 8, (row, where) => {
      const confusionUm = row.circleOfConfusionMm * 1000;
      const near = (m: number | null, mm: number | null, what: string) =>
        mm === null
          ? expect(m, `${what} ${where}`).toBeNull()
          : expect(Math.abs((m ?? NaN) * 1000 - mm), `${what} ${where}`).toBeLessThanOrEqual(
              depths.tolerance,
            );
      near(hyperfocalM(row.focalLengthMm, row.aperture, confusionUm), row.hyperfocalMm, 'hyperfocal');
      const limits = depthLimits({
        focalLengthMm: row.focalLengthMm,
        aperture: row.aperture,
        distanceM: row.distanceMm / 1000,
        circleOfConfusionUm: confusionUm,
      });
      near(limits.nearM, row.nearMm, 'near');
      near(limits.farM, row.farMm, 'far');
      near(limits.totalM, row.totalMm, 'total');
    });
  });

  it('has blur discs of one circle of confusion at both of its limits', () => {
    fc.assert(
      fc.property(focus, (one) => {
        const { nearM, farM } = depthLimits(one);
        // |D − s| loses digits where the depth is a tiny part of the distance.
        const room = (limit: number) => 1e-6 + (1e-13 * one.distanceM) / Math.abs(limit - one.distanceM);
        if (nearM === one.distanceM) return;
        expect(Math.abs(blurOf(one, nearM) / one.circleOfConfusionUm - 1)).toBeLessThan(room(nearM));
        const far = farM ?? Infinity;
        const ratio = blurOf(one, far) / one.circleOfConfusionUm;
        if (farM === null) expect(ratio).toBeLessThan(1 + 1e-9);
        else if (farM !== one.distanceM) expect(Math.abs(ratio - 1)).toBeLessThan(room(farM));
      }),
      { numRuns: 500 },
    );
  });

  it('reaches from half the hyperfocal distance to infinity when focused there', () => {
    fc.assert(
      fc.property(focus, (one) => {
        const distanceM = hyperfocalM(one.focalLengthMm, one.aperture, one.circleOfConfusionUm);
        if (distanceM > 1e6) return;
        const limits = depthLimits({ ...one, distanceM });
        expect(limits.farM).toBeNull();
        expect(limits.totalM).toBeNull();
        expect(limits.nearM / distanceM).toBeCloseTo(0.5, 9);
      }),
    );
  });

  it('holds the focus between its limits, finite, and as deep as they are apart', () => {
    fc.assert(
      fc.property(focus, (one) => {
        const { nearM, farM, totalM } = depthLimits(one);
        expect(nearM).toBeGreaterThan(0);
        expect(nearM).toBeLessThanOrEqual(one.distanceM);
        if (farM === null || totalM === null) return;
        expect(Number.isFinite(farM)).toBe(true);
        expect(farM).toBeGreaterThanOrEqual(one.distanceM);
        expect(Math.abs(totalM - (farM - nearM))).toBeLessThanOrEqual(1e-12 * farM + 1e-9 * totalM);
      }),
    );
  });

  it('grows when the lens is stopped down', () => {
    fc.assert(
      fc.property(focus, (one) => {
        const open = depthLimits(one);
        const stopped = depthLimits({ ...one, aperture: one.aperture * 1.4 });
        expect(stopped.nearM).toBeLessThanOrEqual(open.nearM);
        expect(stopped.farM ?? Infinity).toBeGreaterThanOrEqual(open.farM ?? Infinity);
      }),
    );
  });

  it('refuses a focus that the lens cannot have', () => {
    const at = (distanceM: number) => () =>
      depthLimits({ focalLengthMm: 50, aperture: 8, distanceM, circleOfConfusionUm: 30 });
    for (const distanceM of [0.05, 0.01, 0, -1, NaN, Infinity]) expect(at(distanceM)).toThrow(RangeError);
    expect(at(0.0501)).not.toThrow();
    expect(() => hyperfocalM(50, 0, 30)).toThrow(RangeError);
    expect(() => blurDiscUm(50, 8, 0.05, 10)).toThrow(RangeError);
    expect(() => blurDiscUm(50, 8, 5, 0)).toThrow(RangeError);
  });
});

describe('the circle of confusion', () => {
  it('gives diagonals and circles of the usual sensors', () => {
    eachRow(circles, 5, (row, where) => {
      const circleMm = circleOfConfusionUm(row.widthMm, row.heightMm) / 1000;
      expect(Math.abs(circleMm - row.circleMm), where).toBeLessThanOrEqual(circles.tolerance);
      expect(Math.abs(circleMm * 1500 - row.diagonalMm), where).toBeLessThanOrEqual(5e-4);
    });
  });

  it('scales with the sensor and does not mind how it is turned', () => {
    const side = fc.double({ min: 1, max: 300, noNaN: true });
    fc.assert(
      fc.property(side, side, (width, height) => {
        expect(circleOfConfusionUm(width, height)).toBe(circleOfConfusionUm(height, width));
        expect(circleOfConfusionUm(2 * width, 2 * height) / circleOfConfusionUm(width, height)).toBeCloseTo(
          2,
          12,
        );
      }),
    );
    expect(() => circleOfConfusionUm(0, 24)).toThrow(RangeError);
  });
});

describe('blur of the background', () => {
  it('gives the discs that the handbook works out', () => {
    eachRow(blurs, 5, (row, where) => {
      const disc = blurDiscUm(row.focalLengthMm, row.aperture, row.distanceM, row.pointM ?? Infinity) / 1000;
      expect(Math.abs(disc - row.blurMm), where).toBeLessThanOrEqual(blurs.tolerance);
    });
  });

  it('is the defocus of the thin lens: aperture times the way from image to sensor, over the image distance', () => {
    fc.assert(
      fc.property(focus, fc.double({ min: 0.01, max: 10_000, noNaN: true }), (one, pointM) => {
        const f = one.focalLengthMm;
        if (pointM * 1000 <= f * 1.01) return;
        const image = (d: number) => 1 / (1 / f - 1 / (d * 1000));
        const [sensor, point] = [image(one.distanceM), image(pointM)];
        const plain = ((f / one.aperture) * Math.abs(point - sensor)) / point;
        const room = 1e-9 * plain + (1e-11 * sensor * f) / one.aperture;
        expect(Math.abs(blurOf(one, pointM) / 1000 - plain)).toBeLessThanOrEqual(room);
      }),
    );
  });

  it('is none in the plane of focus and grows towards that of infinity', () => {
    fc.assert(
      fc.property(focus, fc.double({ min: 1, max: 1e6, noNaN: true }), (one, times) => {
        expect(blurOf(one, one.distanceM)).toBe(0);
        const disc = blurOf(one, one.distanceM * times);
        expect(Number.isFinite(blurOf(one, Infinity))).toBe(true);
        expect(disc).toBeLessThanOrEqual(blurOf(one, Infinity) * (1 + 1e-12));
        expect(disc).toBeLessThanOrEqual(blurOf(one, one.distanceM * times * 2) * (1 + 1e-12));
      }),
    );
  });
});

describe('diffraction', () => {
  it('gives the Airy discs of the handbook', () => {
    eachRow(diffraction, 6, (row, where) =>
      expect(Math.abs(airyDiscUm(row.aperture) - row.airyUm), where).toBeLessThanOrEqual(
        diffraction.tolerance,
      ),
    );
  });

  it('grows with f-number and wavelength alike', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.5, max: 256, noNaN: true }),
        fc.double({ min: 380, max: 780, noNaN: true }),
        (aperture, nm) => {
          expect(airyDiscUm(aperture, nm) / (aperture * nm)).toBeCloseTo(0.00244, 12);
        },
      ),
    );
    expect(() => airyDiscUm(0)).toThrow(RangeError);
    expect(() => airyDiscUm(8, NaN)).toThrow(RangeError);
  });
});
