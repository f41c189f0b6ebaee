import { setImmediate } from 'node:timers/promises';
import { parseArgs } from 'node:util';
import type { Config } from '../config';
import { serve } from '../main';
import { migrate } from '../services/database/migrate';
import { seedDemo } from '../services/demo/seed';
import { openDatabase, type Database } from './cluster/openDatabase';
import { buildClient } from './support/buildClient';
import { claimPort, portTaken } from './support/claimPort';
import { rememberedSignIn, rememberSignIn } from './support/demoSignIn';
import { serviceConfig } from './support/loadConfig';
import { dataFolder } from './support/place';
import { ProcessRegistry } from './support/ProcessRegistry';
import { say } from './support/say';
import { stopSignal, untilAborted } from './support/stopSignal';

const DRAIN_MS = 10_000;

/** `npm start`: everything from a fresh clone to a service that answers, until it is asked to stop. */
export async function main(args: readonly string[]): Promise<void> {
  const { values } = parseArgs({ args: [...args], options: { 'no-client': { type: 'boolean' } } });
  const stop = stopSignal();
  const config = serviceConfig();
  const registry = new ProcessRegistry(dataFolder, 'start');
  try {
    await claimPort(config, registry);
    const client = values['no-client'] ? Promise.resolve(null) : buildClient();
    const [folder, database] = await bothOrNeither(client, openDatabase(config, { dataFolder, registry }));
    try {
      if (!stop.aborted) await runService({ config, database, clientFolder: folder, stop });
    } finally {
      await database.close();
    }
  } catch (error) {
    // What Ctrl-C interrupts, fails; that is what was asked for. A signal is told a turn after it has arrived.
    await setImmediate();
    if (!stop.aborted) throw error;
  } finally {
    registry.leave();
  }
  process.exit(0);
}

/** A failure of one must not leave the other behind, half started. */
async function bothOrNeither<First>(
  first: Promise<First>,
  opening: Promise<Database>,
): Promise<[First, Database]> {
  const [done, database] = await Promise.allSettled([first, opening]);
  if (done.status === 'fulfilled' && database.status === 'fulfilled') return [done.value, database.value];
  if (database.status === 'fulfilled') await database.value.close();
  throw done.status === 'rejected' ? done.reason : (database as PromiseRejectedResult).reason;
}

type Task = { config: Config; database: Database; clientFolder: string | null; stop: AbortSignal };

async function runService({ config, database, clientFolder, stop }: Task): Promise<void> {
  const applied = await migrate(database.ownerUrl);
  if (applied.length > 0) say(`Migrations applied: ${applied.length}`);
  const signIn = await signInLines(config, database);
  const { ownerUrl, serviceUrl } = database;
  const service = await serve({ config, ownerUrl, serviceUrl, clientFolder }).catch((error: unknown) => {
    throw isPortTaken(error) ? portTaken(config) : error;
  });
  process.stdout.write(`${greeting(config, database, signIn).join('\n')}\n`);
  await untilAborted(stop);
  say('Stopping');
  await Promise.race([service.stop(), new Promise((resolve) => setTimeout(resolve, DRAIN_MS).unref())]);
}

/** The demo scenario goes into an empty database, but never into a production's: its passwords are known to all. */
async function signInLines(config: Config, { ownerUrl }: Database): Promise<string[]> {
  if (config.mode !== 'development') return [];
  const report = await seedDemo(ownerUrl, new Date());
  if (!report) return config.databaseUrl ? [] : rememberedSignIn(dataFolder);
  if (!config.databaseUrl) rememberSignIn(dataFolder, report.lines);
  return report.lines;
}

function greeting(
  { publicUrl, mode, smtpUrl }: Config,
  { clusterPort }: Database,
  signIn: readonly string[],
): string[] {
  return [
    '',
    'Evenfall is ready.',
    `  Console     ${publicUrl}/`,
    `  API docs    ${publicUrl}/docs`,
    ...(mode === 'production' || smtpUrl ? [] : [`  Local mail  ${publicUrl}/mail`]),
    clusterPort
      ? `  Database    its own, on 127.0.0.1:${clusterPort}`
      : '  Database    the one in DATABASE_URL',
    ...(signIn.length > 0 ? ['', ...signIn.map((line) => `  ${line}`)] : []),
    '',
    'Ctrl-C stops it.',
  ];
}

function isPortTaken(error: unknown): boolean {
  return (
    error instanceof Error && 'code' in error && (error.code === 'EADDRINUSE' || error.code === 'EACCES')
  );
}
