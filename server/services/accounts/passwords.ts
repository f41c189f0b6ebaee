import { ProblemError } from '../../http/ProblemError';
import { audit } from '../audit/audit';
import type { ConsoleServices, Origin, Transaction } from '../console/ConsoleServices';
import { hashOfToken, newSecretToken } from '../console/secretToken';
import { endSessions } from '../sessions/endSessions';
import { accountByEmail } from './findAccount';

const LINK_MINUTES = 30;

/**
 * Mails a link for a new password; an address without an account gets a mail that says so. The same statements
 * run for both, and who asks can't tell the two apart. However often it is asked, the old password goes on working.
 */
export async function askForPassword(
  services: ConsoleServices,
  email: string,
  origin: Origin,
): Promise<void> {
  const { database, outbox, throttle, settings } = services;
  const mayMail = await throttle.mayMail('reset', email);
  const token = newSecretToken();
  await database.transact(async (transaction) => {
    const account = await accountByEmail(database, email, transaction);
    const accountId = account?.id ?? null;
    await audit(database, origin, { event: 'password_asked', actorId: null, accountId }, transaction);
    if (!mayMail) return;
    await database.rows(
      `INSERT INTO email_tokens (hash, account_id, purpose, expires_at)
       VALUES ($1, $2, 'reset', service_now() + make_interval(mins => $3))`,
      [token.hash, accountId, LINK_MINUTES],
      transaction,
    );
    const shared = { accountId, to: account?.email ?? email, minutes: LINK_MINUTES };
    const link = `${settings.publicUrl}/reset#${token.text}`;
    await outbox.put(
      account
        ? { ...shared, kind: 'set_password', params: { link, minutes: LINK_MINUTES } }
        : { ...shared, kind: 'no_account', params: { link: `${settings.publicUrl}/sign-up` } },
      transaction,
    );
  });
  outbox.nudge();
}

interface LinkOwner {
  readonly id: string;
  readonly email: string;
  readonly name: string;
}

/** Whose link for a new password this is. @throws ProblemError 410 where it is used or over */
export async function ownerOfLink({ database }: ConsoleServices, token: string): Promise<LinkOwner> {
  const [owner] = await database.rows<LinkOwner>(
    `SELECT a.id, a.email, a.name FROM email_tokens t JOIN accounts a ON a.id = t.account_id
     WHERE t.hash = $1 AND t.purpose = 'reset' AND t.used_at IS NULL AND t.expires_at > service_now()
       AND a.closed_at IS NULL`,
    [hashOfToken(token)],
  );
  if (!owner) throw new ProblemError('link_not_valid');
  return owner;
}

/** Sets the password of an account, ends its sessions but the one given, and says so by mail. */
async function setPassword(
  { database, outbox, settings }: ConsoleServices,
  change: { owner: LinkOwner; passwordHash: string; origin: Origin; keepSession?: string },
  transaction: Transaction,
): Promise<void> {
  const { owner, passwordHash, origin, keepSession } = change;
  await database.rows(
    'UPDATE accounts SET password_hash = $2 WHERE id = $1',
    [owner.id, passwordHash],
    transaction,
  );
  // Whatever links are still about were asked for under the old password.
  await database.rows(
    'UPDATE email_tokens SET used_at = service_now() WHERE account_id = $1 AND used_at IS NULL',
    [owner.id],
    transaction,
  );
  const which = { accountId: owner.id, except: keepSession };
  const ended = await endSessions(database, which, 'password', transaction);
  const details = { sessionsEnded: ended.length };
  const actorId = keepSession === undefined ? null : owner.id;
  const event = 'password_changed';
  await audit(database, origin, { event, accountId: owner.id, actorId, details }, transaction);
  const params = { link: `${settings.publicUrl}/reset` };
  await outbox.put({ accountId: owner.id, to: owner.email, kind: 'password_changed', params }, transaction);
}

/** Sets a new password by a link, which works once. Nobody is signed in by it. */
export async function setPasswordByLink(
  services: ConsoleServices,
  link: { token: string; password: string; owner: LinkOwner },
  origin: Origin,
): Promise<void> {
  const { database, hasher, outbox } = services;
  const passwordHash = await hasher.hash(link.password);
  await database.transact(async (transaction) => {
    const [used] = await database.rows(
      `UPDATE email_tokens SET used_at = service_now()
       WHERE hash = $1 AND purpose = 'reset' AND used_at IS NULL AND expires_at > service_now() RETURNING hash`,
      [hashOfToken(link.token)],
      transaction,
    );
    if (!used) throw new ProblemError('link_not_valid');
    await setPassword(services, { owner: link.owner, passwordHash, origin }, transaction);
  });
  outbox.nudge();
}

/** Changes the password of who is signed in, and ends the other sessions. */
export async function changePassword(
  services: ConsoleServices,
  change: { owner: LinkOwner; password: string; sessionId: string },
  origin: Origin,
): Promise<void> {
  const passwordHash = await services.hasher.hash(change.password);
  const { owner, sessionId: keepSession } = change;
  await services.database.transact((transaction) =>
    setPassword(services, { owner, passwordHash, origin, keepSession }, transaction),
  );
  services.outbox.nudge();
}
