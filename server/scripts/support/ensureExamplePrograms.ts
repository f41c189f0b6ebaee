import { spawnSync } from 'node:child_process';
import { installDebianPackages } from './installDebianPackages';

/** The examples run with these; each is the name of its Debian package as well. */
const PROGRAMS = ['curl', 'python3'];

/** What the tests of the examples call, installed from Debian's packages where it is missing. */
export async function ensureExamplePrograms(): Promise<void> {
  const missing = PROGRAMS.filter((program) => spawnSync(program, ['--version'], { stdio: 'ignore' }).error);
  if (missing.length === 0) return;
  const otherwise = `The examples need ${missing.join(' and ')}, which this user may not install: run \`sudo apt-get install ${missing.join(' ')}\``;
  await installDebianPackages(missing, otherwise);
}
