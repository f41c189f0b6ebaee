import { ABSOLUTE_DAYS } from '../../policies/sessionLife';
import type { ConsoleServices, Origin, Transaction } from '../console/ConsoleServices';
import { newSecretToken } from '../console/secretToken';
import { signAccess } from './accessToken';

/** What a browser is given: an access token, and a refresh token unless another tab has it already. */
export interface GivenSession {
  readonly sessionId: string;
  readonly access: string;
  readonly accessEndsAt: Date;
  readonly refresh: string | null;
  readonly sessionEndsAt: Date;
}

/** A session of its own for each sign-in, with an id that nobody could have known before. */
export async function beginSession(
  { database, settings, now }: ConsoleServices,
  accountId: string,
  origin: Origin,
  transaction: Transaction,
): Promise<GivenSession> {
  const refresh = newSecretToken();
  const [row] = await database.rows<{ id: string; expires_at: Date }>(
    `WITH made AS (
       INSERT INTO sessions (account_id, agent, address, address_group, expires_at)
       VALUES ($1, $2, $3, $4, service_now() + make_interval(days => $5)) RETURNING id, expires_at
     ), token AS (INSERT INTO session_tokens (hash, session_id) SELECT $6, id FROM made)
     SELECT id, expires_at FROM made`,
    [accountId, origin.agent, origin.address, origin.addressGroup, ABSOLUTE_DAYS, refresh.hash],
    transaction,
  );
  if (!row) throw new Error('no session was made');
  const access = signAccess(
    { accountId, sessionId: row.id },
    { sessionSecret: settings.sessionSecret, now: now() },
  );
  return {
    sessionId: row.id,
    access: access.token,
    accessEndsAt: access.expiresAt,
    refresh: refresh.text,
    sessionEndsAt: row.expires_at,
  };
}
