import type pg from 'pg';
import { LOG_LENGTH } from './LineLog';
import type { Gathered, HourCount } from './UsageRecorder';

const ADD_HOURS = `
INSERT INTO usage_hours AS u (key_id, hour, calculator, status_class, calls, units, total_ms, latency)
SELECT key_id, hour, calculator, status_class, calls, units, total_ms, string_to_array(latency, ',')::int[]
FROM unnest($1::uuid[], $2::timestamptz[], $3::text[], $4::int[], $5::int[], $6::bigint[], $7::float8[], $8::text[])
  s (key_id, hour, calculator, status_class, calls, units, total_ms, latency)
WHERE EXISTS (SELECT FROM api_keys k WHERE k.id = s.key_id)
ORDER BY key_id, hour, calculator, status_class
ON CONFLICT (key_id, hour, calculator, status_class) DO UPDATE SET
  calls = u.calls + excluded.calls, units = u.units + excluded.units, total_ms = u.total_ms + excluded.total_ms,
  latency = add_each(u.latency, excluded.latency), updated_at = service_now()`;

/** The lines come as one JSON text: in an array of texts each quotation mark would have to be escaped. */
const ADD_LOG = `
INSERT INTO request_log (key_id, last_at, calls_held, calls)
SELECT s.key_id, s.last_at, s.held, s.calls
FROM json_to_recordset($1::json) s (key_id uuid, last_at timestamptz, held int, calls jsonb)
WHERE EXISTS (SELECT FROM api_keys k WHERE k.id = s.key_id)`;

/** Rows of a key that lie wholly behind its newest 10,000 calls. */
const SHORTEN = `
DELETE FROM request_log l USING (
  SELECT id, sum(calls_held) OVER (PARTITION BY key_id ORDER BY id DESC) - calls_held AS newer
  FROM request_log WHERE key_id = ANY ($1::uuid[])
) r WHERE l.id = r.id AND r.newer >= ${LOG_LENGTH}`;

/** Lines older than the stated retention. */
export const FORGET_OLD = `DELETE FROM request_log WHERE last_at < service_now() - interval '30 days'`;

function hourParameters(hours: readonly HourCount[]): unknown[] {
  return [
    hours.map(({ keyId }) => keyId),
    hours.map(({ hourMs }) => new Date(hourMs)),
    hours.map(({ calculator }) => calculator),
    hours.map(({ statusClass }) => statusClass),
    hours.map(({ calls }) => calls),
    hours.map(({ units }) => units),
    hours.map(({ totalMs }) => totalMs),
    hours.map(({ latency }) => latency.join(',')),
  ];
}

/** Writes what was gathered: counts are added up, log lines appended, logs kept to their length. */
export async function writeUsage(pool: pg.Pool | pg.Client, { hours, logs }: Gathered): Promise<void> {
  if (hours.length > 0) await pool.query(ADD_HOURS, hourParameters(hours));
  if (logs.size === 0) return;
  await pool.query(ADD_LOG, [`[${[...logs].map(([keyId, log]) => log.text(keyId)).join(',')}]`]);
  await pool.query(SHORTEN, [[...logs.keys()]]);
}
