import { randomBytes } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { pathToFileURL } from 'node:url';
import { freePort } from '../../../server/scripts/support/freePort';
import { endProcess, spawnPinned } from './part';

export interface BenchService {
  readonly url: string;
  readonly port: number;
  /** The most memory that the process ever held, in megabytes. */
  peakMemoryMb(): number;
  stop(): Promise<void>;
}

interface ServiceOptions {
  readonly ownerUrl: string;
  readonly serviceUrl: string;
  /** The built server. */
  readonly serverFolder: string;
}

// A benchmark that was killed must not leave a service behind.
const START = `
process.once('disconnect', () => process.kill(process.pid, 'SIGTERM'));
import(process.argv[1]).then((script) => script.main(['--no-client']));`;
const PATIENCE_MS = 30_000;

/** Starts the service as in production: a process of its own, logs written away, on one core. */
export async function startService(
  { ownerUrl, serviceUrl, serverFolder }: ServiceOptions,
  core: number | null,
): Promise<BenchService> {
  const port = await freePort('127.0.0.1', {});
  const script = pathToFileURL(join(serverFolder, 'start.js')).href;
  const child = spawnPinned(core, ['--input-type=module', '-e', START, script], {
    output: 'quiet',
    env: {
      PORT: String(port),
      DATABASE_URL: serviceUrl,
      DATABASE_OWNER_URL: ownerUrl,
      SESSION_SECRET: randomBytes(32).toString('base64url'),
    },
  });
  const url = `http://127.0.0.1:${port}`;
  const deadline = performance.now() + PATIENCE_MS;
  while (!(await answers(url))) {
    if (child.exitCode !== null || performance.now() > deadline) throw new Error('the service did not start');
    await wait(20);
  }
  return {
    url,
    port,
    peakMemoryMb: () => peakMemoryMb(child.pid ?? 0),
    stop: () => endProcess(child),
  };
}

async function answers(url: string): Promise<boolean> {
  return fetch(`${url}/health/live`).then(
    ({ ok }) => ok,
    () => false,
  );
}

/** Linux keeps the high-water mark of a process's resident memory (proc(5), VmHWM, in kB of 1,024 bytes). */
function peakMemoryMb(pid: number): number {
  const status = readFileSync(`/proc/${pid}/status`, 'utf8');
  return (Number(/VmHWM:\s+(\d+)/.exec(status)?.[1] ?? Number.NaN) * 1024) / 1e6;
}
