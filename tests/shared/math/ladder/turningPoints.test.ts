import { describe, expect, it } from 'vitest';
import { sceneEv100 } from '../../../../shared/math/exposure';
import { flashStops } from '../../../../shared/math/flashExposure';
import { duskLadder } from '../../../../shared/math/ladder/duskLadder';
import { sunPosition } from '../../../../shared/math/sunPosition';
import {
  clear,
  eveningMs,
  evOfRung,
  frameOf,
  inputOf,
  middleTone as aim,
  munich,
  truthOf,
  widePlan as plan,
  type Evening,
} from '../../../support/ladderInputs';
import { within } from '../../../support/within';

const MINUTE_MS = 60_000;

describe('turning points', () => {
  const frame = frameOf(clear, clear.sunsetMs - 20 * MINUTE_MS);
  const ladder = duskLadder({
    place: munich,
    frames: [frame],
    aim,
    plan: { ...plan, isoMax: 800 },
    lampFloorEv100: -20,
  });

  it('come in the order in which things give way, each at the rung that does it', () => {
    expect(ladder.turningPoints.map(({ code }) => code)).toEqual([
      'handheld_limit',
      'aperture_opens',
      'iso_rises',
      'out_of_reach',
    ]);
    const [limit, opens, rises, out] = ladder.turningPoints;
    const rungAt = (atMs: number | undefined) => ladder.rungs.find((rung) => rung.atMs === atMs);
    expect(rungAt(limit?.atMs)?.shutterS).toBe(1 / 8);
    expect(rungAt(opens?.atMs)?.aperture).toBeLessThan(4);
    expect(rungAt(rises?.atMs)?.iso).toBeGreaterThan(100);
    // Out of reach: half a third under the last setting, f/2, 1/8 s, ISO 800.
    within(truthOf(clear)(out?.atMs ?? NaN), sceneEv100(2, 1 / 8, 800) - 1 / 6, 1e-3, 'scene');
    expect(ladder.rungs.at(-1)?.iso).toBe(800);
  });

  it('end the ladder, where nothing else is said, when the sky is dark, or at its darkest', () => {
    const endOf = (latitude: number) => {
      const place = { latitude, longitude: 11.5 };
      const sunsetMs = eveningMs(place, clear.sunsetMs, -50 / 60);
      const { rungs } = duskLadder({
        place,
        frames: [frameOf({ ...clear, place, sunsetMs }, sunsetMs)],
        aim,
        plan,
      });
      return sunPosition(place, rungs.at(-1)?.untilMs ?? NaN);
    };
    within(endOf(40).altitudeDeg, -18, 1e-6, 'altitude');
    // In June at 55 degrees the sun turns at −11.6 degrees.
    within(endOf(55).climbDegPerMinute, 0, 1e-5, 'climb');
    within(endOf(55).altitudeDeg, -11.56, 0.02, 'altitude');
  });

  it('tell where the flash cannot follow: at its lowest power once the ISO has risen', () => {
    const onSubject = {
      guideNumberM: 40,
      distanceM: 3,
      lossStops: 1,
      minPower: 1 / 32,
      stepStops: 1 / 3,
      belowBackgroundStops: 1,
    };
    const { rungs, turningPoints } = duskLadder({
      place: munich,
      frames: [frame],
      aim: { backgroundStops: -1, subjectStops: 0 },
      plan,
      flash: { syncS: 1 / 128, onSubject },
    });
    const limit = turningPoints.find(({ code }) => code === 'flash_limit');
    const rung = rungs.find(({ atMs }) => atMs === limit?.atMs);
    expect(rung?.power).toBe(1 / 32);
    for (const { aperture, shutterS, iso, power, atMs } of rungs) {
      expect(shutterS).toBeGreaterThanOrEqual(1 / 128);
      if (typeof power !== 'number' || atMs >= (limit?.atMs ?? 0)) continue;
      // The subject's ambient is a stop under a background that is a stop under a middle tone.
      const stops = flashStops({ ...onSubject, aperture, iso, power }, { lossStops: 1 });
      within(Math.log2(2 ** stops + 2 ** -2), 0, 1 / 6 + 1e-9, 'subject');
    }
  });

  it('say from the start on that a scene is too bright for the sync speed, and when it no longer is', () => {
    const { turningPoints, rungs } = duskLadder({
      ...inputOf(clear),
      flash: { syncS: 1 / 4 },
      plan: { ...plan, slowestShutterS: 2 },
    });
    const [start, end] = turningPoints.filter(({ code }) => code === 'out_of_reach');
    expect(start).toMatchObject({ atMs: rungs[0]?.atMs, isLeft: false });
    expect(end?.isLeft).toBe(true);
    within(truthOf(clear)(end?.atMs ?? NaN), sceneEv100(4, 1 / 4, 100) + 1 / 6, 1e-3, 'scene');
  });
});

describe('at dawn', () => {
  const place = { latitude: 30, longitude: 35 };
  const startMs = Date.UTC(2026, 9, 12, 2, 50);
  const evening: Evening = { place, sunsetMs: startMs, offsetStops: 0.5, floorEv100: null };
  const ladder = duskLadder({ place, frames: [frameOf(evening, startMs)], aim, plan, lampFloorEv100: -20 });

  it('the ladder rises: it takes back what it gave, and says when each is held again', () => {
    expect(ladder.rungs.length).toBeGreaterThan(10);
    ladder.rungs.forEach((rung, index) => {
      const before = ladder.rungs[index - 1];
      if (before) expect(evOfRung(rung)).toBeGreaterThan(evOfRung(before));
    });
    const codes = ladder.turningPoints.map(({ code, isLeft }) => `${code} ${isLeft}`);
    expect(codes.slice(-3)).toEqual(['iso_rises true', 'aperture_opens true', 'handheld_limit true']);
  });

  it('it ends when the golden hour does, and its changes may be early or late as well', () => {
    within(sunPosition(place, ladder.rungs.at(-1)?.untilMs ?? NaN).altitudeDeg, 6, 1e-6, 'altitude');
    for (const rung of ladder.rungs.slice(1)) {
      expect(rung.earlyS ?? 0).toBeGreaterThan(0);
      expect(rung.lateS ?? 0).toBeGreaterThan(0);
    }
  });
});
