import { spawn } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { root } from './place';

export type Verdict = { passed: boolean; output: string };

/** Where an installed package keeps the program of that name: started without npm's shell scripts, which cost time. */
function programPath(packageName: string, program: string): string {
  const manifest = join(root, 'node_modules', packageName, 'package.json');
  const { bin } = JSON.parse(readFileSync(manifest, 'utf8')) as { bin: string | Record<string, string> };
  const path = typeof bin === 'string' ? bin : bin[program];
  if (!path) throw new Error(`The package ${packageName} has no program ${program}`);
  return join(dirname(manifest), path);
}

/** Runs a package's program at the root and gathers what it says. */
export function runTool(packageName: string, program: string, args: readonly string[]): Promise<Verdict> {
  const child = spawn(process.execPath, [programPath(packageName, program), ...args], {
    cwd: root,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const parts: Buffer[] = [];
  child.stdout.on('data', (part: Buffer) => parts.push(part));
  child.stderr.on('data', (part: Buffer) => parts.push(part));
  return new Promise((resolve, reject) => {
    child.once('error', reject);
    child.once('close', (code) =>
      resolve({ passed: code === 0, output: Buffer.concat(parts).toString('utf8') }),
    );
  });
}
