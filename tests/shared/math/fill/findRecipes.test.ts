import { describe, expect, it } from 'vitest';
import { countOf } from '../../../../shared/math/fill/fillMisses';
import { fillOutcome } from '../../../../shared/math/fill/fillOutcome';
import { missCounts } from '../../../../shared/math/fill/fillScore';
import {
  exactSettingsOf,
  type FillFlash,
  type FillRecipe,
  type FillWish,
} from '../../../../shared/math/fill/fillTypes';
import { findRecipes } from '../../../../shared/math/fill/findRecipes';
import { leastMissesOf, type OracleMisses } from '../../../support/fillOracle';
import { leastScoreOf } from '../../../support/fillScoreOracle';
import { fillScenario, type ScenarioOptions } from '../../../support/fillScenarios';

const KITS: ScenarioOptions[] = [
  { marks: [3, 3, 6], roles: ['key'], powers: 9 },
  { marks: [2, 3, 5], roles: ['key', 'fill'], powers: 6 },
  { marks: [2, 2, 5], roles: ['key', 'fill', 'rim'], powers: 5 },
  { marks: [2, 2, 4], roles: ['key', 'key', 'fill'], powers: 5 },
  { marks: [4, 4, 8], roles: [], powers: 1 },
  { marks: [2, 3, 5], roles: ['fill', 'rim'], powers: 7 },
];

const onAimOf = (wish: FillWish) => countOf({ third: 1 / 6, half: 1 / 4, full: 1 / 2 }[wish.camera.scale]);

/** What the first recipe misses by, as the oracle tells it. */
function missesOf(wish: FillWish): OracleMisses {
  const { recipes, search } = findRecipes(wish);
  const [first] = recipes;
  if (!first) return { main: Infinity, beside: Infinity, near: Infinity };
  const { main, beside, near } = missCounts(search.problem, first.outcome);
  return { main, beside: main > onAimOf(wish) ? 0 : beside, near };
}

/** Nearness within half a step counts as one: what is over it is compared part by part. */
const overAim = ({ main, beside, near }: OracleMisses, onAim: number) => [
  Math.max(0, main - onAim),
  Math.max(0, beside - onAim),
  near,
];

function limitsHeld(wish: FillWish, { aperture, shutter, iso, ndStops, sync, flashes }: FillRecipe): void {
  const { camera } = wish;
  const isWithin = (value: number, low: number, high: number) => {
    expect(value).toBeGreaterThanOrEqual(low * (1 - 1e-9));
    expect(value).toBeLessThanOrEqual(high * (1 + 1e-9));
  };
  isWithin(aperture.exact, camera.apertureMin, camera.apertureMax);
  isWithin(iso.exact, camera.isoMin, camera.isoMax);
  isWithin(shutter.exact, camera.shutterFastestS, camera.shutterSlowestS);
  expect([0, ...camera.ndStops]).toContain(ndStops);
  const isFaster = shutter.exact < camera.syncSpeedS * (1 - 1e-9);
  expect(sync).toBe(flashes.length === 0 ? 'none' : isFaster ? 'highSpeed' : 'normal');
  if (sync === 'highSpeed') expect(camera.highSpeedSync).not.toBeNull();
  for (const { flash, power, distanceM } of flashes) {
    isWithin(distanceM, flash.nearM, flash.farM);
    isWithin(power, flash.minPower, 1);
    const steps = -Math.log2(power) / flash.powerStepStops;
    expect(Math.abs(steps - Math.round(steps))).toBeLessThan(1e-9);
    if (flash.role === 'rim') expect(wish.aim.rimStops).not.toBeNull();
  }
}

describe('recipes against going through every combination', () => {
  it('misses by no more than the best of all combinations, with fixed flashes, over 1,000 requests (seeds 1 to 1000)', () => {
    let checked = 0;
    for (let seed = 1; seed <= 1000; seed++) {
      const wish = fillScenario(seed, KITS[seed % KITS.length] as ScenarioOptions);
      const onAim = onAimOf(wish);
      const oracle = leastMissesOf(wish, onAim);
      expect(overAim(missesOf(wish), onAim), `seed ${seed}`).toEqual(overAim(oracle, onAim));
      checked++;
    }
    expect(checked).toBe(1000);
  });

  it('gives the recipe with the least score of all combinations first (seeds 2001 to 2200)', () => {
    for (let seed = 2001; seed <= 2200; seed++) {
      const kit = KITS[seed % KITS.length] as ScenarioOptions;
      const wish = fillScenario(seed, { ...kit, marks: [2, 2, 4], powers: Math.min(kit.powers, 5) });
      const [first] = findRecipes(wish).recipes;
      const oracle = leastScoreOf(wish);
      expect(
        Math.abs((first?.score ?? NaN) - oracle),
        `seed ${seed}: ${first?.score} against ${oracle}`,
      ).toBeLessThan(1e-6);
    }
  });

  it('misses by no more than any of many distances, where flashes may be moved (seeds 5001 to 5200)', () => {
    const sampled = ({ nearM, farM }: FillFlash) =>
      nearM === farM ? [nearM] : Array.from({ length: 12 }, (_, i) => nearM * (farM / nearM) ** (i / 11));
    for (let seed = 5001; seed <= 5200; seed++) {
      const kit = KITS[seed % 2] as ScenarioOptions;
      const wish = fillScenario(seed, { ...kit, powers: 4, isMovable: true });
      const onAim = onAimOf(wish);
      const [found, oracle] = [missesOf(wish), leastMissesOf(wish, onAim, sampled)].map((misses) =>
        overAim(misses, onAim).reduce((sum, part) => sum * 2000 + part, 0),
      );
      expect(found, `seed ${seed}`).toBeLessThanOrEqual(oracle ?? NaN);
    }
  });

  it('keeps every limit, and claims what the forward calculation gives (seeds 1 to 600)', () => {
    let recipesSeen = 0;
    for (let seed = 1; seed <= 600; seed++) {
      const wish = fillScenario(seed, { ...(KITS[seed % KITS.length] as ScenarioOptions), isMovable: true });
      for (const recipe of findRecipes(wish).recipes) {
        limitsHeld(wish, recipe);
        const again = fillOutcome(wish, exactSettingsOf(recipe), recipe.sync, recipe.flashes);
        expect(again).toEqual(recipe.outcome);
        recipesSeen++;
      }
    }
    expect(recipesSeen).toBeGreaterThan(600);
  });
});
