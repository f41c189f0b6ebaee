import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';

// Functions of numbers and texts: these folders' tests need nothing but Node.
const PURE = ['tests/shared/', 'tests/src/'];
const IN_BROWSER = ['tests/browser/'];
const EXAMPLES = ['tests/examples/'];

export type Needs = { service: boolean; browser: boolean; examples: boolean; isWhole: boolean };

export function testFiles(root: string): string[] {
  const folder = join(root, 'tests');
  const names = existsSync(folder) ? readdirSync(folder, { recursive: true, encoding: 'utf8' }) : [];
  return names.filter((name) => name.endsWith('.test.ts')).map((name) => `tests/${name}`);
}

/** What has to be set up for the files that vitest's arguments select: it takes those whose path holds one of them. */
export function needsOf(files: readonly string[], args: readonly string[]): Needs {
  const filters = args.filter((arg) => !arg.startsWith('-')).map((arg) => arg.replace(/^\.\//, ''));
  const selected = files.filter(
    (file) => filters.length === 0 || filters.some((filter) => file.includes(filter)),
  );
  const startsWithOneOf = (file: string, folders: readonly string[]) =>
    folders.some((folder) => file.startsWith(folder));
  return {
    service: selected.some((file) => !startsWithOneOf(file, PURE)),
    browser: selected.some((file) => startsWithOneOf(file, IN_BROWSER)),
    examples: selected.some((file) => startsWithOneOf(file, EXAMPLES)),
    isWhole: args.length === 0,
  };
}
