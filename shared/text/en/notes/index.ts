import { exposureNotes } from './exposure';

/** Sentences for notes, by code. One file a calculator group; a code stands in one of them only. */
export const notes = { ...exposureNotes } as const;
