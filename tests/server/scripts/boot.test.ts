import { execFile } from 'node:child_process';
import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  readdirSync,
  rmSync,
  utimesSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { builtFolder } from '../../../server/scripts/boot/builtFolder.mjs';
import { contentHash } from '../../../server/scripts/boot/contentHash.mjs';
import { withFolderLock } from '../../../server/scripts/boot/folderLock.mjs';
import { installPackages, isInstalledAlready } from '../../../server/scripts/boot/installPackages.mjs';
import { isAlive, processIdentity } from '../../../server/scripts/boot/processIdentity.mjs';

let root: string;
const write = (path: string, text: string) => {
  mkdirSync(join(root, path, '..'), { recursive: true });
  writeFileSync(join(root, path), text);
};

beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'evenfall-boot-'));
});
afterEach(() => rmSync(root, { recursive: true, force: true }));

describe('contentHash', () => {
  it('stays the same while paths and contents do, whatever their times', () => {
    write('src/a.ts', 'a');
    write('src/deep/b.ts', 'b');
    const before = contentHash(root, ['src', 'missing.ts']);
    utimesSync(join(root, 'src/a.ts'), 1, 1);
    write('elsewhere.ts', 'not looked at');
    expect(contentHash(root, ['src', 'missing.ts'])).toBe(before);
    expect(before).toMatch(/^[0-9a-f]{20}$/);
  });

  it('changes with a byte, with a name, with a new file, and when bytes move from one file to the next', () => {
    write('src/a.ts', 'ab');
    write('src/b.ts', 'c');
    const hashes = [contentHash(root, ['src'])];
    write('src/a.ts', 'a');
    write('src/b.ts', 'bc');
    hashes.push(contentHash(root, ['src']));
    write('src/c.ts', '');
    hashes.push(contentHash(root, ['src']));
    rmSync(join(root, 'src/c.ts'));
    write('src/d.ts', '');
    hashes.push(contentHash(root, ['src']));
    expect(new Set(hashes).size).toBe(4);
  });
});

describe('builtFolder', () => {
  const parent = () => join(root, 'built');
  const build = (folder: string) => {
    mkdirSync(folder);
    writeFileSync(join(folder, 'entry.js'), folder);
    return Promise.resolve();
  };

  it('builds once, and gives the same folder afterwards', async () => {
    const folder = await builtFolder(parent(), 'one', build);
    const again = await builtFolder(parent(), 'one', () => Promise.reject(new Error('built twice')));
    expect(again).toBe(folder);
    expect(existsSync(join(folder, 'entry.js'))).toBe(true);
  });

  it('leaves nothing behind of a build that failed', async () => {
    const half = async (folder: string) => {
      await build(folder);
      throw new Error('half-way');
    };
    await expect(builtFolder(parent(), 'one', half)).rejects.toThrow('half-way');
    expect(readdirSync(parent())).toEqual([]);
  });

  it('keeps the five that were used last, and all that were used within the hour', async () => {
    for (const [age, name] of ['a', 'b', 'c', 'd', 'e'].entries()) {
      const folder = await builtFolder(parent(), name, build);
      utimesSync(folder, 1_000 + age, 1_000 + age);
    }
    await builtFolder(parent(), 'a', build);
    await builtFolder(parent(), 'f', build);
    expect(readdirSync(parent()).sort()).toEqual(['a', 'c', 'd', 'e', 'f']);
    for (const name of ['g', 'h', 'i', 'j']) await builtFolder(parent(), name, build);
    expect(readdirSync(parent()).sort()).toEqual(['a', 'f', 'g', 'h', 'i', 'j']);
  });
});

describe('processIdentity', () => {
  it('knows a living process from a dead one and from another with the same number', () => {
    const own = processIdentity(process.pid) ?? '';
    expect(isAlive(own)).toBe(true);
    expect(isAlive(`${process.pid}-1`)).toBe(false);
    // Linux gives no number above 2^22 (proc(5), pid_max).
    expect(processIdentity(2 ** 22 + 1)).toBeNull();
    expect(isAlive('nonsense')).toBe(false);
  });
});

