import { createHash } from 'node:crypto';
import { ProblemError } from '../../http/ProblemError';
import { KEYS_MAX } from '../../policies/keyRules';
import { audit } from '../audit/audit';
import type { ConsoleServices, Origin, Transaction } from '../console/ConsoleServices';
import { hashOfKey, newKey, shownPartsOf } from './keyText';

export interface KeyWish {
  readonly name: string;
  readonly scopes: readonly string[];
  readonly monthlyCap: number | null;
  readonly expiresAt: string | null;
}

/** A key whole, which is shown now and never again. */
export interface FreshKey {
  readonly id: string;
  readonly key: string;
}

interface MadeBefore {
  readonly id: string;
  readonly askedHash: Buffer;
}

const INSERT = `
INSERT INTO api_keys (account_id, kind, name, hash, shown_prefix, last_four, claimed_at, scopes, monthly_cap, expires_at,
  asked_as, asked_hash)
VALUES ($1, 'server', $2, $3, $4, $5, service_now(), $6, $7, $8, $9, $10) RETURNING id`;

/** Stores a new server key of an account; only its hash stays. */
export async function insertKey(
  { database }: ConsoleServices,
  accountId: string,
  wish: KeyWish & { asked?: { name: string; hash: Buffer } | null },
  transaction: Transaction,
): Promise<FreshKey> {
  const key = newKey('server');
  const { shownPrefix, lastFour } = shownPartsOf(key);
  const { name, scopes, monthlyCap, expiresAt, asked = null } = wish;
  const own = [accountId, name, hashOfKey(key), shownPrefix, lastFour, scopes, monthlyCap, expiresAt];
  const bind = [...own, asked?.name ?? null, asked?.hash ?? null];
  const [row] = await database.rows<{ id: string }>(INSERT, bind, transaction);
  if (!row) throw new Error('no key was made');
  return { id: row.id, key };
}

function madeBefore({ id, askedHash }: MadeBefore, hash: Buffer): ProblemError {
  if (!askedHash.equals(hash)) {
    const detail = 'This Idempotency-Key was used for another key; take a new one.';
    const fault = { pointer: '/Idempotency-Key', code: 'used_before', detail };
    return new ProblemError('invalid_input', detail, { errors: [fault] });
  }
  const detail = `The key ${id} was made under this Idempotency-Key. It was shown then, and can't be shown again.`;
  return new ProblemError('already_made', detail, { headers: { Location: `/api/keys/${id}` } });
}

/**
 * Makes a server key.
 * @param idempotencyName the request's Idempotency-Key; a second request under it makes no second key
 * @throws ProblemError 409 where it was made before or there are too many
 */
export async function makeKey(
  services: ConsoleServices,
  accountId: string,
  wish: KeyWish,
  idempotencyName: string | null,
  origin: Origin,
): Promise<FreshKey> {
  const { database } = services;
  const hash = createHash('sha256').update(JSON.stringify(wish)).digest();
  return database.transact(async (transaction) => {
    // One at a time for an account, so that neither the number of keys nor a repeated request slips through.
    await database.rows('SELECT id FROM accounts WHERE id = $1 FOR UPDATE', [accountId], transaction);
    const [before] = await database.rows<MadeBefore>(
      'SELECT id, asked_hash AS "askedHash" FROM api_keys WHERE account_id = $1 AND asked_as = $2',
      [accountId, idempotencyName],
      transaction,
    );
    if (before) throw madeBefore(before, hash);
    const [count] = await database.rows<{ held: number }>(
      `SELECT count(*)::int AS held FROM api_keys WHERE account_id = $1 AND kind = 'server' AND revoked_at IS NULL
         AND (expires_at IS NULL OR expires_at > service_now())`,
      [accountId],
      transaction,
    );
    if ((count?.held ?? 0) >= KEYS_MAX)
      throw new ProblemError('too_many_keys', `An account may hold ${KEYS_MAX} keys that have not ended.`);
    const asked = idempotencyName === null ? null : { name: idempotencyName, hash };
    const fresh = await insertKey(services, accountId, { ...wish, asked }, transaction);
    const subject = { kind: 'key', id: fresh.id } as const;
    await audit(
      database,
      origin,
      { event: 'key_made', accountId, subject, details: { ...wish } },
      transaction,
    );
    return fresh;
  });
}
