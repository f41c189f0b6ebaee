import { existsSync, mkdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { isAlive } from '../boot/processIdentity.mjs';
import { withFolderLock } from '../boot/folderLock.mjs';
import { freePort } from '../support/freePort';
import { PeopleError } from '../support/PeopleError';
import type { ProcessRegistry } from '../support/ProcessRegistry';
import { say } from '../support/say';
import { clusterFolder, newRecord, readRecord, writeRecord, type ClusterRecord } from './clusterRecord';
import { clusterSettings } from './clusterSettings';
import { createCluster, resetAdminPassword } from './createCluster';
import { ensurePostgres, postgresPrograms, type PostgresPrograms } from './postgresPrograms';
import {
  clearLeftovers,
  findPostmaster,
  startPostmaster,
  stopPostmaster,
  type Postmaster,
} from './postmaster';
import { adminUrl, withClient } from './prepareDatabase';
import { canReach, clusterUser, type SystemUser } from './systemUser';

export type ClusterOptions = {
  dataFolder: string;
  /** Also the name of its folder, its record and its log under the data folder. */
  name: string;
  isDurable: boolean;
  registry: ProcessRegistry;
  avoidPorts?: readonly number[];
};

export type Cluster = {
  port: number;
  pid: number;
  folder: string;
  passwords: ClusterRecord['passwords'];
  /** Leaves the cluster, and stops it if no other process uses it. */
  close(): Promise<void>;
};

/** A cluster of this clone's own: made if it is missing, adopted if it runs already, started otherwise. */
export async function openCluster(options: ClusterOptions): Promise<Cluster> {
  const { dataFolder, name, registry } = options;
  const lockPath = join(dataFolder, `${name}.lock`);
  mkdirSync(dataFolder, { recursive: true });
  return withFolderLock(lockPath, async () => {
    registry.update({ cluster: name });
    const { postmaster, folder, passwords } = await runningCluster(options);
    const close = () => withFolderLock(lockPath, () => leaveCluster(options, postmaster));
    return { port: postmaster.port, pid: postmaster.pid, folder, passwords, close };
  });
}

async function leaveCluster({ name, registry }: ClusterOptions, postmaster: Postmaster): Promise<void> {
  registry.update({ cluster: null });
  if (registry.others().some(({ cluster }) => cluster === name)) return;
  await stopPostmaster(postmaster);
}

async function runningCluster(options: ClusterOptions) {
  const { dataFolder, name } = options;
  await ensurePostgres();
  const user = clusterUser();
  const known = readRecord(dataFolder, name);
  const record = known ?? newRecord(dataFolder, name, user);
  const folder = clusterFolder(dataFolder, record);
  const programs = postgresPrograms(majorOfData(folder), folder);
  if (!known) writeRecord(dataFolder, name, record);
  const task = { programs, folder, user, adminPassword: record.passwords.admin };
  if (!existsSync(join(folder, 'PG_VERSION'))) await createCluster(task);
  else if (!canReach(user, folder)) throw unreachable(folder);
  else if (!known) await reclaim(task);
  const postmaster = (await adopted(folder, record)) ?? (await started(options, record, programs, user));
  if (record.port !== postmaster.port) writeRecord(dataFolder, name, { ...record, port: postmaster.port });
  return { postmaster, folder, passwords: record.passwords };
}

function majorOfData(folder: string): number | null {
  const path = join(folder, 'PG_VERSION');
  return existsSync(path) ? Number(readFileSync(path, 'utf8')) : null;
}

function unreachable(folder: string): PeopleError {
  return new PeopleError(
    `PostgreSQL's user can't get at ${folder}: allow it through the folders above, or move it`,
  );
}

/** Data whose record is gone: kept, and opened with passwords of this start. */
async function reclaim(task: Parameters<typeof resetAdminPassword>[0]): Promise<void> {
  say(`Using the data that were left in ${task.folder}`);
  const running = findPostmaster(task.folder);
  if (running) await stopPostmaster(running);
  await clearLeftovers(task.folder);
  resetAdminPassword(task);
}

async function adopted(folder: string, record: ClusterRecord): Promise<Postmaster | null> {
  const running = findPostmaster(folder);
  return running && (await becomesReady(running, record)) ? running : null;
}

async function started(
  { dataFolder, name, isDurable, avoidPorts = [] }: ClusterOptions,
  record: ClusterRecord,
  programs: PostgresPrograms,
  user: SystemUser | null,
): Promise<Postmaster> {
  const folder = clusterFolder(dataFolder, record);
  const logPath = join(dataFolder, `${name}.log`);
  const settings = clusterSettings({ isDurable });
  // A port that was free a moment ago may be taken by the time the server asks for it.
  for (let attempt = 1; attempt <= 3; attempt += 1) {
    await clearLeftovers(folder);
    const port = await freePort('127.0.0.1', { preferred: record.port ?? undefined, avoid: avoidPorts });
    const postmaster = startPostmaster({ programs, folder, logPath, user, port, settings });
    if (await becomesReady(postmaster, record)) return postmaster;
  }
  const log = readFileSync(logPath, 'utf8').trimEnd().split('\n').slice(-5).join('\n');
  throw new PeopleError(`PostgreSQL did not start; the end of ${logPath}:\n${log}`);
}

/** Waits until the server takes queries, however long it has to recover from a crash; false when it ended instead. */
async function becomesReady({ identity, port }: Postmaster, { passwords }: ClusterRecord): Promise<boolean> {
  let failure: unknown;
  for (let waitedMs = 0; waitedMs < 120_000; waitedMs += 50) {
    if (!isAlive(identity)) return false;
    try {
      await withClient(adminUrl(port, passwords), (client) => client.query('SELECT 1'));
      return true;
    } catch (error) {
      failure = error;
      if (isWrongPassword(error)) break;
    }
    await wait(50);
  }
  throw new Error(`The database on port ${port} does not answer`, { cause: failure });
}

function isWrongPassword(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === '28P01';
}
