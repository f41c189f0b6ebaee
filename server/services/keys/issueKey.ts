import pg from 'pg';
import { hashOfKey, newKey, shownPartsOf } from './keyText';

export interface OperatorsKey {
  readonly account: string;
  readonly name: string;
  readonly units?: number;
  readonly rate?: number;
}

const ACCOUNT = `
INSERT INTO accounts (email, name, roles, verified_at) VALUES ($1, $2, '{developer}', service_now())
ON CONFLICT (lower(email)) DO UPDATE SET updated_at = service_now()
RETURNING id`;
const OVERRIDES = `
UPDATE accounts SET own_units_per_month = coalesce($2, own_units_per_month),
  own_rate_per_second = coalesce($3, own_rate_per_second) WHERE id = $1`;
const KEY = `
INSERT INTO api_keys (account_id, kind, name, hash, shown_prefix, last_four, claimed_at)
VALUES ($1, 'server', $2, $3, $4, $5, service_now())`;

/**
 * Makes one server key from the operator's command line, and the account if there is none. The operator is the
 * owner there, so the key is given back whole; it is stored as a hash only.
 */
export async function issueKeyForOperator(ownerUrl: string, wish: OperatorsKey): Promise<string> {
  const client = new pg.Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    await client.query('BEGIN');
    const name = wish.account.split('@')[0] || wish.account;
    const { rows } = await client.query<{ id: string }>(ACCOUNT, [wish.account, name]);
    const accountId = rows[0]?.id;
    if (wish.units !== undefined || wish.rate !== undefined)
      await client.query(OVERRIDES, [accountId, wish.units ?? null, wish.rate ?? null]);
    const key = newKey('server');
    const { shownPrefix, lastFour } = shownPartsOf(key);
    await client.query(KEY, [accountId, wish.name, hashOfKey(key), shownPrefix, lastFour]);
    await client.query('COMMIT');
    return key;
  } finally {
    await client.end();
  }
}
