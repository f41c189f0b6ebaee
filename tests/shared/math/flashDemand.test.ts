import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { settingsOfWay, syncConflictStops, type DaylightWay } from '../../../shared/math/daylightWays';
import { betterForFlash, flashDemand } from '../../../shared/math/flashDemand';
import { flashStops } from '../../../shared/math/flashExposure';
import { highSpeedSyncLossStops } from '../../../shared/math/highSpeedSync';
import { addStops } from '../../../shared/math/mixing';
import { conflicts, sunny } from '../../support/daylightScenes';
import { within } from '../../support/within';

const WAYS: DaylightWay[] = ['smallerAperture', 'neutralDensity', 'highSpeedSync'];
const flash = { guideNumberM: 40, distanceM: 2, lossStops: 1 };

describe('what the flash has to do', () => {
  it('added to the ambient light gives the subject its brightness, at exactly that power', () => {
    fc.assert(
      fc.property(conflicts, fc.constantFrom(...WAYS), (scene, way) => {
        if (syncConflictStops(scene) < 0) return;
        const settings = settingsOfWay(way, scene);
        const loss =
          way === 'highSpeedSync' ? highSpeedSyncLossStops(settings.shutterS, scene.syncSpeedS, 0.5) : 0;
        const demand = flashDemand(settings, scene, flash, loss);
        if (demand.flashStops === null || demand.power === null) {
          expect(demand.ambientStops).toBeGreaterThanOrEqual(scene.subjectStops - 1e-9);
          return;
        }
        const setup = { ...flash, aperture: settings.aperture, iso: settings.iso, power: demand.power };
        const given = flashStops(setup, { lossStops: flash.lossStops + settings.ndStops + loss });
        expect(addStops([demand.ambientStops, given])).toBeCloseTo(scene.subjectStops, 6);
        expect(demand.power).toBeCloseTo(2 ** -(demand.reserveStops ?? NaN), 9);
      }),
    );
  });

  it('is the same behind a filter as at a smaller aperture: both take flash and sun alike', () => {
    fc.assert(
      fc.property(conflicts, (scene) => {
        if (syncConflictStops(scene) < 0) return;
        const reserve = (way: DaylightWay) =>
          flashDemand(settingsOfWay(way, scene), scene, flash, 0).reserveStops;
        const filter = reserve('neutralDensity');
        // Next to no room makes a rounding error of the light a large one of the flash.
        if (filter !== null && filter < 30) expect(reserve('smallerAperture')).toBeCloseTo(filter, 2);
      }),
    );
  });

  it('with high-speed sync differs from a filter by log2(sync speed/(curtain + time)), derived by hand', () => {
    // The filter takes log2(sync/t), the train log2((T + t)/t); the difference is the reserve.
    const curtainS = 1 / 300;
    const settings = settingsOfWay('highSpeedSync', sunny);
    const highSpeed = flashDemand(
      settings,
      sunny,
      flash,
      highSpeedSyncLossStops(settings.shutterS, curtainS),
    );
    const filter = flashDemand(settingsOfWay('neutralDensity', sunny), sunny, flash, 0);
    const gain = (highSpeed.reserveStops ?? NaN) - (filter.reserveStops ?? NaN);
    within(gain, Math.log2(1 / 256 / (curtainS + 1 / 8192)), 1e-9, 'gain');
  });

  it('is nothing where the ambient light alone is bright enough', () => {
    const bright = { ...sunny, subjectEv100: 15 };
    expect(flashDemand(settingsOfWay('neutralDensity', bright), bright, flash, 0)).toMatchObject({
      flashStops: null,
      power: null,
      reserveStops: null,
    });
  });
});

describe('the better way for the flash', () => {
  it('is named only while the ranges stand apart', () => {
    expect(betterForFlash(2, { lowStops: 0, highStops: 1.5 })).toBe('neutralDensity');
    expect(betterForFlash(-1, { lowStops: 0, highStops: 1.5 })).toBe('highSpeedSync');
    expect(betterForFlash(1, { lowStops: 0, highStops: 1.5 })).toBeNull();
    expect(betterForFlash(1.5, { lowStops: 0, highStops: 1.5 })).toBeNull();
    expect(betterForFlash(0, { lowStops: 0, highStops: 1.5 })).toBeNull();
  });
});
