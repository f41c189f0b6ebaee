import type { ConsoleDatabase, Transaction } from '../../models/ConsoleDatabase';
import type { LengthUnit, Role } from '../../models/Account';

/** What a person calls themselves, and the units that they read. */
export async function changeProfile(
  { accounts }: ConsoleDatabase,
  id: string,
  profile: { name: string; lengthUnit: LengthUnit },
  transaction: Transaction,
): Promise<void> {
  await accounts.update(profile, { where: { id }, transaction });
}

export async function setRoles(
  { accounts }: ConsoleDatabase,
  id: string,
  roles: readonly Role[],
  transaction: Transaction,
): Promise<void> {
  await accounts.update({ roles: [...roles] }, { where: { id }, transaction });
}
