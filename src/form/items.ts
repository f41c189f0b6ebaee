import type { Field } from '../../shared/contract/field';

/** The items that a list field, or a one-or-many field, holds. */
export function itemsOf(value: unknown): readonly unknown[] {
  if (value === undefined || value === null) return [];
  return Array.isArray(value) ? value : [value];
}

/** The value with one item more: like the last one, like the example's first, or as little as the item needs. */
export function withItemAdded(field: Field, value: unknown, example: unknown): unknown {
  const items = itemsOf(value);
  const least = field.item?.kind === 'group' ? {} : (field.item?.minimum ?? '');
  return [...items, items.at(-1) ?? example ?? least];
}

/** The value without one item. A one-or-many field with one item left is that item, and with none is absent. */
export function withoutItem(field: Field, value: unknown, index: number): unknown {
  const left = itemsOf(value).filter((_, i) => i !== index);
  if (field.kind === 'oneOrMany' && left.length === 1) return left[0];
  return left.length === 0 && !field.required ? undefined : left;
}
