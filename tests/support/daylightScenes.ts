import fc from 'fast-check';
import type { DaylightScene } from '../../shared/math/daylightWays';
import { sceneEv100 } from '../../shared/math/exposure';

/** Scenes in which the wanted aperture is too wide by 0 to 20 stops. */
export const conflicts: fc.Arbitrary<DaylightScene> = fc
  .record({
    over: fc.double({ min: 0, max: 20, noNaN: true }),
    backgroundStops: fc.double({ min: -5, max: 5, noNaN: true }),
    subjectStops: fc.double({ min: -5, max: 5, noNaN: true }),
    belowStops: fc.double({ min: -5, max: 10, noNaN: true }),
    aperture: fc.double({ min: 0.5, max: 64, noNaN: true }),
    iso: fc.double({ min: 1, max: 1e6, noNaN: true }),
    syncSpeedS: fc.double({ min: 1e-4, max: 0.1, noNaN: true }),
  })
  .map(({ over, belowStops, ...rest }) => {
    const backgroundEv100 =
      sceneEv100(rest.aperture, rest.syncSpeedS, rest.iso) + rest.backgroundStops + over;
    return { ...rest, backgroundEv100, subjectEv100: backgroundEv100 - belowStops };
  });

/** f/2 in full sun, ISO 100, the sync speed a plain power of two; the subject two stops under the background. */
export const sunny: DaylightScene = {
  backgroundEv100: 15,
  subjectEv100: 13,
  backgroundStops: 0,
  subjectStops: 0,
  aperture: 2,
  iso: 100,
  syncSpeedS: 1 / 256,
};