describe('withFolderLock', () => {
  it('lets one process in at a time', async () => {
    write('count', '0');
    const lock = join(process.cwd(), 'server/scripts/boot/folderLock.mjs');
    const program = `
      import { readFileSync, writeFileSync } from 'node:fs';
      import { setTimeout as wait } from 'node:timers/promises';
      import { withFolderLock } from ${JSON.stringify(lock)};
      for (let turn = 0; turn < 5; turn += 1) {
        await withFolderLock('lock', async () => {
          const count = Number(readFileSync('count', 'utf8'));
          await wait(2);
          writeFileSync('count', String(count + 1));
        });
      }`;
    const run = () =>
      promisify(execFile)(process.execPath, ['--input-type=module', '-e', program], { cwd: root });
    await Promise.all([run(), run(), run()]);
    expect(readFileSync(join(root, 'count'), 'utf8')).toBe('15');
    expect(readdirSync(root)).toEqual(['count']);
  });

  it('is opened when the work fails', async () => {
    const path = join(root, 'lock');
    await expect(withFolderLock(path, () => Promise.reject(new Error('no')))).rejects.toThrow('no');
    expect(await withFolderLock(path, () => Promise.resolve('in'))).toBe('in');
  });

  it('is taken from an owner that has died', async () => {
    write('lock/4194305-1', '');
    expect(await withFolderLock(join(root, 'lock'), () => Promise.resolve('in'))).toBe('in');
  });

  it('says so when it has to wait', async () => {
    const own = processIdentity(process.ppid) ?? '';
    write(`lock/${own}`, '');
    const said: string[] = [];
    const onWait = (path: string) => {
      said.push(path);
      rmSync(join(root, 'lock', own));
    };
    await withFolderLock(join(root, 'lock'), () => Promise.resolve(), { waitingMs: 50, onWait });
    expect(said).toEqual([join(root, 'lock')]);
  });
});

describe('installPackages', () => {
  const lockOf = (packages: object) => JSON.stringify({ lockfileVersion: 3, packages });
  const one = { 'node_modules/one': { version: '1.0.0', integrity: 'sha512-one' } };
  const optional = {
    'node_modules/elsewhere': { version: '1.0.0', integrity: 'sha512-else', optional: true },
  };
  let installs: number;
  const install = () => {
    installs += 1;
    write('node_modules/.package-lock.json', lockOf(one));
    return Promise.resolve();
  };

  beforeEach(() => {
    installs = 0;
    write('package.json', '{}');
    write('package-lock.json', lockOf({ '': {}, ...one, ...optional }));
  });

  it('installs once, and again when the lock file says something else', async () => {
    await installPackages(root, install);
    await installPackages(root, install);
    expect(installs).toBe(1);
    write(
      'package-lock.json',
      lockOf({ '': {}, 'node_modules/one': { version: '2.0.0', integrity: 'sha512-two' } }),
    );
    await installPackages(root, install);
    expect(installs).toBe(2);
  });

  it('takes what somebody has installed by hand, without what is for other machines', async () => {
    write('node_modules/.package-lock.json', lockOf(one));
    await installPackages(root, install);
    expect(installs).toBe(0);
  });

  it.each([
    ['nothing is installed', undefined],
    ['a package is missing', {}],
    ['a version differs', { 'node_modules/one': { version: '1.0.1', integrity: 'sha512-one' } }],
    ['the content differs', { 'node_modules/one': { version: '1.0.0', integrity: 'sha512-other' } }],
    ['there is one too many', { ...one, 'node_modules/two': { version: '1.0.0', integrity: 'sha512-two' } }],
  ])('is not content when %s', (_, installed) => {
    if (installed) write('node_modules/.package-lock.json', lockOf(installed));
    expect(isInstalledAlready(root)).toBe(false);
  });

  it('leaves no mark when installing fails', async () => {
    await expect(installPackages(root, () => Promise.reject(new Error('no network')))).rejects.toThrow(
      'no network',
    );
    await installPackages(root, install);
    expect(installs).toBe(1);
  });
});
