import type { z } from 'zod';
import { contradictionAt } from './contradictionAt';
import { givenOf } from './exactlyOne';

/** A check that the named fields come together or not at all; each missing one is blamed. */
export function together<T extends z.ZodType>(...fields: readonly string[]) {
  return contradictionAt<T>((value) => {
    const given = givenOf(value as object, fields);
    if (given.length === 0) return [];
    return fields
      .filter((field) => !given.includes(field))
      .map((missing) => ({ code: 'needed_together', path: [missing], params: { missing, given: given[0] } }));
  });
}
