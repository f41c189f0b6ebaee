import { createHash, randomBytes } from 'node:crypto';

export interface SecretToken {
  /** What its holder gets: 256 random bits. */
  readonly text: string;
  /** What is stored. */
  readonly hash: Buffer;
}

/** The stored form of a token; a fast hash is right, since there are 256 random bits behind it. */
export function hashOfToken(text: string): Buffer {
  return createHash('sha256').update(text).digest();
}

export function newSecretToken(prefix = ''): SecretToken {
  const text = prefix + randomBytes(32).toString('base64url');
  return { text, hash: hashOfToken(text) };
}
