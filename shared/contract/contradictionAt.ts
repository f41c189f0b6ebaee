import type { z } from 'zod';
import { sayFault, type ContradictionCode } from '../text';

/** One fault between fields: its code, the path to the field to blame, and what its sentence needs to know. */
export interface FoundContradiction {
  readonly code: ContradictionCode;
  readonly path: readonly (string | number)[];
  readonly params?: Record<string, unknown>;
}

/**
 * Faults between fields whose place depends on the value, such as the pair of a table that does not rise; `find`
 * gives all of them. It runs only when the fields that it reads are well formed.
 */
export function contradictionAt<T extends z.ZodType>(
  find: (value: z.output<T>) => readonly FoundContradiction[],
) {
  return (schema: T): T =>
    schema.check((payload) => {
      for (const { code, path, params = {} } of find(payload.value as z.output<T>)) {
        payload.issues.push({
          code: 'custom',
          input: payload.value,
          path: [...path],
          message: sayFault(code, params),
          params: { fault: 'contradiction', code },
        });
      }
    }) as T;
}
