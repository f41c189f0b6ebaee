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
 * gives all of them. It runs only when the fields that it reads are of their types.
 */
export function contradictionAt<T extends z.ZodType>(
  find: (value: z.output<T>) => readonly FoundContradiction[],
) {
  return (schema: T): T =>
    schema.check((payload) => {
      for (const { code, path, params = {} } of foundIn(payload.value as z.output<T>, find)) {
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

/** What the mathematics refuses here is outside its own field's range, which that field's own fault says. */
function foundIn<V>(value: V, find: (value: V) => readonly FoundContradiction[]) {
  try {
    return find(value);
  } catch (error) {
    if (error instanceof RangeError) return [];
    throw error;
  }
}
