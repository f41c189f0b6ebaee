import { spawn } from 'node:child_process';
import { mkdirSync, rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { openTestCluster } from './cluster/testCluster';
import { buildClient } from './support/buildClient';
import { ensureChromium } from './support/ensureChromium';
import { ensureExamplePrograms } from './support/ensureExamplePrograms';
import { dataFolder, root } from './support/place';
import { ProcessRegistry } from './support/ProcessRegistry';
import { say } from './support/say';
import { needsOf, testFiles, type Needs } from './support/selectedTests';
import { stopSignal } from './support/stopSignal';
import { countLines, readCounts, totalOf } from './support/testCounts';
import { TEST_COUNTS, TEST_SETTINGS, type TestSettings } from './support/testSettings';

/** `npm test`: sets up what the tests need, runs them once, and ends with the counts. Arguments go to vitest. */
export async function main(args: readonly string[]): Promise<void> {
  const stop = stopSignal();
  const runFolder = join(dataFolder, 'test-runs', String(process.pid));
  const countsPath = `${runFolder}.counts.json`;
  mkdirSync(runFolder, { recursive: true });
  try {
    const code = await runWithNeeds(needsOf(testFiles(root), args), args, { stop, runFolder, countsPath });
    const counts = readCounts(countsPath);
    const { passed, failed } = totalOf(counts);
    if (code !== 0 && failed === 0) say(passed === 0 ? 'No test ran' : `vitest ended with code ${code}`);
    process.stdout.write(`\n${countLines(counts).join('\n')}\n`);
    process.exitCode = code === 0 && failed === 0 && passed > 0 ? 0 : code || 1;
  } finally {
    rmSync(runFolder, { recursive: true, force: true });
    rmSync(countsPath, { force: true });
  }
  process.exit();
}

type Run = { stop: AbortSignal; runFolder: string; countsPath: string };

async function runWithNeeds(needs: Needs, args: readonly string[], run: Run): Promise<number> {
  if (!needs.service) return runVitest(args, null, run);
  const registry = new ProcessRegistry(dataFolder, 'test');
  // One after the other: on two cores nothing is gained by doing them side by side.
  if (needs.examples) await ensureExamplePrograms();
  const chromium = needs.browser ? await ensureChromium() : null;
  // Only a browser looks at the console.
  const clientFolder = needs.browser ? await buildClient() : null;
  const { close, ...cluster } = await openTestCluster(dataFolder, registry);
  try {
    const serverFolder = dirname(fileURLToPath(import.meta.url));
    const { runFolder } = run;
    const settings = { ...cluster, serverFolder, clientFolder, chromium, runFolder, isWhole: needs.isWhole };
    return run.stop.aborted ? 130 : await runVitest(args, settings, run);
  } finally {
    await close();
    registry.leave();
  }
}

function runVitest(
  args: readonly string[],
  settings: TestSettings | null,
  { stop, countsPath }: Run,
): Promise<number> {
  const reporters = ['--reporter=default', '--reporter=./tests/support/CountsReporter.ts'];
  const child = spawn(process.execPath, ['node_modules/vitest/vitest.mjs', 'run', ...reporters, ...args], {
    cwd: root,
    stdio: ['ignore', 'inherit', 'inherit'],
    env: {
      ...process.env,
      NODE_ENV: 'test',
      [TEST_COUNTS]: countsPath,
      ...(settings ? { [TEST_SETTINGS]: JSON.stringify(settings) } : {}),
    },
  });
  stop.addEventListener('abort', () => child.kill('SIGTERM'));
  return new Promise((resolve, reject) => {
    child.once('error', reject);
    child.once('exit', (code) => resolve(code ?? 1));
  });
}
