import type { z } from 'zod';
import { sayFault, type ContradictionCode } from '../text';

type ObjectOf<T extends z.ZodType> = z.output<T>;

/**
 * A fault between fields: `isTrue` says when it stands, `path` which field is to blame, `code` names the
 * sentence in the text catalogue. It runs only when the fields that it reads are well formed.
 */
export function contradiction<T extends z.ZodType, C extends ContradictionCode>(
  code: C,
  path: readonly (string | number)[],
  isTrue: (value: ObjectOf<T>) => boolean,
  params: (value: ObjectOf<T>) => Record<string, unknown> = () => ({}),
) {
  return (schema: T): T =>
    schema.check((payload) => {
      const value = payload.value as ObjectOf<T>;
      if (!isTrue(value)) return;
      payload.issues.push({
        code: 'custom',
        input: value,
        path: [...path],
        message: sayFault(code, params(value)),
        params: { fault: 'contradiction', code },
      });
    }) as T;
}
