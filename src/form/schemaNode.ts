import type { AnyCalculator } from '../../shared/contract/defineCalculator';
import type { FieldMeta } from '../../shared/contract/field';

/** What a calculator describes its input by. */
export type Schema = AnyCalculator['input'];

/** The parts of a schema's own description that the form reads. */
interface LooseDef {
  readonly innerType?: Schema;
  readonly shape?: Record<string, Schema>;
  readonly element?: Schema;
  readonly checks?: readonly { readonly _zod: { readonly def: { readonly params?: unknown } } }[];
}

const defOf = (schema: Schema): LooseDef => schema.def as unknown as LooseDef;

/** A schema without the wrappers that make it optional or give it a default. */
function unwrapped(schema: Schema): Schema {
  const inner = defOf(schema).innerType;
  return inner ? unwrapped(inner) : schema;
}

/** What the checks of an object schema say about themselves. */
export function checkParamsOf(schema: Schema): unknown[] {
  return (defOf(unwrapped(schema)).checks ?? []).map((check) => check._zod.def.params);
}

/** The schema of a named field of an object. */
export function schemaOfField(schema: Schema, name: string): Schema | undefined {
  return defOf(unwrapped(schema)).shape?.[name];
}

/** The schema of what a list, or a one-or-many field, holds. */
export function schemaOfItem(schema: Schema): Schema | undefined {
  const inner = unwrapped(schema);
  return defOf(inner).element ?? ((inner.meta() ?? {}) as FieldMeta).oneOrMany;
}
