import { UniqueConstraintError } from 'sequelize';
import { ProblemError } from '../../http/ProblemError';
import { isAdminAddress } from '../../policies/roles';
import { audit } from '../audit/audit';
import type { ConsoleServices, Origin } from '../console/ConsoleServices';
import { hashOfToken, newSecretToken } from '../console/secretToken';
import type { SignedIn } from '../sessions/liveSession';
import { accountByEmail } from './findAccount';

const LINK_MINUTES = 60;

/** Mails a link to the new address, and a notice to the old one; nothing changes until the link is used. */
export async function askForNewEmail(
  services: ConsoleServices,
  { account }: SignedIn,
  newEmail: string,
  origin: Origin,
): Promise<void> {
  const { database, outbox, throttle, settings } = services;
  const accountId = account.id;
  const mayMail = await throttle.mayMail('new-address', newEmail);
  const token = newSecretToken();
  await database.transact(async (transaction) => {
    const taken = await accountByEmail(database, newEmail, transaction);
    await audit(database, origin, { event: 'email_change_asked', accountId }, transaction);
    await database.rows(
      "UPDATE email_tokens SET used_at = service_now() WHERE account_id = $1 AND purpose = 'email' AND used_at IS NULL",
      [accountId],
      transaction,
    );
    await database.rows(
      `INSERT INTO email_tokens (hash, account_id, purpose, new_email, expires_at)
       VALUES ($1, $2, 'email', $3, service_now() + make_interval(mins => $4))`,
      [token.hash, accountId, newEmail, LINK_MINUTES],
      transaction,
    );
    if (!mayMail) return;
    const shared = { accountId: null, to: newEmail, minutes: LINK_MINUTES };
    const link = `${settings.publicUrl}/confirm-email#${token.text}`;
    await outbox.put(
      taken
        ? { ...shared, kind: 'address_taken', params: {} }
        : { ...shared, kind: 'confirm_new_address', params: { link, minutes: LINK_MINUTES } },
      transaction,
    );
    const params = { newAddress: newEmail, link: `${settings.publicUrl}/reset` };
    await outbox.put({ accountId, to: account.email, kind: 'address_change_asked', params }, transaction);
  });
  outbox.nudge();
}

/**
 * Gives an account the address whose link was used, and tells the old one.
 * @throws ProblemError 410 where the link is used or over, or another account has the address by now
 */
export async function confirmNewEmail(
  { database, outbox, settings }: ConsoleServices,
  token: string,
  origin: Origin,
): Promise<{ email: string }> {
  try {
    return await database.transact(async (transaction) => {
      const [asked] = await database.rows<{ accountId: string; newEmail: string; oldEmail: string }>(
        `UPDATE email_tokens t SET used_at = service_now() FROM accounts a
         WHERE t.hash = $1 AND t.purpose = 'email' AND t.used_at IS NULL AND t.expires_at > service_now()
           AND a.id = t.account_id AND a.closed_at IS NULL
         RETURNING a.id AS "accountId", t.new_email AS "newEmail", a.email AS "oldEmail"`,
        [hashOfToken(token)],
        transaction,
      );
      if (!asked) throw new ProblemError('link_not_valid');
      const { accountId, newEmail, oldEmail } = asked;
      const isAdmin = isAdminAddress(newEmail, settings.adminEmail);
      await database.rows(
        `UPDATE accounts SET email = $2, verified_at = service_now(),
           roles = CASE WHEN $3 AND NOT 'admin' = ANY (roles) THEN roles || '{admin}' ELSE roles END WHERE id = $1`,
        [accountId, newEmail, isAdmin],
        transaction,
      );
      // A link for a new password that went to the old address must not outlive it.
      await database.rows(
        'UPDATE email_tokens SET used_at = service_now() WHERE account_id = $1 AND used_at IS NULL',
        [accountId],
        transaction,
      );
      const event = 'email_changed';
      await audit(
        database,
        origin,
        { event, accountId, details: { from: oldEmail, to: newEmail } },
        transaction,
      );
      const params = { newAddress: newEmail };
      await outbox.put({ accountId, to: oldEmail, kind: 'address_changed', params }, transaction);
      return { email: newEmail };
    });
  } catch (error) {
    if (error instanceof UniqueConstraintError)
      throw new ProblemError('link_not_valid', undefined, { cause: error });
    throw error;
  } finally {
    outbox.nudge();
  }
}
