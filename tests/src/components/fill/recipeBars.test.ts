import { expect, it } from 'vitest';
import { fillRecipes } from '../../../../shared/calculators/fill/recipes';
import { BAR_SPAN, barsText, recipeBars, stretchOf, yOf } from '../../../../src/components/fill/recipeBars';
import { outcomeRows, settingsLine } from '../../../../src/components/fill/recipeText';
import { askCalculator } from '../../../support/askCalculator';

const [recipe] = askCalculator(fillRecipes, fillRecipes.examples[0]?.input).result.recipes;
if (!recipe) throw new Error('the example has no recipe');
const bars = recipeBars(recipe, { backgroundStops: -1, subjectStops: 0 });

it('a recipe’s bars are its background, its ambient light, its flash and the sum, each at what the outcome says', () => {
  expect(bars.map(({ letter, stops }) => [letter, stops])).toEqual([
    ['B', recipe.outcome.backgroundStops],
    ['A', recipe.outcome.subjectAmbientStops],
    ['F', recipe.outcome.subjectFlashStops],
    ['S', recipe.outcome.subjectStops],
  ]);
  expect(bars.map(({ aimStops }) => aimStops)).toEqual([-1, null, null, 0]);
});

it('the flash’s part of the sum reaches from the ambient light up, and without flash there is none', () => {
  const sum = bars[3];
  expect(sum?.parts.map(({ isFlash }) => isFlash)).toEqual([false, true]);
  expect(sum?.parts[1]).toMatchObject({
    fromStops: recipe.outcome.subjectAmbientStops,
    toStops: recipe.outcome.subjectStops,
  });
  const unlit = { ...recipe, outcome: { ...recipe.outcome, subjectFlashStops: null } };
  const [, , flash, dark] = recipeBars(unlit, { backgroundStops: 0, subjectStops: 0 });
  expect(flash?.parts).toEqual([]);
  expect(dark?.parts.every(({ isFlash }) => !isFlash)).toBe(true);
  expect(barsText(recipeBars(unlit, { backgroundStops: 0, subjectStops: 0 }))).toMatch(
    /flash on the subject none/,
  );
});

it('every stop is as long as any other, and what lies beyond the drawing is cut off', () => {
  const { fromStops, toStops } = BAR_SPAN;
  expect(yOf(toStops, 90)).toBe(0);
  expect(yOf(fromStops, 90)).toBe(90);
  expect(yOf(-1, 90) - yOf(0, 90)).toBeCloseTo(90 / (toStops - fromStops), 9);
  expect(yOf(40, 90)).toBe(0);
  expect(stretchOf({ fromStops: -1000, toStops: -50, isFlash: true }, 90)).toBeNull();
});

it('settings read as on the camera, and the outcome leaves out what is not there', () => {
  expect(settingsLine(recipe)).toBe('f/4, 1/15, ISO 100');
  const titles = outcomeRows(recipe).map(({ title }) => title);
  expect(titles).toContain('Subject in flash');
  expect(titles).not.toContain('Rim');
  expect(outcomeRows(recipe).every(({ text }) => !/NaN|undefined|null/.test(text))).toBe(true);
});
