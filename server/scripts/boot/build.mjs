// Run as a process of its own, so that the bundler's memory is gone when the service runs:
// node build.mjs server FOLDER, node build.mjs client FOLDER, node build.mjs entry FILE FOLDER.
import { readdirSync } from 'node:fs';
import { basename } from 'node:path';
import { build } from 'vite';

function entriesOf(paths) {
  return Object.fromEntries(paths.map((path) => [basename(path, '.ts'), path]));
}

/** The scripts, and the workers (`*.worker.ts`), which load by `new URL('./name.worker.js', import.meta.url)`. */
function serverEntries() {
  const scripts = readdirSync('server/scripts').filter((name) => name.endsWith('.ts'));
  const workers = readdirSync('server', { recursive: true }).filter((name) => name.endsWith('.worker.ts'));
  return entriesOf([
    ...scripts.map((name) => `server/scripts/${name}`),
    ...workers.map((name) => `server/${name}`),
  ]);
}

function buildForNode(input, outDir) {
  return build({
    configFile: false,
    logLevel: 'warn',
    build: {
      ssr: true,
      target: 'node20',
      outDir,
      sourcemap: true,
      emptyOutDir: true,
      rolldownOptions: {
        input,
        // Every file in one folder, so that a worker lies beside whatever part of the build starts it.
        output: { entryFileNames: '[name].js', chunkFileNames: '[name]-[hash].js' },
      },
    },
  });
}

function run(kind, paths) {
  if (kind === 'server') return buildForNode(serverEntries(), paths[0]);
  if (kind === 'client') return build({ logLevel: 'warn', build: { outDir: paths[0], emptyOutDir: true } });
  if (kind === 'entry') return buildForNode(entriesOf([paths[0]]), paths[1]);
  throw new Error(`Nothing is called ${kind}`);
}

const [kind, ...paths] = process.argv.slice(2);
try {
  await run(kind, paths);
} catch (error) {
  // The bundler's message shows the place; its stack is the bundler's own.
  process.stderr.write(`${error.message}\n`);
  process.exit(1);
}
