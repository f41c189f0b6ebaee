import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { contentHash } from './contentHash.mjs';
import { runProgram } from './runNode.mjs';

const STAMP = 'node_modules/.evenfall-installed';

/** Installs what package-lock.json names unless that was done already; the packages in use need no install script. */
export async function installPackages(root, install = npmCi) {
  const wanted = contentHash(root, ['package.json', 'package-lock.json']);
  const stamp = join(root, STAMP);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  if (!isInstalledAlready(root)) {
    process.stderr.write('Installing the npm packages\n');
    await install(root);
  }
  mkdirSync(join(root, 'node_modules'), { recursive: true });
  writeFileSync(stamp, wanted);
}

function npmCi(root) {
  const flags = ['--include=dev', '--ignore-scripts', '--no-audit', '--no-fund', '--loglevel=error'];
  return runProgram('npm', ['ci', ...flags], { cwd: root });
}

/** Whether somebody has run npm by hand: npm leaves a list of what it installed, which must say what the lock says. */
export function isInstalledAlready(root) {
  const wanted = packagesOf(join(root, 'package-lock.json'));
  const installed = packagesOf(join(root, 'node_modules', '.package-lock.json'));
  if (!wanted || !installed || Object.keys(installed).some((path) => !wanted[path])) return false;
  return Object.entries(wanted).every(([path, { version, integrity, optional }]) => {
    const found = installed[path];
    if (path === '' || (!found && optional)) return true;
    return found?.version === version && found?.integrity === integrity;
  });
}

function packagesOf(path) {
  try {
    return JSON.parse(readFileSync(path, 'utf8')).packages;
  } catch {
    return undefined;
  }
}
