import { hkdfSync } from 'node:crypto';

/** A 256-bit key for one purpose, from the service's secret: what signs sessions never encrypts mails. */
export function derivedKey(secret: string, purpose: string): Buffer {
  return Buffer.from(hkdfSync('sha256', secret, '', `evenfall ${purpose}`, 32));
}
