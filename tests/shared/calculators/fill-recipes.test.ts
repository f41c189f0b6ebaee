import { describe, expect, it } from 'vitest';
import { fillRecipes } from '../../../shared/calculators/fill/recipes';
import { parseInput, type Calculator } from '../../../shared/contract/defineCalculator';
import { askCalculator, codesOf, faultsIn, placesOf } from '../../support/askCalculator';
import { isFiniteThroughout } from '../../support/closeTo';
import { hostileFill, threeFlashes } from '../../support/hostileFill';

const ask = (body: unknown) => askCalculator(fillRecipes, body);
const places = (body: unknown) => placesOf(faultsIn(fillRecipes, body));

const camera = {
  apertureMin: 'f/1.8',
  apertureMax: 'f/16',
  isoMin: 100,
  isoMax: 6400,
  shutterSlowest: '1/4',
  shutterFastest: '1/8000',
  syncSpeed: '1/250',
};
const key = {
  name: 'octabox',
  role: 'key',
  guideNumberM: 40,
  minPower: '1/128',
  distanceM: 2,
  lossStops: 1.5,
};
const dusk = {
  background: { ev100: 8 },
  subjectAmbient: { belowBackgroundStops: 2 },
  camera,
  flashes: [key],
};
const firstOf = (body: unknown) => {
  const [first] = ask(body).result.recipes;
  if (!first) throw new Error('there is no recipe');
  return first;
};

describe('fill/recipes, worked question', () => {
  it('puts background and subject on a middle tone at dusk with one key', () => {
    // The subject's ambient light is 2 stops under: the flash adds log2(1 − 1/4) = −0.415 (derivation).
    const { result } = ask(dusk);
    expect(result).not.toHaveProperty('whyNot');
    for (const { outcome, sync } of result.recipes) {
      expect(outcome.onAim).toBe(true);
      expect(Math.abs(outcome.backgroundStops)).toBeLessThan(0.17);
      expect(Math.abs((outcome.subjectFlashStops ?? NaN) + 0.415)).toBeLessThan(0.3);
      expect(sync).toBe('normal');
    }
    const scores = result.recipes.map(({ score }) => score);
    expect(scores).toEqual([...scores].sort((a, b) => a - b));
  });

  it('takes a test frame for the light, with what came out of it', () => {
    // f/4, 1/64 s, ISO 100 are EV 10; a background half a stop too bright there is EV 10.5.
    const frame = { aperture: 'f/4', shutter: '1/60', iso: 100, offsetStops: 0.5 };
    const typed = firstOf({ ...dusk, background: { testFrame: frame } });
    expect(typed).toEqual(firstOf({ ...dusk, background: { ev100: 10.5 } }));
  });

  it('gives recipes that differ in kind: none is within a stop of another in aperture, shutter and ISO', () => {
    const { recipes } = ask({ ...dusk, count: 6 }).result;
    expect(recipes.length).toBe(6);
    const at = ({ settings: { aperture, shutter, iso } }: (typeof recipes)[number]) => [
      2 * Math.log2(aperture.exact),
      Math.log2(shutter.exact),
      Math.log2(iso.exact),
    ];
    for (const [i, one] of recipes.entries())
      for (const other of recipes.slice(i + 1)) {
        const apart = at(one).map((stops, axis) => Math.abs(stops - (at(other)[axis] ?? 0)));
        expect(Math.max(...apart)).toBeGreaterThan(1 - 1e-9);
      }
  });

  it('follows what is preferred', () => {
    const widest = firstOf({ ...dusk, prefer: 'shallowFocus' });
    const deepest = firstOf({ ...dusk, prefer: 'deepFocus' });
    expect(widest.settings.aperture.mark).toBe('f/1.8');
    expect(deepest.settings.aperture.exact).toBeGreaterThan(3 * widest.settings.aperture.exact);
    expect(firstOf({ ...dusk, prefer: 'lowIso' }).settings.iso.mark).toBe('100');
    const sparing = firstOf({ ...dusk, prefer: 'battery' }).flashes[0]?.power.exact;
    expect(sparing).toBeLessThanOrEqual(firstOf(dusk).flashes[0]?.power.exact ?? NaN);
  });
});

