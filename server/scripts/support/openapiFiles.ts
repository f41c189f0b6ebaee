import { existsSync, mkdirSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './place';

type Documents = Readonly<Record<string, string>>;

const folder = join(root, 'openapi');

export function writeDocuments(documents: Documents): string[] {
  mkdirSync(folder, { recursive: true });
  return Object.entries(documents).map(([name, text]) => {
    writeFileSync(join(folder, name), text);
    return `openapi/${name}`;
  });
}

/** The documents that are missing, differ from what the code says, or that the code no longer makes. */
export function staleDocuments(documents: Documents): string[] {
  const present = existsSync(folder) ? readdirSync(folder).filter((name) => /\.(json|ts)$/.test(name)) : [];
  const names = new Set([...present, ...Object.keys(documents)]);
  const isStale = (name: string) =>
    !present.includes(name) || readFileSync(join(folder, name), 'utf8') !== documents[name];
  return [...names].filter(isStale).map((name) => `openapi/${name}`);
}
