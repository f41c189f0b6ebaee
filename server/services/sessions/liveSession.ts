import { IDLE_HOURS } from '../../policies/sessionLife';
import type { ConsoleDatabase } from '../../models/ConsoleDatabase';
import type { LengthUnit, Role } from '../../models/Account';
import type { AccessClaims } from './accessToken';

export interface SignedIn {
  readonly sessionId: string;
  readonly sessionEndsAt: Date;
  readonly account: {
    readonly id: string;
    readonly email: string;
    readonly name: string;
    readonly roles: readonly Role[];
    readonly lengthUnit: LengthUnit;
    readonly passwordHash: string | null;
    readonly isBlocked: boolean;
  };
}

interface Row {
  readonly sessionEndsAt: Date;
  readonly isSeenLately: boolean;
  readonly id: string;
  readonly email: string;
  readonly name: string;
  readonly roles: Role[];
  readonly lengthUnit: LengthUnit;
  readonly passwordHash: string | null;
  readonly isBlocked: boolean;
}

/** Where a session counts as live, in SQL over `sessions s`. */
export const IS_LIVE = `s.ended_at IS NULL AND s.expires_at > service_now()
  AND s.last_seen_at > service_now() - make_interval(hours => ${IDLE_HOURS})`;

const FIND = `
SELECT s.expires_at AS "sessionEndsAt", s.last_seen_at > service_now() - interval '1 minute' AS "isSeenLately",
  a.id, a.email, a.name, a.roles, a.length_unit AS "lengthUnit", a.password_hash AS "passwordHash",
  a.blocked_at IS NOT NULL AS "isBlocked"
FROM sessions s JOIN accounts a ON a.id = s.account_id
WHERE s.id = $1 AND s.account_id = $2 AND a.closed_at IS NULL AND ${IS_LIVE}`;

/** The session that an access token names, if it is live, and who is signed in by it. Keeps it from idling out. */
export async function liveSession(
  database: ConsoleDatabase,
  { sessionId, accountId }: Pick<AccessClaims, 'sessionId' | 'accountId'>,
): Promise<SignedIn | null> {
  const [row] = await database.rows<Row>(FIND, [sessionId, accountId]);
  if (!row) return null;
  const { sessionEndsAt, isSeenLately, ...account } = row;
  if (!isSeenLately)
    await database.rows('UPDATE sessions SET last_seen_at = service_now() WHERE id = $1', [sessionId]);
  return { sessionId, sessionEndsAt, account };
}
