import type { RouteConfig } from '@asteasolutions/zod-to-openapi';
import { answerFor, parseInput, type AnyCalculator } from '../../shared/contract/defineCalculator';
import type { Field } from '../../shared/contract/field';
import { jsonSchemaOf, type JsonSchema } from '../../shared/contract/jsonSchema';
import { headerRefs, LIMIT_HEADERS } from './components';
import { schemaName } from './schemaName';

const ref = (name: string) => ({ $ref: `#/components/schemas/${name}` });
const problems = (...statuses: number[]) =>
  Object.fromEntries(statuses.map((status) => [status, { $ref: `#/components/responses/Problem${status}` }]));

/** Examples with the whole answer, computed here, so that the document can't say what the code does not. */
function examplesOf(calculator: AnyCalculator) {
  const named = calculator.examples.map(({ title, input }, i) => {
    const parsed = parseInput(calculator, input);
    if ('faults' in parsed) throw new Error(`${calculator.id}: the example “${title}” is not valid`);
    const answer = answerFor(calculator, parsed.input, { now: new Date('2026-06-21T18:00:00Z') });
    return { name: `example${i + 1}`, title, input, answer };
  });
  const pick = (which: 'input' | 'answer') =>
    Object.fromEntries(named.map((one) => [one.name, { summary: one.title, value: one[which] }]));
  return { inputs: pick('input'), answers: pick('answer') };
}

function describe({ summary, units, sources }: AnyCalculator): string {
  const cost = units === 1 ? '1 unit' : `${units} units`;
  return `${summary}\n\nCosts ${cost}.\n\nSources:\n${sources.map((source) => `- ${source}`).join('\n')}`;
}

function propertyAt(schema: JsonSchema, path: readonly string[]): JsonSchema {
  return path.reduce<JsonSchema>(
    (level, name) => ((level.properties as Record<string, JsonSchema> | undefined) ?? {})[name] ?? {},
    schema,
  );
}

/** Scalars as query parameters; those of a group under dotted names. */
function parametersOf(fields: readonly Field[], schema: JsonSchema, path: string[] = []): object[] {
  return fields.flatMap((field) => {
    const here = [...path, field.name];
    if (field.kind === 'group') return parametersOf(field.fields ?? [], schema, here);
    if (field.kind === 'list' || field.kind === 'oneOrMany') return [];
    return [
      {
        name: here.join('.'),
        in: 'query',
        required: field.required && path.length === 0,
        description: field.description ?? field.title,
        schema: propertyAt(schema, here),
      },
    ];
  });
}

function answerResponse(calculator: AnyCalculator, answers: object, extra: readonly string[]) {
  return {
    description: 'The answer, with notes and cautions',
    headers: headerRefs(['X-Request-Id', ...LIMIT_HEADERS, ...extra]),
    content: { 'application/json': { schema: ref(schemaName(calculator.id, 'Answer')), examples: answers } },
  };
}

/** The paths of one calculator: POST, and GET where its required fields are scalars. */
export function calculatorPaths(calculator: AnyCalculator): RouteConfig[] {
  const { id, title, group } = calculator;
  const { inputs, answers } = examplesOf(calculator);
  const common = { path: `/v1/${id}`, summary: title, description: describe(calculator), tags: [group] };
  const post = {
    ...common,
    method: 'post',
    operationId: schemaName(id, ''),
    requestBody: {
      required: true,
      content: { 'application/json': { schema: ref(schemaName(id, 'Input')), examples: inputs } },
    },
    responses: {
      200: answerResponse(calculator, answers, []),
      ...problems(400, 401, 403, 413, 415, 422, 429, 500, 503),
    },
  };
  if (!calculator.answersGet) return [post as unknown as RouteConfig];
  const get = {
    ...common,
    method: 'get',
    operationId: `${schemaName(id, '')}Get`,
    parameters: parametersOf(calculator.fields, jsonSchemaOf(calculator.input, 'input')),
    responses: {
      200: answerResponse(calculator, answers, ['ETag']),
      304: { description: 'As before', headers: headerRefs(['X-Request-Id', 'ETag', ...LIMIT_HEADERS]) },
      ...problems(400, 401, 403, 422, 429, 500, 503),
    },
  };
  return [post, get] as unknown as RouteConfig[];
}
