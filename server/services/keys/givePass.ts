import { ProblemError } from '../../http/ProblemError';
import { mayPass, PASS_MINUTES } from '../../policies/keyRules';
import { audit } from '../audit/audit';
import type { ConsoleServices, Origin } from '../console/ConsoleServices';
import { hashOfKey, newKey } from './keyText';
import { ownKey } from './ownKeys';

export interface Pass {
  readonly pass: string;
  readonly expiresAt: Date;
}

/**
 * Gives the try page a bearer for ten minutes. It stands for a key, works from the console's own pages only, and
 * ends with the session, with the key or by the clock, whichever comes first.
 */
export async function givePass(
  { database }: ConsoleServices,
  wish: { accountId: string; keyId: string; sessionId: string; origin: Origin },
): Promise<Pass> {
  const { accountId, keyId, sessionId, origin } = wish;
  const pass = newKey('pass');
  return database.transact(async (transaction) => {
    const key = await ownKey(database, accountId, keyId, transaction);
    if (!mayPass(key, key.now)) throw new ProblemError('key_settled', 'A pass needs a key that works.');
    await database.rows(
      'DELETE FROM key_passes WHERE session_id = $1 AND expires_at <= service_now()',
      [sessionId],
      transaction,
    );
    const [row] = await database.rows<{ expiresAt: Date }>(
      `INSERT INTO key_passes (hash, key_id, session_id, expires_at)
       VALUES ($1, $2, $3, service_now() + make_interval(mins => $4)) RETURNING expires_at AS "expiresAt"`,
      [hashOfKey(pass), keyId, sessionId, PASS_MINUTES],
      transaction,
    );
    if (!row) throw new Error('no pass was made');
    const subject = { kind: 'key', id: keyId } as const;
    await audit(database, origin, { event: 'pass_given', accountId, subject }, transaction);
    return { pass, expiresAt: row.expiresAt };
  });
}
