import { describe, expect, it } from 'vitest';
import { fillRecipes } from '../../../../shared/calculators/fill/recipes';
import { flashMotion } from '../../../../shared/calculators/flash/motion';
import {
  parseInput,
  type AnyCalculator,
  type Calculator,
} from '../../../../shared/contract/defineCalculator';
import type { FillRecipesIn } from '../../../../shared/contract/fillIn';
import { recipeView } from '../../../../src/components/fill/frameView';
import { askCalculator } from '../../../support/askCalculator';

const now = new Date('2026-06-21T18:00:00Z');

const request = {
  background: { ev100: 5 },
  subjectAmbient: { belowBackgroundStops: 3 },
  camera: {
    apertureMin: 'f/2.8',
    apertureMax: 'f/2.8',
    isoMin: 400,
    isoMax: 400,
    shutterSlowest: '1/15',
    shutterFastest: '1/8000',
    syncSpeed: '1/250',
  },
  flashes: [{ name: 'bare', role: 'key', guideNumberM: 30, minPower: '1/128', distanceM: 4, t05S: 0.001 }],
  view: { focalLengthMm: 50, distanceM: 5, pixelPitchUm: 6 },
  subject: { speedMS: 3 },
  support: { kind: 'handheld' },
};

function viewOf(body: object) {
  const [recipe] = askCalculator(fillRecipes, body).result.recipes;
  const parsed = parseInput(fillRecipes as unknown as Calculator, body);
  if (!recipe || !('input' in parsed)) throw new Error('there is no recipe');
  const motion = flashMotion as unknown as AnyCalculator;
  return { recipe, drawn: recipeView(motion, parsed.input as FillRecipesIn, recipe, now) };
}

describe('the picture at 100 % that a recipe makes', () => {
  it('has the blur by flash, the trail by ambient light and the levels that the outcome tells', () => {
    const { recipe, drawn } = viewOf(request);
    const { outcome } = recipe;
    expect(drawn?.isFlashAssumed).toBe(false);
    expect(drawn?.view.flash?.stops).toBeCloseTo(outcome.subjectFlashStops ?? NaN, 9);
    expect(drawn?.view.flash?.blurPx).toBeCloseTo(outcome.blur?.blurPx ?? NaN, 9);
    expect(drawn?.view.ambient?.blurPx).toBeCloseTo(outcome.ghost?.trailPx ?? NaN, 9);
    expect(drawn?.view.ambient?.stops).toBeCloseTo(outcome.subjectAmbientStops, 9);
    expect(drawn?.view.backgroundStops).toBeCloseTo(outcome.backgroundStops, 9);
    expect(drawn?.view.shakePx).toBeGreaterThan(0);
  });

  it('says so where it takes a flash of unknown duration to freeze', () => {
    const [flash] = request.flashes;
    const { drawn, recipe } = viewOf({ ...request, flashes: [{ ...flash, t05S: undefined }] });
    expect(drawn?.isFlashAssumed).toBe(true);
    expect(drawn?.view.flash).toEqual({ stops: recipe.outcome.subjectFlashStops, blurPx: 0 });
  });

  it('lets the shutter draw everything in high-speed sync', () => {
    const camera = { ...request.camera, shutterSlowest: '1/500', highSpeedSync: {} };
    const day = { ...request, background: { ev100: 12 }, camera };
    const { drawn, recipe } = viewOf({ ...day, flashes: [{ ...request.flashes[0], guideNumberM: 80 }] });
    expect(recipe.sync).toBe('highSpeed');
    expect(drawn?.view.flash).toBeNull();
    expect(drawn?.view.ambient?.stops).toBeCloseTo(recipe.outcome.subjectStops, 9);
    expect(drawn?.view.ambient?.blurPx).toBeCloseTo(recipe.outcome.blur?.blurPx ?? NaN, 9);
  });

  it('is none where nobody told how the picture is framed', () => {
    expect(viewOf({ ...request, view: undefined, subject: undefined }).drawn).toBeNull();
  });
});
