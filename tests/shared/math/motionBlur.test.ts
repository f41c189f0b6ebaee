import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { HAND_TURN_RAD_PER_S, shakeBlurUm, slowestHandheldS } from '../../../shared/math/handheld';
import {
  blurOf,
  longestSharpS,
  magnificationAt,
  motionBlurUm,
  pixelPitchUm,
  shareAcross,
  travelMm,
} from '../../../shared/math/motionBlur';
import motion from '../../reference/motion-blur.json';
import pitches from '../../reference/pixel-pitch.json';
import { eachRow } from '../../support/eachRow';
import { within } from '../../support/within';

const speed = fc.oneof(fc.constant(0), fc.double({ min: 1e-9, max: 1000, noNaN: true }));
const direction = fc.double({ min: -720, max: 720, noNaN: true });
const seconds = fc.double({ min: Math.log(1e-6), max: Math.log(86_400), noNaN: true }).map(Math.exp);
const scene = fc
  .tuple(fc.double({ min: 1, max: 5000, noNaN: true }), fc.double({ min: 1.1, max: 1e4, noNaN: true }))
  .map(([f, times]) => ({ focalLengthMm: f, distanceM: (f * times) / 1000 }));

describe('blur by movement', () => {
  it('gives the published rows', () => {
    eachRow(motion, 8, (row, where) => {
      const m = magnificationAt(row.focalLengthMm, row.distanceM);
      within(m / row.magnification, 1, motion.tolerance, where);
      // The table counts from the lens axis, the API from the picture's plane.
      const movement = { speedMS: row.speedMS, directionDeg: 90 - row.fromAxisDeg };
      const blur = motionBlurUm(movement, 1 / row.timeParts, m);
      within(blur / row.blurUm, 1, motion.tolerance, where);
      within(blur / row.pitchUm / row.blurPx, 1, motion.tolerance, where);
      within(
        (longestSharpS(movement, m, row.pitchUm) ?? NaN) * row.onePixelParts,
        1,
        motion.tolerance,
        where,
      );
      within((longestSharpS(movement, m, 30) ?? NaN) * row.thirtyUmParts, 1, motion.timesTolerance, where);
    });
  });

  it('is in proportion to time and to speed', () => {
    fc.assert(
      fc.property(
        speed,
        direction,
        seconds,
        scene,
        (speedMS, directionDeg, t, { focalLengthMm, distanceM }) => {
          const m = magnificationAt(focalLengthMm, distanceM);
          const blur = motionBlurUm({ speedMS, directionDeg }, t, m);
          expect(Number.isFinite(blur)).toBe(true);
          const room = 1e-9 * blur;
          expect(Math.abs(motionBlurUm({ speedMS, directionDeg }, 3 * t, m) - 3 * blur)).toBeLessThanOrEqual(
            3 * room,
          );
          expect(
            Math.abs(motionBlurUm({ speedMS: 2 * speedMS, directionDeg }, t, m) - 2 * blur),
          ).toBeLessThanOrEqual(2 * room);
        },
      ),
    );
  });

  it('after the longest sharp time is exactly the tolerance', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.001, max: 1000, noNaN: true }),
        fc.double({ min: 0, max: 89, noNaN: true }),
        scene,
        fc.double({ min: 0.1, max: 1000, noNaN: true }),
        (speedMS, directionDeg, { focalLengthMm, distanceM }, toleranceUm) => {
          const m = magnificationAt(focalLengthMm, distanceM);
          const t = longestSharpS({ speedMS, directionDeg }, m, toleranceUm) ?? NaN;
          expect(motionBlurUm({ speedMS, directionDeg }, t, m) / toleranceUm).toBeCloseTo(1, 9);
        },
      ),
    );
  });

  it('is the travel at the subject, made smaller by the lens: tracing two rays gives the same', () => {
    // A point in the plane of focus at height y is drawn at y·(image distance)/(subject distance), 1/f = 1/d + 1/i.
    fc.assert(
      fc.property(speed, seconds, scene, (speedMS, t, { focalLengthMm, distanceM }) => {
        const dMm = distanceM * 1000;
        const imageMm = 1 / (1 / focalLengthMm - 1 / dMm);
        const traced = (travelMm({ speedMS, directionDeg: 0 }, t) * imageMm * 1000) / dMm;
        const blur = motionBlurUm({ speedMS, directionDeg: 0 }, t, magnificationAt(focalLengthMm, distanceM));
        expect(Math.abs(blur - traced)).toBeLessThanOrEqual(1e-9 * blur);
      }),
    );
  });
});

