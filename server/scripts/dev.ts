import { spawn, type ChildProcess } from 'node:child_process';
import { watch } from 'node:fs';
import { join } from 'node:path';
import { createServer } from 'vite';
import { openDatabase } from './cluster/openDatabase';
import { claimPort } from './support/claimPort';
import { freePort } from './support/freePort';
import { serviceConfig } from './support/loadConfig';
import { dataFolder, root } from './support/place';
import { ProcessRegistry } from './support/ProcessRegistry';
import { say } from './support/say';
import { stopSignal, untilAborted } from './support/stopSignal';

// What the server answers; everything else is Vite's.
const SERVED = [
  '/v1',
  '/api',
  '/docs',
  '/openapi.json',
  '/health',
  '/problems',
  '/metrics',
  '/llms.txt',
  '/.well-known',
];
const SETTLE_MS = 150;

/** `npm run dev`: Vite at the usual address, and behind it a server that is built and started anew on every change. */
export async function main(): Promise<void> {
  const stop = stopSignal();
  const config = serviceConfig();
  const registry = new ProcessRegistry(dataFolder, 'dev');
  await claimPort(config, registry);
  const serverPort = await freePort('127.0.0.1', { avoid: [config.port] });
  const database = await openDatabase(config, { dataFolder, registry });
  const server = new RestartedServer({
    HOST: '127.0.0.1',
    PORT: String(serverPort),
    PUBLIC_URL: config.publicUrl,
  });
  const target = `http://127.0.0.1:${serverPort}`;
  const vite = await createServer({
    root,
    server: {
      host: config.host,
      port: config.port,
      strictPort: true,
      proxy: Object.fromEntries(SERVED.map((path) => [path, { target, changeOrigin: false }])),
    },
  });
  await vite.listen();
  say(`Console with reload: ${config.publicUrl}/ (the server behind it: ${target})`);
  const watchers = ['server', 'shared'].map((folder) =>
    watch(join(root, folder), { recursive: true }, () => server.restartSoon()),
  );
  server.restartSoon();
  await untilAborted(stop);
  for (const watcher of watchers) watcher.close();
  await vite.close();
  await server.stop();
  await database.close();
  registry.leave();
  process.exit(0);
}

/** Runs `start` as a process of its own; a build that fails leaves nothing running until the next change. */
class RestartedServer {
  #child: ChildProcess | null = null;
  #timer: NodeJS.Timeout | null = null;
  #work = Promise.resolve();

  constructor(readonly settings: NodeJS.ProcessEnv) {}

  /** Editors write several files at once: one restart for all of them, and one after the other. */
  restartSoon(): void {
    if (this.#timer) clearTimeout(this.#timer);
    this.#timer = setTimeout(() => {
      this.#work = this.#work.then(async () => {
        await this.#end();
        this.#begin();
      });
    }, SETTLE_MS);
  }

  async stop(): Promise<void> {
    if (this.#timer) clearTimeout(this.#timer);
    await this.#work;
    await this.#end();
  }

  #begin(): void {
    this.#child = spawn(process.execPath, ['server/scripts/run.mjs', 'start', '--no-client'], {
      cwd: root,
      stdio: ['ignore', 'ignore', 'inherit'],
      env: { ...process.env, ...this.settings },
    });
  }

  #end(): Promise<void> {
    const child = this.#child;
    this.#child = null;
    if (!child || child.exitCode !== null || child.signalCode !== null) return Promise.resolve();
    return new Promise((resolve) => {
      child.once('exit', () => resolve());
      child.kill('SIGTERM');
    });
  }
}
