import type { FillRecipeOut } from '../../../shared/contract/fillRecipeOut';
import type { LimitOut } from '../../../shared/contract/fillWhyNotOut';

/** What the page reads of an answer. */
export interface FillAnswer {
  readonly recipes: readonly FillRecipeOut[];
  readonly whyNot?: readonly LimitOut[];
}

export type { FillRecipeOut, LimitOut };
