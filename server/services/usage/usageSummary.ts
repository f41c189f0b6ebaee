import { LATENCY_BUCKETS } from '../../../shared/math/latencyHistogram';
import type { ConsoleDatabase } from '../../models/ConsoleDatabase';

/** Calls that have something in common, with their histogram of milliseconds. */
export interface UsageGroup {
  readonly by: 'all' | 'day' | 'calculator' | 'key' | 'status';
  readonly day: string | null;
  readonly calculator: string | null;
  readonly keyId: string | null;
  readonly keyName: string | null;
  readonly statusClass: number | null;
  readonly calls: number;
  readonly units: number;
  readonly refused: number;
  readonly failed: number;
  readonly latency: number[];
}

export interface UsageQuestion {
  readonly accountId: string;
  /** Days of UTC as YYYY-MM-DD, both included. */
  readonly from: string;
  readonly to: string;
  readonly keyId: string | null;
}

const HISTOGRAM = Array.from({ length: LATENCY_BUCKETS }, (_, i) => `sum(u.latency[${i + 1}])`).join(', ');

// All five ways to group in one reading of the rows.
const SELECT = `
SELECT CASE WHEN grouping(u.day) = 0 THEN 'day' WHEN grouping(u.calculator) = 0 THEN 'calculator'
    WHEN grouping(u.key_id) = 0 THEN 'key' WHEN grouping(u.status_class) = 0 THEN 'status' ELSE 'all' END AS by,
  to_char(u.day, 'YYYY-MM-DD') AS day, u.calculator, u.key_id AS "keyId", min(u.name) AS "keyName",
  u.status_class AS "statusClass", coalesce(sum(u.calls), 0)::float8 AS calls,
  coalesce(sum(u.units), 0)::float8 AS units,
  coalesce(sum(u.calls) FILTER (WHERE u.status_class = 4), 0)::float8 AS refused,
  coalesce(sum(u.calls) FILTER (WHERE u.status_class = 5), 0)::float8 AS failed,
  ARRAY[${HISTOGRAM}]::float8[] AS latency
FROM (
  SELECT h.*, k.name, (h.hour AT TIME ZONE 'UTC')::date AS day
  FROM usage_hours h JOIN api_keys k ON k.id = h.key_id
  WHERE k.account_id = $1 AND h.hour >= $2::timestamp AT TIME ZONE 'UTC'
    AND h.hour < ($3::timestamp + interval '1 day') AT TIME ZONE 'UTC'
    AND ($4::uuid IS NULL OR h.key_id = $4::uuid)
) u
GROUP BY GROUPING SETS ((), (u.day), (u.calculator), (u.key_id), (u.status_class))
ORDER BY 1, u.day, calls DESC, u.status_class`;

/** What an account's keys were used for over a span of days, summed in each of five ways. */
export function usageSummary(
  database: ConsoleDatabase,
  { accountId, from, to, keyId }: UsageQuestion,
): Promise<UsageGroup[]> {
  return database.rows<UsageGroup>(SELECT, [accountId, from, to, keyId]);
}
