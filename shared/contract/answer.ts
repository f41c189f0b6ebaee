import { z } from 'zod';
import { cautions, sayNote, type CautionCode, type NoteCode, type NoteParams } from '../text';

/** A remark on an answer: what was assumed, clipped or uncertain, by stable code. */
export interface Remark {
  readonly code: string;
  readonly message: string;
}

/** What a calculator gives back: the result, notes, and the cautions that apply. */
export interface Answer<R> {
  readonly result: R;
  readonly notes: readonly Remark[];
  readonly cautions: readonly Remark[];
}

/** A note with its sentence. */
export function note<C extends NoteCode>(code: C, ...params: NoteParams<C>): Remark {
  return { code, message: sayNote(code, ...params) };
}

/** A caution with its sentence. */
export function caution(code: CautionCode): Remark {
  return { code, message: cautions[code] };
}

const remark = z.strictObject({
  code: z.string().meta({ description: 'stable, for programs' }),
  message: z.string().meta({ description: 'a sentence, for people' }),
});

/** The envelope of every calculator's answer. */
export function answerSchema<R extends z.ZodType>(result: R) {
  return z.strictObject({
    result,
    notes: z.array(remark).meta({ description: 'what was assumed, clipped or uncertain' }),
    cautions: z.array(remark).meta({ description: 'what to mind on location' }),
  });
}
