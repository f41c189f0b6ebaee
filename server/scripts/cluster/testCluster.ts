import { migrate } from '../../services/database/migrate';
import type { ProcessRegistry } from '../support/ProcessRegistry';
import { openCluster } from './openCluster';
import {
  adminUrl,
  databaseUrl,
  OWNER_ROLE,
  prepareDatabase,
  SERVICE_ROLE,
  withClient,
} from './prepareDatabase';

export type TestCluster = {
  adminUrl: string;
  ownerUrl: string;
  serviceUrl: string;
  template: string;
  prefix: string;
  close(): Promise<void>;
};

const NAME = /^evenfall_test_(\d+)_/;

/** The cluster of the tests, with one migrated database of this run's to clone; several runs may share the cluster. */
export async function openTestCluster(dataFolder: string, registry: ProcessRegistry): Promise<TestCluster> {
  const cluster = await openCluster({ dataFolder, registry, name: 'test-cluster', isDurable: false });
  const { port, passwords } = cluster;
  const prefix = `evenfall_test_${process.pid}_`;
  const template = `${prefix}template`;
  const admin = adminUrl(port, passwords);
  const owner = databaseUrl(port, OWNER_ROLE, passwords.owner, template);
  const close = async () => {
    try {
      await dropDatabases(admin, (pid) => pid === process.pid);
    } finally {
      await cluster.close();
    }
  };
  try {
    const living = registry.others().map(({ pid }) => pid);
    await dropDatabases(admin, (pid) => !living.includes(pid));
    await prepareDatabase(port, passwords, template);
    await migrate(owner);
  } catch (error) {
    await close();
    throw error;
  }
  const serviceUrl = databaseUrl(port, SERVICE_ROLE, passwords.service, template);
  return { adminUrl: admin, ownerUrl: owner, serviceUrl, template, prefix, close };
}

/** Drops the test databases of the runs, known by their process number, that are meant. */
function dropDatabases(admin: string, isMeant: (pid: number) => boolean): Promise<void> {
  return withClient(admin, async (client) => {
    const { rows } = await client.query<{ datname: string }>('SELECT datname FROM pg_database');
    const names = rows
      .map(({ datname }) => datname)
      .filter((name) => isMeant(Number(NAME.exec(name)?.[1] ?? NaN)));
    const ours = names.filter((name) => NAME.test(name));
    for (const name of ours) await client.query(`DROP DATABASE IF EXISTS ${name} WITH (FORCE)`);
  });
}