describe('fill/recipes where the answer would mislead', () => {
  it('sends nobody to a flash where ambient light is too bright already', () => {
    const { result, notes } = ask({ ...dusk, subjectAmbient: { belowBackgroundStops: -1 } });
    expect(result.recipes.every(({ flashes }) => flashes.length === 0)).toBe(true);
    const shade = result.whyNot?.find(({ limit }) => limit === 'ambient_too_bright');
    expect(shade?.shortByStops).toBeCloseTo(1, 9);
    expect(shade?.giveUp).toMatch(/Shade the subject by 1 stop; no flash darkens/);
    expect(codesOf(notes)).toContain('ambient_too_bright');
    for (const { limit } of result.whyNot ?? []) expect(limit).not.toMatch(/power|least|missing/);
  });

  it('offers an outshone flash nearness, heads and less loss, and neither aperture nor ISO nor filter', () => {
    // At 1/203 s f/10.1 and ISO 100 EV 14.33 is right. Full power: 2·log2(5/(10.1·4)) stops, far under −0.415.
    const weak = { ...key, guideNumberM: 5, distanceM: 4, lossStops: 0 };
    const { result, notes } = ask({ ...dusk, background: { ev100: 14.33 }, flashes: [weak] });
    const limits = (result.whyNot ?? []).map(({ limit }) => limit);
    for (const limit of limits) expect(limit).not.toMatch(/^(aperture|iso|nd)_/);
    const short = result.whyNot?.find(({ limit }) => limit === 'key_power');
    expect(short?.distanceFactor).toBeCloseTo(2 ** (-(short?.shortByStops ?? NaN) / 2), 9);
    expect(short?.headsFactor).toBeCloseTo(2 ** (short?.shortByStops ?? NaN), 6);
    expect(codesOf(notes)).toContain('flash_outshone');
    // Moved as it says, the flash is enough.
    const nearer = { ...weak, distanceM: 4 * (short?.distanceFactor ?? NaN) };
    expect(firstOf({ ...dusk, background: { ev100: 14.33 }, flashes: [nearer] }).outcome.onAim).toBe(true);
  });

  it('says that the loss of high-speed sync beyond the model is not measured', () => {
    const able = { ...camera, apertureMax: 'f/2', shutterSlowest: '1/1000', highSpeedSync: {} };
    const day = { ...dusk, background: { ev100: 13 }, camera: able, flashes: [{ ...key, guideNumberM: 60 }] };
    expect(firstOf(day).sync).toBe('highSpeed');
    expect(codesOf(ask(day).notes)).toEqual(['hss_as_continuous', 'hss_loss_unmeasured']);
    const measured = { ...able, highSpeedSync: { extraLossStops: 0.3 } };
    expect(codesOf(ask({ ...day, camera: measured }).notes)).toEqual(['hss_as_continuous']);
  });

  it('names what is missing where there is no flash, and by which guide number', () => {
    const { result } = ask({ ...dusk, flashes: [], aim: { ratio: 3, rimStops: 0 } });
    const limits = (result.whyNot ?? []).map(({ limit }) => limit);
    expect(limits).toEqual(expect.arrayContaining(['key_missing', 'fill_missing', 'rim_missing']));
    const missing = result.whyNot?.find(({ limit }) => limit === 'key_missing');
    expect(missing?.giveUp).toMatch(/guide number/);
  });

  it('gives up the cheapest first, each with the recipe that results', () => {
    // A flash that goes low enough not to stand in the way itself.
    const dark = { ...dusk, background: { ev100: -4 }, flashes: [{ ...key, minPower: 1 / 4096 }] };
    const { whyNot = [] } = ask(dark).result;
    expect(whyNot.length).toBeGreaterThan(1);
    const slower = whyNot.find(({ limit }) => limit === 'shutter_slowest');
    // f/1.8 at ISO 6400 and 1/4 s is EV 1.67 + 2 − 6 = −2.33; half a step may be missed, so 1.67 stops are short.
    expect(slower?.shortByStops).toBeCloseTo(5 / 3, 9);
    expect(slower?.recipe?.outcome.onAim).toBe(true);
    const left = whyNot.map(({ leavesStops, shortByStops }) => leavesStops * 1000 + (shortByStops ?? 999));
    expect(left).toEqual([...left].sort((a, b) => a - b));
  });
});

