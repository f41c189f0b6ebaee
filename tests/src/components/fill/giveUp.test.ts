import { describe, expect, it } from 'vitest';
import { fillRecipes } from '../../../../shared/calculators/fill/recipes';
import { givenUp } from '../../../../src/components/fill/giveUp';
import type { Body } from '../../../../src/form/body';
import { askCalculator } from '../../../support/askCalculator';
import { seeded } from '../../../support/fillScenarios';

const camera = {
  apertureMin: 'f/2.8',
  apertureMax: 'f/11',
  isoMin: 100,
  isoMax: 3200,
  shutterSlowest: '1/30',
  shutterFastest: '1/4000',
  syncSpeed: '1/200',
};
const key = {
  name: 'octabox',
  role: 'key',
  guideNumberM: 30,
  minPower: '1/64',
  distanceM: 2.5,
  lossStops: 1.5,
};
const fill = { name: 'umbrella', role: 'fill', guideNumberM: 20, minPower: '1/64', minM: 2, maxM: 4 };

/** A request that may be out of reach in any of many ways. */
function wish(seed: number): Body {
  const random = seeded(seed);
  const ratio = random() < 0.4 ? { ratio: 3 } : {};
  const rim = random() < 0.3 ? { rimStops: 2 * random() - 1 } : {};
  return {
    background: { ev100: 16 * random() },
    subjectAmbient: random() < 0.5 ? { belowBackgroundStops: 5 * random() - 1 } : { ev100: 12 * random() },
    aim: { backgroundStops: -random(), ...ratio, ...rim },
    camera,
    flashes: [key, fill, { ...key, name: 'strip', role: 'rim' }],
    count: 1,
  };
}

describe('giving a limit up', () => {
  it('changes the request so that what was promised comes out, whichever limit it is (400 requests)', () => {
    const kept = new Map<string, number>();
    for (let seed = 1; seed <= 400; seed++) {
      const body = wish(seed);
      for (const limit of askCalculator(fillRecipes, body).result.whyNot ?? []) {
        const next = givenUp(body, limit);
        if (!limit.recipe) {
          expect(next, limit.limit).toBeNull();
          continue;
        }
        const again = askCalculator(fillRecipes, next).result;
        const [first] = again.recipes;
        // What remains of the aim is met as well as the answer said, give or take the rounding of an address.
        const promised = limit.leavesStops === 0 ? 1 / 6 : limit.leavesStops;
        const { ratioStops, rimStops, ...main } = first?.outcome.misses ?? {
          backgroundStops: NaN,
          subjectStops: NaN,
        };
        const left = limit.leavesStops === 0 ? [ratioStops, rimStops] : [];
        for (const stops of [...Object.values(main), ...left]) {
          if (stops === undefined || stops === null) continue;
          expect(Math.abs(stops), `seed ${seed}, ${limit.limit}`).toBeLessThanOrEqual(promised + 0.01);
        }
        kept.set(limit.limit, (kept.get(limit.limit) ?? 0) + 1);
      }
    }
    expect([...kept.keys()].length).toBeGreaterThan(10);
  });

  it('leaves the rest of the request as it was', () => {
    const body = wish(1);
    const limit = { limit: 'aim_ratio', shortByStops: null, giveUp: '', leavesStops: 0 };
    expect(givenUp(body, limit)).toBeNull();
    const [recipe] = askCalculator(fillRecipes, body).result.recipes;
    const next = givenUp({ ...body, aim: { ratio: 3, subjectStops: 0.5 } }, { ...limit, recipe });
    expect(next).toEqual({ ...body, aim: { subjectStops: 0.5 } });
  });
});
