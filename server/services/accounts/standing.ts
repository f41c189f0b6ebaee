import type { ConsoleDatabase } from '../../models/ConsoleDatabase';
import type { StandingFacts } from '../../presenters/account';

/** The plan of an account with what was agreed on for it, and what it used this month. */
export async function accountStanding(database: ConsoleDatabase, accountId: string): Promise<StandingFacts> {
  const [row] = await database.rows<StandingFacts>(
    `SELECT plan.id AS "planId", plan.title AS "planTitle",
       coalesce(a.own_units_per_month, plan.units_per_month)::float8 AS "unitsPerMonth",
       coalesce(a.own_rate_per_second, plan.rate_per_second) AS "ratePerSecond",
       CASE WHEN a.own_rate_per_second IS NULL THEN plan.burst ELSE a.own_rate_per_second * 4 END AS burst,
       coalesce(q.used, 0)::float8 AS used, service_now() AS now
     FROM accounts a JOIN plans plan ON plan.id = a.plan_id
     LEFT JOIN quota_periods q ON q.account_id = a.id AND q.month = month_of(service_now())
     WHERE a.id = $1`,
    [accountId],
  );
  if (!row) throw new Error('the account has no plan');
  return row;
}
