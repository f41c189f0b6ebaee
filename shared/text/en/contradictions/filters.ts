import { readable } from '../format';

export const filtersContradictions = {
  stack_too_dense: (p: Record<string, unknown>) =>
    `The stack takes ${readable(Number(p.stops))} stops; 0 to ${readable(Number(p.most))} stops are allowed.`,
  gel_result_out_of_reach: (p: Record<string, unknown>) =>
    `A shift of ${readable(Number(p.shift))} mired takes ${readable(Number(p.sourceK))} K beyond 1,000 to 40,000 K; ${readable(Number(p.low))} to ${readable(Number(p.high))} mired are possible.`,
} as const;
