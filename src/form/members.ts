import type { Field } from '../../shared/contract/field';
import type { Path } from './body';
import { schemaOfField, type Schema } from './schemaNode';

/** A member of a family as its form shows it. */
export interface Member {
  readonly name: string;
  readonly field: Field;
  readonly path: Path;
  readonly schema?: Schema;
}

/**
 * The members of a family, made once: their forms are drawn anew only when something about them changes, not on
 * every step of a slider beside them. Their family says what may be empty, so none is called optional.
 */
export function membersOf(fields: readonly Field[], path: Path, schema?: Schema): Member[] {
  return fields.map((field) => ({
    name: field.name,
    field: { ...field, required: true },
    path: [...path, field.name],
    schema: schema && schemaOfField(schema, field.name),
  }));
}
