import { createHmac, randomBytes } from 'node:crypto';
import { ProblemError } from '../../http/ProblemError';
import type { ConsoleDatabase } from '../../models/ConsoleDatabase';
import { derivedKey } from '../console/derivedKey';
import { hashOfToken } from '../console/secretToken';

export type SavedKind = 'recipe' | 'evening';

export interface SavedThing {
  readonly id: string;
  readonly kind: SavedKind;
  readonly name: string;
  readonly body: Record<string, unknown>;
  readonly version: number;
  readonly createdAt: Date;
  readonly updatedAt: Date;
  readonly shareNonce: Buffer | null;
}

export type SavedLine = Omit<SavedThing, 'body'>;

/** Most things that an account keeps. */
const MOST = 500;

const LINE = `id, kind, name, version, created_at AS "createdAt", updated_at AS "updatedAt",
  share_nonce AS "shareNonce"`;
const WHOLE = `${LINE}, body`;

/** Everything that an account keeps, the latest first, without what it says. */
export function savedLines(database: ConsoleDatabase, accountId: string): Promise<SavedLine[]> {
  return database.rows<SavedLine>(
    `SELECT ${LINE} FROM saved_things WHERE account_id = $1 ORDER BY updated_at DESC, id LIMIT ${MOST}`,
    [accountId],
  );
}

/** The same with what it says. */
export function savedWhole(database: ConsoleDatabase, accountId: string): Promise<SavedThing[]> {
  return database.rows<SavedThing>(
    `SELECT ${WHOLE} FROM saved_things WHERE account_id = $1 ORDER BY updated_at DESC, id LIMIT ${MOST}`,
    [accountId],
  );
}

/** @throws ProblemError 404 where the account has no such thing, whoever else may have it */
export async function savedThing(
  database: ConsoleDatabase,
  accountId: string,
  id: string,
): Promise<SavedThing> {
  const [thing] = await database.rows<SavedThing>(
    `SELECT ${WHOLE} FROM saved_things WHERE account_id = $1 AND id = $2`,
    [accountId, id],
  );
  if (!thing) throw new ProblemError('not_found');
  return thing;
}

type Wish = Pick<SavedThing, 'kind' | 'name' | 'body'>;

/** @throws ProblemError 409 where the account keeps as much as it may */
export async function saveThing(
  database: ConsoleDatabase,
  accountId: string,
  { kind, name, body }: Wish,
): Promise<SavedThing> {
  const [thing] = await database.rows<SavedThing>(
    `INSERT INTO saved_things (account_id, kind, name, body)
     SELECT $1, $2, $3, $4 WHERE (SELECT count(*) FROM saved_things WHERE account_id = $1) < ${MOST}
     RETURNING ${WHOLE}`,
    [accountId, kind, name, JSON.stringify(body)],
  );
  if (!thing) throw new ProblemError('too_much_saved', `An account may keep ${MOST} recipes and evenings.`);
  return thing;
}

/** @throws ProblemError 404 where there is no such thing, 409 where it was changed meanwhile */
export async function changeThing(
  database: ConsoleDatabase,
  accountId: string,
  id: string,
  { name, body, version }: { name?: string; body?: Record<string, unknown>; version: number },
): Promise<SavedThing> {
  const [changed] = await database.rows<SavedThing>(
    `UPDATE saved_things SET name = coalesce($3, name), body = coalesce($4, body), version = version + 1,
       updated_at = service_now() WHERE account_id = $1 AND id = $2 AND version = $5 RETURNING ${WHOLE}`,
    [accountId, id, name ?? null, body === undefined ? null : JSON.stringify(body), version],
  );
  if (changed) return changed;
  await savedThing(database, accountId, id);
  throw new ProblemError('changed_meanwhile');
}

/** @throws ProblemError 404 */
export async function dropThing(database: ConsoleDatabase, accountId: string, id: string): Promise<void> {
  const gone = await database.rows(
    'DELETE FROM saved_things WHERE account_id = $1 AND id = $2 RETURNING id',
    [accountId, id],
  );
  if (gone.length === 0) throw new ProblemError('not_found');
}

/** The token of a thing's link: 256 bits that only the service's secret can make from its nonce. */
export function shareToken(secret: string, id: string, nonce: Buffer): string {
  return createHmac('sha256', derivedKey(secret, 'shares')).update(id).update(nonce).digest('base64url');
}

/** Lets whoever has the link read a thing; a link that it had before stays. @throws ProblemError 404 */
export async function shareThing(
  database: ConsoleDatabase,
  accountId: string,
  id: string,
  secret: string,
): Promise<SavedThing> {
  const nonce = randomBytes(16);
  await database.rows(
    `UPDATE saved_things SET share_nonce = $3, share_hash = $4
     WHERE account_id = $1 AND id = $2 AND share_nonce IS NULL RETURNING id`,
    [accountId, id, nonce, hashOfToken(shareToken(secret, id, nonce))],
  );
  return savedThing(database, accountId, id);
}

/** Makes a thing's link worthless. @throws ProblemError 404 */
export async function unshareThing(
  database: ConsoleDatabase,
  accountId: string,
  id: string,
): Promise<SavedThing> {
  await database.rows(
    `UPDATE saved_things SET share_nonce = NULL, share_hash = NULL WHERE account_id = $1 AND id = $2 RETURNING id`,
    [accountId, id],
  );
  return savedThing(database, accountId, id);
}

/** What stands behind a link. @throws ProblemError 404 where there is none, or none any more */
export async function sharedThing(database: ConsoleDatabase, token: string): Promise<SavedThing> {
  const [thing] = await database.rows<SavedThing>(
    `SELECT ${WHOLE} FROM saved_things s WHERE share_hash = $1
       AND EXISTS (SELECT FROM accounts a WHERE a.id = s.account_id AND a.blocked_at IS NULL)`,
    [hashOfToken(token)],
  );
  if (!thing) throw new ProblemError('not_found');
  return thing;
}
