import { EMPTY_KIT, type KitIn } from '../../../shared/contract/kit';
import { ProblemError } from '../../http/ProblemError';
import type { ConsoleDatabase } from '../../models/ConsoleDatabase';

export interface KeptKit {
  readonly kit: KitIn;
  /** 0 where nothing was kept yet. */
  readonly version: number;
}

/** The gear of an account. */
export async function kitOf(database: ConsoleDatabase, accountId: string): Promise<KeptKit> {
  const [kept] = await database.rows<KeptKit>('SELECT kit, version FROM kits WHERE account_id = $1', [
    accountId,
  ]);
  return kept ?? { kit: EMPTY_KIT, version: 0 };
}

/**
 * Keeps the gear of an account.
 * @param version the one that was changed
 * @throws ProblemError 409 where another one was kept meanwhile
 */
export async function keepKit(
  database: ConsoleDatabase,
  accountId: string,
  { kit, version }: KeptKit,
): Promise<KeptKit> {
  const statement =
    version === 0
      ? `INSERT INTO kits (account_id, kit) VALUES ($1, $2) ON CONFLICT DO NOTHING RETURNING kit, version`
      : `UPDATE kits SET kit = $2, version = version + 1, updated_at = service_now()
         WHERE account_id = $1 AND version = $3 RETURNING kit, version`;
  const bind = [accountId, JSON.stringify(kit), ...(version === 0 ? [] : [version])];
  const [kept] = await database.rows<KeptKit>(statement, bind);
  if (!kept) throw new ProblemError('changed_meanwhile');
  return kept;
}
