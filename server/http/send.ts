import type { Call } from './Call';

export type HeaderList = string[];

/** Headers of every answer of the API: nothing of ours may run, be framed or be guessed at. */
const API_HEADERS: Readonly<HeaderList> = [
  'X-Content-Type-Options',
  'nosniff',
  'Content-Security-Policy',
  "default-src 'none'; frame-ancestors 'none'",
  'Referrer-Policy',
  'no-referrer',
  'Cross-Origin-Resource-Policy',
  'cross-origin',
  'Strict-Transport-Security',
  'max-age=31536000; includeSubDomains',
];

/** What becomes of a finished call: the log line, the usage counts. */
export type Finish = (call: Call, status: number, ms: number) => void;

interface Outgoing {
  readonly call: Call;
  readonly status: number;
  readonly headers: HeaderList;
  readonly body: string;
  readonly finish: Finish;
}

let queue: Outgoing[] = [];

function write({ call, status, headers, body, finish }: Outgoing): void {
  const { response, requestId } = call;
  // A caller who is gone gets nothing, but the call was counted and has to be in the books.
  if (!response.headersSent && !response.destroyed) {
    const all = ['X-Request-Id', requestId, ...API_HEADERS, ...headers];
    const bytes = Buffer.byteLength(body);
    if (status !== 304 && status !== 204) all.push('Content-Length', String(bytes));
    response.writeHead(status, all);
    // Plain ASCII, which most answers are, is the same in both, and Latin-1 is copied where UTF-8 is put together.
    const encoding = bytes === body.length ? 'latin1' : 'utf8';
    if (call.request.method === 'HEAD') response.end();
    else response.end(body, encoding);
  }
  finish(call, status, Math.round((performance.now() - call.startedMs) * 1000) / 1000);
}

function flush(): void {
  const ready = queue;
  queue = [];
  for (const outgoing of ready) write(outgoing);
}

/**
 * Sends an answer whose body is complete; `headers` are name and value by turns. Answers of one turn of the event
 * loop are written together at its end, so that requests that arrive meanwhile are parsed in one go.
 */
export function send(call: Call, status: number, headers: HeaderList, body: string, finish: Finish): void {
  if (queue.push({ call, status, headers, body, finish }) === 1) setImmediate(flush);
}

/** Sends JSON. */
export function sendJson(
  call: Call,
  status: number,
  headers: HeaderList,
  value: unknown,
  finish: Finish,
): void {
  const body = JSON.stringify(value);
  send(call, status, ['Content-Type', 'application/json; charset=utf-8', ...headers], body, finish);
}
