import type { Call } from '../../http/Call';
import { ProblemError } from '../../http/ProblemError';
import { readQuery } from '../../http/query';
import { readJson } from '../../http/readBody';
import { sendJson, send, type Finish, type HeaderList } from '../../http/send';
import { problemErrorOf, sendProblem } from '../../http/sendProblem';
import { refusalProblem } from '../../policies/refusals';
import { limitHeaders } from '../../presenters/limitHeaders';
import {
  MeterUnavailable,
  type Ask,
  type Decision,
  type Meter,
  type Standing,
} from '../../services/metering/meter';
import { corsHeaders } from './cors';
import { credentialsOf } from './credentialsOf';
import type { Operation, Prepared } from './operation';

type MeteredOperation = Extract<Operation, { access: 'key' }>;

export interface MeteredDependencies {
  readonly meter: Meter;
  readonly publicUrl: string;
  readonly finish: Finish;
  readonly onFault: (call: Call, error: unknown) => void;
}

/** A day in the caller's own cache; never in a shared one, which would serve calls unmetered. */
const CACHE_ANSWER = ['Cache-Control', 'private, max-age=86400'];
const NO_STORE = ['Cache-Control', 'no-store'];

/** A call that can't be read still asks the meter, so that it counts in the rate and a bad key is told first. */
async function prepare(operation: MeteredOperation, call: Call): Promise<Prepared> {
  try {
    const given =
      operation.method === 'POST'
        ? await readJson(call.request, operation.bodyLimit)
        : readQuery(call.search);
    return await operation.prepare(given, call);
  } catch (error) {
    const problem = problemErrorOf(error);
    if (problem.code === 'internal_error') throw error;
    return { units: 0, needs: [], problem, answer: () => null };
  }
}

/** A call that is refused unread; its body must not keep the connection from the next request. */
function refused({ request }: Call, problem: ProblemError): Prepared {
  request.resume();
  return { units: 0, needs: [], problem, answer: () => null };
}

function matches(call: Call, etag: string | undefined): boolean {
  const given = call.request.headers['if-none-match'];
  if (!etag || !given) return false;
  return given.split(',').some((one) => one.trim() === etag || one.trim() === etag.slice(2));
}

let told: { readonly standing: Standing; readonly headers: HeaderList } | undefined;

/** Calls that were decided together have one standing, and the same to be told about it. */
function limitsOf(standing: Standing): HeaderList {
  if (told?.standing !== standing) told = { standing, headers: limitHeaders(standing) };
  return told.headers;
}

async function decide(meter: Meter, ask: Ask): Promise<Decision> {
  try {
    return await meter.take(ask);
  } catch (error) {
    if (!(error instanceof MeterUnavailable)) throw error;
    const headers = { 'Retry-After': String(error.retryAfterS) };
    throw new ProblemError('unavailable', undefined, { headers, cause: error });
  }
}

/**
 * Serves one metered call: key, input, meter, calculation, answer. The input is checked before the meter is
 * asked, so that faults cost nothing; the units are taken before the calculation, so that nothing is served
 * uncounted.
 */
export async function serveMetered(
  operation: MeteredOperation,
  call: Call,
  dependencies: MeteredDependencies,
): Promise<void> {
  const { meter, publicUrl, finish, onFault } = dependencies;
  const { keyHash, site, isPass, refusal } = credentialsOf(call.request, publicUrl);
  const ready = refusal ? refused(call, refusal) : await prepare(operation, call);
  const isUnchanged = !ready.problem && matches(call, ready.etag);
  const units = isUnchanged || ready.problem ? 0 : ready.units;
  const ask: Ask = { keyHash, units, needs: ready.needs, site, isPass };
  const decision = await decide(meter, ask);
  const { standing } = decision;
  call.facts.keyId = standing?.keyId ?? (decision.granted ? undefined : (decision.keyId ?? undefined));
  call.facts.accountId = standing?.accountId;
  call.facts.at = standing?.at;
  const limits: HeaderList = corsHeaders(call.request);
  if (standing) limits.push(...limitsOf(standing));
  if (!decision.granted) {
    sendProblem(call, refusalProblem(decision, ask), publicUrl, finish, limits);
    return;
  }
  if (ready.problem) {
    sendProblem(call, ready.problem, publicUrl, finish, limits);
    return;
  }
  const caching = ready.etag ? ['ETag', ready.etag, ...CACHE_ANSWER] : NO_STORE;
  if (isUnchanged) {
    send(call, 304, [...limits, ...caching], '', finish);
    return;
  }
  try {
    const answer = await ready.answer(decision.standing);
    sendJson(call, 200, [...limits, ...caching], answer, finish);
    // Only now: an answer that can't be written costs nothing either.
    call.facts.units = units;
  } catch (error) {
    meter.giveBack(decision.standing, units);
    onFault(call, error);
    sendProblem(call, new ProblemError('internal_error'), publicUrl, finish, limits);
  }
}
