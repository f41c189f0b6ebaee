import type { ErrorRequestHandler, RequestHandler } from 'express';
import type { ProblemCode } from '../../shared/contract/problems';
import { callOf, type Call } from '../http/Call';
import { ProblemError } from '../http/ProblemError';
import { sendProblem } from '../http/sendProblem';
import type { Finish } from '../http/send';

interface Dependencies {
  readonly publicUrl: string;
  readonly finish: Finish;
  readonly onFault: (call: Call, error: unknown) => void;
}

/** What Express and its parts throw for a request they can't take, by status. */
const BY_STATUS: Record<number, ProblemCode> = {
  400: 'malformed_request',
  404: 'not_found',
  413: 'too_large',
  415: 'unsupported_media_type',
};

function problemFor(error: unknown): ProblemError {
  if (error instanceof ProblemError) return error;
  const status = (error as { status?: number } | null)?.status ?? 500;
  return new ProblemError(BY_STATUS[status] ?? 'internal_error', undefined, { cause: error });
}

/** Nothing answered before. */
export const nothingHere: RequestHandler = () => {
  throw new ProblemError('not_found');
};

/** The one place that turns what was thrown on the way into problem details. */
export function problemAnswers({ publicUrl, finish, onFault }: Dependencies): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (response.headersSent) return void next(error);
    const call = callOf(request, response);
    const problem = problemFor(error);
    if (problem.code === 'internal_error') onFault(call, error);
    sendProblem(call, problem, publicUrl, finish);
  };
}
