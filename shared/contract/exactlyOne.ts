import type { z } from 'zod';

/**
 * A check that exactly `count` of the named fields are given. It runs also when other fields are at fault,
 * so that every fault of a body is told at once.
 */
export function exactly(count: number, fields: readonly string[]) {
  return <T extends z.ZodType>(schema: T): T =>
    schema.refine((value) => !isObject(value) || givenOf(value, fields).length === count, {
      when: () => true,
      params: { fault: 'exactly', count, fields },
    }) as T;
}

/** A check that exactly one of the named fields is given. */
export const exactlyOne = (...fields: readonly string[]) => exactly(1, fields);

/** A check that at most one of the named fields is given. */
export function atMostOne(...fields: readonly string[]) {
  return <T extends z.ZodType>(schema: T): T =>
    schema.refine((value) => !isObject(value) || givenOf(value, fields).length <= 1, {
      when: () => true,
      params: { fault: 'at_most_one', count: 1, fields },
    }) as T;
}

/** Which of the named fields an object holds. */
export function givenOf(value: object, fields: readonly string[]): string[] {
  const entries = value as Record<string, unknown>;
  return fields.filter((field) => Object.hasOwn(entries, field) && entries[field] !== undefined);
}

function isObject(value: unknown): value is object {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
