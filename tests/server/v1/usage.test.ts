import { readFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { startService, type TestService } from '../../support/service';

let service: TestService;
const logFile = join(tmpdir(), `evenfall-log-${process.pid}.txt`);
const body = { aperture: 8, shutter: '1/125' };

beforeAll(async () => {
  service = await startService({}, undefined, logFile);
});
afterAll(() => service.stop());

/** The counts are written once a second; asks until they say what is wanted, for a bounded time. */
async function until<T>(ask: () => Promise<T>, isThere: (value: T) => boolean): Promise<T> {
  const end = Date.now() + 8_000;
  for (;;) {
    const value = await ask();
    if (isThere(value) || Date.now() > end) return value;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

const hoursOf = (email: string) =>
  service.sql<{ calculator: string; status_class: number; calls: number; units: string; latency: number[] }>(
    `SELECT u.* FROM usage_hours u JOIN api_keys k ON k.id = u.key_id JOIN accounts a ON a.id = k.account_id
     WHERE a.email = $1 ORDER BY calculator, status_class`,
    [email],
  );

it('counts calls by calculator and class of status, with units that equal the quota’s count', async () => {
  const key = await service.key({ account: 'counts@example.org' });
  for (let i = 0; i < 3; i++) await service.call('POST', '/v1/exposure/value', { key, body });
  await service.call('POST', '/v1/exposure/value', { key, body: {} });
  await service.call('POST', '/v1/light/convert', { key, body: { ev100: 1 } });
  const rows = await until(
    () => hoursOf('counts@example.org'),
    (given) => given.reduce((sum, { calls }) => sum + calls, 0) === 5,
  );
  expect(
    rows.map(({ calculator, status_class, calls, units }) => [
      calculator,
      status_class,
      calls,
      Number(units),
    ]),
  ).toEqual([
    ['exposure/value', 2, 3, 3],
    ['exposure/value', 4, 1, 0],
    ['light/convert', 2, 1, 1],
  ]);
  for (const { calls, latency } of rows) expect(latency.reduce((a, b) => a + b, 0)).toBe(calls);
  const [quota] = await service.sql<{ used: string }>(
    `SELECT q.used FROM quota_periods q JOIN accounts a ON a.id = q.account_id WHERE a.email = 'counts@example.org'`,
  );
  expect(Number(quota?.used)).toBe(4);
});

it('keeps each key’s recent calls with what a developer needs to see why one was refused', async () => {
  const key = await service.key({ account: 'log@example.org', units: 1 });
  await service.call('POST', '/v1/exposure/value', {
    key,
    body,
    headers: { 'X-Request-Id': 'first-call-1' },
  });
  await service.call('POST', '/v1/exposure/value', {
    key,
    body,
    headers: { 'X-Request-Id': 'second-call-2' },
  });
  const lines = await until(
    () =>
      service.sql<{ request: string; status: number; code: string | null; units: number; ms: number }>(
        `SELECT c.* FROM request_log l JOIN api_keys k ON k.id = l.key_id JOIN accounts a ON a.id = k.account_id,
           jsonb_to_recordset(l.calls) AS c (at timestamptz, request text, status int, code text, units int, ms float8)
         WHERE a.email = 'log@example.org' ORDER BY l.id, c.at`,
      ),
    (given) => given.length === 2,
  );
  expect(lines).toMatchObject([
    { request: 'first-call-1', status: 200, code: null, units: 1 },
    { request: 'second-call-2', status: 429, code: 'quota_exhausted', units: 0 },
  ]);
  for (const { ms } of lines) expect(ms).toBeGreaterThan(0);
});

it('tells an operator of this machine calls, their time and whether the books agree, and nobody else', async () => {
  const key = await service.key({ account: 'metrics@example.org' });
  await service.call('POST', '/v1/exposure/value', { key, body });
  const { status, text } = await service.call('GET', '/metrics');
  expect(status).toBe(200);
  expect(text).toMatch(/evenfall_calls_total\{operation="exposure\/value",status="200"\} \d+/);
  expect(text).toMatch(/evenfall_uncounted_usage_units -?\d+/);
  const forwarded = await service.call('GET', '/metrics', { headers: { 'X-Forwarded-For': '127.0.0.1' } });
  expect(forwarded.status).toBe(404);
});

it('lets a token read the metrics from anywhere, and only the right one', async () => {
  const guarded = await startService({ metricsToken: 'a-long-metrics-token' });
  try {
    const read = (token?: string) =>
      guarded.call('GET', '/metrics', { headers: token ? { Authorization: `Bearer ${token}` } : {} });
    expect((await read()).status).toBe(404);
    expect((await read('another-metrics-token')).status).toBe(404);
    expect((await read('a-long-metrics-token')).status).toBe(200);
  } finally {
    await guarded.stop();
  }
});

it('writes a log line a call, without key, query or body', async () => {
  const key = await service.key({ account: 'lines@example.org' });
  await service.call('GET', '/v1/exposure/value?aperture=7.9123&shutter=1/125', {
    key,
    headers: { 'X-Request-Id': 'a-line-to-find' },
  });
  const log = await until(
    () => Promise.resolve(readFileSync(logFile, 'utf8')),
    (text) => text.includes('a-line-to-find'),
  );
  const line = log.split('\n').find((one) => one.includes('a-line-to-find')) ?? '{}';
  expect(JSON.parse(line)).toMatchObject({
    method: 'GET',
    operation: 'exposure/value',
    status: 200,
    units: 1,
  });
  expect(log).not.toContain(key);
  expect(log).not.toContain('7.9123');
  expect(log).not.toContain('evenfall_server_');
});

it('says where to report a flaw, and what it is in brief', async () => {
  const security = await service.call('GET', '/.well-known/security.txt');
  expect(security.text).toMatch(/^Contact: mailto:/);
  const expires = Date.parse(/Expires: (.*)/.exec(security.text)?.[1] ?? '');
  expect(expires).toBeGreaterThan(Date.now());
  expect(expires).toBeLessThan(Date.now() + 365 * 24 * 3_600_000);
  const summary = await service.call('GET', '/llms.txt');
  expect(summary.text).toMatch(/^# Evenfall\n\n> /);
  expect(summary.text).toContain('POST /v1/exposure/value');
});

it('has a page of cause and cure for every problem code', async () => {
  const list = await service.call('GET', '/problems');
  const codes = [...list.text.matchAll(/href="\/problems\/([a-z_]+)"/g)].map(([, code]) => code);
  expect(codes.length).toBeGreaterThan(15);
  for (const code of codes) {
    const page = await service.call('GET', `/problems/${code}`);
    expect(page.status).toBe(200);
    expect(page.text).toContain('What to do');
  }
  expect((await service.call('GET', '/problems/no_such_code')).status).toBe(404);
});
