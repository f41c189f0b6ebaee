import { ProblemError } from '../../http/ProblemError';
import { GRACES, mayChange, mayClaim, mayRevoke, mayRotate, type Grace } from '../../policies/keyRules';
import { audit } from '../audit/audit';
import type { ConsoleServices, Origin } from '../console/ConsoleServices';
import { hashOfKey, newKey, shownPartsOf } from './keyText';
import { insertKey, type FreshKey, type KeyWish } from './makeKey';
import { ownKey } from './ownKeys';

interface Which {
  readonly accountId: string;
  readonly keyId: string;
  readonly origin: Origin;
}

const settled = (detail: string) => new ProblemError('key_settled', detail);

/** Renames a key, or gives it other scopes, another cap or another expiry. */
export async function changeKey(
  { database }: ConsoleServices,
  { accountId, keyId, origin }: Which,
  change: Partial<KeyWish>,
): Promise<void> {
  await database.transact(async (transaction) => {
    const key = await ownKey(database, accountId, keyId, transaction);
    if (!mayChange(key, key.now))
      throw settled('A key that has ended, was replaced or is a widget’s stays as it is.');
    const before = {
      name: key.name,
      scopes: key.scopes,
      monthlyCap: key.monthlyCap,
      expiresAt: key.expiresAt?.toISOString() ?? null,
    };
    const after = { ...before, ...change };
    await database.rows(
      `UPDATE api_keys SET name = $2, scopes = $3, monthly_cap = $4, expires_at = $5,
         reminded_days = CASE WHEN expires_at IS DISTINCT FROM $5 THEN NULL ELSE reminded_days END WHERE id = $1`,
      [keyId, after.name, after.scopes, after.monthlyCap, after.expiresAt],
      transaction,
    );
    const subject = { kind: 'key', id: keyId } as const;
    await audit(
      database,
      origin,
      { event: 'key_changed', accountId, subject, details: { before, after } },
      transaction,
    );
  });
}

/** Makes the key that takes another's place; the old one works until the grace is over, or its own expiry. */
export async function rotateKey(
  services: ConsoleServices,
  { accountId, keyId, origin }: Which,
  grace: Grace,
): Promise<FreshKey> {
  const { database } = services;
  return database.transact(async (transaction) => {
    const key = await ownKey(database, accountId, keyId, transaction);
    if (!mayRotate(key, key.now))
      throw settled('Only a key that works and was not replaced yet can be rotated.');
    const expiresAt = key.expiresAt?.toISOString() ?? null;
    const wish = { name: key.name, scopes: key.scopes, monthlyCap: key.monthlyCap, expiresAt };
    const fresh = await insertKey(services, accountId, wish, transaction);
    await database.rows(
      `UPDATE api_keys SET replaced_by = $2,
         expires_at = least(expires_at, service_now() + make_interval(secs => $3)) WHERE id = $1`,
      [keyId, fresh.id, GRACES[grace]],
      transaction,
    );
    const subject = { kind: 'key', id: keyId } as const;
    const details = { replacedBy: fresh.id, grace };
    await audit(database, origin, { event: 'key_rotated', accountId, subject, details }, transaction);
    return fresh;
  });
}

/** Ends a key for good; every server process refuses it from its next batch of calls on. */
export async function revokeKey(
  { database }: ConsoleServices,
  { accountId, keyId, origin }: Which,
): Promise<void> {
  await database.transact(async (transaction) => {
    const key = await ownKey(database, accountId, keyId, transaction);
    if (!mayRevoke(key)) throw settled('A widget’s key ends with its widget.');
    if (key.revokedAt) return;
    await database.rows('UPDATE api_keys SET revoked_at = service_now() WHERE id = $1', [keyId], transaction);
    await database.rows('DELETE FROM key_passes WHERE key_id = $1', [keyId], transaction);
    const subject = { kind: 'key', id: keyId } as const;
    await audit(database, origin, { event: 'key_revoked', accountId, subject }, transaction);
  });
}

/** Generates a key that an administrator issued, once, for its owner alone. */
export async function claimKey(
  { database }: ConsoleServices,
  { accountId, keyId, origin }: Which,
): Promise<FreshKey> {
  return database.transact(async (transaction) => {
    const key = await ownKey(database, accountId, keyId, transaction);
    if (!mayClaim(key, key.now))
      throw settled('Only an issued key that nobody generated yet can be claimed.');
    const text = newKey('server');
    const { shownPrefix, lastFour } = shownPartsOf(text);
    await database.rows(
      'UPDATE api_keys SET hash = $2, shown_prefix = $3, last_four = $4, claimed_at = service_now() WHERE id = $1',
      [keyId, hashOfKey(text), shownPrefix, lastFour],
      transaction,
    );
    const subject = { kind: 'key', id: keyId } as const;
    await audit(database, origin, { event: 'key_claimed', accountId, subject }, transaction);
    return { id: keyId, key: text };
  });
}
