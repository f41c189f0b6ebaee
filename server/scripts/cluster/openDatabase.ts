import type { Config } from '../../config';
import type { ProcessRegistry } from '../support/ProcessRegistry';
import { openCluster } from './openCluster';
import { databaseUrl, OWNER_ROLE, prepareDatabase, SERVICE_ROLE } from './prepareDatabase';

export type Database = {
  /** For migrations and operators: the role that owns the tables. */
  ownerUrl: string;
  /** For the service: the role that may only read and write rows. */
  serviceUrl: string;
  /** The port of the cluster of its own; null where DATABASE_URL is used. */
  clusterPort: number | null;
  close(): Promise<void>;
};

const DATABASE = 'evenfall';

/** The database that the settings name, or else one in a cluster of this clone's own, which is started. */
export async function openDatabase(
  config: Pick<Config, 'databaseUrl' | 'databaseOwnerUrl' | 'port'>,
  place: { dataFolder: string; registry: ProcessRegistry; name?: string },
): Promise<Database> {
  if (config.databaseUrl) {
    const ownerUrl = config.databaseOwnerUrl ?? config.databaseUrl;
    return { ownerUrl, serviceUrl: config.databaseUrl, clusterPort: null, close: () => Promise.resolve() };
  }
  const cluster = await openCluster({
    name: 'cluster',
    isDurable: true,
    avoidPorts: [config.port],
    ...place,
  });
  const { port, passwords, close } = cluster;
  try {
    await prepareDatabase(port, passwords, DATABASE);
  } catch (error) {
    await close();
    throw error;
  }
  return {
    ownerUrl: databaseUrl(port, OWNER_ROLE, passwords.owner, DATABASE),
    serviceUrl: databaseUrl(port, SERVICE_ROLE, passwords.service, DATABASE),
    clusterPort: port,
    close,
  };
}
