import type { ConsoleDatabase, Transaction } from '../../models/ConsoleDatabase';
import type { LengthUnit, Role } from '../../models/Account';

export interface AccountRow {
  readonly id: string;
  readonly email: string;
  readonly name: string;
  readonly roles: Role[];
  readonly lengthUnit: LengthUnit;
  readonly passwordHash: string | null;
  readonly isBlocked: boolean;
}

const COLUMNS = `id, email, name, roles, length_unit AS "lengthUnit", password_hash AS "passwordHash",
  blocked_at IS NOT NULL AS "isBlocked"`;

/** The account with an address, whatever its case; null where there is none. */
export async function accountByEmail(
  database: ConsoleDatabase,
  email: string,
  transaction?: Transaction,
): Promise<AccountRow | null> {
  const [row] = await database.rows<AccountRow>(
    `SELECT ${COLUMNS} FROM accounts WHERE lower(email) = lower($1) AND closed_at IS NULL`,
    [email],
    transaction,
  );
  return row ?? null;
}

/** Whether somebody signed in to the account with this address from this place in the last month. */
export async function isKnownPlace(
  database: ConsoleDatabase,
  email: string,
  addressGroup: string,
): Promise<boolean> {
  const [row] = await database.rows<{ known: boolean }>(
    `SELECT EXISTS (SELECT FROM sessions s JOIN accounts a ON a.id = s.account_id
       WHERE lower(a.email) = lower($1) AND s.address_group = $2
         AND s.created_at > service_now() - interval '30 days') AS known`,
    [email, addressGroup],
  );
  return row?.known === true;
}
