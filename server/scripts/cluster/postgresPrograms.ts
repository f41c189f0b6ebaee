import { execFileSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { installDebianPackages, rootPrefix, runAsRoot } from '../support/installDebianPackages';
import { PeopleError } from '../support/PeopleError';

export type PostgresPrograms = { folder: string; major: number };

const debianFolder = '/usr/lib/postgresql';
// Without this, Debian's package makes and starts a cluster of its own as it is installed.
const noMainCluster = '/etc/postgresql-common/createcluster.d/evenfall.conf';

/** The installed PostgreSQL servers, newest first: Debian's, which are not on the PATH, and whatever is. */
function installedPostgres(): PostgresPrograms[] {
  const debian = existsSync(debianFolder) ? readdirSync(debianFolder) : [];
  const folders = [
    ...debian.map((name) => join(debianFolder, name, 'bin')),
    ...(process.env.PATH ?? '').split(delimiter).filter((folder) => folder !== ''),
  ];
  const complete = [...new Set(folders)].filter((folder) =>
    ['initdb', 'postgres'].every((name) => existsSync(join(folder, name))),
  );
  return complete.map((folder) => ({ folder, major: majorOf(folder) })).sort((a, b) => b.major - a.major);
}

function majorOf(folder: string): number {
  const [, debianMajor] = /^\/usr\/lib\/postgresql\/(\d+)\/bin$/.exec(folder) ?? [];
  if (debianMajor) return Number(debianMajor);
  const text = execFileSync(join(folder, 'postgres'), ['--version'], { encoding: 'utf8' });
  return Number(/(\d+)(\.\d+|\w+)/.exec(text)?.[1] ?? 0);
}

/** The programs for data of that major version, or the newest ones where there are no data yet. */
export function postgresPrograms(dataMajor: number | null, dataPlace: string): PostgresPrograms {
  const installed = installedPostgres();
  const fit = dataMajor === null ? installed[0] : installed.find(({ major }) => major === dataMajor);
  if (fit) return fit;
  if (dataMajor === null) throw new PeopleError("PostgreSQL's programs (initdb, postgres) were not found");
  throw new PeopleError(
    `The data in ${dataPlace} are PostgreSQL ${dataMajor}'s, and only ${[...new Set(installed.map(({ major }) => major))].join(', ')} is ` +
      `installed: install postgresql-${dataMajor}, or move that folder away to begin with an empty database`,
  );
}

/** Installs PostgreSQL from Debian's packages unless a server is installed. */
export async function ensurePostgres(): Promise<void> {
  if (installedPostgres().length > 0) return;
  const otherwise =
    'PostgreSQL is missing and this user may not install it: run `sudo apt-get install postgresql`, or set DATABASE_URL';
  const prefix = rootPrefix();
  if (!prefix) throw new PeopleError(otherwise);
  const write = `mkdir -p "$(dirname ${noMainCluster})" && echo 'create_main_cluster = false' > ${noMainCluster}`;
  await runAsRoot(prefix, ['sh', '-c', write]);
  try {
    await installDebianPackages(['postgresql'], otherwise);
  } finally {
    await runAsRoot(prefix, ['rm', '-f', noMainCluster]);
  }
}
