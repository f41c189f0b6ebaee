import pg from 'pg';
import { issueKeyForOperator } from '../../server/services/keys/issueKey';

export interface Caller {
  readonly accountId: string;
  readonly keys: readonly string[];
}

/** Accounts, keys and their counts behind the service's back, as the role that owns the tables. */
export interface CountedDatabase {
  sql<R extends pg.QueryResultRow>(text: string, values?: readonly unknown[]): Promise<R[]>;
  /** A new account with so many server keys; units and rate are its own. */
  caller(options: { units: number; rate?: number; keys?: number }): Promise<Caller>;
  /** Units that the account used in this month. */
  used(caller: Caller): Promise<number>;
  /** Units that one key used in this month. */
  keyUsed(key: string): Promise<number>;
  deadlocks(): Promise<number>;
  close(): Promise<void>;
}

let callers = 0;

export function countedDatabase(ownerUrl: string): CountedDatabase {
  const pool = new pg.Pool({ connectionString: ownerUrl, max: 2 });
  pool.on('error', () => undefined);
  const sql = async <R extends pg.QueryResultRow>(text: string, values: readonly unknown[] = []) =>
    (await pool.query<R>(text, [...values])).rows;
  const numberOf = async (text: string, value: unknown): Promise<number> => {
    const [row] = await sql<{ n: string }>(text, [value]);
    return Number(row?.n ?? 0);
  };
  return {
    sql,
    caller: async ({ units, rate = 10_000, keys: count = 1 }) => {
      const account = `counted-${(callers += 1)}@example.org`;
      const keys: string[] = [];
      for (let i = 0; i < count; i += 1)
        keys.push(await issueKeyForOperator(ownerUrl, { account, name: `key ${i + 1}`, units, rate }));
      const [row] = await sql<{ id: string }>('SELECT id FROM accounts WHERE email = $1', [account]);
      return { accountId: row?.id ?? '', keys };
    },
    used: ({ accountId }) =>
      numberOf(
        'SELECT used AS n FROM quota_periods WHERE account_id = $1 AND month = month_of(service_now())',
        accountId,
      ),
    keyUsed: (key) =>
      numberOf(
        `SELECT p.used AS n FROM key_periods p JOIN api_keys k ON k.id = p.key_id
         WHERE k.hash = sha256(convert_to($1, 'UTF8')) AND p.month = month_of(service_now())`,
        key,
      ),
    deadlocks: () =>
      numberOf('SELECT deadlocks AS n FROM pg_stat_database WHERE datname = $1', databaseOf(ownerUrl)),
    close: () => pool.end(),
  };
}

const databaseOf = (address: string) => new URL(address).pathname.slice(1);
