import { accountsAndKeys } from './0001-accounts-and-keys';
import { metering } from './0002-metering';
import { usage } from './0003-usage';
import { consoleTables } from './0004-console';
import { refunds } from './0007-refunds';
import { quotaAlerts } from './0010-quota-alerts';
import { kitAndSaved } from './0011-kit-and-saved';
import type { Migration } from './migration';

/** All steps of the schema, in order. */
export const migrations: readonly Migration[] = [
  accountsAndKeys,
  metering,
  usage,
  consoleTables,
  refunds,
  quotaAlerts,
  kitAndSaved,
];
