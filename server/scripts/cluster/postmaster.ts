import { spawn } from 'node:child_process';
import {
  closeSync,
  openSync,
  readFileSync,
  readdirSync,
  readlinkSync,
  realpathSync,
  rmSync,
  statSync,
} from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { isAlive, processIdentity } from '../boot/processIdentity.mjs';
import type { PostgresPrograms } from './postgresPrograms';
import { clusterEnvironment, type SystemUser } from './systemUser';

/** A running server: its main process and its port. */
export type Postmaster = { identity: string; pid: number; port: number };

const LARGEST_LOG_BYTES = 10_000_000;
const POLL_MS = 20;

/** The server that runs on this folder, whoever started it; a file left by one that crashed is not believed. */
export function findPostmaster(folder: string): Postmaster | null {
  const lines = pidFileLines(folder);
  const pid = Number(lines[0]);
  const port = Number(lines[3]);
  if (!pid || !port || !worksIn(pid, folder)) return null;
  const identity = processIdentity(pid);
  return identity ? { identity, pid, port } : null;
}

function pidFileLines(folder: string): string[] {
  try {
    return readFileSync(join(folder, 'postmaster.pid'), 'utf8').split('\n');
  } catch {
    return [];
  }
}

/** All of a cluster's processes have its folder as their working directory. */
function worksIn(pid: number | string, folder: string): boolean {
  try {
    return readlinkSync(`/proc/${pid}/cwd`) === realpathSync(folder);
  } catch {
    return false;
  }
}

/** The server's main process and its helpers. */
export function processesIn(folder: string): number[] {
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name) && worksIn(name, folder))
    .map(Number);
}

/**
 * A server that was killed leaves its pid file, and its helpers end by themselves a moment later. PostgreSQL refuses
 * to start while the number in that file belongs to any process of the same user, so the file goes once nobody works
 * in the folder any more, which is what it stands for.
 */
export async function clearLeftovers(folder: string): Promise<void> {
  for (let waitedMs = 0; processesIn(folder).length > 0; waitedMs += POLL_MS) {
    if (waitedMs > 30_000) throw new Error(`Processes of a server that died still work in ${folder}`);
    await wait(POLL_MS);
  }
  rmSync(join(folder, 'postmaster.pid'), { force: true });
}

type Start = {
  programs: PostgresPrograms;
  folder: string;
  logPath: string;
  user: SystemUser | null;
  port: number;
  settings: Readonly<Record<string, string>>;
};

/** Starts a server in a session of its own, so that Ctrl-C in this terminal does not reach it. */
export function startPostmaster({ programs, folder, logPath, user, port, settings }: Start): Postmaster {
  if ((statSync(logPath, { throwIfNoEntry: false })?.size ?? 0) > LARGEST_LOG_BYTES) rmSync(logPath);
  const log = openSync(logPath, 'a', 0o600);
  const options = Object.entries({ ...settings, port: String(port) }).flatMap(([name, value]) => [
    '-c',
    `${name}=${value}`,
  ]);
  const child = spawn(join(programs.folder, 'postgres'), ['-D', folder, ...options], {
    cwd: '/',
    detached: true,
    env: clusterEnvironment,
    stdio: ['ignore', log, log],
    ...user,
  });
  closeSync(log);
  child.unref();
  if (child.pid === undefined) throw new Error(`${programs.folder}/postgres did not start`);
  return { identity: processIdentity(child.pid) ?? `${child.pid}-gone`, pid: child.pid, port };
}

/** Stops a server: its clients are cut off and everything committed is kept ("fast shutdown"). */
export async function stopPostmaster({ identity, pid }: Postmaster): Promise<void> {
  signal(pid, 'SIGINT');
  if (await hasEnded(identity, 30_000)) return;
  // "Immediate shutdown": what is committed is recovered from the log at the next start.
  signal(pid, 'SIGQUIT');
  if (!(await hasEnded(identity, 10_000))) throw new Error(`PostgreSQL (process ${pid}) does not stop`);
}

function signal(pid: number, name: NodeJS.Signals): void {
  try {
    process.kill(pid, name);
  } catch {
    // It has just ended by itself.
  }
}

async function hasEnded(identity: string, patienceMs: number): Promise<boolean> {
  for (let waitedMs = 0; isAlive(identity); waitedMs += POLL_MS) {
    if (waitedMs > patienceMs) return false;
    await wait(POLL_MS);
  }
  return true;
}
