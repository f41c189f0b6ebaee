import type { z } from 'zod';
import type { ContradictionCode } from '../text';
import { contradictionAt } from './contradictionAt';

/**
 * A fault between fields: `isTrue` says when it stands, `path` which field is to blame, `code` names the
 * sentence in the text catalogue. It runs only when the fields that it reads are well formed: those named in
 * `reads`, or all of them where none is named.
 */
export function contradiction<T extends z.ZodType, C extends ContradictionCode>(
  code: C,
  path: readonly (string | number)[],
  isTrue: (value: z.output<T>) => boolean,
  params: (value: z.output<T>) => Record<string, unknown> = () => ({}),
  reads: readonly string[] = [],
) {
  return contradictionAt<T>((value) => (isTrue(value) ? [{ code, path, params: params(value) }] : []), reads);
}
