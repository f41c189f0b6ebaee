import type { OpenAPIRegistry } from '@asteasolutions/zod-to-openapi';
import { answerSchema } from '../../shared/contract/answer';
import type { AnyCalculator } from '../../shared/contract/defineCalculator';
import { jsonSchemaOf, type JsonSchema } from '../../shared/contract/jsonSchema';
import { PROBLEM_CODES, statusOf } from '../../shared/contract/problems';
import { usageSchema } from '../presenters/usage';
import { schemaName } from './schemaName';

type Component = Parameters<OpenAPIRegistry['registerComponent']>[2];

const FAULT: JsonSchema = {
  type: 'object',
  required: ['pointer', 'code', 'detail'],
  additionalProperties: false,
  properties: {
    pointer: { type: 'string', description: 'JSON Pointer into the body, or /name of a query field' },
    code: { type: 'string' },
    detail: { type: 'string', description: 'what was given and what is allowed, in units' },
  },
};

const PROBLEM: JsonSchema = {
  title: 'Problem details (RFC 9457)',
  type: 'object',
  required: ['type', 'title', 'status', 'detail', 'instance', 'code'],
  additionalProperties: false,
  properties: {
    type: { type: 'string', format: 'uri', description: 'leads to the page of this problem' },
    title: { type: 'string' },
    status: { type: 'integer' },
    detail: { type: 'string' },
    instance: { type: 'string', description: 'the request id, as a URN' },
    code: { type: 'string', enum: PROBLEM_CODES },
    errors: { type: 'array', items: FAULT, description: 'every fault of the input' },
  },
};

const HEADERS: Record<string, [string, JsonSchema]> = {
  'X-Request-Id': ['Names this call in logs and in messages to us', { type: 'string' }],
  RateLimit: ['What is left of the burst and of the month (IETF draft)', { type: 'string' }],
  'RateLimit-Policy': ['The burst’s and the month’s limits (IETF draft)', { type: 'string' }],
  'Evenfall-Quota-Limit': ['Units of this calendar month (UTC)', { type: 'integer' }],
  'Evenfall-Quota-Remaining': ['Units left', { type: 'integer' }],
  'Evenfall-Quota-Reset': ['Seconds until the next month begins', { type: 'integer' }],
  'Retry-After': ['Seconds to wait', { type: 'integer' }],
  ETag: ['Changes with the input and the engine’s version', { type: 'string' }],
  'WWW-Authenticate': ['How to authenticate', { type: 'string' }],
  Allow: ['The methods that this address takes', { type: 'string' }],
};

/** Statuses that a good key can get; these answers tell where it stands. */
const WITH_LIMITS = [400, 403, 413, 415, 422, 429, 500];

/** Headers that each status may carry beside the request id. */
const HEADERS_BY_STATUS: Record<number, string[]> = {
  401: ['WWW-Authenticate'],
  403: ['WWW-Authenticate'],
  405: ['Allow'],
  429: ['Retry-After'],
  503: ['Retry-After'],
};

export const LIMIT_HEADERS = [
  'RateLimit',
  'RateLimit-Policy',
  'Evenfall-Quota-Limit',
  'Evenfall-Quota-Remaining',
  'Evenfall-Quota-Reset',
];

/** References to header components. */
export function headerRefs(names: readonly string[]) {
  return Object.fromEntries(names.map((name) => [name, { $ref: `#/components/headers/${name}` }]));
}

function problemResponse(status: number) {
  const codes = PROBLEM_CODES.filter((code) => statusOf(code) === status);
  return {
    description: codes.map((code) => `\`${code}\``).join(', '),
    headers: headerRefs([
      'X-Request-Id',
      ...(HEADERS_BY_STATUS[status] ?? []),
      ...(WITH_LIMITS.includes(status) ? LIMIT_HEADERS : []),
    ]),
    content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
  };
}

/** The statuses that problems can have, in order. */
const PROBLEM_STATUSES = [...new Set(PROBLEM_CODES.map(statusOf))].sort((a, b) => a - b);

/** Problem details, the headers that answers carry, and the problem answers by status. */
export function registerProblems(registry: OpenAPIRegistry): void {
  registry.registerComponent('schemas', 'Problem', PROBLEM as Component);
  for (const [name, [description, header]] of Object.entries(HEADERS))
    registry.registerComponent('headers', name, { description, schema: header } as Component);
  for (const status of PROBLEM_STATUSES)
    registry.registerComponent('responses', `Problem${status}`, problemResponse(status) as Component);
}

/** Schemas and security schemes that the paths refer to. */
export function registerComponents(registry: OpenAPIRegistry, calculators: readonly AnyCalculator[]): void {
  const schema = (name: string, value: JsonSchema) =>
    registry.registerComponent('schemas', name, value as Component);
  registerProblems(registry);
  schema('Usage', jsonSchemaOf(usageSchema, 'output'));
  for (const calculator of calculators) {
    schema(schemaName(calculator.id, 'Input'), jsonSchemaOf(calculator.input, 'input'));
    schema(schemaName(calculator.id, 'Answer'), jsonSchemaOf(answerSchema(calculator.output), 'output'));
  }
  registry.registerComponent('securitySchemes', 'serverKey', {
    type: 'http',
    scheme: 'bearer',
    description: 'A server key (evenfall_server_…), for programs on a server; refused from pages of other sites.',
  });
  registry.registerComponent('securitySchemes', 'pageKey', {
    type: 'http',
    scheme: 'bearer',
    description: 'A page key (evenfall_page_…), for one widget, from the sites on its list.',
  });
}
