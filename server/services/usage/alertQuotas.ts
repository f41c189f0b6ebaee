import { usagePace } from '../../../shared/math/usagePace';
import type { ConsoleDatabase } from '../../models/ConsoleDatabase';
import { alertsUpTo, quotaAlertFor } from '../../policies/quotaAlert';
import { monthEnd } from '../../presenters/limitHeaders';
import type { Outbox } from '../mail/Outbox';

interface InUse {
  readonly accountId: string;
  readonly email: string;
  readonly used: number;
  readonly limit: number;
  readonly now: Date;
}

// Accounts that may be due; what is due is the policy's to say.
const IN_USE = `
SELECT a.id AS "accountId", a.email, q.used::float8 AS used,
  coalesce(a.own_units_per_month, plan.units_per_month)::float8 AS limit, service_now() AS now
FROM quota_periods q JOIN accounts a ON a.id = q.account_id JOIN plans plan ON plan.id = a.plan_id
WHERE q.month = month_of(service_now()) AND a.closed_at IS NULL
  AND q.used * 10 >= coalesce(a.own_units_per_month, plan.units_per_month)
  AND NOT EXISTS (SELECT FROM quota_alerts t WHERE t.account_id = a.id AND t.month = q.month AND t.alert = 'all')`;

const NOTE = `
INSERT INTO quota_alerts (account_id, month, alert)
SELECT $1, month_of(service_now()), unnest($2::text[]) ON CONFLICT DO NOTHING RETURNING alert`;

/** Mails the owners of accounts whose month's units are used up, nearly so, or will be; each alert once a month. */
export async function alertQuotas(
  database: ConsoleDatabase,
  outbox: Outbox,
  publicUrl: string,
): Promise<number> {
  let mails = 0;
  for (const { accountId, email, ...use } of await database.rows<InUse>(IN_USE, [])) {
    const alert = quotaAlertFor(use);
    if (alert === null) continue;
    const { used, limit, now } = use;
    const startMs = Date.UTC(now.getUTCFullYear(), now.getUTCMonth(), 1);
    const resets = monthEnd(now);
    const { runsOutAtMs } = usagePace(used, limit, startMs, resets.getTime(), now.getTime());
    const dayOf = (ms: number) => new Date(ms).toISOString().slice(0, 10);
    const shared = { used, limit, resetsOn: dayOf(resets.getTime()), link: `${publicUrl}/usage` };
    const isNew = await database.transact(async (transaction) => {
      const noted = await database.rows<{ alert: string }>(
        NOTE,
        [accountId, `{${alertsUpTo(alert).join(',')}}`],
        transaction,
      );
      if (!noted.some((one) => one.alert === alert)) return false;
      const wish = { accountId, to: email };
      if (alert === 'all') await outbox.put({ ...wish, kind: 'quota_used_up', params: shared }, transaction);
      else if (alert === 'most')
        await outbox.put({ ...wish, kind: 'quota_nearly_used', params: shared }, transaction);
      else {
        const params = { ...shared, endsOn: dayOf(runsOutAtMs ?? resets.getTime()) };
        await outbox.put({ ...wish, kind: 'quota_will_end', params }, transaction);
      }
      return true;
    });
    if (isNew) mails += 1;
  }
  if (mails > 0) outbox.nudge();
  return mails;
}
