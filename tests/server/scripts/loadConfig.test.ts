import { mkdtempSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import { ConfigError } from '../../../server/config';
import { commandConfig, keptSecret, serviceConfig } from '../../../server/scripts/support/loadConfig';

const given = 'a secret of the operator, long enough';

it('keeps one secret for a data folder, which no other user can read', () => {
  const folders = ['a', 'b'].map((name) => mkdtempSync(join(tmpdir(), `evenfall-secret-${name}-`)));
  const [secret, other] = folders.map((folder) => keptSecret(folder));
  expect(keptSecret(folders[0] ?? '')).toBe(secret);
  expect(other).not.toBe(secret);
  expect(secret?.length).toBeGreaterThanOrEqual(32);
  expect(statSync(join(folders[0] ?? '', 'session-secret')).mode & 0o077).toBe(0);
  for (const folder of folders) rmSync(folder, { recursive: true });
});

it('starts no production service on a secret that nobody gave, while operators’ commands need none', () => {
  expect(() => serviceConfig({ NODE_ENV: 'production' })).toThrow(ConfigError);
  expect(serviceConfig({ NODE_ENV: 'production', SESSION_SECRET: given }).sessionSecret).toBe(given);
  expect(commandConfig({ NODE_ENV: 'production' }).mode).toBe('production');
});
