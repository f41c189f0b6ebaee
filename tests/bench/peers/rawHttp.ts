import { createServer } from 'node:http';
import type { RunningPart } from '../parts/runPart';
import { listen } from './listen';

/** The least that Node can do: a constant answer, the body unread. */
export async function rawHttp(): Promise<RunningPart> {
  const body = JSON.stringify({ ok: true });
  const headers = ['Content-Type', 'application/json', 'Content-Length', String(body.length)];
  const server = createServer((_request, response) => {
    response.writeHead(200, headers);
    response.end(body);
  });
  return { ready: await listen(server) };
}
