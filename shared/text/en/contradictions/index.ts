import { exposureContradictions } from './exposure';

/** Sentences for faults between fields, by code; each says what was given and what is allowed. */
export const contradictions = { ...exposureContradictions } as const;
