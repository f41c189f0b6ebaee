import { openSync } from 'node:fs';
import type { Server } from 'node:http';
import { pathToFileURL } from 'node:url';
import pg from 'pg';
import request from 'supertest';
import { afterAll } from 'vitest';
import { loadCalculators } from '../../shared/calculators';
import { readConfig, type Config } from '../../server/config';
import { serve } from '../../server/main';
import { buildOpenapi } from '../../server/openapi/buildOpenapi';
import { issueKeyForOperator } from '../../server/services/keys/issueKey';
import { Contract, type ApiDocument } from './contract';
import { openTestDatabase, type TestDatabase } from './database';
import { testSettings } from './testSettings';

export interface CallOptions {
  readonly key?: string;
  readonly body?: unknown;
  readonly headers?: Readonly<Record<string, string>>;
}

export interface CallAnswer {
  readonly status: number;
  readonly headers: Record<string, string>;
  // Tests read answers of many shapes; the contract has checked this one's.
  readonly body: Record<string, never> & {
    result: Record<string, never>;
    errors: { pointer: string; code: string; detail: string }[];
  };
  readonly text: string;
}

export interface TestService {
  readonly url: string;
  readonly config: Config;
  readonly database: TestDatabase;
  /** One call of the API, its answer held against the document. */
  call(method: string, path: string, options?: CallOptions): Promise<CallAnswer>;
  /** A new account's server key; each caller's own, so that files run side by side. */
  key(options?: { units?: number; rate?: number; account?: string }): Promise<string>;
  /** A statement as the role that owns the tables. */
  sql<R extends pg.QueryResultRow>(text: string, values?: unknown[]): Promise<R[]>;
  /** Stands the service's clock at a moment, or lets it go again. */
  setClock(moment: string | null): Promise<void>;
  stop(): Promise<void>;
}

const API = buildOpenapi(await loadCalculators(), { version: '0.0.0', publicUrl: 'http://127.0.0.1' });
const contract = new Contract(API as unknown as ApiDocument, 'api');
afterAll(() => contract.leave());

let accounts = 0;

function configFor(overrides: Partial<Config>): Config {
  const config = readConfig({ NODE_ENV: 'test', LOG_LEVEL: 'info' });
  return { ...config, port: 0, publicUrl: 'http://127.0.0.1:4310', ...overrides };
}

async function callOf(
  server: Server | string,
  method: string,
  path: string,
  { key, body, headers = {} }: CallOptions,
): Promise<CallAnswer> {
  const verb = method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete' | 'head' | 'options';
  let sent = request(server)[verb](path);
  if (key !== undefined) sent = sent.set('Authorization', `Bearer ${key}`);
  if (body !== undefined && typeof body !== 'string') sent = sent.set('Content-Type', 'application/json');
  for (const [name, value] of Object.entries(headers)) sent = sent.set(name, value);
  const answer = await (body === undefined ? sent : sent.send(body as string | object));
  const isJson = /json/.test(answer.headers['content-type'] ?? '');
  const given: unknown = isJson && answer.text ? JSON.parse(answer.text) : undefined;
  const { status } = answer;
  contract.check({
    method: method.toUpperCase(),
    path: path.split('?')[0] ?? path,
    status,
    headers: answer.headers as Record<string, string>,
    body: given,
  });
  return { status, headers: answer.headers, body: given, text: answer.text } as CallAnswer;
}

/** The service as in production, on a free port of loopback, over a database of its own. */
export async function startService(
  overrides: Partial<Config> = {},
  given?: TestDatabase,
  logFile = '/dev/null',
  clientFolder: string | null = null,
): Promise<TestService> {
  const database = given ?? (await openTestDatabase());
  const config = configFor(overrides);
  const { ownerUrl, serviceUrl } = database;
  const logFd = openSync(logFile, 'a');
  const workerFolder = pathToFileURL(`${testSettings().serverFolder}/`);
  const service = await serve({ config, ownerUrl, serviceUrl, clientFolder, logFd, workerFolder });
  const owner = new pg.Pool({ connectionString: ownerUrl, max: 2 });
  owner.on('error', () => undefined);
  return {
    url: service.url,
    config,
    database,
    call: (method, path, options = {}) => callOf(service.url, method, path, options),
    key: ({ account = `caller-${(accounts += 1)}@example.org`, ...limits } = {}) =>
      issueKeyForOperator(ownerUrl, { account, name: 'test', rate: 10_000, ...limits }),
    sql: async (text, values) => (await owner.query(text, values)).rows as never,
    setClock: async (moment) => {
      const now = moment === null ? 'now()' : `timestamptz '${moment}'`;
      await owner.query(
        `CREATE OR REPLACE FUNCTION service_now() RETURNS timestamptz LANGUAGE sql STABLE AS $$ SELECT ${now} $$`,
      );
    },
    stop: async () => {
      await service.stop();
      await owner.end();
      if (!given) await database.drop();
    },
  };
}
