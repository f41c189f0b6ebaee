import { audit } from '../audit/audit';
import type { ConsoleServices, Origin } from '../console/ConsoleServices';
import { endSessions } from '../sessions/endSessions';
import type { SignedIn } from '../sessions/liveSession';

/** Tables whose rows of an account are its holder's own, by `account_id`; they go with the account. */
const PERSONAL_TABLES = [
  'sessions',
  'email_tokens',
  'plan_requests',
  'quota_alerts',
  'kits',
  'saved_things',
] as const;

/**
 * Closes an account for good: its keys are revoked, what is personal is removed, and what the service has to keep
 * (how many units were used, that something happened) is kept without a person behind it.
 */
export async function closeAccount(
  { database, outbox }: ConsoleServices,
  { account }: SignedIn,
  origin: Origin,
): Promise<void> {
  const { id, email } = account;
  await database.transact(async (transaction) => {
    const run = (sql: string, bind: readonly unknown[] = [id]) => database.rows(sql, bind, transaction);
    await run('UPDATE api_keys SET revoked_at = service_now() WHERE account_id = $1 AND revoked_at IS NULL');
    await run(
      "UPDATE api_keys SET name = 'closed', allowed_sites = '{}', asked_as = NULL WHERE account_id = $1",
    );
    await run(`DELETE FROM request_log WHERE key_id IN (SELECT id FROM api_keys WHERE account_id = $1)`);
    await endSessions(database, { accountId: id }, 'closed', transaction);
    for (const table of PERSONAL_TABLES) await run(`DELETE FROM ${table} WHERE account_id = $1`);
    await run('DELETE FROM sign_ups WHERE lower(email) = lower($1)', [email]);
    await run('DELETE FROM mail_outbox WHERE account_id = $1 OR lower(recipient) = lower($2)', [id, email]);
    await run(
      `UPDATE accounts SET email = 'closed-' || id || '@closed.invalid', name = 'Closed account',
         password_hash = NULL, roles = '{}', closed_at = service_now() WHERE id = $1`,
    );
    await audit(database, origin, { event: 'account_closed', accountId: id }, transaction);
    await run('SELECT audit_forget($1)');
    await outbox.put({ accountId: id, to: email, kind: 'account_closed', params: {} }, transaction);
  });
  outbox.nudge();
}
