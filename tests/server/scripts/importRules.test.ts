import { ESLint } from 'eslint';
import tseslint from 'typescript-eslint';
import { describe, expect, it } from 'vitest';

// The project's own configuration, less what needs a program with types: the samples are no files.
const eslint = new ESLint({
  overrideConfig: [
    tseslint.configs.disableTypeChecked as ESLint.Options['overrideConfig'] & object,
    { languageOptions: { parserOptions: { projectService: false, project: false } } },
  ].flat() as NonNullable<ESLint.Options['overrideConfig']>,
});

async function faultsOf(path: string, text: string): Promise<string[]> {
  const [result] = await eslint.lintText(text, { filePath: path });
  return (result?.messages ?? []).map(({ ruleId, message }) => `${ruleId ?? 'parser'}: ${message}`);
}

async function layerFaultsOf(path: string, text: string): Promise<string[]> {
  const faults = await faultsOf(path, text);
  return faults.filter((fault) => fault.startsWith('evenfall/import-layers'));
}

const importOf = (source: string) => `import { a } from '${source}';\nexport const b = a;\n`;

describe('the import rules', () => {
  it.each([
    ['shared/math/light.ts', '../text'],
    ['shared/math/light.ts', '../contract/quantities'],
    ['shared/math/light.ts', 'zod'],
    ['shared/math/light.ts', 'luxon'],
    ['shared/math/exposure.ts', 'astronomy-engine'],
    ['shared/math/light.ts', 'node:crypto'],
    ['shared/time/zone.ts', 'zod'],
    ['shared/time/zone.ts', '../contract/place'],
    ['shared/text/en/notes.ts', '../../contract/answer'],
    ['shared/contract/answer.ts', '../calculators'],
    ['shared/contract/answer.ts', 'luxon'],
    ['shared/calculators/exposure/value.ts', '../../../server/http/send'],
    ['shared/calculators/exposure/value.ts', '../../../src/api/client'],
    ['shared/calculators/frames/read.ts', 'node:buffer'],
    ['server/routes/v1/a.ts', '../../models/ApiKey'],
    ['server/routes/v1/a.ts', '../../config'],
    ['server/routes/v1/a.ts', '../../scripts/start'],
    ['server/routes/v1/a.ts', '../../../src/api/client'],
    ['server/routes/v1/a.ts', '../../main'],
    ['server/services/keys/a.ts', '../../routes/v1/a'],
    ['server/services/keys/a.ts', '../../middleware/key'],
    ['server/services/keys/a.ts', '../../config'],
    ['server/models/ApiKey.ts', '../routes/v1/a'],
    ['server/models/ApiKey.ts', '../services/keys/a'],
    ['server/policies/keys.ts', '../services/keys/a'],
    ['server/policies/keys.ts', '../models/ApiKey'],
    ['server/policies/keys.ts', 'pg'],
    ['server/presenters/key.ts', '../models/ApiKey'],
    ['server/presenters/key.ts', 'node:fs'],
    ['server/migrations/0001.ts', '../models/ApiKey'],
    ['server/app.ts', './scripts/start'],
    ['server/app.ts', './main'],
    ['server/main.ts', './scripts/start'],
    ['server/openapi/a.ts', '../../openapi/openapi.json'],
    ['src/views/HomeView.ts', '../api/client'],
    ['src/views/HomeView.ts', '../../server/http/send'],
    ['src/components/A.ts', '../views/HomeView.vue'],
    ['src/components/A.ts', '../api/client'],
    ['src/composables/useA.ts', '../components/A.vue'],
    ['src/stores/useA.ts', '../composables/useA'],
    ['src/stores/useA.ts', '../components/A.vue'],
    ['src/api/client.ts', '../stores/useA'],
    ['src/api/client.ts', 'node:http'],
    ['src/api/client.ts', '../../openapi/openapi.json'],
    ['examples/typescript/a.ts', '../../shared/math/light'],
    ['examples/typescript/a.ts', 'zod'],
    ['server/jobs/a.ts', '../services/keys/a'],
    ['shared/misc/a.ts', './b'],
  ])('keep %s from importing %s', async (path, source) => {
    expect(await layerFaultsOf(path, importOf(source))).toHaveLength(1);
  });

  it.each([
    ['shared/math/sunFit.ts', 'astronomy-engine'],
    ['shared/math/light.ts', './exposure'],
    ['shared/time/zone.ts', 'luxon'],
    ['shared/time/zone.ts', '@photostructure/tz-lookup'],
    ['shared/contract/answer.ts', '../text'],
    ['shared/contract/answer.ts', 'zod'],
    ['shared/calculators/exposure/value.ts', '../../math/exposure'],
    ['server/routes/v1/a.ts', '../../services/keys/a'],
    ['server/routes/v1/a.ts', '../../../shared/calculators'],
    ['server/services/keys/a.ts', '../../models/ApiKey'],
    ['server/models/ApiKey.ts', 'sequelize'],
    ['server/main.ts', './app'],
    ['server/main.ts', './config'],
    ['server/scripts/start.ts', '../main'],
    ['src/views/HomeView.ts', '../components/A.vue'],
    ['src/components/A.ts', '../composables/useA'],
    ['src/composables/useA.ts', '../api/client'],
    ['src/api/client.ts', '../../shared/contract/problems'],
    ['tests/server/a.test.ts', '../../server/main'],
    ['examples/typescript/a.ts', 'node:process'],
  ])('let %s import %s', async (path, source) => {
    expect(await layerFaultsOf(path, importOf(source))).toEqual([]);
  });

  it.each([
    ['server/presenters/key.ts', '../models/ApiKey'],
    ['server/policies/keys.ts', '../services/keys/a'],
    ['server/services/keys/a.ts', '../../config'],
    ['src/api/client.ts', '../../openapi/types'],
  ])('let %s import %s for its types, in every way to write that', async (path, source) => {
    const ways = [
      `import type { A } from '${source}';\nexport type B = A;\n`,
      `import { type A } from '${source}';\nexport type B = A;\n`,
    ];
    for (const text of ways) expect(await layerFaultsOf(path, text)).toEqual([]);
    expect(
      await layerFaultsOf(path, `import { a, type A } from '${source}';\nexport const b: A = a;\n`),
    ).toHaveLength(1);
  });

  it.each([
    `export { a } from '../../server/http/send';\n`,
    `export * from '../../server/http/send';\n`,
    `export const load = () => import('../../server/http/send');\n`,
    `import '../../server/http/send';\n`,
    `export type A = import('../../server/http/send').A;\n`,
  ])('see through every form of an import: %s', async (text) => {
    expect(await layerFaultsOf('shared/math/light.ts', text)).toHaveLength(1);
  });

  it('hold in components written in Vue', async () => {
    const text = `<script setup lang="ts">\nimport { a } from '../../server/http/send';\n</script>\n<template><p>{{ a }}</p></template>\n`;
    expect(await layerFaultsOf('src/components/AThing.vue', text)).toHaveLength(1);
  });
});

