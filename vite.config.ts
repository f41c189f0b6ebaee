import vue from '@vitejs/plugin-vue';
import { runnerImport } from 'vite';
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

export default defineConfig({
  plugins: [vue(), appearances],
  publicDir: 'src/public',
  build: {
    target: 'es2022',
    // The list of files from which the size of a first load is counted.
    manifest: true,
    // Every browser that can run this target preloads modules by itself.
    modulePreload: { polyfill: false },
  },
  test: {
    include: ['tests/**/*.test.ts'],
    environment: 'node',
    pool: 'forks',
    testTimeout: 20_000,
  },
});
