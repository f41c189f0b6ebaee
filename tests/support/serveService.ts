import { createServer } from 'node:net';
import type { AddressInfo } from 'node:net';
import { builtClient } from './consoleServer';
import { startConsole, type ConsoleService } from './consoleService';

/** A port that was free a moment ago: links and cookies name it before the service listens there. */
function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address() as AddressInfo;
      server.close(() => resolve(port));
    });
  });
}

/** The whole service with the built console in it, as people meet it. */
export async function serveService(): Promise<ConsoleService> {
  const port = await freePort();
  return startConsole({ port, publicUrl: `http://127.0.0.1:${port}` }, undefined, await builtClient());
}
