import { z } from 'zod';
import { defineCalculator } from '../../contract/defineCalculator';
import { fillWish } from '../../contract/fillExact';
import { fillRecipesIn } from '../../contract/fillIn';
import { fillCautions, recipeNotes } from '../../contract/fillNotes';
import { fillRecipeOut, shapeRecipe } from '../../contract/fillRecipeOut';
import { limitOut, shapeLimit } from '../../contract/fillWhyNotOut';
import { findRecipes } from '../../math/fill/findRecipes';
import { whyNot } from '../../math/fill/whyNot';
import { recipesExamples } from './examples/recipesExamples';

export const fillRecipesOut = z.strictObject({
  recipes: z.array(fillRecipeOut).meta({ title: 'Recipes', description: 'best first, different in kind' }),
  whyNot: z.array(limitOut).optional().meta({
    title: 'Why not',
    description:
      'where there is no recipe, or the best misses the aim by more than half a step: each limit in the way, the cheapest to give up first',
  }),
});

export const fillRecipes = defineCalculator({
  id: 'fill/recipes',
  title: 'Recipes for flash and ambient light',
  summary:
    'Settings, powers and distances that put background and subject where they are wanted, or what stands in the way.',
  units: 5,
  input: fillRecipesIn,
  output: fillRecipesOut,
  sources: [
    'Additivity of exposure; lighting ratio as (key + fill):fill, the cinematographers’ definition',
    'ISO 1230:2007, introduction (guide number = f-number times distance); inverse square law; EV100 = log2(N²/t) − log2(S/100) + nd',
    'Every combination of marks, filters, powers and distances counts: a search by bounds that leaves none out (derivation), tested against going through all of them',
    'High-speed sync: light spread evenly over curtain travel and exposure, a model; ghost and hand-held limit: common practice',
  ],
  examples: recipesExamples,
  compute(given) {
    const wish = fillWish(given);
    const { search, recipes } = findRecipes(wish);
    const limits = whyNot(search);
    const [first] = recipes;
    return {
      result: {
        recipes: recipes.map((recipe) => shapeRecipe(recipe, wish.camera, first ?? recipe)),
        ...(limits.length > 0 || recipes.length === 0
          ? { whyNot: limits.map((limit) => shapeLimit(limit, wish, first)) }
          : {}),
      },
      notes: recipeNotes(given, wish, recipes, limits),
      cautions: fillCautions(wish, wish.flashes.length > 0),
    };
  },
});
