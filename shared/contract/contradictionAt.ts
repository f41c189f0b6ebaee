import type { z } from 'zod';
import { sayFault, type ContradictionCode } from '../text';
import { wellFormed } from './wellFormed';

/** One fault between fields: its code, the path to the field to blame, and what its sentence needs to know. */
export interface FoundContradiction {
  readonly code: ContradictionCode;
  readonly path: readonly (string | number)[];
  readonly params?: Record<string, unknown>;
}

/**
 * Faults between fields whose place depends on the value, such as the pair of a table that does not rise; `find`
 * gives all of them. It runs only when the fields that it reads are well formed: those named in `reads`, or all
 * of them where none is named.
 */
export function contradictionAt<T extends z.ZodType>(
  find: (value: z.output<T>) => readonly FoundContradiction[],
  reads: readonly string[] = [],
) {
  return (schema: T): T =>
    schema.superRefine(
      (value, context) => {
        for (const { code, path, params = {} } of find(value))
          context.addIssue({
            code: 'custom',
            path: [...path],
            message: sayFault(code, params),
            params: { fault: 'contradiction', code },
          });
      },
      { when: wellFormed(reads) },
    ) as T;
}
