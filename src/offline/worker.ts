/** What this file needs of a service worker's own globals; the page's types know them only from outside. */
interface WorkerEvent extends Event {
  waitUntil(task: Promise<unknown>): void;
}
interface FetchedEvent extends WorkerEvent {
  readonly request: Request;
  respondWith(answer: Promise<Response>): void;
}
interface WorkerScope {
  addEventListener(type: 'install' | 'activate', listener: (event: WorkerEvent) => void): void;
  addEventListener(type: 'fetch', listener: (event: FetchedEvent) => void): void;
  addEventListener(type: 'message', listener: (event: MessageEvent) => void): void;
  skipWaiting(): Promise<void>;
  readonly clients: { claim(): Promise<void> };
}

/** Written in when the client is built: a name that changes with any of the files, and the files. */
declare const OFFLINE_BUILD: string;
declare const OFFLINE_FILES: readonly string[];

const PREFIX = 'evenfall-';
const CACHE = `${PREFIX}${OFFLINE_BUILD}`;
/** Screens that work without a network. All else, the API above all, goes to the network as if there were no worker. */
const SCREENS = /^\/(?:$|calculators(?:\/|$)|evening$|fill$|kit$|recipes(?:\/|$))/;
const FILES = new Set(OFFLINE_FILES);

const worker = self as unknown as WorkerScope;

async function fetchAll(): Promise<void> {
  const cache = await caches.open(CACHE);
  await cache.addAll(['/', ...OFFLINE_FILES].map((path) => new Request(path, { cache: 'no-cache' })));
}

async function dropOlder(): Promise<void> {
  const names = await caches.keys();
  await Promise.all(
    names.filter((name) => name.startsWith(PREFIX) && name !== CACHE).map((name) => caches.delete(name)),
  );
  await worker.clients.claim();
}

/** The path under which a request is kept; null for what is none of this worker's business. */
function keptPath({ method, mode, url }: Request): string | null {
  const { origin, pathname } = new URL(url);
  if (method !== 'GET' || origin !== location.origin) return null;
  if (FILES.has(pathname)) return pathname;
  return mode === 'navigate' && SCREENS.test(pathname) ? '/' : null;
}

async function answer(path: string, request: Request): Promise<Response> {
  const cache = await caches.open(CACHE);
  return (await cache.match(path)) ?? fetch(request);
}

worker.addEventListener('install', (event) => event.waitUntil(fetchAll()));
worker.addEventListener('activate', (event) => event.waitUntil(dropOlder()));
worker.addEventListener('message', ({ data }) => {
  if (data === 'take over') void worker.skipWaiting();
});
worker.addEventListener('fetch', (event) => {
  const path = keptPath(event.request);
  if (path !== null) event.respondWith(answer(path, event.request));
});
