import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sceneEv100 } from '../../../../shared/math/exposure';
import { flashStops } from '../../../../shared/math/flashExposure';
import { rungPower, type LadderFlash } from '../../../../shared/math/ladder/rungPower';
import { SHUTTER_FIRST, staircase, type StaircasePlan } from '../../../../shared/math/ladder/staircase';
import { exactAt, positionOf, stepsPerStop } from '../../../../shared/math/marks';
import { plans } from '../../../support/ladderInputs';
import { within } from '../../../support/within';

const plan: StaircasePlan = {
  scale: 'full',
  holdAperture: 4,
  holdIso: 100,
  ndStops: 0,
  baseShutterS: 1 / 64,
  order: SHUTTER_FIRST,
  slowestShutterS: 1 / 16,
  isoMax: 400,
  apertureMin: 2,
};

const shown = (given: StaircasePlan, brightest: number) =>
  staircase(given, brightest).map(({ aperture, shutterS, iso }) => [
    Number(aperture.toFixed(9)),
    1 / shutterS,
    iso,
  ]);

describe('the stairs of a ladder', () => {
  it('lengthen the shutter, open the aperture, then raise the ISO, by hand', () => {
    // f/4 and ISO 100: EV 8 is 1/16 s, EV 10 is 1/64 s.
    expect(shown(plan, 9.9)).toEqual([
      [4, 128, 100],
      [4, 64, 100],
      [4, 32, 100],
      [4, 16, 100],
      [2.828427125, 16, 100],
      [2, 16, 100],
      [2, 16, 200],
      [2, 16, 400],
    ]);
  });

  it('keep the frame’s shutter while ISO gives way first, and use faster ones only for brighter scenes', () => {
    expect(shown({ ...plan, order: ['iso', 'shutter', 'aperture'] }, 10.9)).toEqual([
      [4, 256, 100],
      [4, 128, 100],
      [4, 64, 100],
      [4, 64, 200],
      [4, 64, 400],
      [4, 32, 400],
      [4, 16, 400],
      [2.828427125, 16, 400],
      [2, 16, 400],
    ]);
  });

  it('never use a shutter that is faster than a flash can be synchronised with', () => {
    expect(shown({ ...plan, fastestShutterS: 1 / 32 }, 14)[0]).toEqual([4, 32, 100]);
    expect(() => staircase({ ...plan, fastestShutterS: 1 / 8 }, 8)).toThrow(RangeError);
  });

  it('fall by a step at most, stay inside the limits, and lie on marks or on what is held', () => {
    fc.assert(
      fc.property(plans, fc.double({ min: -10, max: 18, noNaN: true }), (given, brightest) => {
        const whole = { ...given, baseShutterS: 1 / 64 };
        const stairs = staircase(whole, brightest);
        const step = 1 / stepsPerStop(given.scale);
        stairs.forEach(({ aperture, shutterS, iso, ev100 }, index) => {
          within(ev100, sceneEv100(aperture, shutterS, iso, given.ndStops), 1e-12, 'EV');
          expect(aperture).toBeGreaterThanOrEqual(given.apertureMin * (1 - 1e-8));
          expect(iso).toBeLessThanOrEqual(given.isoMax * (1 + 1e-8));
          expect(shutterS).toBeLessThanOrEqual(given.slowestShutterS * (1 + 1e-8));
          if (aperture !== given.holdAperture) {
            const position = Math.round(positionOf('aperture', given.scale, aperture));
            within(aperture, exactAt('aperture', given.scale, position), 1e-9, 'aperture');
          }
          const before = stairs[index - 1];
          if (!before) return;
          expect(ev100).toBeLessThan(before.ev100);
          // Times over 32 s are whole seconds, up to half a second off their place on the scale.
          const rounding = shutterS > 32 ? 0.05 : 1e-9;
          expect(before.ev100 - ev100).toBeLessThanOrEqual(step + rounding);
        });
        const asked = Math.min(brightest, sceneEv100(given.holdAperture, 1e-6, given.holdIso, given.ndStops));
        const slowest = stairs.filter(
          ({ iso, aperture }) => iso === given.holdIso && aperture === given.holdAperture,
        );
        if (slowest.length > 1) expect(stairs[0]?.ev100 ?? NaN).toBeGreaterThan(asked - step);
      }),
      { numRuns: 300 },
    );
  });
});

describe('the flash power on a rung', () => {
  const flash: LadderFlash = {
    guideNumberM: 32,
    distanceM: 4,
    lossStops: 0,
    minPower: 1 / 128,
    stepStops: 1 / 3,
    belowBackgroundStops: 1,
  };
  const stair = { aperture: 4, shutterS: 1 / 64, iso: 100, ev100: 10 };

  it('is half the light where the ambient gives the other half, by hand', () => {
    // At f/4 and 4 m a guide number of 32 is two stops over; half of the light is one stop under the aim: 1/8.
    const found = rungPower(flash, { backgroundStops: 0, subjectStops: 0 }, stair, 0);
    expect(found).toEqual({ power: 1 / 8, isInRange: true });
  });

  it('is halved when the ISO is doubled and doubled by a stop of filter', () => {
    const aim = { backgroundStops: 0, subjectStops: 0 };
    expect(rungPower(flash, aim, { ...stair, iso: 200 }, 0)?.power).toBe(1 / 16);
    expect(rungPower(flash, aim, stair, 1)?.power).toBe(1 / 4);
  });

  it('brings the subject to its aim within half a power step, as light adds', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -3, max: 1, noNaN: true }),
        fc.double({ min: -1, max: 1, noNaN: true }),
        fc.double({ min: 0, max: 6, noNaN: true }),
        fc.double({ min: 1.4, max: 16, noNaN: true }),
        fc.constantFrom(1 / 3, 1 / 2, 1),
        (backgroundStops, subjectStops, belowBackgroundStops, aperture, stepStops) => {
          const given = { ...flash, belowBackgroundStops, stepStops };
          const found = rungPower(given, { backgroundStops, subjectStops }, { ...stair, aperture }, 0);
          const ambient = 2 ** (backgroundStops - belowBackgroundStops);
          expect(found === null).toBe(ambient >= 2 ** subjectStops);
          if (!found) return;
          expect(found.power).toBeLessThanOrEqual(1);
          expect(found.power).toBeGreaterThanOrEqual(1 / 128 - 1e-12);
          if (!found.isInRange) return;
          const stops = flashStops({ ...given, aperture, iso: 100, power: found.power });
          within(Math.log2(2 ** stops + ambient), subjectStops, stepStops / 2 + 1e-9, 'subject');
        },
      ),
    );
  });

  it('stops at full power and at the lowest, and says so', () => {
    const aim = { backgroundStops: -1, subjectStops: 0 };
    expect(rungPower({ ...flash, distanceM: 40 }, aim, stair, 0)).toEqual({ power: 1, isInRange: false });
    expect(rungPower({ ...flash, distanceM: 0.3 }, aim, stair, 0)).toEqual({
      power: 1 / 128,
      isInRange: false,
    });
  });
});
