import { problemOf, statusOf } from '../../shared/contract/problems';
import type { Call } from './Call';
import type { ProblemError } from './ProblemError';
import type { Finish } from './send';

interface Content {
  readonly status: number;
  readonly type: string;
  /** JSON; empty for an answer without content. */
  readonly text: string;
}

/** Sends an answer of the console's own API: never stored, never run, never read by another site. */
export function sendConsole(call: Call, { status, type, text }: Content, finish: Finish): void {
  const { response, request, requestId } = call;
  if (!response.headersSent && !response.destroyed) {
    response.statusCode = status;
    response.setHeader('X-Request-Id', requestId);
    response.setHeader('Cache-Control', 'no-store');
    response.setHeader('Content-Security-Policy', "default-src 'none'; frame-ancestors 'none'");
    if (text !== '') {
      response.setHeader('Content-Type', `${type}; charset=utf-8`);
      response.setHeader('Content-Length', Buffer.byteLength(text));
    }
    response.end(request.method === 'HEAD' ? undefined : text);
  }
  finish(call, status, Math.round((performance.now() - call.startedMs) * 1000) / 1000);
}

/** Sends problem details of the console's own API. */
export function sendConsoleProblem(call: Call, error: ProblemError, publicUrl: string, finish: Finish): void {
  call.facts.code = error.code;
  const { detail, errors, headers } = error;
  for (const [name, value] of Object.entries(headers)) call.response.setHeader(name, value);
  const problem = problemOf(error.code, { publicUrl, requestId: call.requestId, detail, errors });
  const content = { type: 'application/problem+json', text: JSON.stringify(problem) };
  sendConsole(call, { status: statusOf(error.code), ...content }, finish);
}
