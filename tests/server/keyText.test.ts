import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { KEY_PATTERN, kindOfKey, newKey } from '../../server/services/keys/keyText';

const DIGITS = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz';
const KINDS = ['server', 'page', 'pass'] as const;

/** CRC-32 bit by bit, as RFC 1952, section 8, describes it (reflected polynomial edb88320). */
function crcBitByBit(text: string): number {
  let crc = 0xffffffff;
  for (const byte of Buffer.from(text)) {
    crc ^= byte;
    for (let bit = 0; bit < 8; bit += 1) crc = (crc >>> 1) ^ (crc & 1 ? 0xedb88320 : 0);
  }
  return (crc ^ 0xffffffff) >>> 0;
}

describe('the pattern for secret scanners', () => {
  const found = (text: string) => text.match(new RegExp(`\\b${KEY_PATTERN}\\b`, 'g'));

  it('is the one that the README tells', () => {
    expect(readFileSync('README.md', 'utf8')).toContain(`look for \`${KEY_PATTERN}\``);
  });

  it.each(KINDS)('finds a %s key wherever it was left', (kind) => {
    for (let i = 0; i < 50; i += 1) {
      const key = newKey(kind);
      const places = [
        key,
        `KEY="${key}"`,
        `Authorization: Bearer ${key}\r\n`,
        `https://x.example/?k=${key}&b=1`,
      ];
      for (const place of places) expect(found(place)).toEqual([key]);
    }
  });

  it('does not cry out about the words that documents have', () => {
    const words = [
      'evenfall_server_',
      'evenfall_server_YOUR_KEY',
      'evenfall_page_…',
      `evenfall_${'a'.repeat(38)}`,
      newKey('server').slice(0, -1),
    ];
    for (const word of words) expect(found(word)).toBeNull();
  });
});

describe('a key’s checksum', () => {
  // "123456789" and its CRC-32, cbf43926, are the usual check value of that sum.
  it('is computed here as everywhere', () => {
    expect(crcBitByBit('123456789')).toBe(0xcbf43926);
  });

  it('is the CRC-32 of all before it in base 62, as the README says', () => {
    for (const kind of KINDS) {
      const key = newKey(kind);
      const told = [...key.slice(-6)].reduce((sum, digit) => sum * 62 + DIGITS.indexOf(digit), 0);
      expect(told).toBe(crcBitByBit(key.slice(0, -6)));
    }
  });

  it('tells every typing error of one character, and of two neighbours that changed places', () => {
    const key = newKey('server');
    expect(kindOfKey(key)).toBe('server');
    for (let i = 'evenfall_server_'.length; i < key.length; i += 1) {
      for (const digit of DIGITS)
        if (digit !== key[i]) expect(kindOfKey(key.slice(0, i) + digit + key.slice(i + 1))).toBeNull();
      const [here = '', next = ''] = key.slice(i, i + 2);
      if (here !== next && next !== '')
        expect(kindOfKey(key.slice(0, i) + next + here + key.slice(i + 2))).toBeNull();
    }
  });
});
