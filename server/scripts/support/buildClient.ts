import { join } from 'node:path';
import { builtFolder } from '../boot/builtFolder.mjs';
import { contentHash } from '../boot/contentHash.mjs';
import { withFolderLock } from '../boot/folderLock.mjs';
import { runNode } from '../boot/runNode.mjs';
import { dataFolder, root } from './place';
import { say } from './say';

const sources = [
  'src',
  'shared',
  'public',
  'index.html',
  'vite.config.ts',
  'tsconfig.json',
  'package.json',
  'package-lock.json',
];

const buildProgram = join(root, 'server/scripts/boot/build.mjs');

/** The console's built files, made anew only when its sources have changed. */
export function buildClient(): Promise<string> {
  return withFolderLock(join(dataFolder, 'client.lock'), () =>
    builtFolder(join(dataFolder, 'client'), contentHash(root, sources), (folder) => {
      say('Building the console');
      return runNode([buildProgram, 'client', folder], { cwd: root });
    }),
  );
}

/** A program outside the server, such as the benchmarks, built the way the server is. */
export async function buildEntry(entry: string, changes: readonly string[]): Promise<string> {
  const hash = contentHash(root, ['server', 'shared', 'package-lock.json', ...changes]);
  return builtFolder(join(dataFolder, 'entries'), hash, (folder) =>
    runNode([buildProgram, 'entry', entry, folder], { cwd: root }),
  );
}
