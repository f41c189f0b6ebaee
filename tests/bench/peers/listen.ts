import type { AddressInfo } from 'node:net';
import type { Server } from 'node:http';

/** Listens on a free port of loopback and gives the port back. */
export async function listen(server: Server): Promise<number> {
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(0, '127.0.0.1', resolve);
  });
  return (server.address() as AddressInfo).port;
}
