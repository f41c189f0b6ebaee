import { createHash, randomBytes } from 'node:crypto';
import { crc32 } from 'node:zlib';

/**
 * A server key is for programs on a server, a page key for one widget on listed sites. A pass stands for a server
 * key on the console's own try page, for ten minutes.
 */
export type KeyKind = 'server' | 'page' | 'pass';

const DIGITS = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz';
const RANDOM_LENGTH = 32;
const CHECKSUM_LENGTH = 6;
const FORM = /^evenfall_(server|page|pass)_([0-9A-Za-z]{32})([0-9A-Za-z]{6})$/;

/** What secret scanners may look for; the checksum tells a key from a word of the same shape. */
export const KEY_PATTERN = 'evenfall_(server|page|pass)_[0-9A-Za-z]{38}';

/** Base-62 digits, each equally likely: bytes past the last full round of 62 are thrown away. */
function randomDigits(length: number): string {
  let text = '';
  while (text.length < length) {
    for (const byte of randomBytes(2 * length)) {
      if (byte < 248 && text.length < length) text += DIGITS[byte % 62];
    }
  }
  return text;
}

/** CRC-32 of everything before it, in six base-62 digits. It finds typing errors; it is no security. */
function checksumOf(text: string): string {
  let rest = crc32(text);
  let digits = '';
  for (let i = 0; i < CHECKSUM_LENGTH; i++) {
    digits = DIGITS[rest % 62] + digits;
    rest = Math.floor(rest / 62);
  }
  return digits;
}

/** A new key: about 190 random bits (32 base-62 digits) and a checksum. */
export function newKey(kind: KeyKind): string {
  const body = `evenfall_${kind}_${randomDigits(RANDOM_LENGTH)}`;
  return body + checksumOf(body);
}

/** The kind of a well-formed key; null for a typing error, without asking the database. */
export function kindOfKey(key: string): KeyKind | null {
  const match = FORM.exec(key);
  if (!match) return null;
  const body = key.slice(0, -CHECKSUM_LENGTH);
  return checksumOf(body) === match[3] ? (match[1] as KeyKind) : null;
}

/**
 * SHA-256 of a key, as it is stored. A fast hash is right here: the key itself has about 190 random bits, so
 * there is nothing to guess (ASVS 5.0, 6.5.2: a standard hash from 112 bits up).
 */
export function hashOfKey(key: string): Buffer {
  return createHash('sha256').update(key).digest();
}

/** What may be shown of a key after it was shown whole once. */
export function shownPartsOf(key: string): { shownPrefix: string; lastFour: string } {
  return { shownPrefix: key.slice(0, key.lastIndexOf('_') + 5), lastFour: key.slice(-4) };
}
