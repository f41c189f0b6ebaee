import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { openDatabase } from './cluster/openDatabase';
import { buildClient, buildEntry } from './support/buildClient';
import { commandConfig } from './support/loadConfig';
import { dataFolder } from './support/place';
import { ProcessRegistry } from './support/ProcessRegistry';
import { stopSignal } from './support/stopSignal';

/** What the benchmarks are given: an empty database of their own, which keeps what it commits as a service's does. */
export type BenchOptions = {
  args: readonly string[];
  ownerUrl: string;
  serviceUrl: string;
  serverFolder: string;
  clientFolder: string;
};

type Bench = { runBench(options: BenchOptions): Promise<void> };

/** `npm run bench`: one line for each measurement. */
export async function main(args: readonly string[]): Promise<void> {
  const entry = await buildEntry('tests/bench/bench.ts', ['tests/bench', 'tests/support']);
  const clientFolder = await buildClient();
  const registry = new ProcessRegistry(dataFolder, 'bench');
  const config = { ...commandConfig(), databaseUrl: null, databaseOwnerUrl: null };
  const database = await openDatabase(config, { dataFolder, registry, name: 'bench-cluster' });
  stopSignal().addEventListener('abort', () => {
    void database.close().finally(() => process.exit(130));
  });
  try {
    const { runBench } = (await import(pathToFileURL(join(entry, 'bench.js')).href)) as Bench;
    const { ownerUrl, serviceUrl } = database;
    const serverFolder = dirname(fileURLToPath(import.meta.url));
    await runBench({ args, ownerUrl, serviceUrl, serverFolder, clientFolder });
  } finally {
    await database.close();
    registry.leave();
  }
}
