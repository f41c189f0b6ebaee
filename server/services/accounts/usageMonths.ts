import type { ConsoleDatabase } from '../../models/ConsoleDatabase';

export interface UsageMonth {
  readonly month: string;
  readonly units: number;
}

/** The units that an account used, by month (UTC). */
export function usageMonths(database: ConsoleDatabase, accountId: string): Promise<UsageMonth[]> {
  return database.rows<UsageMonth>(
    `SELECT to_char(month, 'YYYY-MM') AS month, used::float8 AS units FROM quota_periods
     WHERE account_id = $1 ORDER BY quota_periods.month`,
    [accountId],
  );
}
