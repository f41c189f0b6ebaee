import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { runProgram } from '../boot/runNode.mjs';
import { PeopleError } from './PeopleError';
import { say } from './say';

const environment = {
  DEBIAN_FRONTEND: 'noninteractive',
  LC_ALL: 'C.UTF-8',
  PATH: '/usr/sbin:/usr/bin:/sbin:/bin',
};
const aptOptions = ['-q', '-y', '-o', 'DPkg::Lock::Timeout=300', '-o', 'Dpkg::Use-Pty=0'];

function rootEnvironment(): Record<string, string> {
  const names = ['http_proxy', 'https_proxy', 'no_proxy', 'HTTP_PROXY', 'HTTPS_PROXY', 'NO_PROXY'];
  const proxies = names.flatMap((name) => (process.env[name] ? [[name, process.env[name]] as const] : []));
  return { ...environment, ...Object.fromEntries(proxies) };
}

/** What to put before a command so that it runs as root: nothing, sudo where it asks nothing, or null. */
export function rootPrefix(): string[] | null {
  if (process.getuid?.() === 0) return [];
  const sudo = spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' });
  if (sudo.status !== 0) return null;
  return ['sudo', '-n', 'env', ...Object.entries(rootEnvironment()).map((pair) => pair.join('='))];
}

export async function runAsRoot(prefix: readonly string[], command: readonly string[]): Promise<void> {
  const [program, ...args] = [...prefix, ...command];
  if (!program) throw new Error('There is no command to run');
  // Interrupting dpkg half-way would leave the machine's package system in need of repair.
  await runProgram(program, args, { detached: true, env: rootEnvironment() });
}

/** Installs packages of Debian's if this user may; `otherwise` tells what to do by hand where that can't be done. */
export async function installDebianPackages(packages: readonly string[], otherwise: string): Promise<void> {
  const prefix = existsSync('/usr/bin/apt-get') ? rootPrefix() : null;
  if (!prefix) throw new PeopleError(otherwise);
  say(`Installing ${packages.join(' and ')} from Debian's packages`);
  const install = ['apt-get', 'install', ...aptOptions, '--no-install-recommends', ...packages];
  const update = ['apt-get', 'update', ...aptOptions];
  try {
    if (!hasPackageLists()) await runAsRoot(prefix, update);
    await runAsRoot(prefix, install).catch(async () => {
      // The usual reason is that the lists are old and name versions that are gone.
      await runAsRoot(prefix, update);
      await runAsRoot(prefix, install);
    });
  } catch (error) {
    throw new PeopleError(`${error instanceof Error ? error.message : String(error)}\n${otherwise}`);
  }
}

function hasPackageLists(): boolean {
  const folder = '/var/lib/apt/lists';
  return existsSync(folder) && readdirSync(folder).some((name) => /_Packages(\.\w+)?$/.test(name));
}
