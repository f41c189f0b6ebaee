import type { IncomingMessage, ServerResponse } from 'node:http';
import { requestIdOf } from './requestId';

/** One request on its way through the metered API. */
export interface Call {
  readonly request: IncomingMessage;
  readonly response: ServerResponse;
  readonly requestId: string;
  /** Path without the query. */
  readonly path: string;
  /** The query without its question mark. */
  readonly search: string;
  /** Monotonic milliseconds at arrival. */
  readonly startedMs: number;
  /** What the log and the usage counts learn on the way. */
  readonly facts: CallFacts;
}

export interface CallFacts {
  operation?: string;
  keyId?: string;
  accountId?: string;
  /** The database's clock when it decided, so that counts fall into the month that the quota did. */
  at?: Date;
  units: number;
  code?: string;
}

export function callOf(request: IncomingMessage, response: ServerResponse): Call {
  const url = request.url ?? '/';
  const at = url.indexOf('?');
  return {
    request,
    response,
    requestId: requestIdOf(request),
    path: at < 0 ? url : url.slice(0, at),
    search: at < 0 ? '' : url.slice(at + 1),
    startedMs: performance.now(),
    facts: { units: 0 },
  };
}
