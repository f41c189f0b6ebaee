import { OpenApiGeneratorV31, OpenAPIRegistry, type RouteConfig } from '@asteasolutions/zod-to-openapi';
import type { z } from 'zod';
import { jsonSchemaOf } from '../../shared/contract/jsonSchema';
import type { Route } from '../routes/api/route';
import type { DocumentOptions } from './buildOpenapi';
import { headerRefs, registerProblems } from './components';

type Component = Parameters<OpenAPIRegistry['registerComponent']>[2];

const ABOUT = `What the console's own pages ask of the service. It changes with the console and is no contract for others: programs use the public API with a key.

**Session.** Signing in sets two cookies that no script sees: an access token (a signed token of five minutes that names a session) and a refresh token (good for one use, sent to its own address only). The session's row in the database is what counts: it ends after a day unused, after thirty days, at a sign-out, when the password changes, or when a refresh token comes a second time. A second use within ten seconds is two tabs at once and gets an access token alone.

**Requests that change something** need \`Sec-Fetch-Site: same-origin\` (or, from a browser too old for it, our own \`Origin\`), \`Content-Type: application/json\` and \`X-Evenfall-Console: 1\`.`;

const text = (description: string) => ({ description, schema: { type: 'string' } });

/** Headers that only these answers carry. */
const OWN_HEADERS: Record<string, object> = {
  'Set-Cookie': text('The session’s cookies; HttpOnly'),
  'Clear-Site-Data': text('What the browser is to forget'),
  Location: text('Where the thing is'),
  'Content-Disposition': text('A name for the file'),
};

/** Problems that any request can get. */
function statusesOf(route: Route): number[] {
  const changes = route.method !== 'GET';
  const common = [400, 422, 429, 500, 503, ...(changes ? [403, 413, 415] : [])];
  const closed = route.access === 'session' ? [401, 403] : [];
  return [...new Set([...common, ...closed, ...route.problems])].sort((a, b) => a - b);
}

function parametersOf(schema: z.ZodType | undefined, place: 'path' | 'query') {
  if (!schema) return [];
  const { properties = {}, required = [] } = jsonSchemaOf(schema, 'input') as {
    properties?: Record<string, object>;
    required?: string[];
  };
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: place,
    required: required.includes(name),
    schema: property,
  }));
}

function successOf({ answer, headers = [], summary }: Route) {
  const content = answer && {
    'application/json': { schema: jsonSchemaOf(answer, 'output') },
  };
  return {
    description: summary,
    headers: headerRefs(['X-Request-Id', ...headers]),
    ...(content && { content }),
  };
}

function pathOf(route: Route): RouteConfig {
  const { id, method, path, tag, summary, access, status, body, params, query } = route;
  const described = {
    method: method.toLowerCase(),
    path: path.replace(/:(\w+)/g, '{$1}'),
    operationId: id,
    summary,
    tags: [tag],
    security: access === 'session' ? [{ session: [] }] : [],
    parameters: [...parametersOf(params, 'path'), ...parametersOf(query, 'query')],
    ...(body && {
      requestBody: {
        required: true,
        content: { 'application/json': { schema: jsonSchemaOf(body, 'input') } },
      },
    }),
    responses: {
      [status]: successOf(route),
      ...Object.fromEntries(
        statusesOf(route).map((code) => [code, { $ref: `#/components/responses/Problem${code}` }]),
      ),
    },
  };
  return described as unknown as RouteConfig;
}

/** The document of the console's own API, OpenAPI 3.1, made from its routes. */
export function buildConsoleOpenapi(
  routes: readonly Route[],
  { version, publicUrl }: DocumentOptions,
): Record<string, unknown> {
  const registry = new OpenAPIRegistry();
  registerProblems(registry);
  for (const [name, header] of Object.entries(OWN_HEADERS))
    registry.registerComponent('headers', name, header as Component);
  registry.registerComponent('securitySchemes', 'session', {
    type: 'apiKey',
    in: 'cookie',
    name: '__Host-evenfall_session',
    description: 'Set by signing in; without the prefix where the service is reached by plain http.',
  });
  for (const route of routes) registry.registerPath(pathOf(route));
  const document = new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: { title: 'Evenfall console', version, description: ABOUT },
    servers: [{ url: publicUrl }],
    tags: [...new Set(routes.map(({ tag }) => tag))].map((name) => ({ name })),
  });
  return document as unknown as Record<string, unknown>;
}
