import { describe, expect, it } from 'vitest';
import { countOf } from '../../../../shared/math/fill/fillMisses';
import { missCounts, onAimCount } from '../../../../shared/math/fill/fillScore';
import type { FillFlash, FillRecipe, FillWish } from '../../../../shared/math/fill/fillTypes';
import { findRecipes } from '../../../../shared/math/fill/findRecipes';
import { exactAt } from '../../../../shared/math/marks';
import { fillScenario, seeded, type ScenarioOptions } from '../../../support/fillScenarios';

const KITS: ScenarioOptions[] = [
  { marks: [3, 3, 6], roles: ['key'], powers: 9, isMovable: true },
  { marks: [2, 3, 5], roles: ['key', 'fill'], powers: 6 },
  { marks: [2, 2, 5], roles: ['key', 'fill', 'rim'], powers: 5, isMovable: true },
];
const scenario = (seed: number) => fillScenario(seed, KITS[seed % KITS.length] as ScenarioOptions);

/** The best recipe's misses as one number: the main ones outweigh those beside, and those what is nearer than half a step. */
function errorOf(wish: FillWish): number {
  const { recipes, search } = findRecipes(wish);
  const [first] = recipes;
  if (!first) return Infinity;
  const onAim = onAimCount(search.problem.grid);
  const { main, beside, near } = missCounts(search.problem, first.outcome);
  const over = Math.max(0, main - onAim);
  return over * 1e7 + (over > 0 ? 0 : Math.max(0, beside - onAim) * 1e3) + near;
}

const secondKey: FillFlash = {
  name: 'one more',
  role: 'key',
  guideNumberM: 30,
  minPower: 1 / 16,
  powerStepStops: 1,
  nearM: 2,
  farM: 2,
  lossStops: 0,
  t05S: null,
  control: 'decay',
  recycleFullS: null,
};

/** The same request with more gear, in one respect each. */
function withMoreGear({ camera, ...wish }: FillWish): FillWish[] {
  const stop = (exact: number, stops: number) => exact * 2 ** stops;
  return [
    { ...wish, camera: { ...camera, ndStops: [...camera.ndStops, 1, 4] } },
    { ...wish, camera: { ...camera, isoMax: stop(camera.isoMax, 1) } },
    { ...wish, camera: { ...camera, apertureMin: stop(camera.apertureMin, -0.5) } },
    { ...wish, camera: { ...camera, shutterSlowestS: stop(camera.shutterSlowestS, 1) } },
    { ...wish, camera, flashes: [...wish.flashes, secondKey] },
    { ...wish, camera, flashes: wish.flashes.map((one) => ({ ...one, nearM: one.nearM / 2 })) },
    { ...wish, camera, flashes: wish.flashes.map((one) => ({ ...one, minPower: one.minPower / 2 })) },
  ];
}

const settingsOf = ({ aperture, shutter, iso, ndStops }: FillRecipe) => [
  aperture.label,
  shutter.label,
  iso.label,
  ndStops,
];

describe('recipes, whatever the request', () => {
  it('never miss by more with more gear (seeds 7001 to 7200, seven kinds of gear each)', () => {
    let better = 0;
    for (let seed = 7001; seed <= 7200; seed++) {
      const wish = scenario(seed);
      const before = errorOf(wish);
      withMoreGear(wish).forEach((more, i) => {
        const after = errorOf(more);
        expect(after, `seed ${seed}, gear ${i}`).toBeLessThanOrEqual(before);
        if (after < before) better++;
      });
    }
    expect(better).toBeGreaterThan(200);
  });

  it('stay as they are when the flashes are named in another order (seeds 7301 to 7500)', () => {
    const byName = (recipes: readonly FillRecipe[]) =>
      recipes.map((recipe) => [
        ...settingsOf(recipe),
        recipe.flashes
          .map(({ flash, power, distanceM }) => `${flash.name} ${power} ${distanceM.toFixed(9)}`)
          .sort(),
      ]);
    for (let seed = 7301; seed <= 7500; seed++) {
      const wish = scenario(seed);
      const turned = { ...wish, flashes: [...wish.flashes].reverse() };
      expect(byName(findRecipes(turned).recipes), `seed ${seed}`).toEqual(byName(findRecipes(wish).recipes));
    }
  });

  it('ask one stop more of the flash, and nothing else, in a scene one stop brighter behind one more stop of filter', () => {
    const random = seeded(11);
    let compared = 0;
    for (let round = 0; round < 300; round++) {
      const scale = 'third';
      const [aperture, iso] = [exactAt('aperture', scale, 12), exactAt('iso', scale, 3)];
      const shutterS = exactAt('shutter', scale, 18);
      const ev = Math.log2((aperture * aperture) / shutterS) - Math.log2(iso / 100);
      const filter = 1 + Math.floor(random() * 18) / 3;
      const below = 0.5 + 4 * random();
      const key = { ...secondKey, guideNumberM: 8 + 40 * random(), minPower: 1 / 512, powerStepStops: 1 / 3 };
      const at = (more: number): FillWish => ({
        scene: {
          backgroundEv100: ev + filter + more,
          subjectEv100: ev + filter + more - below,
          rimEv100: null,
        },
        aim: { backgroundStops: 0, subjectStops: 0, ratio: null, rimStops: null },
        camera: {
          scale,
          apertureMin: aperture,
          apertureMax: aperture,
          isoMin: iso,
          isoMax: iso,
          shutterSlowestS: shutterS,
          shutterFastestS: shutterS,
          syncSpeedS: shutterS,
          highSpeedSync: null,
          shutCurtainS: 0,
          ndStops: [filter + more],
        },
        flashes: [key],
        motion: { view: null, subject: null, handheld: null },
        prefer: null,
        count: 1,
      });
      const [before] = findRecipes(at(0)).recipes;
      const [after] = findRecipes(at(1)).recipes;
      const [one, other] = [before?.flashes[0], after?.flashes[0]];
      // A flash at its limits has no stop more to give; then only the best that it can do is found.
      if (!one || !other || one.power > 0.5 || other.power < 1 / 256) continue;
      expect(after && settingsOf(after)).toEqual(before && [...settingsOf(before).slice(0, 3), filter + 1]);
      expect(other.power / one.power).toBeCloseTo(2, 9);
      expect(countOf((after?.outcome.missStops ?? NaN) - (before?.outcome.missStops ?? NaN))).toBe(0);
      compared++;
    }
    expect(compared).toBeGreaterThan(100);
  });
});
