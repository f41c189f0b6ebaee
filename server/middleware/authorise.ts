import { createHash } from 'node:crypto';
import type { IncomingMessage } from 'node:http';
import { ProblemError } from '../http/ProblemError';
import { isConsolePage } from '../policies/ownPage';
import { keyMissing, keyMistyped, passElsewhere } from '../policies/refusals';
import { kindOfKey } from '../services/keys/keyText';

/** A call's key as far as it can be judged without the database. */
export interface Credentials {
  readonly keyHash: Buffer;
  /** The page's site, where the caller is a browser page of another site than the console's own. */
  readonly site: string | null;
  /** A bearer of the try page, which stands for a key. */
  readonly isPass: boolean;
  /** Why the call is refused whatever the key may do; its key is looked up all the same, so that its log tells. */
  readonly refusal?: ProblemError;
}

/**
 * Reads the key of a call; a typing error is found by its checksum.
 * @throws ProblemError 401 without a key or with one that can't be, 403 for a pass elsewhere
 */
export function authorise(request: IncomingMessage, ownOrigin: string): Credentials {
  const header = request.headers.authorization;
  if (header === undefined) throw keyMissing();
  const key = header.slice(0, 7).toLowerCase() === 'bearer ' ? header.slice(7).trim() : '';
  if (key === '') throw keyMissing();
  const kind = kindOfKey(key);
  if (kind === null) throw keyMistyped();
  const origin = request.headers.origin ?? null;
  const site = origin === ownOrigin ? null : origin;
  const isPass = kind === 'pass';
  if (isPass && !isConsolePage(request.headers, ownOrigin)) throw passElsewhere();
  const keyHash = createHash('sha256').update(key).digest();
  const isInBrowser = kind === 'server' && site !== null;
  const refusal = isInBrowser ? new ProblemError('server_key_in_browser') : undefined;
  return { keyHash, site: kind === 'page' ? origin : null, isPass, refusal };
}
