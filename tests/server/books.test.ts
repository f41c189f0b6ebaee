import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { serviceMetrics } from '../../server/services/metrics/serviceMetrics';
import { FORGET_OLD, writeUsage } from '../../server/services/usage/writeUsage';
import { UsageRecorder } from '../../server/services/usage/UsageRecorder';
import { countedDatabase, type CountedDatabase } from '../support/countedDatabase';
import { openTestDatabase, type TestDatabase } from '../support/database';

let database: TestDatabase;
let counted: CountedDatabase;
let pool: pg.Pool;

beforeAll(async () => {
  database = await openTestDatabase();
  counted = countedDatabase(database.ownerUrl);
  pool = new pg.Pool({ connectionString: database.serviceUrl, max: 2 });
});
afterAll(async () => {
  await pool.end();
  await counted.close();
  await database.drop();
});

/** A new account with one key, by their ids. */
async function newKey(): Promise<{ accountId: string; keyId: string }> {
  const { accountId } = await counted.caller({ units: 1_000 });
  const [row] = await counted.sql<{ id: string }>('SELECT id FROM api_keys WHERE account_id = $1', [
    accountId,
  ]);
  return { accountId, keyId: row?.id ?? '' };
}

const call = (keyId: string, at: Date, requestId: string, units = 1) => ({
  keyId,
  calculator: 'exposure/value',
  at,
  status: 200,
  code: undefined,
  units,
  ms: 0.25,
  requestId,
});

async function write(calls: readonly ReturnType<typeof call>[]): Promise<void> {
  const recorder = new UsageRecorder();
  for (const one of calls) recorder.record(one);
  await writeUsage(pool, recorder.take());
}

const logged = async (keyId: string) =>
  counted.sql<{ request: string }>(
    `SELECT c.call ->> 'request' AS request FROM request_log l,
       jsonb_array_elements(l.calls) WITH ORDINALITY c (call, line)
     WHERE l.key_id = $1 ORDER BY l.id, c.line`,
    [keyId],
  );

describe('the log of a key', () => {
  it('forgets calls once they are older than the 30 days that are stated, and no others', async () => {
    const { keyId } = await newKey();
    const daysAgo = (days: number) => new Date(Date.now() - days * 86_400_000);
    for (const days of [31, 30.01, 29.99, 1])
      await write([call(keyId, daysAgo(days), `of ${days} days ago`)]);
    await pool.query(FORGET_OLD);
    const requests = (await logged(keyId)).map(({ request }) => request);
    expect(requests).toEqual(['of 29.99 days ago', 'of 1 days ago']);
  });

  it('keeps the last 10,000 calls, less than one writing more, and leaves other keys’ alone', async () => {
    const [busy, quiet] = [await newKey(), await newKey()];
    const now = new Date();
    await write([call(quiet.keyId, now, 'quiet')]);
    const WRITINGS = 8;
    const EACH = 2_000;
    for (let no = 0; no < WRITINGS; no += 1)
      await write(Array.from({ length: EACH }, (_, i) => call(busy.keyId, now, `${no * EACH + i}`)));
    const requests = (await logged(busy.keyId)).map(({ request }) => Number(request));
    const last = WRITINGS * EACH - 1;
    expect(requests.at(-1)).toBe(last);
    expect(requests.length).toBeGreaterThanOrEqual(10_000);
    expect(requests.length).toBeLessThan(10_000 + EACH);
    expect(requests).toEqual(requests.map((_, i) => last - requests.length + 1 + i));
    expect(await logged(quiet.keyId)).toEqual([{ request: 'quiet' }]);
    // The log is cut; what was counted is not.
    const [hours] = await counted.sql<{ units: string }>(
      'SELECT sum(units) AS units FROM usage_hours WHERE key_id = $1',
      [busy.keyId],
    );
    expect(Number(hours?.units)).toBe(WRITINGS * EACH);
  });
});

describe('the metric that holds hourly counts against the quota', () => {
  let clockMs = 0;
  const figure = async (metrics: ReturnType<typeof serviceMetrics>) =>
    Number(/^evenfall_uncounted_usage_units (\S+)$/m.exec(await metrics.text())?.[1]);
  const take = (accountId: string, units: number) =>
    counted.sql(
      `INSERT INTO quota_periods (account_id, month, used, tokens, refilled_at)
       VALUES ($1, month_of(service_now()), $2, 0, service_now())
       ON CONFLICT (account_id, month) DO UPDATE SET used = quota_periods.used + excluded.used`,
      [accountId, units],
    );

  beforeAll(() => counted.sql('DELETE FROM usage_hours'));

  it('says how many units the hours lack, over all accounts, and nought when the books agree', async () => {
    const metrics = serviceMetrics(pool, () => clockMs);
    const [first, second] = [await newKey(), await newKey()];
    const look = () => {
      clockMs += 30_000;
      return figure(metrics);
    };
    expect(await look()).toBe(0);
    await take(first.accountId, 7);
    await take(second.accountId, 5);
    expect(await look()).toBe(12);
    await write([call(first.keyId, new Date(), 'a', 7)]);
    expect(await look()).toBe(5);
    await write([call(second.keyId, new Date(), 'b', 5)]);
    expect(await look()).toBe(0);
  });

  it('leaves other months out, and asks the database no oftener than twice a minute', async () => {
    const metrics = serviceMetrics(pool, () => clockMs);
    const { accountId, keyId } = await newKey();
    clockMs += 30_000;
    expect(await figure(metrics)).toBe(0);
    await counted.sql(
      `INSERT INTO quota_periods (account_id, month, used, tokens, refilled_at)
       VALUES ($1, (month_of(service_now()) - interval '1 month')::date, 90, 0, service_now())`,
      [accountId],
    );
    await counted.sql(
      `INSERT INTO usage_hours (key_id, hour, calculator, status_class, calls, units, total_ms, latency)
       VALUES ($1, month_of(service_now())::timestamp AT TIME ZONE 'UTC' - interval '1 hour',
         'exposure/value', 2, 40, 40, 1, '{40}')`,
      [keyId],
    );
    await take(accountId, 3);
    clockMs += 29_999;
    expect(await figure(metrics)).toBe(0);
    clockMs += 1;
    expect(await figure(metrics)).toBe(3);
  });
});
