import { writeFileSync } from 'node:fs';
import { relative } from 'node:path';
import type { Reporter, SerializedError, TestModule } from 'vitest/node';
import {
  TEST_COUNTS,
  TEST_SETTINGS,
  type Counts,
  type TestSettings,
} from '../../server/scripts/support/testSettings';
import { unexercised } from './unexercised';

/** Leaves for the runner how many tests passed and failed, by the folder that they are in. */
export default class CountsReporter implements Reporter {
  onTestRunEnd(modules: readonly TestModule[], unhandledErrors: readonly SerializedError[]): void {
    const path = process.env[TEST_COUNTS];
    if (!path) return;
    const byKind: Record<string, Counts> = {};
    for (const module of modules) add(byKind, kindOf(module), countsOf(module));
    if (unhandledErrors.length > 0)
      add(byKind, 'outside tests', { passed: 0, failed: unhandledErrors.length, skipped: 0 });
    const untried = untriedContract();
    if (untried.length > 0) {
      process.stdout.write(`\n${untried.join('\n')}\n`);
      add(byKind, 'contract', { passed: 0, failed: untried.length, skipped: 0 });
    }
    writeFileSync(path, JSON.stringify(byKind));
  }
}

/** What a whole run should have tried of the API's documents and did not. */
function untriedContract(): string[] {
  const settings = process.env[TEST_SETTINGS];
  return settings ? unexercised(JSON.parse(settings) as TestSettings) : [];
}

/** The one or two folders under tests/ that hold the file. */
function kindOf(module: TestModule): string {
  const folders = relative(process.cwd(), module.moduleId).split('/').slice(1, -1);
  return folders.slice(0, 2).join('/') || 'tests';
}

/** A file that can't be loaded, or a hook that fails outside any test, counts as a failure too. */
function countsOf(module: TestModule): Counts {
  const counts: Counts = { passed: 0, failed: 0, skipped: 0 };
  for (const test of module.children.allTests()) {
    const { state } = test.result();
    if (state === 'passed') counts.passed += 1;
    else if (state === 'failed') counts.failed += 1;
    else counts.skipped += 1;
  }
  const suites = [module, ...module.children.allSuites()];
  counts.failed += suites.filter((suite) => suite.errors().length > 0).length;
  if (!module.ok() && counts.failed === 0) counts.failed = 1;
  return counts;
}

function add(byKind: Record<string, Counts>, kind: string, more: Counts): void {
  const counts = (byKind[kind] ??= { passed: 0, failed: 0, skipped: 0 });
  counts.passed += more.passed;
  counts.failed += more.failed;
  counts.skipped += more.skipped;
}
