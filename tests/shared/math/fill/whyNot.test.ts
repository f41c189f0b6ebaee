import { describe, expect, it } from 'vitest';
import type { ExactSettings } from '../../../../shared/math/exposure';
import { onAimCount, onAimStops } from '../../../../shared/math/fill/fillScore';
import { isOnAim } from '../../../../shared/math/fill/fillSearch';
import type { FillWish } from '../../../../shared/math/fill/fillTypes';
import { findRecipes } from '../../../../shared/math/fill/findRecipes';
import { movableLimits } from '../../../../shared/math/fill/limits';
import type { LimitInTheWay } from '../../../../shared/math/fill/limitInTheWay';
import { whyNot } from '../../../../shared/math/fill/whyNot';
import { flashStops } from '../../../../shared/math/flashExposure';
import { everySetting, isMetBy, judgeOf, syncOf } from '../../../support/fillOracle';
import { fillScenario, type ScenarioOptions } from '../../../support/fillScenarios';

const KITS: ScenarioOptions[] = [
  { marks: [2, 2, 4], roles: ['key'], powers: 5 },
  { marks: [2, 2, 4], roles: ['key', 'fill'], powers: 3 },
  { marks: [2, 2, 4], roles: ['key', 'rim'], powers: 3 },
  { marks: [3, 2, 4], roles: [], powers: 1 },
];

interface Asked {
  readonly seed: number;
  readonly wish: FillWish;
  readonly limits: readonly LimitInTheWay[];
  readonly onAim: number;
}

/** Requests over gear that can't meet the aim, with what stands in the way. */
function* unmet(from: number, to: number, kits = KITS): Generator<Asked> {
  for (let seed = from; seed <= to; seed++) {
    const wish = fillScenario(seed, kits[seed % kits.length] as ScenarioOptions);
    const { search } = findRecipes(wish);
    const onAim = onAimCount(search.problem.grid);
    if (!isOnAim(search)) yield { seed, wish, limits: whyNot(search), onAim };
  }
}

/** The request with everything that the movable limit allows, so far that going through it stays bearable. */
const MOST_STEPS = 9;

