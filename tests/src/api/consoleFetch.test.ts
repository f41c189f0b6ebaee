import { beforeEach, describe, expect, it } from 'vitest';
import { consoleFetch, type Surroundings } from '../../../src/api/consoleFetch';
import { Refused } from '../../../src/api/Refused';

const URL = 'http://console.example/api/keys';
const json = (status: number, body: object) => new Response(JSON.stringify(body), { status });
const ended = () => json(401, { code: 'session_ended', detail: 'over' });

interface Sent {
  readonly method: string;
  readonly path: string;
  readonly headers: Headers;
  readonly body: string;
}

let sent: Sent[];
let endings: number;
let turns: Promise<unknown>;

beforeEach(() => {
  sent = [];
  endings = 0;
  turns = Promise.resolve();
});

/** Runs one task at a time, as the browser's locks do. */
function alone<T>(task: () => Promise<T>): Promise<T> {
  const turn = turns.then(task, task);
  turns = turn.catch(() => undefined);
  return turn;
}

/** A fetch that notes what is sent and answers by a script. */
function fetchWith(
  answer: (sent: Sent, nth: number) => Response | Promise<Response>,
  more: Partial<Surroundings> = {},
) {
  const fetch = async (request: Request): Promise<Response> => {
    const { method, headers } = request;
    const one = {
      method,
      path: new globalThis.URL(request.url).pathname,
      headers,
      body: await request.text(),
    };
    sent.push(one);
    return answer(one, sent.length);
  };
  return consoleFetch({ fetch, alone, onSessionEnd: () => (endings += 1), ...more });
}

const paths = () => sent.map(({ method, path }) => `${method} ${path}`);

describe('a request', () => {
  it('that changes something says that it comes from an own page, and keeps its body', async () => {
    const call = fetchWith(() => json(201, {}));
    await call(new Request(URL, { method: 'POST', body: '{"name":"a"}' }));
    await call(new Request(`${URL}/1`, { method: 'DELETE' }));
    for (const { headers } of sent) {
      expect(headers.get('x-evenfall-console')).toBe('1');
      expect(headers.get('content-type')).toBe('application/json');
    }
    expect(sent.map(({ body }) => body)).toEqual(['{"name":"a"}', '']);
  });

  it('that only reads says nothing of the kind', async () => {
    await fetchWith(() => json(200, {}))(new Request(URL));
    expect(sent[0]?.headers.has('x-evenfall-console')).toBe(false);
  });

  it('gives its answer whole, also where that is empty', async () => {
    expect(await (await fetchWith(() => json(200, { keys: [] }))(new Request(URL))).json()).toEqual({
      keys: [],
    });
    const none = await fetchWith(() => new Response(null, { status: 204 }))(new Request(URL));
    expect([none.status, await none.text()]).toEqual([204, '']);
  });
});

describe('a session whose minutes are over', () => {
  it('is renewed once, and the request is put again with its body', async () => {
    let isFresh = false;
    const call = fetchWith(({ path }) => {
      if (path === '/api/session/refresh') isFresh = true;
      return isFresh ? json(200, {}) : ended();
    });
    const answer = await call(new Request(URL, { method: 'POST', body: '{"name":"a"}' }));
    expect(answer.status).toBe(200);
    expect(paths()).toEqual([
      'POST /api/keys',
      'POST /api/keys',
      'POST /api/session/refresh',
      'POST /api/keys',
    ]);
    expect(sent[3]?.body).toBe('{"name":"a"}');
    expect(sent[2]).toMatchObject({ body: '{}' });
    expect(sent[2]?.headers.get('x-evenfall-console')).toBe('1');
    expect(endings).toBe(0);
  });

  it('is renewed once for all who find it so at the same time', async () => {
    let isFresh = false;
    const call = fetchWith(async ({ path }) => {
      await Promise.resolve();
      if (path === '/api/session/refresh') isFresh = true;
      return isFresh ? json(200, {}) : ended();
    });
    const answers = await Promise.all([1, 2, 3, 4].map(() => call(new Request(URL))));
    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200, 200]);
    expect(paths().filter((path) => path.endsWith('/refresh'))).toHaveLength(1);
  });

  it('is renewed where its state says so, and not where nobody is signed in', async () => {
    let isFresh = false;
    const call = fetchWith(({ path }) => {
      if (path === '/api/session/refresh') isFresh = true;
      return json(200, { state: isFresh ? 'live' : 'stale' });
    });
    const state = new Request('http://console.example/api/session');
    expect(await (await call(state)).json()).toEqual({ state: 'live' });
    sent = [];
    await fetchWith(() => json(200, { state: 'none' }))(state);
    expect(paths()).toEqual(['GET /api/session']);
  });

  it('that cannot be renewed has ended, and the refusal is handed on', async () => {
    const answer = await fetchWith(ended)(new Request(URL));
    expect([answer.status, endings]).toEqual([401, 1]);
  });

  it('goes on where the service is only busy', async () => {
    const call = fetchWith(({ path }) =>
      path.endsWith('/refresh') ? json(503, { code: 'unavailable' }) : ended(),
    );
    expect([(await call(new Request(URL))).status, endings]).toEqual([503, 0]);
  });

  it('is not what other refusals mean', async () => {
    const answer = await fetchWith(() => json(401, { code: 'credentials_wrong' }))(new Request(URL));
    expect([answer.status, sent.length, endings]).toEqual([401, 1, 0]);
  });
});

describe('a request that gets no answer', () => {
  const reasonOf = async (asked: Promise<Response>) => {
    const error: unknown = await asked.then(
      () => null,
      (reason: unknown) => reason,
    );
    return error instanceof Refused ? [error.status, error.code] : error;
  };

  it('says that the service is out of reach, also where the answer breaks off', async () => {
    const failing = fetchWith(() => Promise.reject(new TypeError('failed')));
    expect(await reasonOf(failing(new Request(URL)))).toEqual([0, 'not_connected']);
    const broken = new ReadableStream({ start: (controller) => controller.error(new TypeError('cut')) });
    const cut = fetchWith(() => new Response(broken));
    expect(await reasonOf(cut(new Request(URL)))).toEqual([0, 'not_connected']);
  });

  it('gives up in time', async () => {
    const call = consoleFetch({
      fetch: ({ signal }) =>
        new Promise((_, reject) => signal.addEventListener('abort', () => reject(signal.reason as Error))),
      alone,
      onSessionEnd: () => undefined,
      timeOutMs: 5,
    });
    expect(await reasonOf(call(new Request(URL)))).toEqual([0, 'no_answer']);
  });

  it('is given up by whoever asked, which is no refusal', async () => {
    const asking = new AbortController();
    const call = fetchWith(() => {
      asking.abort();
      return Promise.reject(new DOMException('given up', 'AbortError'));
    });
    expect(await reasonOf(call(new Request(URL, { signal: asking.signal })))).toMatchObject({
      name: 'AbortError',
    });
  });
});
