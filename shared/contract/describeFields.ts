import type { z } from 'zod';
import type { Field, FieldMeta, SettingKind, TextFormat } from './field';

interface Peeled {
  schema: z.ZodType;
  meta: FieldMeta;
  required: boolean;
  defaultValue?: unknown;
}

interface LooseDef {
  type: string;
  innerType?: z.ZodType;
  defaultValue?: unknown;
  shape?: Record<string, z.ZodType>;
  element?: z.ZodType;
  entries?: Record<string, string>;
  format?: string;
}

/** A check as zod keeps it: bounds of numbers, lengths of lists. */
interface CheckDef {
  check: string;
  value?: number;
  inclusive?: boolean;
  minimum?: number;
  maximum?: number;
}

const defOf = (schema: z.ZodType): LooseDef => schema.def as unknown as LooseDef;

/** Takes off the wrappers (optional, default, nullable) and gathers what each says. */
function peel(schema: z.ZodType): Peeled {
  let meta: FieldMeta = (schema.meta() ?? {}) as FieldMeta;
  let required = true;
  let defaultValue: unknown;
  let inner = schema;
  for (;;) {
    const def = defOf(inner);
    if (!def.innerType) return { schema: inner, meta, required, defaultValue };
    if (def.type === 'optional' || def.type === 'default' || def.type === 'prefault') required = false;
    if (def.type === 'default' || def.type === 'prefault') defaultValue = def.defaultValue;
    inner = def.innerType;
    meta = { ...((inner.meta() ?? {}) as FieldMeta), ...meta };
  }
}

function checksOf(schema: z.ZodType): CheckDef[] {
  const checks = (schema.def as unknown as { checks?: { _zod: { def: CheckDef } }[] }).checks ?? [];
  return checks.map((check) => check._zod.def);
}

function ofNumber(schema: z.ZodType): Partial<Field> {
  const checks = checksOf(schema);
  const low = checks.find(({ check }) => check === 'greater_than');
  return {
    kind: 'number',
    minimum: low?.value,
    maximum: checks.find(({ check }) => check === 'less_than')?.value,
    minimumIsExcluded: low?.inclusive === false,
    isInteger: (schema as z.ZodNumber).isInt === true,
  };
}

function ofList(schema: z.ZodType): Partial<Field> {
  const checks = checksOf(schema);
  const element = defOf(schema).element;
  return {
    kind: 'list',
    item: element && describeField('item', element),
    minItems: checks.find(({ check }) => check === 'min_length')?.minimum,
    maxItems: checks.find(({ check }) => check === 'max_length')?.maximum,
  };
}

/** A power of 0 is no flash, so that bound alone is not allowed itself. */
function ofSetting(setting: SettingKind, { range }: FieldMeta): Partial<Field> {
  const minimumIsExcluded = setting === 'power';
  return { kind: 'setting', setting, minimum: range?.[0], maximum: range?.[1], minimumIsExcluded };
}

const formatOf = ({ format }: LooseDef): TextFormat | undefined =>
  format === 'datetime' || format === 'date' ? format : undefined;

function ofType(schema: z.ZodType, meta: FieldMeta): Partial<Field> {
  if (meta.setting) return ofSetting(meta.setting, meta);
  if (meta.oneOrMany) {
    const item = describeField('item', meta.oneOrMany);
    return { kind: 'oneOrMany', item, minItems: 1, maxItems: meta.maxItems };
  }
  const def = defOf(schema);
  if (def.type === 'number') return ofNumber(schema);
  if (def.type === 'array') return ofList(schema);
  if (def.type === 'object') return { kind: 'group', fields: describeFields(schema) };
  if (def.type === 'enum') return { kind: 'choice', choices: Object.values(def.entries ?? {}) };
  return def.type === 'boolean' ? { kind: 'boolean' } : { kind: 'text', format: formatOf(def) };
}

/** Describes one schema as a field of the given name. */
function describeField(name: string, schema: z.ZodType): Field {
  const { schema: inner, meta, required, defaultValue } = peel(schema);
  return {
    name,
    kind: 'text',
    required,
    title: meta.title ?? name,
    description: meta.description,
    unit: meta.unit,
    advanced: meta.advanced ?? false,
    step: meta.step,
    defaultValue,
    ...ofType(inner, meta),
  };
}

/** Describes an object schema's fields in their order; an empty list for anything else. */
export function describeFields(schema: z.ZodType): Field[] {
  const shape = defOf(peel(schema).schema).shape ?? {};
  return Object.entries(shape).map(([name, field]) => describeField(name, field));
}

/** A calculator answers GET when every field that it requires is a scalar. */
export function acceptsGet(fields: readonly Field[]): boolean {
  return fields.every((field) => !field.required || !['group', 'list', 'oneOrMany'].includes(field.kind));
}
