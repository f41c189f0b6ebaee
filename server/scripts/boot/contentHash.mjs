import { createHash } from 'node:crypto';
import { readFileSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';

function filesUnder(root, path) {
  const stats = statSync(join(root, path), { throwIfNoEntry: false });
  if (!stats) return [];
  if (!stats.isDirectory()) return [path];
  return readdirSync(join(root, path))
    .sort()
    .flatMap((name) => filesUnder(root, `${path}/${name}`));
}

/** A short name for what the given files and folders contain: their paths and bytes, not their times. */
export function contentHash(root, paths) {
  const hash = createHash('sha256');
  for (const path of paths.flatMap((entry) => filesUnder(root, entry))) {
    const content = readFileSync(join(root, path));
    hash.update(`${path}\0${content.length}\0`).update(content);
  }
  return hash.digest('hex').slice(0, 20);
}
