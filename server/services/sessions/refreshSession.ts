import { refreshVerdict } from '../../policies/sessionLife';
import { ProblemError } from '../../http/ProblemError';
import { audit } from '../audit/audit';
import type { ConsoleServices, Origin, Transaction } from '../console/ConsoleServices';
import { hashOfToken, newSecretToken } from '../console/secretToken';
import { signAccess } from './accessToken';
import type { GivenSession } from './beginSession';
import { endSessions } from './endSessions';
import { IS_LIVE } from './liveSession';

interface TokenRow {
  readonly sessionId: string;
  readonly accountId: string;
  readonly email: string;
  readonly sessionEndsAt: Date;
  readonly isSessionLive: boolean;
  readonly usedAgoS: number | null;
  readonly isSuccessorUsed: boolean;
}

// The session's row is locked, so that two who come with the same token are judged one after the other.
const FIND = `
SELECT s.id AS "sessionId", s.account_id AS "accountId", s.expires_at AS "sessionEndsAt", a.email,
  (${IS_LIVE} AND a.closed_at IS NULL AND a.blocked_at IS NULL) AS "isSessionLive"
FROM session_tokens t JOIN sessions s ON s.id = t.session_id JOIN accounts a ON a.id = s.account_id
WHERE t.hash = $1 FOR UPDATE OF s`;
// Read after the lock was had, so that what the other one did is seen.
const USE = `
SELECT extract(epoch FROM service_now() - t.used_at)::float8 AS "usedAgoS",
  EXISTS (SELECT FROM session_tokens later
    WHERE later.session_id = t.session_id AND later.created_at >= t.used_at AND later.hash <> t.hash
      AND later.used_at IS NOT NULL) AS "isSuccessorUsed"
FROM session_tokens t WHERE t.hash = $1`;
const REPLACE = `
WITH used AS (UPDATE session_tokens SET used_at = service_now() WHERE hash = $1),
  seen AS (UPDATE sessions SET last_seen_at = service_now() WHERE id = $2)
INSERT INTO session_tokens (hash, session_id) VALUES ($3, $2)`;

const ended = () =>
  new ProblemError('session_ended', undefined, {
    headers: { 'WWW-Authenticate': 'Session realm="evenfall"' },
  });

async function find(services: ConsoleServices, hash: Buffer, transaction: Transaction) {
  const [session] = await services.database.rows<TokenRow>(FIND, [hash], transaction);
  if (!session) return null;
  const [use] = await services.database.rows<TokenRow>(USE, [hash], transaction);
  return use ? { ...session, ...use } : null;
}

/**
 * Goes on with a session by its refresh token, which is good for one use (see refreshVerdict).
 * @throws ProblemError 401 where there is no session to go on with, or the token was copied: then it ends
 */
export async function refreshSession(
  services: ConsoleServices,
  refresh: string | null,
  origin: Origin,
): Promise<GivenSession> {
  if (refresh === null) throw ended();
  const hash = hashOfToken(refresh);
  const { database, settings, now, outbox } = services;
  const given = await database.transact(async (transaction) => {
    const row = await find(services, hash, transaction);
    if (!row) return null;
    const { sessionId, accountId, sessionEndsAt } = row;
    const verdict = refreshVerdict(row);
    if (verdict === 'ended') return null;
    if (verdict === 'reuse') {
      await endSessions(database, { accountId, only: sessionId }, 'reuse', transaction);
      const subject = { kind: 'session', id: sessionId } as const;
      const event = 'session_token_reused';
      await audit(database, origin, { event, actorId: null, accountId, subject }, transaction);
      const link = `${settings.publicUrl}/reset`;
      await outbox.put({ accountId, to: row.email, kind: 'session_reused', params: { link } }, transaction);
      return null;
    }
    const next = verdict === 'renew' ? newSecretToken() : null;
    if (next) await database.rows(REPLACE, [hash, sessionId, next.hash], transaction);
    const secret = { sessionSecret: settings.sessionSecret, now: now() };
    const access = signAccess({ accountId, sessionId }, secret);
    return {
      sessionId,
      access: access.token,
      accessEndsAt: access.expiresAt,
      refresh: next?.text ?? null,
      sessionEndsAt,
    };
  });
  outbox.nudge();
  if (!given) throw ended();
  return given;
}
