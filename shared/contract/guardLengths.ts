import type { z } from 'zod';
import type { FieldMeta } from './field';

interface LooseDef {
  readonly innerType?: z.ZodType;
  readonly shape?: Record<string, z.ZodType>;
  readonly element?: z.ZodType;
  readonly checks?: readonly z.core.$ZodCheck[];
}

const LENGTHS = ['min_length', 'max_length', 'length_equals'];
const hasLength = (value: unknown) => typeof value === 'string' || Array.isArray(value);

/**
 * Lets the length of text and lists be looked at only where there is text or a list, throughout a schema. By
 * itself zod compares whatever stands under "length" in any object, which a request may choose so that the
 * comparison throws: {"length": {"valueOf": 1, "toString": 1}}.
 */
export function guardLengths<T extends z.ZodType>(schema: T): T {
  const { innerType, shape = {}, element, checks = [] } = schema.def as unknown as LooseDef;
  for (const { _zod } of checks)
    if (LENGTHS.includes(_zod.def.check)) _zod.def.when = ({ value }) => hasLength(value);
  const { oneOrMany } = (schema.meta() ?? {}) as FieldMeta;
  for (const inner of [innerType, element, oneOrMany, ...Object.values(shape)])
    if (inner) guardLengths(inner);
  return schema;
}
