import { z } from 'zod';
import type { FieldMeta } from './field';

/**
 * A value or a list of 1 to `max` such values, with the item's own defaults filled in. No union, so that a fault
 * names the item it stands in.
 */
export function oneOrMany<T extends z.ZodType>(
  item: T,
  max: number,
  meta: FieldMeta = {},
): z.ZodCustom<z.output<T> | z.output<T>[], z.input<T> | z.input<T>[]> {
  // The words are the item's own; that it is a setting is true of each value only.
  const { setting: _, range: __, ...words } = (item.meta() ?? {}) as FieldMeta;
  const schema = z
    .custom<z.output<T> | z.output<T>[]>()
    .check((payload) => {
      const value: unknown = payload.value;
      const many = Array.isArray(value);
      const parsed = many ? z.array(item).min(1).max(max).safeParse(value) : item.safeParse(value);
      if (parsed.success) {
        payload.value = parsed.data;
        return;
      }
      for (const issue of parsed.error.issues)
        payload.issues.push({ ...issue, input: value, path: [...issue.path] } as z.core.$ZodRawIssue);
    })
    .meta({ ...words, ...meta, oneOrMany: item, maxItems: max });
  // What comes in lacks the defaults that go out; a custom schema knows one type only.
  return schema as unknown as z.ZodCustom<z.output<T> | z.output<T>[], z.input<T> | z.input<T>[]>;
}

/** The values of a one-or-many field as a list. */
export function asList<T>(value: T | readonly T[]): readonly T[] {
  return Array.isArray(value) ? (value as readonly T[]) : [value as T];
}