describe('what stands in the way, against going through every combination', () => {
  it('names a limit of the camera exactly when moving it is enough, and by the fewest steps (seeds 1 to 100)', () => {
    let [named, asked] = [0, 0];
    for (const { seed, wish, limits, onAim } of unmet(1, 100)) {
      asked++;
      for (const { limit, mostSteps, movedBy } of movableLimits(wish)) {
        const found = limits.find((one) => one.limit === limit && one.leavesStops === 0);
        const steps = found ? Math.round((found.shortByStops ?? NaN) * stepsOf(wish)) : null;
        const where = `seed ${seed}, ${limit}, ${steps} steps`;
        for (let step = 1; step <= Math.min(mostSteps, MOST_STEPS); step++) {
          if (steps !== null && step > steps) break;
          expect(isMetBy(movedBy(step), onAim), `${where}, at ${step}`).toBe(step === steps);
        }
        if (steps !== null) named++;
      }
    }
    expect(asked).toBeGreaterThan(60);
    expect(named).toBeGreaterThan(25);
  });

  it('says by how much a lone key is short, to a hundredth of a stop (seeds 601 to 1400)', () => {
    let named = 0;
    for (const { seed, wish, limits } of unmet(601, 1400, KITS.slice(0, 1))) {
      const found = limits.find((one) => one.limit === 'key_power' && one.leavesStops === 0);
      if (!found) continue;
      const [flash] = wish.flashes;
      if (!flash || flash.t05S !== null) continue;
      let short = Infinity;
      for (const { settings } of everySetting(wish)) {
        const judge = judgeOf(wish, settings);
        const { shutterS, ndStops } = settings;
        const sync = syncOf(wish, shutterS);
        const missing = 2 ** wish.aim.subjectStops - judge.ambient;
        if (judge.background > onAimStops(wish.camera.scale) || sync === 'none') continue;
        if (!(missing > 0)) continue;
        const hss = wish.camera.highSpeedSync;
        const loss =
          sync === 'highSpeed' && hss
            ? Math.log2((hss.curtainS + shutterS) / shutterS) + hss.extraLossStops
            : 0;
        const full = flashStops(
          { ...settings, guideNumberM: flash.guideNumberM, distanceM: flash.nearM, power: 1 },
          { lossStops: flash.lossStops + ndStops + loss },
        );
        // Between two powers a flash that is strong enough may still have to move a little.
        const below =
          (((full - Math.log2(missing)) % flash.powerStepStops) + flash.powerStepStops) %
          flash.powerStepStops;
        short = Math.min(
          short,
          full >= Math.log2(missing) ? flash.powerStepStops - below : Math.log2(missing) - full,
        );
      }
      expect(Math.abs((found.shortByStops ?? NaN) - short), `seed ${seed}`).toBeLessThan(0.01);
      named++;
    }
    expect(named).toBeGreaterThan(10);
  });

  it('gives with each limit the recipe that results, which meets what remains of the aim (seeds 1 to 400)', () => {
    let recipes = 0;
    for (const { seed, wish, limits } of unmet(1, 400)) {
      expect(limits.length, `seed ${seed}`).toBeGreaterThan(0);
      for (const { limit, shortByStops, leavesStops, recipe } of limits) {
        if (shortByStops !== null) expect(shortByStops, `seed ${seed} ${limit}`).toBeGreaterThan(0);
        if (!recipe || limit.startsWith('aim_')) continue;
        const size = Math.max(
          Math.abs(recipe.outcome.misses.backgroundStops),
          limit === 'ambient_too_bright' ? 0 : Math.abs(recipe.outcome.misses.subjectStops),
        );
        const allowed = leavesStops === 0 ? onAimStops(wish.camera.scale) : leavesStops + 1e-9;
        expect(size, `seed ${seed} ${limit}`).toBeLessThanOrEqual(allowed);
        recipes++;
      }
    }
    expect(recipes).toBeGreaterThan(150);
  });

  it('says by how much the subject would have to be shaded, and by how much the background to be darker (seeds 3001 to 3800)', () => {
    let shaded = 0;
    for (const { seed, wish, limits } of unmet(3001, 3800, KITS.slice(0, 1))) {
      const found = limits.find((one) => one.limit === 'ambient_too_bright');
      if (!found) continue;
      const over = everySetting(wish)
        .map(({ settings }) => judgeOf(wish, settings))
        .filter(({ background }) => background <= onAimStops(wish.camera.scale))
        .map(({ ambient }) => Math.log2(ambient) - wish.aim.subjectStops);
      expect(found.shortByStops, `seed ${seed}`).toBeCloseTo(Math.min(...over), 9);
      shaded++;
    }
    expect(shaded).toBeGreaterThan(5);
  });

  it('gives up as little of the background as lets the flashes be right (seeds 1 to 100)', () => {
    let named = 0;
    for (const { seed, wish, limits, onAim } of unmet(1, 100)) {
      const found = limits.find((one) => one.limit === 'aim_background');
      const { aim } = wish;
      const { backgroundEv100 } = wish.scene;
      const misses = everySetting(wish)
        .map(({ settings }) => backgroundEv100 - evOf(settings) - aim.backgroundStops)
        .sort((a, b) => Math.abs(a) - Math.abs(b));
      const least = misses.find((miss) => {
        const moved = { ...wish, aim: { ...aim, backgroundStops: aim.backgroundStops + miss } };
        return isMetBy(moved, onAim);
      });
      if (!found) continue;
      expect(found.shortByStops, `seed ${seed}`).toBeCloseTo(Math.abs(least ?? NaN), 9);
      named++;
    }
    expect(named).toBeGreaterThan(15);
  });
});

const evOf = ({ aperture, shutterS, iso, ndStops }: ExactSettings) =>
  Math.log2((aperture * aperture) / shutterS) - Math.log2(iso / 100) + ndStops;

const stepsOf = (wish: FillWish) => ({ third: 3, half: 2, full: 1 })[wish.camera.scale];
