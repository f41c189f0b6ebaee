import { existsSync } from 'node:fs';
import { installDebianPackages } from './installDebianPackages';

const CHROMIUM = '/usr/bin/chromium';

/** Debian's Chromium for the browser tests, installed where it is missing. */
export async function ensureChromium(): Promise<string> {
  const otherwise =
    'Chromium is missing and this user may not install it: run `sudo apt-get install chromium`, or leave out tests/browser';
  if (!existsSync(CHROMIUM)) await installDebianPackages(['chromium'], otherwise);
  return CHROMIUM;
}
