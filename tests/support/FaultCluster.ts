import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { migrate } from '../../server/services/database/migrate';
import { openCluster, type Cluster } from '../../server/scripts/cluster/openCluster';
import { processesIn } from '../../server/scripts/cluster/postmaster';
import {
  databaseUrl,
  OWNER_ROLE,
  prepareDatabase,
  SERVICE_ROLE,
} from '../../server/scripts/cluster/prepareDatabase';
import { ProcessRegistry } from '../../server/scripts/support/ProcessRegistry';

const DATABASE = 'evenfall';

/** A PostgreSQL of the caller's own, to be stopped, frozen and killed in the middle of work. It keeps its port. */
export class FaultCluster {
  readonly ownerUrl: string;
  readonly serviceUrl: string;
  #cluster: Cluster;

  private constructor(
    private readonly dataFolder: string,
    cluster: Cluster,
  ) {
    const { port, passwords } = cluster;
    this.#cluster = cluster;
    this.ownerUrl = databaseUrl(port, OWNER_ROLE, passwords.owner, DATABASE);
    this.serviceUrl = databaseUrl(port, SERVICE_ROLE, passwords.service, DATABASE);
  }

  /** With `isDurable` what is committed outlives a crash of the machine; a killed server loses nothing either way. */
  static async open({ isDurable = false } = {}): Promise<FaultCluster> {
    const dataFolder = mkdtempSync(join(tmpdir(), 'evenfall-fault-'));
    // The user who runs the server as root's deputy has to get in.
    chmodSync(dataFolder, 0o755);
    const cluster = await openIn(dataFolder, isDurable);
    await prepareDatabase(cluster.port, cluster.passwords, DATABASE);
    const opened = new FaultCluster(dataFolder, cluster);
    await migrate(opened.ownerUrl);
    return opened;
  }

  /** Every process stands still: connections stay open, and nothing answers. */
  freeze(): void {
    this.#signal('SIGSTOP');
  }

  thaw(): void {
    this.#signal('SIGCONT');
  }

  /** As if the power had gone. */
  kill(): void {
    this.#signal('SIGKILL');
  }

  /** An orderly stop, which cuts off the clients. */
  async stop(): Promise<void> {
    await this.#cluster.close();
  }

  /** After `kill` or `stop`: the same data, on the same port. */
  async start({ isDurable = false } = {}): Promise<void> {
    this.#cluster = await openIn(this.dataFolder, isDurable);
  }

  async close(): Promise<void> {
    this.thaw();
    if (processesIn(this.#cluster.folder).length > 0) await this.#cluster.close();
    rmSync(this.dataFolder, { recursive: true, force: true });
  }

  #signal(name: NodeJS.Signals): void {
    for (const pid of processesIn(this.#cluster.folder)) signalled(pid, name);
  }
}

/** A backend may end by itself between being listed and being signalled; then there is nothing left to reach. */
function signalled(pid: number, name: NodeJS.Signals): void {
  try {
    process.kill(pid, name);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ESRCH') throw error;
  }
}

function openIn(dataFolder: string, isDurable: boolean): Promise<Cluster> {
  return openCluster({
    dataFolder,
    name: 'cluster',
    isDurable,
    registry: new ProcessRegistry(dataFolder, 'test'),
  });
}
