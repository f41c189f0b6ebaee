import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  filterFor,
  settingsAsWanted,
  settingsOfWay,
  syncConflictStops,
  type DaylightWay,
} from '../../../shared/math/daylightWays';
import { sceneEv100 } from '../../../shared/math/exposure';
import { conflicts, sunny } from '../../support/daylightScenes';
import { within } from '../../support/within';

const WAYS: DaylightWay[] = ['smallerAperture', 'neutralDensity', 'highSpeedSync'];

describe('a wide aperture in daylight', () => {
  it('at f/2, 1/256 s and ISO 100 is five stops too wide for EV 15, by hand', () => {
    // EV100 of f/2 and 1/256 s is 2 + 8 = 10.
    expect(syncConflictStops(sunny)).toBeCloseTo(5, 12);
    expect(syncConflictStops({ ...sunny, backgroundStops: 2 })).toBeCloseTo(3, 12);
  });

  it('is settled by f/11.3, by five stops of filter, or by 1/8192 s', () => {
    within(settingsOfWay('smallerAperture', sunny).aperture, 2 * 2 ** 2.5, 1e-12, 'aperture');
    within(settingsOfWay('neutralDensity', sunny).ndStops, 5, 1e-12, 'filter');
    within(settingsOfWay('highSpeedSync', sunny).shutterS, 1 / 8192, 1e-15, 'shutter');
  });

  it('puts the background where it is wanted, whichever way is taken and whatever filters are at hand', () => {
    const owned = fc.option(fc.array(fc.double({ min: 0, max: 15, noNaN: true }), { maxLength: 6 }), {
      nil: undefined,
    });
    fc.assert(
      fc.property(conflicts, owned, fc.constantFrom(...WAYS), (scene, filters, way) => {
        if (syncConflictStops(scene) < 0) return;
        const { aperture, shutterS, iso, ndStops } = settingsOfWay(way, scene, filters);
        const comesOut = scene.backgroundEv100 - sceneEv100(aperture, shutterS, iso, ndStops);
        expect(comesOut).toBeCloseTo(scene.backgroundStops, 8);
        if (way !== 'highSpeedSync') expect(shutterS).toBeGreaterThanOrEqual(scene.syncSpeedS * (1 - 1e-9));
        expect(aperture).toBeGreaterThanOrEqual(scene.aperture * (1 - 1e-9));
      }),
    );
  });

  it('has no way out where there is no conflict', () => {
    expect(() => settingsOfWay('neutralDensity', { ...sunny, backgroundEv100: 9 })).toThrow(/conflict/);
  });
});

describe('the settings as wanted', () => {
  it('keep the aperture and put the background where it is wanted, slower than sync where there is room', () => {
    // EV 8 at f/2 and ISO 100 is 1/64 s, two stops slower than 1/256 s.
    const dusk = { ...sunny, backgroundEv100: 8 };
    within(settingsAsWanted(dusk).shutterS, 1 / 64, 1e-12, 'shutter');
    fc.assert(
      fc.property(conflicts, fc.double({ min: -20, max: 20, noNaN: true }), (scene, moved) => {
        const there = { ...scene, backgroundEv100: scene.backgroundEv100 + moved };
        const { aperture, shutterS, iso, ndStops } = settingsAsWanted(there);
        expect([aperture, iso, ndStops]).toEqual([scene.aperture, scene.iso, 0]);
        expect(there.backgroundEv100 - sceneEv100(aperture, shutterS, iso)).toBeCloseTo(
          scene.backgroundStops,
          8,
        );
      }),
    );
  });
});

describe('the filter', () => {
  it('is the weakest that is strong enough, else the strongest, else none', () => {
    expect(filterFor(3.3, [2, 6, 4])).toBe(4);
    expect(filterFor(3, [2, 3, 6])).toBe(3);
    expect(filterFor(9, [2, 6, 4])).toBe(6);
    expect(filterFor(9, [])).toBe(0);
    expect(filterFor(9)).toBe(9);
  });
});
