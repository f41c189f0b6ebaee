import type { cautions } from './en/cautions';
import { contradictions } from './en/contradictions';
import { notes } from './en/notes';

export { faults, rules, wanted } from './en/faults';
export { account } from './en/account';
export { cautions } from './en/cautions';
export { costs } from './en/costs';
export { fillLimits, fillSides, type LimitParams } from './en/fillLimits';
export { fillTrades } from './en/fillTrades';
export { mails } from './en/mails';
export { problems } from './en/problems';

export type NoteCode = keyof typeof notes;
export type CautionCode = keyof typeof cautions;
export type ContradictionCode = keyof typeof contradictions;

/** What a sentence needs to know, by its code; nothing where it needs nothing. */
export type NoteParams<C extends NoteCode> = Parameters<(typeof notes)[C]>;

/** A note's sentence. */
export function sayNote<C extends NoteCode>(code: C, ...params: NoteParams<C>): string {
  const sentence = notes[code] as (...given: NoteParams<C>) => string;
  return sentence(...params);
}

/** The sentence of a fault between fields. */
export function sayFault(code: ContradictionCode, params: Record<string, unknown>): string {
  return contradictions[code](params);
}
