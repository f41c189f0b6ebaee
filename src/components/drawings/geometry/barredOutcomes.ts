import type { FillRecipeOut } from '../../../../shared/contract/fillRecipeOut';

type Outcome = Pick<FillRecipeOut, 'outcome'>;

interface Aim {
  readonly backgroundStops: number;
  readonly subjectStops: number;
}

/** The outcomes that an answer of either fill calculator tells, and the aim that they are held against, if any. */
export function barredOutcomes(
  input: unknown,
  result: unknown,
): { aim: Aim | null; outcomes: readonly Outcome[] } {
  const { aim = null } = (input ?? {}) as { aim?: Aim };
  const { recipes, outcome } = (result ?? {}) as {
    recipes?: readonly Outcome[];
    outcome?: Outcome['outcome'];
  };
  return { aim, outcomes: outcome ? [{ outcome }] : (recipes ?? []) };
}
