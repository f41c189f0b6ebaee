import type { Answer } from '../../shared/contract/answer';
import { answerFor, parseInput, type Calculator } from '../../shared/contract/defineCalculator';
import type { Fault } from '../../shared/contract/faults';
import type { z } from 'zod';

const now = new Date('2026-06-21T18:00:00Z');

/** A calculator's answer to a request as it comes in; throws where it is refused. */
export function askCalculator<I extends z.ZodType, O extends z.ZodType>(
  calculator: Calculator<I, O>,
  body: unknown,
): Answer<z.output<O>> {
  const parsed = parseInput(calculator as unknown as Calculator, body);
  if ('faults' in parsed) throw new Error(JSON.stringify(parsed.faults));
  return answerFor(calculator as unknown as Calculator, parsed.input, { now }) as Answer<z.output<O>>;
}

/** The faults that a calculator finds in a request; none where it answers. */
export function faultsIn<I extends z.ZodType, O extends z.ZodType>(
  calculator: Calculator<I, O>,
  body: unknown,
): readonly Fault[] {
  const parsed = parseInput(calculator as unknown as Calculator, body);
  return 'faults' in parsed ? parsed.faults : [];
}

/** Pointers and codes of faults, as a request's author finds them. */
export const placesOf = (faults: readonly Fault[]): string[] =>
  faults.map(({ pointer, code }) => `${pointer} ${code}`);

/** The codes of an answer's notes or cautions. */
export const codesOf = (remarks: readonly { readonly code: string }[]): string[] =>
  remarks.map(({ code }) => code);
