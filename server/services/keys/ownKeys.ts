import { ProblemError } from '../../http/ProblemError';
import type { ConsoleDatabase, Transaction } from '../../models/ConsoleDatabase';
import type { KeyRow } from '../../presenters/apiKey';

export interface OwnKey extends KeyRow {
  readonly claimedAt: Date | null;
  /** The database's clock as it read the key. */
  readonly now: Date;
}

const SHOWN = 500;

const SELECT = `
SELECT k.id, k.kind, k.name, k.shown_prefix AS "shownPrefix", k.last_four AS "lastFour", k.scopes,
  k.monthly_cap::float8 AS "monthlyCap", k.created_at AS "createdAt", k.expires_at AS "expiresAt",
  k.claimed_at AS "claimedAt", k.revoked_at AS "revokedAt", k.replaced_by AS "replacedBy",
  use.last AS "lastUsedAt", coalesce(use.month, 0)::float8 AS "usedThisMonth", service_now() AS now
FROM api_keys k LEFT JOIN LATERAL (
  SELECT max(p.updated_at) AS last, sum(p.used) FILTER (WHERE p.month = month_of(service_now())) AS month
  FROM key_periods p WHERE p.key_id = k.id) use ON true
WHERE k.account_id = $1`;

/** The keys of an account, the newest first. */
export function ownKeys(database: ConsoleDatabase, accountId: string): Promise<OwnKey[]> {
  return database.rows<OwnKey>(`${SELECT} ORDER BY k.created_at DESC, k.id LIMIT ${SHOWN}`, [accountId]);
}

/** One key of an account. @throws ProblemError 404 where the account has no such key, whoever else may have it */
export async function ownKey(
  database: ConsoleDatabase,
  accountId: string,
  id: string,
  transaction?: Transaction,
): Promise<OwnKey> {
  const lock = transaction ? ' FOR UPDATE OF k' : '';
  const [key] = await database.rows<OwnKey>(`${SELECT} AND k.id = $2${lock}`, [accountId, id], transaction);
  if (!key) throw new ProblemError('not_found');
  return key;
}
