import { createHash, randomBytes } from 'node:crypto';
import { chmodSync, existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { dirname, isAbsolute, join, relative } from 'node:path';
import { canReach, type SystemUser } from './systemUser';

/** What is remembered of a cluster in `.data/<name>.json`, readable by this user alone. */
export type ClusterRecord = {
  /** Relative to the data folder where it lies inside, so that a clone may be moved. */
  folder: string;
  port: number | null;
  passwords: { admin: string; owner: string; service: string };
};

// Where Linux keeps the data of services (Filesystem Hierarchy Standard 3.0, 5.8).
const SYSTEM_FOLDER = '/var/lib/evenfall';

const recordPath = (dataFolder: string, name: string) => join(dataFolder, `${name}.json`);

export function readRecord(dataFolder: string, name: string): ClusterRecord | null {
  const path = recordPath(dataFolder, name);
  return existsSync(path) ? (JSON.parse(readFileSync(path, 'utf8')) as ClusterRecord) : null;
}

export function writeRecord(dataFolder: string, name: string, record: ClusterRecord): void {
  const draft = `${recordPath(dataFolder, name)}.draft`;
  writeFileSync(draft, `${JSON.stringify(record, null, 2)}\n`, { mode: 0o600 });
  chmodSync(draft, 0o600);
  renameSync(draft, recordPath(dataFolder, name));
}

export function newRecord(dataFolder: string, name: string, user: SystemUser | null): ClusterRecord {
  const password = () => randomBytes(24).toString('base64url');
  return {
    folder: chosenFolder(dataFolder, name, user),
    port: null,
    passwords: { admin: password(), owner: password(), service: password() },
  };
}

export function clusterFolder(dataFolder: string, record: ClusterRecord): string {
  return isAbsolute(record.folder) ? record.folder : join(dataFolder, record.folder);
}

/** Under the data folder, or in the system's place for data where the cluster's user can't get at that. */
function chosenFolder(dataFolder: string, name: string, user: SystemUser | null): string {
  if (canReach(user, dataFolder)) return relative(dataFolder, join(dataFolder, name));
  const clone = createHash('sha256').update(dirname(dataFolder)).digest('hex').slice(0, 16);
  const folder = join(SYSTEM_FOLDER, clone, name);
  mkdirSync(dirname(folder), { recursive: true, mode: 0o755 });
  return folder;
}
