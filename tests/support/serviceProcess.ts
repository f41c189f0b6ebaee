import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { pathToFileURL } from 'node:url';
import { freePort } from '../../server/scripts/support/freePort';
import { testSettings } from './testSettings';

/** The service as a process of its own, as `npm start` runs it; several may share one database. */
export interface ServiceProcess {
  readonly url: string;
  readonly pid: number;
  /** As if the machine had failed. */
  kill(): Promise<void>;
  /** As Ctrl-C; the exit code. */
  stop(): Promise<number | null>;
}

interface Place {
  readonly ownerUrl: string;
  readonly serviceUrl: string;
}

// A test run that dies must not leave a service behind: its end of the pipe closes with it.
const START = `
process.stdin.resume().once('end', () => process.exit(1));
import(process.argv[1]).then((script) => script.main(['--no-client']));`;
const PATIENCE_MS = 30_000;
/** Somebody else may take a port between the look and the listening. */
const ATTEMPTS = 3;

export async function startServiceProcess(
  place: Place,
  env: Readonly<Record<string, string>> = {},
): Promise<ServiceProcess> {
  for (let attempt = 1; ; attempt += 1) {
    const port = await freePort('127.0.0.1');
    const url = `http://127.0.0.1:${port}`;
    const { child, said } = spawnService(place, { PORT: String(port), ...env });
    if (await isReady(child, url)) return processOf(child, url);
    child.kill('SIGKILL');
    if (attempt === ATTEMPTS) throw new Error(`the service did not start: ${said()}`);
  }
}

function spawnService({ ownerUrl, serviceUrl }: Place, env: Readonly<Record<string, string>>) {
  const script = pathToFileURL(join(testSettings().serverFolder, 'start.js')).href;
  const child = spawn(process.execPath, ['--input-type=module', '-e', START, script], {
    stdio: ['pipe', 'pipe', 'pipe'],
    env: {
      PATH: process.env.PATH,
      NODE_ENV: 'test',
      LOG_LEVEL: 'warn',
      DATABASE_URL: serviceUrl,
      DATABASE_OWNER_URL: ownerUrl,
      SESSION_SECRET: 'the same in all processes of one test',
      ...env,
    },
  });
  let text = '';
  for (const stream of [child.stdout, child.stderr])
    stream.on('data', (chunk: Buffer) => (text = (text + chunk.toString()).slice(-2_000)));
  return { child, said: () => text };
}

async function isReady(child: ChildProcess, url: string): Promise<boolean> {
  const end = performance.now() + PATIENCE_MS;
  while (child.exitCode === null && child.signalCode === null && performance.now() < end) {
    const ready = await fetch(`${url}/health/ready`).then(
      ({ ok }) => ok,
      () => false,
    );
    if (ready) return true;
    await wait(20);
  }
  return false;
}

function processOf(child: ChildProcess, url: string): ServiceProcess {
  const gone = once(child, 'exit');
  const end = async (signal: NodeJS.Signals) => {
    child.kill(signal);
    await gone;
  };
  return {
    url,
    pid: child.pid ?? 0,
    kill: () => end('SIGKILL'),
    stop: async () => {
      const cut = setTimeout(() => child.kill('SIGKILL'), 15_000);
      await end('SIGTERM');
      clearTimeout(cut);
      return child.exitCode;
    },
  };
}
