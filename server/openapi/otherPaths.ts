import type { RouteConfig } from '@asteasolutions/zod-to-openapi';
import { headerRefs, LIMIT_HEADERS } from './components';

const text = { type: 'string' };
const problems = (...statuses: number[]) =>
  Object.fromEntries(statuses.map((status) => [status, { $ref: `#/components/responses/Problem${status}` }]));

const ENTRY = {
  type: 'object',
  required: ['id', 'group', 'path', 'title', 'summary', 'get', 'units', 'inputSchema', 'outputSchema'],
  additionalProperties: false,
  properties: {
    id: text,
    group: text,
    path: text,
    title: text,
    summary: text,
    get: { type: 'boolean', description: 'whether GET works' },
    units: { type: 'integer', description: 'what a call costs' },
    inputSchema: { ...text, description: 'where its input’s JSON Schema is' },
    outputSchema: { ...text, description: 'where its result’s JSON Schema is' },
  },
};

const json = (schema: object) => ({ 'application/json': { schema } });

const list = {
  method: 'get',
  path: '/v1/calculators',
  operationId: 'ListCalculators',
  summary: 'All calculators',
  description: 'Needs no key and costs nothing.',
  tags: ['account'],
  security: [],
  responses: {
    200: {
      description: 'The list',
      headers: headerRefs(['X-Request-Id', 'ETag']),
      content: json({
        type: 'object',
        required: ['calculators'],
        additionalProperties: false,
        properties: { calculators: { type: 'array', items: ENTRY } },
      }),
    },
    304: { description: 'As before', headers: headerRefs(['X-Request-Id', 'ETag']) },
    ...problems(405),
  },
};

const schemas = {
  method: 'get',
  path: '/v1/calculators/{group}/{name}/{schema}',
  operationId: 'CalculatorSchema',
  summary: 'JSON Schema of a calculator’s input or result',
  tags: ['account'],
  security: [],
  parameters: [
    { name: 'group', in: 'path', required: true, schema: text },
    { name: 'name', in: 'path', required: true, schema: text },
    {
      name: 'schema',
      in: 'path',
      required: true,
      schema: { type: 'string', enum: ['input.schema.json', 'output.schema.json'] },
    },
  ],
  responses: {
    200: {
      description: 'JSON Schema 2020-12',
      headers: headerRefs(['X-Request-Id', 'ETag']),
      content: json({ type: 'object' }),
    },
    304: { description: 'As before', headers: headerRefs(['X-Request-Id', 'ETag']) },
    ...problems(404, 405),
  },
};

const usage = {
  method: 'get',
  path: '/v1/usage',
  operationId: 'Usage',
  summary: 'What was used and what is left',
  description: 'Any key, no scope, no units; counts in the rate.',
  tags: ['account'],
  responses: {
    200: {
      description: 'This calendar month (UTC)',
      headers: headerRefs(['X-Request-Id', ...LIMIT_HEADERS]),
      content: json({ $ref: '#/components/schemas/Usage' }),
    },
    ...problems(400, 401, 403, 405, 422, 429, 500, 503),
  },
};

const remarks = {
  type: 'array',
  items: {
    type: 'object',
    required: ['code', 'message'],
    additionalProperties: false,
    properties: { code: text, message: text },
  },
};

const ITEM = {
  oneOf: [
    {
      type: 'object',
      title: 'Answered',
      required: ['status', 'result', 'notes', 'cautions'],
      additionalProperties: false,
      properties: { status: { const: 200 }, result: {}, notes: remarks, cautions: remarks },
    },
    {
      type: 'object',
      title: 'Refused',
      required: ['status', 'problem'],
      additionalProperties: false,
      properties: { status: { enum: [404, 422] }, problem: { $ref: '#/components/schemas/Problem' } },
    },
  ],
};

const batch = {
  method: 'post',
  path: '/v1/batch',
  operationId: 'Batch',
  summary: 'Several calls at once',
  description:
    'Up to 1,000 calls of any calculators in one body of at most 2 MiB. Takes the units of all good items at once, or none and answers 429. An item at fault fails alone and costs nothing; the pointers in its problem lead into its own input.',
  tags: ['account'],
  requestBody: {
    required: true,
    content: {
      'application/json': {
        schema: {
          type: 'object',
          required: ['calls'],
          additionalProperties: false,
          properties: {
            calls: {
              type: 'array',
              minItems: 1,
              maxItems: 1000,
              items: {
                type: 'object',
                required: ['calculator', 'input'],
                additionalProperties: false,
                properties: { calculator: { ...text, description: 'group/name' }, input: {} },
              },
            },
          },
        },
        examples: {
          two: {
            summary: 'The same dusk in two ways',
            value: {
              calls: [
                { calculator: 'light/convert', input: { ev100: 5 } },
                { calculator: 'exposure/solve', input: { ev100: 5, aperture: 'f/4', iso: 400 } },
              ],
            },
          },
        },
      },
    },
  },
  responses: {
    200: {
      description: 'One result for each call, in order',
      headers: headerRefs(['X-Request-Id', ...LIMIT_HEADERS]),
      content: json({
        type: 'object',
        required: ['results'],
        additionalProperties: false,
        properties: { results: { type: 'array', items: ITEM } },
      }),
    },
    ...problems(400, 401, 403, 413, 415, 422, 429, 500, 503),
  },
};

/** The paths that belong to no calculator. */
export function otherPaths(): RouteConfig[] {
  return [list, schemas, usage, batch] as unknown as RouteConfig[];
}
