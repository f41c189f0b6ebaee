import { createHash } from 'node:crypto';
import vue from '@vitejs/plugin-vue';
import { runnerImport, type Rolldown } from 'vite';
import { defineConfig } from 'vitest/config';

type AppearanceCss = typeof import('./src/styles/appearanceCss');

/** Puts the appearances' variables into the page's head, before any stylesheet has to be fetched. */
const appearances = {
  name: 'evenfall-appearances',
  async transformIndexHtml() {
    const { module } = await runnerImport<AppearanceCss>('./src/styles/appearanceCss.ts');
    return [{ tag: 'style', children: module.appearanceCss(), injectTo: 'head-prepend' as const }];
  },
};

/** Screens that are of no use without a network; the files that only they use need not be kept for one. */
const ONLINE_ONLY = /\/views\/(?!Landing|Calculator|Evening|Fill|Kit|Recipe|NotFound)\w+View\.vue$/;

type Bundle = Rolldown.OutputBundle;

/** What the screens that work without a network may need, however late they load it. */
function filesFrom(bundle: Bundle): string[] {
  const found = new Set<string>();
  const visit = (name: string): void => {
    const chunk = bundle[name];
    if (found.has(name) || chunk?.type !== 'chunk' || ONLINE_ONLY.test(chunk.facadeModuleId ?? '')) return;
    found.add(name);
    [...chunk.imports, ...chunk.dynamicImports].forEach(visit);
  };
  visit(Object.keys(bundle).find((name) => /\/index-[^/]*\.js$/.test(name)) ?? '');
  const assets = Object.keys(bundle).filter((name) => /\.(css|woff2)$/.test(name));
  return [...found, ...assets].sort();
}

/** Writes into the service worker what it keeps, and a name for it that changes with any of it. */
const offline = {
  name: 'evenfall-offline',
  enforce: 'post' as const,
  generateBundle: {
    order: 'post' as const,
    handler(_options: unknown, bundle: Bundle) {
      const worker = bundle['offline.js'];
      if (worker?.type !== 'chunk') return;
      const hashed = filesFrom(bundle);
      const page = bundle['index.html'];
      const hash = createHash('sha256').update(hashed.join());
      if (page?.type === 'asset') hash.update(page.source);
      const files = [...hashed.map((name) => `/${name}`), '/first-paint.js', '/icon.svg'];
      worker.code = worker.code
        .replace(/\bOFFLINE_BUILD\b/g, JSON.stringify(hash.digest('hex').slice(0, 16)))
        .replace(/\bOFFLINE_FILES\b/g, () => JSON.stringify(files));
    },
  },
};

export default defineConfig({
  plugins: [vue(), appearances, offline],
  publicDir: 'src/public',
  build: {
    target: 'es2022',
    // The list of files from which the size of a first load is counted.
    manifest: true,
    // Every browser that can run this target preloads modules by itself.
    modulePreload: { polyfill: false },
    rolldownOptions: {
      input: { index: 'index.html', offline: 'src/offline/worker.ts' },
      output: {
        // A service worker stands above the paths that it answers for, under the same name always.
        entryFileNames: ({ name }) => (name === 'offline' ? 'offline.js' : 'assets/[name]-[hash].js'),
      },
    },
  },
  test: {
    include: ['tests/**/*.test.ts'],
    environment: 'node',
    pool: 'forks',
    testTimeout: 20_000,
  },
});
