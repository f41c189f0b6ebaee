import { availableParallelism } from 'node:os';
import { buildDocuments } from '../openapi/writeDocuments';
import { staleDocuments } from './support/openapiFiles';
import { runTool, type Verdict } from './support/runTool';

type Check = { name: string; run: () => Promise<Verdict> };

// The slowest first, so that the quick ones fill the gaps.
const checks: Check[] = [
  { name: 'types', run: () => runTool('vue-tsc', 'vue-tsc', ['--noEmit', '--project', '.']) },
  { name: 'lint and import rules', run: () => runTool('eslint', 'eslint', ['.', '--max-warnings=0']) },
  { name: 'unused code', run: () => runTool('knip', 'knip', ['--no-progress']) },
  { name: 'formatting', run: () => runTool('prettier', 'prettier', ['--check', '.', '--log-level=warn']) },
  { name: 'OpenAPI documents', run: checkDocuments },
];

async function checkDocuments(): Promise<Verdict> {
  const stale = staleDocuments(await buildDocuments());
  const output = stale.map((name) => `${name} is not what the code says; run: npm run openapi`).join('\n');
  return { passed: stale.length === 0, output };
}

/** `npm run check`: everything that can be told without running the service. */
export async function main(): Promise<void> {
  const waiting = [...checks];
  const failed: string[] = [];
  const work = async () => {
    for (let check = waiting.shift(); check; check = waiting.shift()) {
      if (!(await report(check))) failed.push(check.name);
    }
  };
  await Promise.all(Array.from({ length: Math.min(2, availableParallelism()) }, work));
  process.stdout.write(failed.length > 0 ? `Failed: ${failed.join(', ')}\n` : 'All checks passed\n');
  process.exitCode = failed.length > 0 ? 1 : 0;
}

async function report({ name, run }: Check): Promise<boolean> {
  const startedMs = performance.now();
  const { passed, output } = await run();
  const seconds = ((performance.now() - startedMs) / 1000).toFixed(1).padStart(5);
  process.stdout.write(`${passed ? 'passed' : 'FAILED'} ${seconds} s  ${name}\n`);
  if (!passed) process.stdout.write(`${output.trimEnd()}\n`);
  return passed;
}
