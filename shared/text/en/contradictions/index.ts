import { exposureContradictions } from './exposure';
import { fillContradictions } from './fill';
import { filtersContradictions } from './filters';
import { flashContradictions } from './flash';
import { lightContradictions } from './light';
import { twilightContradictions } from './twilight';

/** Sentences for faults between fields, by code; each says what was given and what is allowed. */
export const contradictions = {
  ...exposureContradictions,
  ...lightContradictions,
  ...filtersContradictions,
  ...flashContradictions,
  ...fillContradictions,
  ...twilightContradictions,
} as const;
