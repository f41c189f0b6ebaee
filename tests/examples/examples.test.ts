import { execFile } from 'node:child_process';
import { copyFileSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import ts from 'typescript';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { startService, type TestService } from '../support/service';

const run = promisify(execFile);
let service: TestService;
let folder: string;
let env: NodeJS.ProcessEnv;

beforeAll(async () => {
  service = await startService();
  folder = mkdtempSync(join(tmpdir(), 'evenfall-examples-'));
  env = { ...process.env, EVENFALL_URL: service.url, EVENFALL_KEY: await service.key() };
});
afterAll(async () => {
  await service.stop();
  rmSync(folder, { recursive: true });
});

it('the first call in curl answers EV 13', async () => {
  const { stdout } = await run('bash', ['examples/curl/first-call.sh'], { env });
  const answer = JSON.parse(stdout) as { result: { ev100: number } };
  expect(answer.result.ev100).toBe(13);
});

it('the link in curl gets its tag, and 304 for it', async () => {
  const { stdout } = await run('bash', ['examples/curl/link.sh'], { env });
  expect(stdout).toMatch(/^first: {2}tag W\/"[^"]+"\nsecond: status 304\n$/);
});

it('curl without a key says what to set', async () => {
  const keyless = { ...env, EVENFALL_KEY: '' };
  await expect(run('bash', ['examples/curl/first-call.sh'], { env: keyless })).rejects.toThrow(
    /EVENFALL_KEY/,
  );
});

it('the TypeScript example follows the light down and names the field at fault', async () => {
  for (const name of ['callEvenfall', 'falling-light']) {
    const text = readFileSync(`examples/typescript/${name}.ts`, 'utf8');
    const { outputText } = ts.transpileModule(text, {
      compilerOptions: { module: ts.ModuleKind.ESNext, target: ts.ScriptTarget.ES2022 },
    });
    writeFileSync(join(folder, `${name}.js`), outputText);
  }
  writeFileSync(join(folder, 'package.json'), '{"type":"module"}');
  const { stdout } = await run(process.execPath, [join(folder, 'falling-light.js')], { env });
  // 35 mm by hand: 1/40 is the safe mark of 1/35 s. EV 8 at f/4 and ISO 400: t = 16·100/(400·2^8) = 1/64 s.
  // From 1/40 on, ISO 100·16·40.3/2^EV: EV 6 gives 1008, EV 5 2016, EV 4 4032. Hand calculation.
  expect(stdout.trim().split('\n')).toEqual([
    'Hand-held at 35 mm: 1/40 at the slowest',
    'EV 8: f/4, 1/60, ISO 400',
    'EV 7: f/4, 1/40, ISO 500',
    'EV 6: f/4, 1/40, ISO 1000',
    'EV 5: f/4, 1/40, ISO 2000',
    'EV 4: f/4, 1/40, ISO 4000',
    '/shuter: "shuter" is not a field here; did you mean “shutter”?',
    '/shutter: Give exactly two of aperture, shutter and iso; aperture was given.',
  ]);
});

it('the Python example reckons a softbox and two guns in one batch', async () => {
  copyFileSync('examples/python/two_guns.py', join(folder, 'two_guns.py'));
  const { stdout } = await run('python3', [join(folder, 'two_guns.py')], { env });
  // 50·√2·√¼·2^(−0.75)/3 = 7.007; √(36² + 22²)/5 = 42.19/5 = 8.438. Hand calculation.
  expect(stdout).toBe('softbox at 3 m: f/7.1 (exactly f/7.01)\ntwo guns at 5 m: f/8 (exactly f/8.44)\n');
});
