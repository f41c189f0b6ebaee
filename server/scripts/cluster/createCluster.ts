import { spawnSync } from 'node:child_process';
import { chownSync, mkdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { runProgram } from '../boot/runNode.mjs';
import type { PostgresPrograms } from './postgresPrograms';
import { clusterEnvironment, type SystemUser } from './systemUser';

export const ADMIN_ROLE = 'evenfall_admin';

type Task = { programs: PostgresPrograms; folder: string; user: SystemUser | null; adminPassword: string };

/** Makes an empty cluster; it gets its name only when complete, so that a broken attempt leaves nothing behind. */
export async function createCluster({ programs, folder, user, adminPassword }: Task): Promise<void> {
  const draft = `${folder}.draft`;
  const passwordFile = `${folder}.password`;
  rmSync(draft, { recursive: true, force: true });
  mkdirSync(draft, { mode: 0o700, recursive: true });
  writeFileSync(passwordFile, `${adminPassword}\n`, { mode: 0o600 });
  if (user) for (const path of [draft, passwordFile]) chownSync(path, user.uid, user.gid);
  const options = [
    `--pgdata=${draft}`,
    `--username=${ADMIN_ROLE}`,
    `--pwfile=${passwordFile}`,
    '--auth-host=scram-sha-256',
    '--auth-local=reject',
    '--encoding=UTF8',
    '--locale=C.UTF-8',
    '--data-checksums',
    '--no-instructions',
  ];
  try {
    // What it prints is only of interest where it fails.
    await runProgram(join(programs.folder, 'initdb'), options, {
      cwd: '/',
      env: clusterEnvironment,
      stdio: ['ignore', 'ignore', 2],
      ...user,
    });
    renameSync(draft, folder);
  } finally {
    rmSync(passwordFile, { force: true });
    rmSync(draft, { recursive: true, force: true });
  }
}

/** Gives the admin role a new password without knowing the old one: for data whose record is gone. */
export function resetAdminPassword({ programs, folder, user, adminPassword }: Task): void {
  const result = spawnSync(join(programs.folder, 'postgres'), ['--single', '-D', folder, 'postgres'], {
    input: `ALTER ROLE ${ADMIN_ROLE} PASSWORD '${adminPassword}'\n`,
    cwd: '/',
    env: clusterEnvironment,
    encoding: 'utf8',
    ...user,
  });
  if (result.status !== 0)
    throw new Error(`The data in ${dirname(folder)} can't be opened: ${result.stderr}`);
}
