import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';

export type SystemUser = { uid: number; gid: number };

/**
 * The user under whom the cluster runs: PostgreSQL refuses to run as root, so root hands it to the `postgres` user
 * that Debian's package makes. Null: the user who is running this.
 */
export function clusterUser(): SystemUser | null {
  if (process.getuid?.() !== 0) return null;
  const line = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .find((entry) => entry.startsWith('postgres:'));
  if (!line)
    throw new Error('There is no user postgres on this machine, and PostgreSQL refuses to run as root');
  const [, , uid, gid] = line.split(':');
  return { uid: Number(uid), gid: Number(gid) };
}

export function canReach(user: SystemUser | null, folder: string): boolean {
  return spawnSync('test', ['-x', folder], { cwd: '/', ...user }).status === 0;
}

/** The environment of PostgreSQL's programs: nothing of the caller's, whose PGDATA or PGPORT would be obeyed. */
export const clusterEnvironment: NodeJS.ProcessEnv = { PATH: '/usr/bin:/bin', LC_ALL: 'C.UTF-8', TZ: 'UTC' };
