import { describe, expect, it } from 'vitest';
import { fillCheck } from '../../../shared/calculators/fill/check';
import { fillRecipes } from '../../../shared/calculators/fill/recipes';
import fillInSun from '../../reference/fill-in-sun.json';
import ratios from '../../reference/lighting-ratios.json';
import needed from '../../reference/mixing-needed.json';
import totals from '../../reference/mixing-totals.json';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';
import { expectAlike } from '../../support/closeTo';
import { eachRow } from '../../support/eachRow';
import { threeFlashes } from '../../support/hostileFill';
import { seeded } from '../../support/fillScenarios';

const ask = (body: unknown) => askCalculator(fillCheck, body);
const places = (body: unknown) => placesOf(faultsIn(fillCheck, body));

/** f/4 and 1/64 s at ISO 100 are EV 4 + 6 = 10. */
const EV = 10;

/** A flash that puts so many stops on the subject: GN = N·d·2^(f/2) at full power, one metre away, at f/4. */
const flashOf = (role: string, stops: number) => ({
  name: role,
  role,
  guideNumberM: 4 * 2 ** (stops / 2),
  power: 1,
  distanceM: 1,
});

const asked = (ambientStops: number, flashes: readonly object[]) => ({
  background: { ev100: EV },
  subjectAmbient: { ev100: EV + ambientStops },
  camera: { syncSpeed: '1/250' },
  settings: { aperture: 4, shutter: 1 / 64, iso: 100 },
  sync: flashes.length > 0 ? 'normal' : 'none',
  flashes,
  readAs: 'exact',
});
const outcomeOf = (ambientStops: number, flashes: readonly object[]) =>
  ask(asked(ambientStops, flashes)).result.outcome;

describe('fill/check against published and computed rows', () => {
  it('adds flash to ambient light on the subject and leaves the background alone', () => {
    eachRow(totals, 8, ({ ambientStops, flashStops, totalStops }, where) => {
      const outcome = outcomeOf(ambientStops, [flashOf('key', flashStops)]);
      expect(Math.abs(outcome.subjectStops - totalStops), where).toBeLessThanOrEqual(totals.tolerance);
      expect(outcome.flashToAmbientStops, where).toBeCloseTo(flashStops - ambientStops, 9);
      expect(outcome.backgroundStops).toBeCloseTo(0, 12);
    });
  });

  it('finds the subject on a middle tone with the flash that its missing light needs', () => {
    eachRow(needed, 7, ({ belowStops, flashStops }, where) => {
      const { subjectStops } = outcomeOf(-belowStops, [flashOf('key', flashStops)]);
      expect(Math.abs(subjectStops), where).toBeLessThanOrEqual(needed.tolerance);
    });
  });

  it('tells lit side, shadow side and their ratio with fill in the sun', () => {
    // The sun stands in as the key: all of the lit side but the shadow's own light, log2(1 − 2^s).
    eachRow(fillInSun, 6, ({ shadowStops, fillStops, litStops, shadowWithFillStops, ratio }, where) => {
      const sun = flashOf('key', Math.log2(1 - 2 ** shadowStops));
      const outcome = outcomeOf(shadowStops, [sun, flashOf('fill', fillStops)]);
      const { tolerance } = fillInSun;
      expect(Math.abs(outcome.subjectStops - litStops), where).toBeLessThanOrEqual(tolerance);
      const shadow = outcome.shadowSideStops ?? NaN;
      expect(Math.abs(shadow - shadowWithFillStops), where).toBeLessThanOrEqual(tolerance);
      expect(Math.abs((outcome.litOverShadowRatio ?? NaN) - ratio), where).toBeLessThanOrEqual(0.006);
    });
  });

  it('tells the lighting ratio as (key + fill):fill', () => {
    eachRow(ratios, 8, ({ differenceStops, ratio }, where) => {
      const { ratio: told } = outcomeOf(-8, [flashOf('key', 0), flashOf('fill', -differenceStops)]);
      expect(Math.abs((told ?? NaN) - ratio), where).toBeLessThanOrEqual(0.001 * ratio);
    });
  });

  it('keeps the rim out of the subject’s front', () => {
    const without = outcomeOf(-2, [flashOf('key', -1)]);
    const withRim = outcomeOf(-2, [flashOf('key', -1), flashOf('rim', 3)]);
    expect(withRim.subjectStops).toBe(without.subjectStops);
    expect(withRim.rimStops).toBeCloseTo(3, 9);
  });

  it('says without flash that there is none, and not that it is dark', () => {
    const outcome = outcomeOf(-2, []);
    expect(outcome).toMatchObject({ subjectFlashStops: null, flashToAmbientStops: null });
    expect(outcome.subjectStops).toBeCloseTo(-2, 9);
  });
});

