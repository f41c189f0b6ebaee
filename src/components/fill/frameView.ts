import { answerFor, parseInput, type AnyCalculator } from '../../../shared/contract/defineCalculator';
import { fillWish } from '../../../shared/contract/fillExact';
import type { FillRecipesIn } from '../../../shared/contract/fillIn';
import type { MotionIn } from '../../../shared/contract/motionIn';
import type { LanternView } from '../drawings/geometry/lanternFrame';
import { motionView } from '../drawings/geometry/motionView';
import type { FillRecipeOut } from './fillAnswer';

/** The picture that a recipe makes, and whether its flash is taken to freeze because nobody told how long it lasts. */
export interface RecipeView {
  readonly view: LanternView;
  readonly isFlashAssumed: boolean;
}

/** What is asked of the calculator of motion about a recipe; null where no view is known. */
function frameQuestion(input: FillRecipesIn, recipe: FillRecipeOut): Record<string, unknown> | null {
  const { view } = fillWish(input).motion;
  if (view === null) return null;
  const { settings, sync, outcome } = recipe;
  // A train of light in high-speed sync lasts as long as the shutter is open, as ambient light does.
  const isSteady = sync !== 'normal' || outcome.subjectFlashStops === null;
  const pulse =
    !isSteady && outcome.blur?.by === 'flash'
      ? { flash: { t01S: outcome.blur.lightS, brightnessStops: outcome.subjectFlashStops } }
      : {};
  return {
    subject: input.subject ?? { speedMS: 0 },
    distanceM: view.distanceM,
    focalLengthMm: view.focalLengthMm,
    pixelPitchUm: view.pitchUm,
    ...pulse,
    ambient: {
      shutter: settings.shutter.exact,
      subjectBrightnessStops: isSteady ? outcome.subjectStops : outcome.subjectAmbientStops,
      backgroundBrightnessStops: outcome.backgroundStops,
    },
    ...(input.support ? { support: input.support } : {}),
    readAs: 'exact',
  };
}

/** The picture at 100 % that a recipe makes; null where no view is known. */
export function recipeView(
  motion: AnyCalculator,
  input: FillRecipesIn,
  recipe: FillRecipeOut,
  now: Date,
): RecipeView | null {
  const question = frameQuestion(input, recipe);
  const parsed = question && parseInput(motion, question);
  if (!parsed || !('input' in parsed)) return null;
  const { result } = answerFor(motion, parsed.input, { now });
  const view = motionView(parsed.input as MotionIn, result as Parameters<typeof motionView>[1]);
  const { subjectFlashStops, blur } = recipe.outcome;
  const isFlashAssumed = recipe.sync === 'normal' && subjectFlashStops !== null && blur?.by !== 'flash';
  if (!isFlashAssumed) return { view, isFlashAssumed };
  return { view: { ...view, flash: { stops: subjectFlashStops, blurPx: 0 } }, isFlashAssumed };
}
