import { ProblemError } from '../../http/ProblemError';
import { audit } from '../audit/audit';
import type { ConsoleServices, Origin } from '../console/ConsoleServices';
import type { AccessClaims } from '../sessions/accessToken';
import { beginSession, type GivenSession } from '../sessions/beginSession';
import { endSessions } from '../sessions/endSessions';
import { accountByEmail, isKnownPlace, type AccountRow } from './findAccount';

interface Credentials {
  readonly email: string;
  readonly password: string;
}

/**
 * Begins a session. An address without an account costs the same work and gets the same answer as a wrong password.
 * @param presented the session that the browser came with; a new sign-in takes its place
 * @throws ProblemError 401 where address and password don't fit, 403 for a blocked account, 429 while a delay lasts
 */
export async function signIn(
  services: ConsoleServices,
  { email, password }: Credentials,
  origin: Origin,
  presented: AccessClaims | null,
): Promise<{ given: GivenSession; account: AccountRow }> {
  const { database, hasher, throttle } = services;
  const { addressGroup } = origin;
  const attempt = {
    name: email,
    addressGroup,
    isKnownPlace: await isKnownPlace(database, email, addressGroup),
  };
  await throttle.admit(attempt);
  const account = await accountByEmail(database, email);
  const fits = await hasher.verify(password, account?.passwordHash ?? null);
  if (!account || !fits) {
    const accountId = account?.id ?? null;
    await audit(database, origin, { event: 'sign_in_failed', accountId, actorId: null });
    throw new ProblemError('credentials_wrong', undefined, {
      headers: { 'WWW-Authenticate': 'Session realm="evenfall"' },
    });
  }
  await throttle.succeeded(attempt);
  if (account.isBlocked) throw new ProblemError('account_blocked');
  const given = await database.transact(async (transaction) => {
    if (presented) {
      const which = { accountId: presented.accountId, only: presented.sessionId };
      await endSessions(database, which, 'replaced', transaction);
    }
    const begun = await beginSession(services, account.id, origin, transaction);
    const subject = { kind: 'session', id: begun.sessionId } as const;
    await audit(database, origin, { event: 'signed_in', accountId: account.id, subject }, transaction);
    return begun;
  });
  return { given, account };
}
