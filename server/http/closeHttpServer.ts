import type { Server } from 'node:http';
import { setTimeout as wait } from 'node:timers/promises';

/** Callers who keep asking learn in this time, from an answer, that they have to go elsewhere. */
const LEAVE_MS = 250;
const LOOK_MS = 50;
/** How long calls under way may take to end. */
const DRAIN_MS = 5_000;

/**
 * Ends a server so that no call is lost on the way: first every answer says that its connection ends with it, then
 * nobody gets in any more, and connections that fall idle are closed. A server that closed what is idle at once
 * would cut off callers who are just sending on it, and by itself it waits for those who stay.
 */
export async function closeHttpServer(server: Server): Promise<void> {
  server.prependListener('request', (_request, response) => {
    response.shouldKeepAlive = false;
  });
  await wait(LEAVE_MS);
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  const look = setInterval(() => server.closeIdleConnections(), LOOK_MS);
  const cut = setTimeout(() => server.closeAllConnections(), DRAIN_MS);
  await closed;
  clearInterval(look);
  clearTimeout(cut);
}
