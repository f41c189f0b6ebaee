import { problemOf, statusOf } from '../../shared/contract/problems';
import type { Call } from './Call';
import { ProblemError } from './ProblemError';
import { send, type Finish, type HeaderList } from './send';

/** Anything that was thrown, as a refusal; what is not one of ours is our fault. */
export function problemErrorOf(error: unknown): ProblemError {
  return error instanceof ProblemError
    ? error
    : new ProblemError('internal_error', undefined, { cause: error });
}

/** Sends problem details (RFC 9457). */
export function sendProblem(
  call: Call,
  error: ProblemError,
  publicUrl: string,
  finish: Finish,
  headers: HeaderList = [],
): void {
  const status = statusOf(error.code);
  call.facts.code = error.code;
  const { detail, errors } = error;
  const problem = problemOf(error.code, { publicUrl, requestId: call.requestId, detail, errors });
  const own = Object.entries(error.headers).flat();
  send(
    call,
    status,
    [
      'Content-Type',
      'application/problem+json; charset=utf-8',
      'Cache-Control',
      'no-store',
      ...own,
      ...headers,
    ],
    JSON.stringify(problem),
    finish,
  );
}
