// Runs one of the scripts beside it: `node server/scripts/run.mjs start`. The scripts are TypeScript, which Node 20
// does not read, so this file and those under boot/ are plain JavaScript: they install the locked packages, build
// the server when its sources changed, and hand over. Whatever they have to say goes to standard error.
import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { builtFolder } from './boot/builtFolder.mjs';
import { contentHash } from './boot/contentHash.mjs';
import { installPackages } from './boot/installPackages.mjs';
import { runNode } from './boot/runNode.mjs';
import { withFolderLock } from './boot/folderLock.mjs';

const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))));
const sources = ['server', 'shared', 'vite.config.ts', 'tsconfig.json', 'package.json', 'package-lock.json'];

async function buildServer() {
  const hash = contentHash(root, sources);
  return builtFolder(join(root, '.data', 'server'), hash, (folder) => {
    process.stderr.write('Building the server\n');
    return runNode([join(root, 'server/scripts/boot/build.mjs'), 'server', folder], { cwd: root });
  });
}

async function run(name, args) {
  process.chdir(root);
  if (!existsSync(join(root, 'server', 'scripts', `${name}.ts`)))
    throw new Error(`There is no script ${name}`);
  const folder = await withFolderLock(join(root, '.data', 'build.lock'), async () => {
    await installPackages(root);
    return buildServer();
  });
  const script = await import(pathToFileURL(join(folder, `${name}.js`)).href);
  await script.main(args);
}

run(process.argv[2] ?? '', process.argv.slice(3)).catch((error) => {
  // An error that is meant for a person says so; anything else keeps its stack.
  process.stderr.write(
    `${error?.isForPeople || !error?.stack ? String(error?.message ?? error) : error.stack}\n`,
  );
  process.exit(1);
});
