import type { Request, RequestHandler } from 'express';
import { z } from 'zod';
import { describeFields } from '../../../shared/contract/describeFields';
import { faultsOf, type Fault } from '../../../shared/contract/faults';
import { callOf, type Call } from '../../http/Call';
import { ProblemError } from '../../http/ProblemError';
import { readQuery } from '../../http/query';
import { readJson } from '../../http/readBody';
import { sendConsole } from '../../http/sendConsole';
import type { Finish } from '../../http/send';
import { changesState, isFromOwnPage } from '../../policies/ownPage';
import { liveSession, type SignedIn } from '../../services/sessions/liveSession';
import { invalidInput } from '../v1/invalidInput';
import type { ConsoleServices, Given, Route } from './route';
import { Visit } from './Visit';

const BODY_LIMIT = 32 * 1024;
const NOTHING = z.strictObject({});
const CHALLENGE = { 'WWW-Authenticate': 'Session realm="evenfall"' };

export interface ServeDependencies {
  readonly services: ConsoleServices;
  readonly finish: Finish;
}

/** The call of a request, made when it first is asked for and kept with its answer. */
export function consoleCall(request: Request): Call {
  const { locals } = request.res as { locals: { call?: Call } };
  locals.call ??= callOf(request, request.res as Call['response']);
  return locals.call;
}

async function signedInBy(visit: Visit, { database }: ConsoleServices): Promise<SignedIn> {
  const { claims } = visit;
  if (!claims) throw new ProblemError('session_missing', undefined, { headers: CHALLENGE });
  const ended = () => new ProblemError('session_ended', undefined, { headers: CHALLENGE });
  if (claims.isStale) throw ended();
  const signedIn = await liveSession(database, claims);
  if (!signedIn) throw ended();
  if (signedIn.account.isBlocked) throw new ProblemError('account_blocked');
  return signedIn;
}

function parsed(schema: z.ZodType, given: unknown): { value?: unknown; faults: Fault[] } {
  const result = schema.safeParse(given);
  if (result.success) return { value: result.data, faults: [] };
  return { faults: faultsOf(result.error.issues, describeFields(schema), given) };
}

async function bodyOf(route: Route, request: Request): Promise<unknown> {
  if (!changesState(route.method)) return {};
  // A DELETE names everything in its path; its type is asked for all the same, since no form can send it.
  const isEmpty = route.method === 'DELETE' && !Number(request.headers['content-length'] ?? 0);
  if (isEmpty && /^application\/json\b/i.test(request.headers['content-type'] ?? '')) return {};
  return readJson(request, BODY_LIMIT);
}

/** Everything that comes in, or a refusal with every fault of it. An id that can't be one is no fault: nothing is there. */
async function givenTo(
  route: Route,
  request: Request,
): Promise<Given<Record<string, unknown>, Record<string, unknown>, Record<string, unknown>>> {
  const params = (route.params ?? NOTHING).safeParse({ ...request.params });
  if (!params.success) throw new ProblemError('not_found');
  const pairs = Object.fromEntries(readQuery(consoleCall(request).search));
  const query = parsed(route.query ?? NOTHING, pairs);
  const body = parsed(route.body ?? NOTHING, await bodyOf(route, request));
  const faults = [...query.faults, ...body.faults];
  if (faults.length > 0) throw invalidInput(faults);
  return {
    params: params.data,
    query: query.value as Record<string, unknown>,
    body: body.value as Record<string, unknown>,
  };
}

/** Serves one route, in this order: own page → session → input → what it does → what may leave. */
export function serveRoute(route: Route, { services, finish }: ServeDependencies): RequestHandler {
  return async (request, response) => {
    const call = consoleCall(request);
    call.facts.operation = route.id;
    const { publicUrl } = services.settings;
    if (changesState(route.method) && !isFromOwnPage(request.headers, publicUrl))
      throw new ProblemError('not_same_origin');
    const visit = new Visit(request, response, call, services);
    if (route.access === 'session') visit.signedIn = await signedInBy(visit, services);
    const given = await givenTo(route, request);
    const body = await route.handle(given as never, visit as never, services);
    // An answer with a field that its schema does not name never leaves.
    const text = route.answer ? JSON.stringify(route.answer.parse(body)) : '';
    sendConsole(call, { status: route.status, type: 'application/json', text }, finish);
  };
}