describe('the rules of purity', () => {
  it.each([
    'process',
    'Buffer',
    'setTimeout',
    'window',
    'document',
    'fetch',
    'performance',
    'console',
    'localStorage',
    'crypto',
    'URL',
    'structuredClone',
    'require',
    'globalThis.process',
  ])('keep %s out of what browser and server share', async (name) => {
    const faults = await faultsOf('shared/math/light.ts', `export const a = ${name};\n`);
    expect(faults.join('\n')).toMatch(/no-undef|no-restricted-globals/);
  });

  it.each([
    'Math.max(1, 2)',
    "new Map<string, Partial<Error>>([['a', {}]])",
    "new Intl.NumberFormat('en')",
    'new Date(0).getTime()',
    'Number.EPSILON',
  ])('let what the language itself has be used: %s', async (expression) => {
    expect(await faultsOf('shared/math/light.ts', `export const a = ${expression};\n`)).toEqual([]);
  });

  it.each([
    'shared/math/light.ts',
    'server/services/keys/a.ts',
    'server/routes/v1/a.ts',
    'src/stores/useA.ts',
  ])('hand the clock to %s', async (path) => {
    for (const clock of ['new Date()', 'Date.now()']) {
      const faults = await faultsOf(path, `export const a = ${clock};\n`);
      expect(faults).toEqual(['no-restricted-syntax: The clock is handed in.']);
    }
  });

  it('let only settings and scripts read the environment', async () => {
    const text = `export const a = process.env.PORT;\n`;
    expect((await faultsOf('server/services/keys/a.ts', text)).join()).toContain('read the environment');
    expect((await faultsOf('tests/server/a.test.ts', text)).join()).toContain('read the environment');
    expect(await faultsOf('server/scripts/start.ts', text)).toEqual([]);
  });

  it('refuse arithmetic and fetching in a view', async () => {
    const view = (script: string, template: string) =>
      `<script setup lang="ts">\n${script}\n</script>\n<template><p>{{ ${template} }}</p></template>\n`;
    const path = 'src/views/HomeView.vue';
    expect(await faultsOf(path, view('const a = 1;', 'a'))).toEqual([]);
    expect((await faultsOf(path, view('const a = 1 * Number("2");', 'a'))).join()).toContain('no arithmetic');
    expect((await faultsOf(path, view('const a = 1;', 'a / 2'))).join()).toContain('no arithmetic');
    expect((await faultsOf(path, view("const a = fetch('/v1');", 'a'))).join()).toContain(
      'no-restricted-globals',
    );
  });

  it.each(['it.skip', 'test.only', 'describe.todo'])('refuse %s in a test', async (call) => {
    const name = call.split('.')[0] ?? '';
    const text = `import { ${name} } from 'vitest';\n${call}('a', () => undefined);\n`;
    expect((await faultsOf('tests/shared/a.test.ts', text)).join()).toContain('Every test runs');
  });

  it('do not listen to comments that would switch a rule off', async () => {
    const text = `/* eslint-disable */\nexport const a = Date.now();\n`;
    expect((await faultsOf('shared/math/light.ts', text)).join()).toContain('The clock is handed in');
  });
});
