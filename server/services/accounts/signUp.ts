import { ProblemError } from '../../http/ProblemError';
import { isAdminAddress, type ChosenRole } from '../../policies/roles';
import { audit } from '../audit/audit';
import type { ConsoleServices, Origin } from '../console/ConsoleServices';
import { hashOfToken, newSecretToken } from '../console/secretToken';
import { accountByEmail } from './findAccount';

const LINK_MINUTES = 60;

export interface SignUpWish {
  readonly email: string;
  readonly name: string;
  readonly password: string;
  readonly roles: readonly ChosenRole[];
}

/**
 * Notes a wish for an account and mails a link that makes it true. For an address that has an account already the
 * same is done, but the mail says so and nobody gets the link: who asks can't tell the two apart.
 */
export async function signUp(services: ConsoleServices, wish: SignUpWish): Promise<void> {
  const { database, hasher, outbox, throttle, settings } = services;
  const { email, name, password, roles } = wish;
  const mayMail = await throttle.mayMail('sign-up', email);
  const passwordHash = await hasher.hash(password);
  const token = newSecretToken();
  await database.transact(async (transaction) => {
    const known = await accountByEmail(database, email, transaction);
    await database.rows(
      `INSERT INTO sign_ups (hash, email, name, password_hash, roles, expires_at)
       VALUES ($1, $2, $3, $4, $5, service_now() + make_interval(mins => $6))`,
      [token.hash, email, name, passwordHash, roles, LINK_MINUTES],
      transaction,
    );
    if (!mayMail) return;
    const link = `${settings.publicUrl}/verify#${token.text}`;
    const shared = { to: known?.email ?? email, minutes: LINK_MINUTES, accountId: known?.id ?? null };
    await outbox.put(
      known
        ? { ...shared, kind: 'already_registered', params: { link: `${settings.publicUrl}/reset` } }
        : { ...shared, kind: 'confirm_address', params: { link, name, minutes: LINK_MINUTES } },
      transaction,
    );
  });
  outbox.nudge();
}

/**
 * Makes the account that a link was sent for; its other links end with it.
 * @throws ProblemError 410 where the link is used, over, or the address has an account by now
 */
export async function confirmSignUp(
  { database, settings }: ConsoleServices,
  token: string,
  origin: Origin,
): Promise<{ email: string }> {
  const email = await database.transact(async (transaction) => {
    const [wish] = await database.rows<{
      email: string;
      name: string;
      password_hash: string;
      roles: string[];
    }>(
      'DELETE FROM sign_ups WHERE hash = $1 AND expires_at > service_now() RETURNING email, name, password_hash, roles',
      [hashOfToken(token)],
      transaction,
    );
    if (!wish) return null;
    const isAdmin = isAdminAddress(wish.email, settings.adminEmail);
    const [made] = await database.rows<{ id: string }>(
      `INSERT INTO accounts (email, name, password_hash, roles, verified_at) VALUES ($1, $2, $3, $4, service_now())
       ON CONFLICT (lower(email)) DO NOTHING RETURNING id`,
      [wish.email, wish.name, wish.password_hash, isAdmin ? [...wish.roles, 'admin'] : wish.roles],
      transaction,
    );
    await database.rows('DELETE FROM sign_ups WHERE lower(email) = lower($1)', [wish.email], transaction);
    if (!made) return null;
    const details = { roles: wish.roles };
    await audit(database, origin, { event: 'signed_up', accountId: made.id, details }, transaction);
    if (isAdmin) await audit(database, origin, { event: 'admin_granted', accountId: made.id }, transaction);
    return wish.email;
  });
  if (email === null) throw new ProblemError('link_not_valid');
  return { email };
}
