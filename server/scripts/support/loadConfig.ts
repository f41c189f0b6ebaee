import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { readConfig, type Config } from '../../config';
import { dataFolder } from './place';

/** The settings of a service to be started: outside production with the secret that this data folder keeps. */
export function serviceConfig(env: NodeJS.ProcessEnv = process.env): Config {
  const isProduction = env.NODE_ENV === 'production';
  return readConfig(
    env.SESSION_SECRET || isProduction ? env : { ...env, SESSION_SECRET: keptSecret(dataFolder) },
  );
}

/** The settings of an operator's command, which opens no sessions and so needs no secret. */
export function commandConfig(env: NodeJS.ProcessEnv = process.env): Config {
  return readConfig({ ...env, SESSION_SECRET: env.SESSION_SECRET || newSecret() });
}

const newSecret = () => randomBytes(32).toString('base64url');

export function keptSecret(folder: string): string {
  const path = join(folder, 'session-secret');
  if (!existsSync(path)) {
    mkdirSync(folder, { recursive: true });
    writeFileSync(path, `${newSecret()}\n`, { mode: 0o600 });
  }
  return readFileSync(path, 'utf8').trim();
}
