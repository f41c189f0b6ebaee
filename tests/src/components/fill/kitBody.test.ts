import { describe, expect, it } from 'vitest';
import { fillRecipes } from '../../../../shared/calculators/fill/recipes';
import { kitIn } from '../../../../shared/contract/kit';
import { STARTING_KITS } from '../../../../shared/contract/startingKits';
import { firstPick, modifierChoices, withKit } from '../../../../src/components/fill/kitBody';
import { initialBody } from '../../../../src/components/fill/initialBody';
import type { Body } from '../../../../src/form/body';
import { askCalculator, faultsIn } from '../../../support/askCalculator';

const body = initialBody(fillRecipes.examples[0]?.input as Body);

describe('taking gear out of a kit', () => {
  it.each(STARTING_KITS.map(({ title, kit }) => [title, kitIn.parse(kit)] as const))(
    '“%s” makes a request that the calculator takes and answers within the kit’s limits',
    (_, kit) => {
      const next = withKit(body, kit, firstPick(kit));
      expect(faultsIn(fillRecipes, next)).toEqual([]);
      const { recipes } = askCalculator(fillRecipes, next).result;
      expect(recipes.length).toBeGreaterThan(0);
      const names = kit.flashes.map(({ name }) => name);
      const filters = [0, ...kit.filters.map(({ ndStops }) => ndStops)];
      for (const { settings, flashes } of recipes) {
        expect(settings.iso.exact).toBeLessThanOrEqual(Number(kit.cameras[0]?.isoMax));
        expect(filters).toContain(settings.ndStops);
        for (const { name } of flashes) expect(names).toContain(name);
      }
    },
  );

  const kit = kitIn.parse({
    cameras: [
      {
        name: 'Small sensor',
        sensorWidthMm: 18,
        sensorHeightMm: 12,
        pixelsAcross: 6000,
        isoMin: 200,
        isoMax: 1600,
        shutterSlowest: '1/30',
        shutterFastest: '1/4000',
        syncSpeed: '1/160',
      },
    ],
    lenses: [{ name: 'Normal', focalLengthMm: 25, apertureMin: 'f/2', apertureMax: 'f/16' }],
    flashes: [
      { name: 'Head', energyWs: 400, efficacyLmSPerWs: 40, minPower: '1/64' },
      {
        name: 'Head',
        guideNumberM: 40,
        minPower: '1/128',
        measured: [{ modifier: 'Octabox', guideNumberM: 21 }],
      },
    ],
    modifiers: [{ name: 'Umbrella', lossStops: 1.5 }],
  });

  it('prefers a measured guide number to one less a reckoned loss, and offers both', () => {
    const [, second] = kit.flashes;
    if (!second) throw new Error('no second flash');
    expect(modifierChoices(kit, second)).toMatchObject([
      { title: 'bare', guideNumberM: 40, lossStops: 0 },
      { title: 'Octabox, measured', guideNumberM: 21, lossStops: 0 },
      { title: 'Umbrella', guideNumberM: 40, lossStops: 1.5 },
    ]);
  });

  it('sets limits, sensor, roles and modifiers, and leaves light, aim and distances alone', () => {
    const pick = {
      camera: 0,
      lens: 0,
      flashes: [
        { role: 'rim' as const, modifier: '' },
        { role: 'key' as const, modifier: 'measured Octabox' },
      ],
    };
    const next = withKit({ ...body, camera: { ...(body.camera as Body), highSpeedSync: {} } }, kit, pick);
    expect(next.background).toEqual(body.background);
    expect(next.aim).toEqual(body.aim);
    expect(next.camera).toEqual({
      apertureMin: 'f/2',
      apertureMax: 'f/16',
      isoMin: 200,
      isoMax: 1600,
      shutterSlowest: '1/30',
      shutterFastest: '1/4000',
      syncSpeed: '1/160',
    });
    // 36 mm over 18 mm is a crop of 2; 18 mm over 6,000 pixels are 3 µm.
    expect(next.view).toMatchObject({ focalLengthMm: 25, pixelPitchUm: 3, cropFactor: 2 });
    // GN = √(M·η·W·100/(4π·C)) with M = 1, η = 40, W = 400, C = 250: 22.57 (derivation).
    expect(next.flashes).toMatchObject([
      { name: 'Head', role: 'rim', guideNumberM: 22.57, distanceM: 2 },
      { name: 'Head 2', role: 'key', guideNumberM: 21, distanceM: 2 },
    ]);
    expect(faultsIn(fillRecipes, next)).toEqual([]);
  });

  it('leaves in the bag what has no role', () => {
    const next = withKit(body, kit, { camera: 0, lens: 0, flashes: [{ role: null, modifier: '' }] });
    expect(next.flashes).toEqual([]);
  });
});
