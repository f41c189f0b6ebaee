import { randomBytes } from 'node:crypto';
import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Ajv2020, type ValidateFunction } from 'ajv/dist/2020';
import addFormats from 'ajv-formats';
import { TEST_SETTINGS, type TestSettings } from '../../server/scripts/support/testSettings';

/** An answer as far as the contract speaks of it. */
export interface Seen {
  readonly method: string;
  /** Path without the query. */
  readonly path: string;
  readonly status: number;
  readonly headers: Readonly<Record<string, string | undefined>>;
  readonly body: unknown;
}

interface ResponseObject {
  readonly headers?: Record<string, unknown>;
  readonly content?: Record<string, { schema?: { $ref?: string } & Record<string, unknown> }>;
  readonly $ref?: string;
}

interface OperationObject {
  readonly operationId: string;
  readonly responses: Record<string, ResponseObject>;
}

export interface ApiDocument {
  readonly paths: Record<string, Record<string, OperationObject>>;
  readonly components: Record<string, Record<string, unknown>>;
}

/** Stands for every address that no operation answers. */
const ELSEWHERE: OperationObject = { operationId: 'elsewhere', responses: {} };

/** Headers that the document must name wherever an answer carries one. */
const DOCUMENTED = [
  'ratelimit',
  'ratelimit-policy',
  'evenfall-quota-limit',
  'evenfall-quota-remaining',
  'evenfall-quota-reset',
  'retry-after',
  'etag',
  'allow',
  'www-authenticate',
  'x-request-id',
];

/** Holds every answer of the service against one document and notes what was exercised. */
export class Contract {
  private readonly ajv = new Ajv2020({ strict: false, allErrors: true });
  private readonly validators = new Map<string, ValidateFunction>();
  private readonly exercised = new Set<string>();
  private readonly templates: { pattern: RegExp; path: string }[];

  constructor(
    private readonly document: ApiDocument,
    private readonly name: string,
  ) {
    addFormats.default(this.ajv);
    this.ajv.addSchema({ $id: 'document', ...document });
    this.templates = Object.keys(document.paths)
      .map((path) => ({ path, pattern: new RegExp(`^${path.replace(/\{[^}]+\}/g, '[^/]+')}$`) }))
      // A path without parameters is the better match.
      .sort((a, b) => a.path.split('{').length - b.path.split('{').length);
  }

  /** Throws what is wrong with an answer; an address that the document does not know needs no operation. */
  check(seen: Seen): void {
    const template = this.templates.find(({ pattern }) => pattern.test(seen.path));
    const operation = template && this.document.paths[template.path]?.[seen.method.toLowerCase()];
    if (!template || !operation) {
      // Pages and files beside the API are no part of its contract.
      if (!seen.path.startsWith(`/${this.name === 'api' ? 'v1' : 'api'}/`)) return;
      return this.checkElsewhere(seen);
    }
    const response = this.resolve(operation.responses[String(seen.status)]);
    const where = `${seen.method} ${template.path} ${seen.status}`;
    if (!response) throw new Error(`${where} is not in the document`);
    this.checkHeaders(where, response, seen);
    this.checkBody(where, operation, response, seen);
    this.exercised.add(`${operation.operationId} ${seen.status}`);
  }

  /** An address or a method that the document does not name is refused, as the document says of that status. */
  private checkElsewhere(seen: Seen): void {
    if (seen.method === 'OPTIONS' || seen.method === 'HEAD') return;
    const where = `${seen.method} ${seen.path} (${seen.status})`;
    const response = [404, 405].includes(seen.status)
      ? this.resolve({ $ref: `#/components/responses/Problem${seen.status}` })
      : undefined;
    if (!response) throw new Error(`${where} is not in the document`);
    this.checkHeaders(where, response, seen);
    this.checkBody(where, ELSEWHERE, response, seen);
    this.exercised.add(`${ELSEWHERE.operationId} ${seen.status}`);
  }

  private resolve(response: ResponseObject | undefined): ResponseObject | undefined {
    if (!response?.$ref) return response;
    const name = response.$ref.split('/').pop() ?? '';
    return this.document.components.responses?.[name] as ResponseObject | undefined;
  }

  private checkHeaders(where: string, response: ResponseObject, { headers }: Seen): void {
    const named = Object.keys(response.headers ?? {}).map((header) => header.toLowerCase());
    for (const header of DOCUMENTED) {
      if (headers[header] !== undefined && !named.includes(header))
        throw new Error(`${where} carries ${header}, which its document does not name`);
    }
    if (headers['x-request-id'] === undefined) throw new Error(`${where} has no X-Request-Id`);
    if (headers['x-content-type-options'] !== 'nosniff') throw new Error(`${where} has no nosniff`);
  }

  private checkBody(where: string, operation: OperationObject, response: ResponseObject, seen: Seen): void {
    const [type, content] = Object.entries(response.content ?? {})[0] ?? [];
    if (!type) return;
    const given = seen.headers['content-type'] ?? '';
    if (!given.startsWith(`${type};`) && given !== type) throw new Error(`${where} is ${given}, not ${type}`);
    const schema = content?.schema;
    if (!schema || seen.body === undefined) return;
    const key = `${operation.operationId} ${seen.status}`;
    let validate = this.validators.get(key);
    if (!validate) {
      // References are into the document, wherever the schema stands.
      const absolute = JSON.stringify(schema).replaceAll('"$ref":"#', '"$ref":"document#');
      validate = this.ajv.compile(JSON.parse(absolute) as object);
      this.validators.set(key, validate);
    }
    if (!validate(seen.body))
      throw new Error(`${where}: ${this.ajv.errorsText(validate.errors)} in ${JSON.stringify(seen.body)}`);
  }

  /** Leaves for the runner what this worker exercised. */
  leave(): void {
    const text = process.env[TEST_SETTINGS];
    if (!text) return;
    const folder = join((JSON.parse(text) as TestSettings).runFolder, 'contract');
    mkdirSync(folder, { recursive: true });
    const all = Object.values(this.document.paths).flatMap((methods) =>
      Object.values(methods).flatMap(({ operationId, responses }) =>
        Object.keys(responses).map((status) => `${operationId} ${status}`),
      ),
    );
    const note = { document: this.name, all, exercised: [...this.exercised] };
    writeFileSync(join(folder, `${this.name}-${randomBytes(6).toString('hex')}.json`), JSON.stringify(note));
  }
}