/** A dusk like the bench's, every number of it a little different. */
function duskLike(seed: number) {
  const random = seeded(seed);
  return {
    ...threeFlashes,
    background: { ev100: 2 + 10 * random() },
    subjectAmbient: { belowBackgroundStops: -0.5 + 5 * random() },
    aim: {
      backgroundStops: -random(),
      ...(random() < 0.5 ? { ratio: 2 + 4 * random() } : {}),
      ...(random() < 0.5 ? { rimStops: 2 * random() - 1 } : {}),
    },
    flashes: threeFlashes.flashes.map((flash) => ({ ...flash, t05S: random() < 0.5 ? 0.002 : undefined })),
    subject: { speedMS: 2 },
    ...(random() < 0.5 ? { prefer: 'frozen' } : {}),
  };
}

describe('fill/check beside fill/recipes', () => {
  it('confirms every recipe’s claim, and every recipe that comes of giving something up (60 requests)', () => {
    let confirmed = 0;
    for (let seed = 1; seed <= 60; seed++) {
      const request = duskLike(seed);
      const { recipes, whyNot = [] } = askCalculator(fillRecipes, request).result;
      const { background, subjectAmbient, aim, camera, flashes, view, subject, support } = request;
      const inside = ['aim_background', 'aim_subject', 'aim_ratio', 'aim_rim', 'iso_max', 'shutter_slowest'];
      const given = whyNot.filter(({ limit }) => inside.includes(limit)).map(({ recipe }) => recipe);
      for (const recipe of [...recipes, ...given]) {
        if (!recipe) continue;
        const { settings } = recipe;
        const used = recipe.flashes.map(({ name, power, distanceM }) => ({
          ...flashes.find((flash) => flash.name === name),
          power: power.exact,
          distanceM,
        }));
        const told = ask({
          background,
          subjectAmbient,
          aim,
          view,
          subject,
          support,
          camera: { syncSpeed: camera.syncSpeed, highSpeedSync: camera.highSpeedSync },
          settings: {
            aperture: settings.aperture.mark,
            shutter: settings.shutter.mark,
            iso: Number(settings.iso.mark),
            ndStops: settings.ndStops,
          },
          sync: recipe.sync,
          flashes: used,
        });
        expectAlike(told.result.outcome, recipe.outcome, `seed ${seed}`);
        told.result.onSubject.forEach(({ stops }, i) =>
          expect(stops).toBeCloseTo(recipe.flashes[i]?.onSubjectStops ?? NaN, 9),
        );
        confirmed++;
      }
    }
    expect(confirmed).toBeGreaterThan(200);
  });
});

describe('fill/check, high-speed sync', () => {
  it('spreads the train of light over curtain and exposure, and lets the shutter judge motion', () => {
    // 1/1024 s behind a curtain of 1/256 s: log2((1/256 + 1/1024)·1024) = log2 5 = 2.322 stops are lost.
    const base = asked(-3, [flashOf('key', 0)]);
    const fast = ask({
      ...base,
      camera: { syncSpeed: 1 / 256, highSpeedSync: { curtainS: 1 / 256, extraLossStops: 0.5 } },
      settings: { aperture: 4, shutter: 1 / 1024, iso: 100 },
      sync: 'highSpeed',
      view: { focalLengthMm: 50, distanceM: 5, pixelPitchUm: 6 },
      subject: { speedMS: 5 },
    });
    expect(fast.result.outcome.highSpeedLossStops).toBeCloseTo(Math.log2(5) + 0.5, 9);
    expect(fast.result.outcome.keyStops).toBeCloseTo(-Math.log2(5) - 0.5, 9);
    expect(fast.result.outcome.blur?.by).toBe('shutter');
    expect(fast.result.outcome).not.toHaveProperty('ghost');
    expect(codesOf(fast.notes)).toEqual(['hss_as_continuous']);
  });

  it('lets a pulse that the shutter clips count', () => {
    // t0.5 = 1/128 s of a decay: behind an equal shutter half of the light is in, one stop less.
    const clipped = { ...flashOf('key', 0), t05S: 1 / 128, control: 'decay' };
    const { outcome } = ask({
      ...asked(-6, [clipped]),
      settings: { aperture: 4, shutter: 1 / 128, iso: 100 },
    }).result;
    expect(outcome.clippedStops).toBeCloseTo(-1, 6);
    expect(outcome.keyStops).toBeCloseTo(-1, 6);
  });
});

describe('fill/check, what is refused', () => {
  it('sync and shutter that don’t go together, flashes without sync, a curtain slower than the sync speed', () => {
    const base = asked(-1, [flashOf('key', 0)]);
    const fast = { ...base, settings: { ...base.settings, shutter: 1 / 1000 } };
    expect(places(fast)).toEqual(['/sync shutter_too_fast_for_sync']);
    expect(places({ ...fast, sync: 'highSpeed' })).toEqual(['/camera/highSpeedSync high_speed_sync_missing']);
    expect(places({ ...base, sync: 'none' })).toEqual(['/flashes flashes_without_sync']);
    const able = (curtainS: number) => ({ syncSpeed: '1/250', highSpeedSync: { curtainS } });
    expect(places({ ...base, sync: 'highSpeed', camera: able(1 / 300) })).toEqual([
      '/sync high_speed_sync_for_faster',
    ]);
    expect(places({ ...base, camera: able(1 / 100) })).toEqual([
      '/camera/highSpeedSync/curtainS curtain_slower_than_sync',
    ]);
  });
});
