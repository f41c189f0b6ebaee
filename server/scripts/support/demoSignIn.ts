import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

const path = (dataFolder: string) => join(dataFolder, 'sign-in.json');

/** How to sign in to the demo scenario is known when it is seeded, and wanted at every later start. */
export function rememberSignIn(dataFolder: string, lines: readonly string[]): void {
  writeFileSync(path(dataFolder), JSON.stringify(lines), { mode: 0o600 });
}

export function rememberedSignIn(dataFolder: string): string[] {
  return existsSync(path(dataFolder)) ? (JSON.parse(readFileSync(path(dataFolder), 'utf8')) as string[]) : [];
}
