import { refusedByNetwork } from './Refused';

/** What of the browser a request needs; handed in, so that tests can stand in for it. */
export interface Surroundings {
  readonly fetch: (request: Request) => Promise<Response>;
  /** Runs one task at a time over all tabs of this site. */
  readonly alone: <T>(task: () => Promise<T>) => Promise<T>;
  readonly onSessionEnd: () => void;
  readonly timeOutMs?: number;
}

const TIME_OUT_MS = 15_000;
const REFRESH = '/api/session/refresh';
const OWN_PAGE = { 'X-Evenfall-Console': '1', 'Content-Type': 'application/json' };
/** Refusals that a fresh session may undo. */
const RENEWABLE = new Set(['session_ended', 'session_missing']);

async function codeOf(response: Response): Promise<string | null> {
  const given = (await response
    .clone()
    .json()
    .catch(() => null)) as { code?: string; state?: string } | null;
  return given?.code ?? given?.state ?? null;
}

async function needsRenewal(request: Request, response: Response): Promise<boolean> {
  const isState = request.method === 'GET' && new URL(request.url).pathname === '/api/session';
  if (isState) return (await codeOf(response)) === 'stale';
  return response.status === 401 && RENEWABLE.has((await codeOf(response)) ?? '');
}

/** The answer with its content fetched, so that a connection that breaks midway is told like any other. */
async function whole(response: Response): Promise<Response> {
  const content = await response.arrayBuffer();
  return new Response(content.byteLength > 0 ? content : null, response);
}

/**
 * A `fetch` for the console's own API: says that it comes from an own page, gives up in time, and renews the session
 * once where its minutes are over. Tabs take turns, since a refresh token is good for one use; whoever waited tries
 * again first, as the turn before may have renewed it already.
 */
export function consoleFetch({
  fetch,
  alone,
  onSessionEnd,
  timeOutMs = TIME_OUT_MS,
}: Surroundings): (given: Request) => Promise<Response> {
  const send = async (request: Request): Promise<Response> => {
    const signal = AbortSignal.any([request.signal, AbortSignal.timeout(timeOutMs)]);
    try {
      return await whole(await fetch(new Request(request, { signal })));
    } catch (error) {
      if (request.signal.aborted) throw error;
      throw refusedByNetwork(error);
    }
  };
  const renewed = async (request: Request): Promise<Response> => {
    const again = await send(request.clone());
    if (!(await needsRenewal(request, again))) return again;
    const url = new URL(REFRESH, request.url);
    const renewal = await send(new Request(url, { method: 'POST', body: '{}', headers: OWN_PAGE }));
    if (renewal.ok) return send(request.clone());
    // Only a refusal ends the session; a service that is busy or down leaves it as it is.
    return renewal.status === 401 ? again : renewal;
  };
  return async (given) => {
    const request = new Request(given, { credentials: 'same-origin' });
    if (request.method !== 'GET')
      for (const [name, value] of Object.entries(OWN_PAGE)) request.headers.set(name, value);
    const first = await send(request.clone());
    if (!(await needsRenewal(request, first))) return first;
    const answer = await alone(() => renewed(request));
    if (await needsRenewal(request, answer)) onSessionEnd();
    return answer;
  };
}
