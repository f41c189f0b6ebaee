import { loadCalculators } from '../../shared/calculators';

export interface MixedCall {
  readonly calculator: string;
  readonly input: unknown;
}

/** Calls that a client would gather: every calculator that costs a unit, with its own examples, over and over. */
export async function mixedCalls(count: number): Promise<MixedCall[]> {
  const kinds = (await loadCalculators())
    .filter(({ units }) => units === 1)
    .flatMap(({ id, examples }) =>
      examples.map(({ input }) => ({ calculator: id, input: input as unknown })),
    );
  return Array.from({ length: count }, (_, i) => kinds[i % kinds.length] as MixedCall);
}
