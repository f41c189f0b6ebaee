import createClient, { type Client } from 'openapi-fetch';
import type { operations, paths } from '../../openapi/console';
import { consoleFetch } from './consoleFetch';
import { refusedBy, refusedByNetwork } from './Refused';

export type ConsoleApi = Client<paths>;
export type Account = operations['SignIn']['responses'][200]['content']['application/json']['account'];
export type KitBody = operations['KeepKit']['requestBody']['content']['application/json']['kit'];
export type ApiKey = operations['ReadKey']['responses'][200]['content']['application/json']['key'];
export type SavedThing = operations['Save']['responses'][201]['content']['application/json']['thing'];
export type Session =
  operations['ListSessions']['responses'][200]['content']['application/json']['sessions'][number];

const LOCK = 'evenfall.session';
const listeners = new Set<() => void>();

/** Calls a listener when the session has ended in the middle of a visit. */
export function onSessionEnd(listener: () => void): void {
  listeners.add(listener);
}

async function alone<T>(task: () => Promise<T>): Promise<T> {
  // Where a browser has no locks, two tabs may renew at once, and one of them then signs in anew.
  if (!('locks' in navigator)) return task();
  return (await navigator.locks.request(LOCK, task)) as T;
}

/** The console's own API, typed by its document. */
export const consoleApi: ConsoleApi = createClient<paths>({
  baseUrl: location.origin,
  fetch: consoleFetch({
    fetch: (request) => fetch(request),
    alone,
    onSessionEnd: () => listeners.forEach((listener) => listener()),
  }),
});

/** An answer's content, or a {@link Refused} that says why there is none. */
export async function taken<T>(
  asked: Promise<{ data?: T; error?: unknown; response: Response }>,
): Promise<T> {
  const { data, error, response } = await asked.catch((reason: unknown) => {
    // Something in between answered in the service's place, as a hotel's sign-in page does.
    throw reason instanceof SyntaxError ? refusedByNetwork(reason) : reason;
  });
  if (!response.ok) throw refusedBy(response, error);
  return data as T;
}
