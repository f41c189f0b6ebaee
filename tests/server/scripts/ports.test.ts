import { createServer, type AddressInfo, type Server } from 'node:net';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { readConfig } from '../../../server/config';
import { claimPort } from '../../../server/scripts/support/claimPort';
import { freePort, isPortFree } from '../../../server/scripts/support/freePort';
import { portHolder } from '../../../server/scripts/support/portHolder';
import { ProcessRegistry } from '../../../server/scripts/support/ProcessRegistry';

const HOST = '127.0.0.1';
let taken: Server;
let takenPort: number;

beforeEach(async () => {
  taken = createServer();
  await new Promise<void>((resolve) => taken.listen(0, HOST, resolve));
  takenPort = (taken.address() as AddressInfo).port;
});
afterEach(() => new Promise((resolve) => taken.close(resolve)));

describe('freePort', () => {
  it('gives the preferred port while it is free', async () => {
    const preferred = await freePort(HOST);
    expect(await freePort(HOST, { preferred })).toBe(preferred);
  });

  it('gives another one when that is taken or to be avoided', async () => {
    const avoided = await freePort(HOST);
    for (const port of [
      await freePort(HOST, { preferred: takenPort }),
      await freePort(HOST, { preferred: avoided, avoid: [avoided] }),
    ]) {
      expect([takenPort, avoided]).not.toContain(port);
      expect(await isPortFree(port, HOST)).toBe(true);
    }
  });

  it('stays below the ports of outgoing connections', async () => {
    const port = await freePort(HOST);
    expect(port).toBeGreaterThan(1_023);
    expect(port).toBeLessThan(32_768);
  });
});

describe('portHolder', () => {
  it('names the process that listens on a port', () => {
    expect(portHolder(takenPort)).toMatchObject({ pid: process.pid });
  });

  it('knows nobody where nobody listens', async () => {
    expect(portHolder(await freePort(HOST))).toBeNull();
  });
});

describe('claimPort', () => {
  let dataFolder: string;
  beforeEach(() => {
    dataFolder = mkdtempSync(join(tmpdir(), 'evenfall-claim-'));
  });
  afterEach(() => rmSync(dataFolder, { recursive: true, force: true }));
  const configFor = (port: number) => readConfig({ PORT: String(port) });

  it('says in one line who holds the port and how to choose another', async () => {
    const claim = claimPort(configFor(takenPort), new ProcessRegistry(dataFolder, 'start'));
    await expect(claim).rejects.toThrow(
      new RegExp(
        `^Port ${takenPort} on 127.0.0.1 is taken \\([^,]+, process ${process.pid}\\).*PORT=\\d+ npm start$`,
      ),
    );
  });

  it('enters a free port, so that a second start is told where the first one is', async () => {
    const port = await freePort(HOST);
    const registry = new ProcessRegistry(dataFolder, 'start');
    await claimPort(configFor(port), registry);
    const second = registryOfAnotherProcess(registry);
    await expect(claimPort(configFor(port), second)).rejects.toThrow(
      `Evenfall is already running at http://127.0.0.1:${port} (process 1).`,
    );
    registry.leave();
  });
});

/** Sees what a process sees that finds the first one's entry. */
function registryOfAnotherProcess(first: ProcessRegistry): ProcessRegistry {
  const second = new ProcessRegistry(join(tmpdir(), 'evenfall-nowhere'), 'start');
  const own = first.own();
  second.others = () => [{ ...own, pid: 1 }];
  return second;
}
