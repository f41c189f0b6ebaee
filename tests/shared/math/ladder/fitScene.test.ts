import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitScene, type FrameReading } from '../../../../shared/math/ladder/fitScene';
import { combinedEv100 } from '../../../../shared/math/ladder/sceneModel';
import { within } from '../../../support/within';

const SIGMA = 1 / 6;

function reading(naturalEv100: number, sceneEv100: number, areLampsOn = true): FrameReading {
  return { naturalEv100, sceneEv100, areLampsOn, sigmaStops: SIGMA };
}

function readings(naturals: readonly number[], offset: number, floor: number | null): FrameReading[] {
  return naturals.map((natural) => reading(natural, combinedEv100(natural, offset, floor)));
}

const offsets = fc.double({ min: -3, max: 3, noNaN: true });
const floors = fc.double({ min: -6, max: 6, noNaN: true });
/** Two to six skies, a stop apart or more, from bright to dark. */
const skies = fc
  .tuple(
    fc.double({ min: 4, max: 9, noNaN: true }),
    fc.array(fc.double({ min: 1, max: 4, noNaN: true }), { minLength: 1, maxLength: 5 }),
  )
  .map(([first, falls]) => falls.reduce((list, fall) => [...list, (list.at(-1) ?? 0) - fall], [first]));

describe('the fit of a scene to test frames', () => {
  it('takes the offset from one frame, and no lamps, of which it says nothing', () => {
    fc.assert(
      fc.property(floors, floors, (natural, scene) => {
        const { best, low, high, misfitStops } = fitScene([reading(natural, scene)]);
        within(best.offsetStops, scene - natural, 1e-9, 'offset');
        expect(best.floorEv100).toBeNull();
        expect([low, high]).toEqual([best, best]);
        within(misfitStops[0] ?? NaN, 0, 1e-9, 'misfit');
      }),
    );
  });

  it('takes a known floor off a frame before the offset: equal parts are a stop, by hand', () => {
    // Scene 4 is sky 3 and lamps 3; a natural light of 5 makes the offset −2.
    const { best } = fitScene([reading(5, 4)], 3);
    within(best.offsetStops, -2, 1e-9, 'offset');
    expect(best.floorEv100).toBe(3);
  });

  it('finds offset and floor again from exact frames: what it predicts is right within a thousandth of a stop', () => {
    fc.assert(
      fc.property(skies, offsets, fc.option(floors), (naturals, offset, floor) => {
        const { best, misfitStops } = fitScene(readings(naturals, offset, floor));
        for (let natural = 9; natural > -14; natural -= 0.5) {
          const truth = combinedEv100(natural, offset, floor);
          // Lamps too dim to show by 0.001 stop in the darkest frame are not seen.
          const isSeen =
            combinedEv100(naturals.at(-1) ?? NaN, offset, floor) > (naturals.at(-1) ?? NaN) + offset + 1e-3;
          if (isSeen || floor === null || natural >= (naturals.at(-1) ?? NaN)) {
            within(combinedEv100(natural, best.offsetStops, best.floorEv100), truth, 1e-2, `at ${natural}`);
          }
        }
        for (const misfit of misfitStops) within(misfit, 0, 1e-3, 'misfit');
      }),
    );
  });

  it('is not beaten by any other offset and floor', () => {
    const noisy = fc.array(fc.tuple(floors, fc.double({ min: -0.5, max: 0.5, noNaN: true })), {
      minLength: 2,
      maxLength: 5,
    });
    const cost = (frames: readonly FrameReading[], offset: number, floor: number | null): number =>
      frames.reduce((sum, f) => sum + (combinedEv100(f.naturalEv100, offset, floor) - f.sceneEv100) ** 2, 0);
    fc.assert(
      fc.property(
        noisy,
        offsets,
        floors,
        offsets,
        floors,
        (points, offset, floor, otherOffset, otherFloor) => {
          const frames = points.map(([natural, noise]) =>
            reading(natural, combinedEv100(natural, offset, floor) + noise),
          );
          const { best } = fitScene(frames);
          const least = cost(frames, best.offsetStops, best.floorEv100);
          expect(least).toBeLessThanOrEqual(cost(frames, otherOffset, otherFloor) + 1e-3);
          expect(least).toBeLessThanOrEqual(cost(frames, otherOffset, null) + 1e-6);
          expect(least).toBeLessThanOrEqual(cost(frames, offset, floor) + 1e-3);
        },
      ),
      { numRuns: 300 },
    );
  });

  it('asks for no lamps where the frames fall as fast as the sky, or faster', () => {
    expect(fitScene([reading(6, 7), reading(2, 3)]).best).toEqual({ offsetStops: 1, floorEv100: null });
    const faster = fitScene([reading(6, 7), reading(2, 2.6)]);
    expect(faster.best.floorEv100).toBeNull();
    within(faster.best.offsetStops, 0.8, 1e-9, 'offset');
    within(faster.misfitStops[0] ?? NaN, 0.2, 1e-9, 'misfit');
    within(faster.misfitStops[1] ?? NaN, -0.2, 1e-9, 'misfit');
  });

  it('tells how far two frames leave the floor open: wide when they are close together, narrow when apart', () => {
    const close = fitScene(readings([5, 4], 0, 1));
    expect(close.low.floorEv100).toBeNull();
    expect(close.high.floorEv100).toBeGreaterThan(2);
    const apart = fitScene(readings([5, -3], 0, 1));
    expect(apart.low.floorEv100).toBeGreaterThan(0.5);
    expect(apart.high.floorEv100).toBeLessThan(1.5);
  });

  it('does not look for lamps in frames in which they were out', () => {
    const frames = [reading(5, 6, false), reading(1, 4, false)];
    expect(fitScene(frames).best.floorEv100).toBeNull();
    const lit = fitScene([reading(5, 6, false), reading(1, 4, true)]);
    // Sky 2 and lamps that make 4 of it: log2(16 − 4).
    within(lit.best.floorEv100 ?? NaN, Math.log2(12), 1e-4, 'floor');
    within(lit.best.offsetStops, 1, 1e-4, 'offset');
  });

  it('weighs a doubtful frame less', () => {
    const sure = { ...reading(4, 5), sigmaStops: 0.1 };
    const doubtful = { ...reading(4, 9), sigmaStops: 1 };
    // Weights 100 and 1: 1 + 4/101.
    within(fitScene([sure, doubtful], -30).best.offsetStops, 1 + 4 / 101, 1e-6, 'offset');
  });

  it('refuses no frames', () => {
    expect(() => fitScene([])).toThrow(RangeError);
  });
});
