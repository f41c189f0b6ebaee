import type { ConsoleDatabase } from '../../models/ConsoleDatabase';
import { audit } from '../audit/audit';

/** The account whose confirmed address the operator named is an admin, also where it is older than the setting. */
export async function grantAdmin(database: ConsoleDatabase, adminEmail: string): Promise<void> {
  await database.transact(async (transaction) => {
    const rows = await database.rows<{ id: string }>(
      `UPDATE accounts SET roles = roles || '{admin}'
       WHERE lower(email) = lower($1) AND verified_at IS NOT NULL AND NOT 'admin' = ANY (roles) RETURNING id`,
      [adminEmail],
      transaction,
    );
    for (const { id } of rows)
      await audit(database, null, { event: 'admin_granted', actorId: null, accountId: id }, transaction);
  });
}
