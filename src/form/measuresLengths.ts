import type { Field } from '../../shared/contract/field';

/** Whether any of the fields, or one inside them, is a length that a reader may rather see in feet. */
export function measuresLengths(fields: readonly Field[]): boolean {
  return fields.some(
    (field) =>
      field.unit === 'm' ||
      measuresLengths(field.fields ?? []) ||
      measuresLengths(field.item ? [field.item] : []),
  );
}
