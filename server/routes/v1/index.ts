import { createHash } from 'node:crypto';
import type { RequestHandler } from 'express';
import type { AnyCalculator } from '../../../shared/contract/defineCalculator';
import { callOf, type Call } from '../../http/Call';
import { ProblemError } from '../../http/ProblemError';
import { send } from '../../http/send';
import { problemErrorOf, sendProblem } from '../../http/sendProblem';
import { batchOperation } from './batch';
import { calculatorOperations } from './calculate';
import { corsHeaders, preflightHeaders } from './cors';
import { listOperations } from './list';
import type { Operation } from './operation';
import { serveMetered, type MeteredDependencies } from './serveMetered';
import { usageOperation } from './usage';

export interface V1Dependencies extends MeteredDependencies {
  readonly calculators: readonly AnyCalculator[];
  readonly version: string;
  /** The process's clock, for calculators that need one. */
  readonly now: () => Date;
}

type Table = Map<string, Partial<Record<string, Operation>>>;

/** Every operation of the metered API, found by path and method. */
function v1Operations({ calculators, version, now, publicUrl }: V1Dependencies): Operation[] {
  return [
    ...listOperations(calculators),
    usageOperation,
    batchOperation({ calculators, publicUrl, now }),
    ...calculators.flatMap((calculator) => calculatorOperations(calculator, { version, now })),
  ];
}

function tableOf(operations: readonly Operation[]): Table {
  const table: Table = new Map();
  for (const operation of operations) {
    const methods = table.get(operation.path) ?? {};
    methods[operation.method] = operation;
    if (operation.method === 'GET') methods.HEAD = operation;
    table.set(operation.path, methods);
  }
  return table;
}

function notAllowed(methods: readonly string[]): ProblemError {
  const allowed = [...methods, 'OPTIONS'].sort();
  return new ProblemError('method_not_allowed', `Use ${methods.join(' or ')} here.`, {
    headers: { Allow: allowed.join(', ') },
  });
}

/** What anyone may read is ready made; its tag is its content's. */
function serveOpen(
  operation: Extract<Operation, { access: 'open' }>,
  call: Call,
  { finish }: V1Dependencies,
) {
  const etag = `"${createHash('sha256').update(operation.body).digest('base64url').slice(0, 22)}"`;
  const headers = ['ETag', etag, 'Cache-Control', 'public, max-age=300', ...corsHeaders(call.request)];
  const isUnchanged = call.request.headers['if-none-match'] === etag;
  const typed = ['Content-Type', 'application/json; charset=utf-8', ...headers];
  send(call, isUnchanged ? 304 : 200, typed, isUnchanged ? '' : operation.body, finish);
}

/**
 * The metered API as one handler in front of everything else: a look-up by path instead of a walk through the
 * router, then the operation. Requests to other paths go on.
 */
export function v1Handler(dependencies: V1Dependencies): RequestHandler {
  const table = tableOf(v1Operations(dependencies));
  const { publicUrl, finish, onFault } = dependencies;
  return (request, response, next) => {
    if (!request.url.startsWith('/v1/')) return void next();
    const call = callOf(request, response);
    const refuse = (error: unknown) => {
      const problem = problemErrorOf(error);
      if (problem.code === 'internal_error') onFault(call, error);
      // A body that nobody read would keep the connection from its next request.
      request.resume();
      sendProblem(call, problem, publicUrl, finish, corsHeaders(request));
    };
    const methods = table.get(call.path);
    if (!methods) return refuse(new ProblemError('not_found'));
    if (request.method === 'OPTIONS')
      return send(call, 204, preflightHeaders(Object.keys(methods)), '', finish);
    const operation = methods[request.method];
    if (!operation) return refuse(notAllowed(Object.keys(methods)));
    call.facts.operation = operation.name;
    if (operation.access === 'open') return serveOpen(operation, call, dependencies);
    serveMetered(operation, call, dependencies).catch(refuse);
  };
}
