import { z } from 'zod';
import type { AnyCalculator } from './defineCalculator';
import type { FieldMeta } from './field';
import { SETTING_PATTERNS } from './settingIn';

export type JsonSchema = Record<string, unknown>;

/** A setting is a number in its range, or text as on the camera. */
function settingSchema(meta: FieldMeta): JsonSchema[] {
  const [low, high] = meta.range ?? [0, Number.MAX_VALUE];
  const kind = meta.setting ?? 'iso';
  const bound = kind === 'power' ? { exclusiveMinimum: low } : { minimum: low };
  const number = { type: 'number', ...bound, maximum: high };
  const pattern = SETTING_PATTERNS[kind];
  return pattern ? [number, { type: 'string', pattern }] : [number];
}

/** Turns our own words about a field into JSON Schema; what it has no word for becomes an `x-` annotation. */
function translate(schema: JsonSchema, io: 'input' | 'output'): void {
  const meta = schema as FieldMeta & JsonSchema;
  if (meta.setting) {
    const ways = settingSchema(meta);
    Object.assign(schema, ways.length === 1 ? ways[0] : { anyOf: ways });
  }
  if (meta.oneOrMany) {
    const item = bareSchema(meta.oneOrMany, io);
    schema.anyOf = [item, { type: 'array', minItems: 1, items: item }];
  }
  if (meta.unit) schema['x-unit'] = meta.unit;
  for (const key of ['setting', 'range', 'unit', 'advanced', 'step', 'oneOrMany']) delete schema[key];
}

function bareSchema(schema: z.ZodType, io: 'input' | 'output'): JsonSchema {
  const made = z.toJSONSchema(schema, {
    io,
    unrepresentable: 'any',
    override: ({ jsonSchema }) => translate(jsonSchema as JsonSchema, io),
  }) as JsonSchema;
  delete made.$schema;
  return made;
}

/** JSON Schema 2020-12 of any schema of the contract. */
export function jsonSchemaOf(schema: z.ZodType, io: 'input' | 'output'): JsonSchema {
  return bareSchema(schema, io);
}

const DIALECT = 'https://json-schema.org/draft/2020-12/schema';

/** What a calculator takes, as JSON Schema. */
export function inputJsonSchema(calculator: AnyCalculator): JsonSchema {
  return { $schema: DIALECT, title: calculator.title, ...bareSchema(calculator.input, 'input') };
}

/** What a calculator's `result` is, as JSON Schema. */
export function outputJsonSchema(calculator: AnyCalculator): JsonSchema {
  return { $schema: DIALECT, title: calculator.title, ...bareSchema(calculator.output, 'output') };
}
