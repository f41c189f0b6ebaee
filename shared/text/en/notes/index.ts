import { exposureNotes } from './exposure';
import { fillNotes } from './fill';
import { filtersNotes } from './filters';
import { flashNotes } from './flash';
import { lightNotes } from './light';
import { twilightNotes } from './twilight';

/** Sentences for notes, by code. One file a calculator group; a code stands in one of them only. */
export const notes = {
  ...exposureNotes,
  ...lightNotes,
  ...filtersNotes,
  ...flashNotes,
  ...fillNotes,
  ...twilightNotes,
} as const;
