import { defineCalculator, type AnyCalculator } from '../../../shared/contract/defineCalculator';
import { kitIn } from '../../../shared/contract/kit';

/** A kit described as a calculator is, so that the same form takes it in and names its faults. It computes nothing. */
export const kitCalculator = defineCalculator({
  id: 'own/kit',
  title: 'Kit',
  summary: 'Your gear, as the limits of what is worked out for you.',
  units: 0,
  input: kitIn,
  output: kitIn,
  sources: [],
  examples: [],
  compute: (kit) => ({ result: kit }),
}) as unknown as AnyCalculator;
