import { existsSync, mkdirSync, readdirSync, renameSync, rmSync, statSync, utimesSync } from 'node:fs';
import { join } from 'node:path';

// Enough for a few branches. What was taken into use within the hour stays as well: a run of the tests, or a service,
// may still load parts of it while somebody who is editing makes build after build.
const KEPT = 5;
const IN_USE_MS = 3_600_000;

/**
 * The folder `parent/name`, made by `build(folder)` unless it is there already. It is built under another name and
 * renamed when complete, so that a folder that exists is whole; the oldest beyond the newest few are removed.
 */
export async function builtFolder(parent, name, build) {
  const folder = join(parent, name);
  if (!existsSync(folder)) {
    const draft = join(parent, `${name}.${process.pid}.draft`);
    mkdirSync(parent, { recursive: true });
    rmSync(draft, { recursive: true, force: true });
    try {
      await build(draft);
      putInPlace(draft, folder);
    } finally {
      rmSync(draft, { recursive: true, force: true });
    }
  }
  const now = new Date(Date.now());
  utimesSync(folder, now, now);
  removeOldest(parent);
  return folder;
}

function putInPlace(draft, folder) {
  try {
    renameSync(draft, folder);
  } catch (error) {
    if (!existsSync(folder)) throw error;
  }
}

function removeOldest(parent) {
  const built = readdirSync(parent)
    .filter((name) => !name.endsWith('.draft'))
    .map((name) => ({ name, usedMs: statSync(join(parent, name)).mtimeMs }))
    .sort((a, b) => b.usedMs - a.usedMs);
  const isOld = ({ usedMs }) => Date.now() - usedMs > IN_USE_MS;
  for (const { name } of built.slice(KEPT).filter(isOld))
    rmSync(join(parent, name), { recursive: true, force: true });
}
