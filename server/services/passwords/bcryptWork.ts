import { createHash } from 'node:crypto';
import { compareSync, hashSync } from 'bcryptjs';
import { normalPassword } from '../../policies/passwordRules';

export type PasswordWork = { text: string } & ({ cost: number } | { hash: string });

/**
 * What bcrypt is given: 44 characters of base64 over a SHA-256 of the whole password, since bcrypt itself would
 * cut it after 72 bytes.
 */
export function preHash(password: string): string {
  return createHash('sha256').update(normalPassword(password), 'utf8').digest('base64');
}

/** Makes a hash, or compares with one. Takes a quarter of a second at cost 12: for worker threads and scripts. */
export function bcryptWork(work: PasswordWork): string | boolean {
  return 'hash' in work ? compareSync(work.text, work.hash) : hashSync(work.text, work.cost);
}
