import type { Field } from '../../shared/contract/field';
import type { LengthUnit } from './lengthUnit';
import { isSettingShape, type SettingShape } from './settingShape';
import { formatNumber } from './formatQuantity';
import { residualText, valueText } from './valueText';

interface Titled {
  readonly name: string;
  readonly title: string;
  readonly description?: string;
}

/** A single value; of a setting also what its mark leaves unsaid, the exact value and the residual. */
export type ValuePart = Titled & {
  readonly kind: 'value';
  readonly text: string;
  readonly exactly?: string;
  /** The code behind a choice's words. */
  readonly code?: string;
};

/** A list as rows under one heading each. */
export type TablePart = Titled & {
  readonly kind: 'table';
  readonly columns: readonly string[];
  readonly rows: readonly (readonly string[])[];
};

/** One piece of an answer, ready to be shown: everything that a reader sees is text by now. */
export type ResultPart =
  | ValuePart
  | TablePart
  | (Titled & { readonly kind: 'group'; readonly parts: readonly ResultPart[] })
  | (Titled & { readonly kind: 'sentences'; readonly sentences: readonly string[] });

const valuesOf = (object: unknown) => (object ?? {}) as Readonly<Record<string, unknown>>;

const isCompound = (field: Field) =>
  (field.kind === 'group' && !isSettingField(field)) ||
  (field.kind === 'list' && Boolean(field.item?.fields));

/** A setting in an answer is described as a group with a mark. */
function isSettingField(field: Field): boolean {
  return Boolean(field.fields?.some(({ name }) => name === 'mark'));
}

/** The exact value behind a setting's mark, in its own unit, which the field's name tells. */
function exactText(name: string, exact: number): string {
  if (/aperture/i.test(name)) return `f/${formatNumber(exact)}`;
  return /shutter|sync/i.test(name) ? `${formatNumber(exact)} s` : formatNumber(exact);
}

function settingPart(titled: Titled, value: SettingShape): ResultPart {
  const exactly = `exactly ${exactText(titled.name, value.exact)}, ${residualText(value.residualStops ?? 0)}`;
  return { ...titled, kind: 'value', text: value.mark, exactly };
}

/** A list whose rows hold more than single values: one group an item, called by its first value. */
function groupsOf(
  titled: Titled,
  fields: readonly Field[],
  items: readonly unknown[],
  measure: LengthUnit,
): ResultPart[] {
  return items.map((item, i) => {
    const first = fields[0] && valueText(fields[0], valuesOf(item)[fields[0].name], measure);
    const title = `${titled.title} ${i + 1}${first ? `: ${first}` : ''}`;
    return {
      kind: 'group',
      name: `${titled.name}${i}`,
      title,
      parts: resultParts(fields.slice(1), item, measure),
    };
  });
}

function listParts(
  titled: Titled,
  fields: readonly Field[],
  items: readonly unknown[],
  measure: LengthUnit,
): ResultPart[] {
  if (items.length === 0) return [{ ...titled, kind: 'value', text: 'none' }];
  if (fields.some(({ name }) => name === 'message')) {
    const sentences = items.map((item) => String(valuesOf(item).message));
    return [{ ...titled, kind: 'sentences', sentences }];
  }
  if (fields.some(isCompound)) return groupsOf(titled, fields, items, measure);
  const rows = items.map((item) =>
    fields.map((field) => valueText(field, valuesOf(item)[field.name], measure)),
  );
  return [{ ...titled, kind: 'table', columns: fields.map(({ title }) => title), rows }];
}

function partOf(field: Field, value: unknown, measure: LengthUnit): ResultPart[] {
  const { name, title, description } = field;
  const titled = { name, title, description };
  if (value === undefined) return [];
  if (isSettingShape(value)) return [settingPart(titled, value)];
  if (field.kind === 'group' && value !== null)
    return [{ ...titled, kind: 'group', parts: resultParts(field.fields ?? [], value, measure) }];
  if (field.kind === 'list' && field.item?.fields && Array.isArray(value))
    return listParts(titled, field.item.fields, value, measure);
  const code = field.kind === 'choice' && typeof value === 'string' ? value : undefined;
  return [{ ...titled, kind: 'value', text: valueText(field, value, measure), code }];
}

/** An answer's result in the order and the words of its output schema. */
export function resultParts(
  fields: readonly Field[],
  result: unknown,
  measure: LengthUnit = 'metres',
): ResultPart[] {
  return fields.flatMap((field) => partOf(field, valuesOf(result)[field.name], measure));
}

/** What the question said already, or what only tells how to read the rest. */
const ECHOED = new Set(['timeZone', 'date', 'at']);

/**
 * What an answer says first: the value that its first one names, else its first one or two single values. Parts of
 * a sum, which are named `by…`, do not stand beside it, nor does what the answer leaves open or says twice.
 */
export function headlineOf(parts: readonly ResultPart[]): ValuePart[] {
  const values = parts.filter((part) => part.kind === 'value');
  const named = values.find(({ name }) => name === values[0]?.code);
  if (named) return [named];
  const [first, second] = values.filter(
    ({ name, text }) => text !== '–' && !/^by[A-Z]/.test(name) && !ECHOED.has(name),
  );
  return [first, second?.text === first?.text ? undefined : second].filter((value) => value !== undefined);
}