describe('fill/recipes at the slow end', () => {
  it('takes a limit of whole seconds for a mark that the shutter has', () => {
    // f/4, 40 s, ISO 100 are EV 4 − log2 40 = −1.32; the next mark, 30 s, is a third of a stop off.
    const night = { ...camera, apertureMin: 'f/4', apertureMax: 'f/4', isoMax: 100, shutterSlowest: '40s' };
    const dark = { ...dusk, background: { ev100: 4 - Math.log2(40) }, camera: night, flashes: [] };
    expect(firstOf({ ...dark, subjectAmbient: { belowBackgroundStops: 0 } }).settings.shutter).toMatchObject({
      exact: 40,
      mark: '40s',
    });
  });
});

describe('fill/recipes, what is refused', () => {
  it('limits that cross, a curtain slower than the sync speed, a name twice, light said twice', () => {
    expect(places({ ...dusk, camera: { ...camera, apertureMax: 'f/1.4' } })).toEqual([
      '/camera/apertureMax limits_crossed',
    ]);
    expect(places({ ...dusk, camera: { ...camera, highSpeedSync: { curtainS: 0.01 } } })).toEqual([
      '/camera/highSpeedSync/curtainS curtain_slower_than_sync',
    ]);
    expect(places({ ...dusk, flashes: [key, key] })).toEqual(['/flashes/1/name name_twice']);
    expect(places({ ...dusk, subjectAmbient: { ev100: 6, belowBackgroundStops: 2 } })).toEqual([
      '/subjectAmbient/belowBackgroundStops exactly',
    ]);
    expect(places({ ...dusk, flashes: [{ ...key, minM: 1, maxM: 2 }] })[0]).toMatch(/^\/flashes\/0\//);
  });

  it('more ways to set the flashes than are gone through, saying what helps', () => {
    const many = Array.from({ length: 6 }, (_, i) => ({ ...key, name: `flash ${i}` }));
    const [fault] = faultsIn(fillRecipes, { ...dusk, flashes: many });
    expect(fault?.code).toBe('too_many_power_settings');
    expect(fault?.detail).toMatch(/role key.*give flashes that stand together/);
    expect(places({ ...dusk, flashes: many.slice(0, 3) })).toEqual([]);
  });
});

describe('fill/recipes over hostile requests', () => {
  it('answers finite numbers that pass its schema, each limit held, or says what is wrong (250 requests)', () => {
    let answered = 0;
    for (let seed = 1; seed <= 250; seed++) {
      const body = hostileFill(seed);
      if (!('input' in parseInput(fillRecipes as unknown as Calculator, body))) continue;
      const answer = ask(body);
      expect(isFiniteThroughout(answer), `seed ${seed}`).toBe(true);
      expect(fillRecipes.output.safeParse(answer.result).success, `seed ${seed}`).toBe(true);
      answered++;
    }
    expect(answered).toBeGreaterThan(180);
  });

  it('answers the dusk portrait of three flashes with five recipes on the aim', () => {
    const { recipes } = ask(threeFlashes).result;
    expect(recipes.length).toBe(5);
    expect(recipes.every(({ outcome }) => outcome.onAim)).toBe(true);
  });
});
