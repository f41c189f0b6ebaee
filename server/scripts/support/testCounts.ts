import { existsSync, readFileSync } from 'node:fs';
import type { Counts, CountsByKind } from './testSettings';

export function readCounts(path: string): CountsByKind {
  return existsSync(path) ? (JSON.parse(readFileSync(path, 'utf8')) as CountsByKind) : {};
}

/** A table of what ran, and as its last line alone the two numbers that others look for. */
export function countLines(byKind: CountsByKind): string[] {
  const kinds = Object.entries(byKind).sort(([a], [b]) => a.localeCompare(b));
  const width = Math.max(0, ...kinds.map(([kind]) => kind.length));
  const rows = kinds.map(([kind, counts]) => `  ${kind.padEnd(width)}  ${described(counts)}`);
  const total = totalOf(byKind);
  return [...rows, `${total.passed} passed, ${total.failed} failed`];
}

export function totalOf(byKind: CountsByKind): Counts {
  const sum = (name: keyof Counts) =>
    Object.values(byKind).reduce((total, counts) => total + counts[name], 0);
  return { passed: sum('passed'), failed: sum('failed'), skipped: sum('skipped') };
}

function described({ passed, failed, skipped }: Counts): string {
  const parts = [`${String(passed).padStart(5)} passed`];
  if (failed > 0) parts.push(`${failed} failed`);
  if (skipped > 0) parts.push(`${skipped} skipped`);
  return parts.join(', ');
}
