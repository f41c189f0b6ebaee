import { mkdirSync, readdirSync, renameSync, rmdirSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { isAlive, processIdentity } from './processIdentity.mjs';

/**
 * Runs `work` while no other process holds the lock at `path`. The lock is a folder that holds one file named after
 * its owner. Taking it renames a ready-made folder onto the path, which the system allows only where the path is
 * absent or an empty folder; a dead owner's file is removed by its own name, so that nobody can break a living lock.
 */
export async function withFolderLock(path, work, { waitingMs = 10_000, onWait } = {}) {
  const owner = processIdentity(process.pid);
  mkdirSync(dirname(path), { recursive: true });
  let waitedMs = 0;
  while (!tryTake(path, owner)) {
    await wait(50);
    waitedMs += 50;
    if (waitedMs === waitingMs) (onWait ?? sayWaiting)(path);
  }
  try {
    return await work();
  } finally {
    rmSync(join(path, owner), { force: true });
    try {
      rmdirSync(path);
    } catch {
      // Somebody else has taken it meanwhile.
    }
  }
}

function sayWaiting(path) {
  process.stderr.write(`Waiting for another process that holds ${path}\n`);
}

function tryTake(path, owner) {
  const ready = `${path}.${owner}`;
  mkdirSync(ready, { recursive: true });
  writeFileSync(join(ready, owner), '');
  try {
    renameSync(ready, path);
    return true;
  } catch (error) {
    rmSync(ready, { recursive: true, force: true });
    if (error.code !== 'ENOTEMPTY' && error.code !== 'EEXIST') throw error;
    removeDeadOwners(path);
    return false;
  }
}

function removeDeadOwners(path) {
  let names = [];
  try {
    names = readdirSync(path);
  } catch {
    return;
  }
  for (const name of names) if (!isAlive(name)) rmSync(join(path, name), { force: true });
}
