import { createServer } from 'node:net';
import { randomInt } from 'node:crypto';

// Below the range from which Linux takes the ports of outgoing connections (32768 to 60999, ip(7)), so that no
// chance connection holds the port when the cluster starts again.
const FIRST = 15_432;
const LAST = 15_999;

export function isPortFree(port: number, host: string): Promise<boolean> {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', () => resolve(false));
    server.listen({ port, host, exclusive: true }, () => server.close(() => resolve(true)));
  });
}

/** The preferred port where it is free and not to be avoided, else a free one of the range for clusters. */
export async function freePort(
  host: string,
  { preferred, avoid = [] }: { preferred?: number | undefined; avoid?: readonly number[] } = {},
): Promise<number> {
  const isUsable = async (port: number) => !avoid.includes(port) && (await isPortFree(port, host));
  if (preferred !== undefined && (await isUsable(preferred))) return preferred;
  const count = LAST - FIRST + 1;
  const start = randomInt(count);
  for (let step = 0; step < count; step += 1) {
    const port = FIRST + ((start + step) % count);
    if (await isUsable(port)) return port;
  }
  throw new Error(`No port from ${FIRST} to ${LAST} is free on ${host}`);
}