describe('direction', () => {
  it('counts as the cosine, and along the axis as nothing at all', () => {
    fc.assert(
      fc.property(direction, (deg) => {
        expect(shareAcross(deg)).toBeCloseTo(Math.abs(Math.cos((deg * Math.PI) / 180)), 12);
      }),
    );
    for (const along of [90, -90, 270, 450]) expect(shareAcross(along)).toBe(0);
    for (const across of [0, 180, -180, 360]) expect(shareAcross(across)).toBe(1);
  });

  it('along the axis leaves no longest time, nor does standing still', () => {
    expect(longestSharpS({ speedMS: 10, directionDeg: 90 }, 0.01, 6)).toBeNull();
    expect(longestSharpS({ speedMS: 0, directionDeg: 0 }, 0.01, 6)).toBeNull();
    expect(motionBlurUm({ speedMS: 10, directionDeg: -90 }, 1, 0.01)).toBe(0);
  });
});

describe('shake beside movement', () => {
  it('is 0.030 mm over the crop factor at the hand-held limit, with or without a stabiliser', () => {
    // t = 2^s/(f·crop) in b = f·0.030·2^(−s)·t leaves 0.030 mm/crop: what the smaller sensor may show.
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 5000, noNaN: true }),
        fc.double({ min: 0.1, max: 10, noNaN: true }),
        fc.double({ min: 0, max: 8, noNaN: true }),
        (f, crop, stabilisation) => {
          const limit = slowestHandheldS(f, crop, stabilisation);
          const wanted = (1000 * HAND_TURN_RAD_PER_S) / crop;
          expect(shakeBlurUm(f, limit, stabilisation) / wanted).toBeCloseTo(1, 9);
        },
      ),
    );
  });
});

describe('blur told in three ways', () => {
  it('agrees with itself, and is frozen up to the longest sharp time', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 1000, noNaN: true }),
        scene,
        fc.double({ min: 0.1, max: 20, noNaN: true }),
        fc.double({ min: 0.1, max: 100, noNaN: true }),
        (speedMS, { focalLengthMm, distanceM }, pitchUm, toleranceUm) => {
          const view = { magnification: magnificationAt(focalLengthMm, distanceM), pitchUm, toleranceUm };
          const movement = { speedMS, directionDeg: 0 };
          const longest = longestSharpS(movement, view.magnification, toleranceUm) ?? NaN;
          const blur = blurOf(movement, longest, view);
          expect(blur.frozen).toBe(true);
          expect(blurOf(movement, longest * 1.01, view).frozen).toBe(false);
          expect((blur.blurPx * pitchUm) / blur.blurUm).toBeCloseTo(1, 12);
          expect((blur.blurMmAtSubject * view.magnification * 1000) / blur.blurUm).toBeCloseTo(1, 12);
        },
      ),
    );
  });

  it('has no longest time where the movement is too slow for any number', () => {
    expect(longestSharpS({ speedMS: 5e-324, directionDeg: 0 }, 1, 6)).toBeNull();
  });
});

describe('pixels', () => {
  it('have the published pitches', () => {
    eachRow(pitches, 6, (row, where) =>
      within(pixelPitchUm(row.sensorWidthMm, row.imageWidthPx), row.pitchUm, pitches.tolerance, where),
    );
  });
});

describe('numbers outside the domain', () => {
  it('are refused: also a subject at or within the focal length', () => {
    expect(() => magnificationAt(100, 0.1)).toThrow(/beyond the focal length/);
    expect(() => magnificationAt(100, 0.05)).toThrow(/beyond the focal length/);
    expect(() => magnificationAt(0, 1)).toThrow(/focalLengthMm/);
    expect(() => travelMm({ speedMS: -1, directionDeg: 0 }, 1)).toThrow(/speedMS/);
    expect(() => travelMm({ speedMS: 1, directionDeg: NaN }, 1)).toThrow(/directionDeg/);
    expect(() => motionBlurUm({ speedMS: 1, directionDeg: 0 }, 1, 0)).toThrow(/magnification/);
    expect(() => longestSharpS({ speedMS: 1, directionDeg: 0 }, 1, 0)).toThrow(/toleranceUm/);
    expect(() => pixelPitchUm(36, 0)).toThrow(/imageWidthPx/);
  });
});
