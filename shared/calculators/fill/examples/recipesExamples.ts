import { recipesDusk } from './recipesDusk';
import { recipesThreeLights } from './recipesThreeLights';
import { recipesTooBright } from './recipesTooBright';

/** Questions that a photographer asks, with their answers. */
export const recipesExamples = [recipesDusk, recipesThreeLights, recipesTooBright] as const;
