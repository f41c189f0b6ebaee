import { z } from 'zod';
import { rules as sentences } from '../text';
import { answerSchema } from './answer';
import type { AnyCalculator } from './defineCalculator';
import type { FieldMeta } from './field';
import { SETTING_PATTERNS, SETTING_RANGES } from './settingIn';

/** A JSON Schema, draft 2020-12. */
export type JsonSchema = z.core.JSONSchema.BaseSchema;

type Direction = 'input' | 'output';

/** What `exactly` and `atMostOne` leave on their checks. */
interface Rule {
  readonly fault: 'exactly' | 'at_most_one';
  readonly fields: readonly string[];
  readonly count: number;
}

const metaOf = (schema: z.core.$ZodType) => (z.globalRegistry.get(schema) ?? {}) as FieldMeta;

/** A setting is a number in its range, or text as it stands on the camera; text can't be held to a range here. */
function ofSetting({ setting, range }: FieldMeta): JsonSchema {
  const kind = setting ?? 'iso';
  const [low, maximum] = range ?? SETTING_RANGES[kind];
  const lowest: JsonSchema = kind === 'power' ? { exclusiveMinimum: low } : { minimum: low };
  const number: JsonSchema = { type: 'number', ...lowest, maximum };
  const pattern = SETTING_PATTERNS[kind];
  return pattern === null ? number : { anyOf: [number, { type: 'string', pattern }] };
}

function ofOneOrMany(item: z.ZodType, maxItems: number | undefined, io: Direction): JsonSchema {
  const { $schema: _, ...one } = schemaOf(item, io);
  return { anyOf: [one, { type: 'array', items: one, minItems: 1, ...(maxItems && { maxItems }) }] };
}

function rulesOf(schema: z.core.$ZodType): Rule[] {
  const checks = (schema._zod.def as { checks?: { _zod: { def: unknown } }[] }).checks ?? [];
  return checks
    .map((check) => (check._zod.def as { params?: Partial<Rule> }).params)
    .filter((params): params is Rule => params?.fault === 'exactly' || params?.fault === 'at_most_one');
}

/** All ways to choose so many names. */
function chosen(fields: readonly string[], count: number): string[][] {
  if (count === 0) return [[]];
  return fields.flatMap((field, i) => chosen(fields.slice(i + 1), count - 1).map((rest) => [field, ...rest]));
}

/** Exactly k of n: just one of the choices of k names is there whole. At most one: no two are there. */
function ofRule({ fault, fields, count }: Rule): JsonSchema {
  const choices = (size: number) => chosen(fields, size).map((required) => ({ required }));
  return fault === 'exactly' ? { oneOf: choices(count) } : { not: { anyOf: choices(2) } };
}

const sentenceOf = (rule: Rule) =>
  rule.fault === 'exactly' ? sentences.exactly(rule) : sentences.at_most_one(rule);

/** Says in JSON Schema what zod can't: settings, one or many, alternatives, and our own metadata. */
function complete(schema: z.core.$ZodType, json: JsonSchema, io: Direction): void {
  const meta = metaOf(schema);
  const { unit, advanced } = json as { unit?: unknown; advanced?: unknown };
  for (const own of ['unit', 'advanced', 'setting', 'range', 'step', 'oneOrMany']) delete json[own];
  if (unit !== undefined) json['x-unit'] = unit;
  if (advanced === true) json['x-advanced'] = true;
  if (meta.setting) Object.assign(json, ofSetting(meta));
  if (meta.oneOrMany) {
    delete json.maxItems;
    Object.assign(json, ofOneOrMany(meta.oneOrMany, meta.maxItems, io));
  }
  const rules = rulesOf(schema);
  if (rules.length === 0) return;
  json.allOf = rules.map(ofRule);
  json.description = [meta.description, ...rules.map(sentenceOf)].filter(Boolean).join(' ');
}

function schemaOf(schema: z.ZodType, io: Direction): JsonSchema {
  const { '~standard': _, ...json } = z.toJSONSchema(schema, {
    io,
    unrepresentable: 'any',
    override: ({ zodSchema, jsonSchema }) => complete(zodSchema, jsonSchema, io),
  });
  return json;
}

/** The JSON Schema of a calculator's input. Faults between fields other than alternatives are not in it. */
export function inputJsonSchema(calculator: AnyCalculator): JsonSchema {
  const json = schemaOf(calculator.input, 'input');
  return {
    ...json,
    title: calculator.title,
    description: [calculator.summary, json.description].filter(Boolean).join(' '),
  };
}

/** The JSON Schema of a calculator's result. */
export function outputJsonSchema(calculator: AnyCalculator): JsonSchema {
  return { ...schemaOf(calculator.output, 'output'), title: calculator.title };
}

/** The JSON Schema of a calculator's whole answer: result, notes and cautions. */
export function answerJsonSchema(calculator: AnyCalculator): JsonSchema {
  return { ...schemaOf(answerSchema(calculator.output), 'output'), title: calculator.title };
}

/** The JSON Schema of any schema of the contract, to be part of a larger document. */
export function jsonSchemaOf(schema: z.ZodType, io: Direction): JsonSchema {
  const { $schema: _, ...json } = schemaOf(schema, io);
  return json;
}
