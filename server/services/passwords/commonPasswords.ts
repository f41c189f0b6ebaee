import { createHash } from 'node:crypto';
import list from './commonPasswords.txt?raw';

/**
 * The 3,000 most used passwords of 15 characters and more, in the order of the OWASP SecLists project's list of
 * ten million (CC BY-SA 3.0), folded; kept as the first 64 bits of their SHA-256, since nobody needs to read them.
 */
const common = new Set(list.split('\n').filter((line) => line !== ''));

/** Whether a folded password is among the most used ones. */
export function isCommonPassword(folded: string): boolean {
  return common.has(createHash('sha256').update(folded).digest().subarray(0, 8).toString('base64url'));
}
