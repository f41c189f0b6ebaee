import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { TestSettings } from '../../server/scripts/support/testSettings';

interface Note {
  readonly document: string;
  readonly all: readonly string[];
  readonly exercised: readonly string[];
}

/**
 * What a whole run left untried: operations that no test called with success, and statuses of a document that
 * no test saw anywhere. A filtered run tries only a part, so nothing is asked of it.
 */
export function unexercised({ runFolder, isWhole }: Pick<TestSettings, 'runFolder' | 'isWhole'>): string[] {
  const folder = join(runFolder, 'contract');
  if (!isWhole || !existsSync(folder)) return [];
  const notes = readdirSync(folder).map(
    (file) => JSON.parse(readFileSync(join(folder, file), 'utf8')) as Note,
  );
  const documents = [...new Set(notes.map(({ document }) => document))];
  return documents.flatMap((name) => {
    const own = notes.filter(({ document }) => document === name);
    const all = [...new Set(own.flatMap((note) => note.all))];
    const tried = new Set(own.flatMap((note) => note.exercised));
    const operationOf = (entry: string) => entry.split(' ')[0];
    const statusOf = (entry: string) => entry.split(' ')[1];
    const operations = new Set(all.map(operationOf));
    for (const entry of tried) if (Number(statusOf(entry)) < 300) operations.delete(operationOf(entry));
    const statuses = new Set(all.map(statusOf));
    for (const entry of tried) statuses.delete(statusOf(entry));
    return [
      ...[...operations].map((operation) => `${name}: no test called ${operation} with success`),
      ...[...statuses].map((status) => `${name}: no test saw status ${status}`),
    ];
  });
}
