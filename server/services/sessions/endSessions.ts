import type { EndReason } from '../../models/Session';
import type { ConsoleDatabase, Transaction } from '../../models/ConsoleDatabase';

interface Which {
  readonly accountId: string;
  /** This one alone; */
  readonly only?: string;
  /** or all but this one. */
  readonly except?: string;
}

/** Ends sessions of one account that have not ended yet; their ids. */
export async function endSessions(
  database: ConsoleDatabase,
  { accountId, only, except }: Which,
  reason: EndReason,
  transaction?: Transaction,
): Promise<string[]> {
  const rows = await database.rows<{ id: string }>(
    `UPDATE sessions SET ended_at = service_now(), end_reason = $4
     WHERE account_id = $1 AND ended_at IS NULL AND ($2::uuid IS NULL OR id = $2) AND ($3::uuid IS NULL OR id <> $3)
     RETURNING id`,
    [accountId, only ?? null, except ?? null, reason],
    transaction,
  );
  return rows.map(({ id }) => id);
}
