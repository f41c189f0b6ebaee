import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { startConsole, type ConsoleService, type Person } from '../../support/consoleService';

let service: ConsoleService;
let owner: Person;
let keyId: string;
let secret: string;
const body = { aperture: 8, shutter: '1/125' };

interface Sums {
  calls: number;
  units: number;
  refused: number;
  p50Ms: number | null;
  p95Ms: number | null;
}
interface Summary {
  from: string;
  to: string;
  total: Sums;
  days: (Sums & { day: string })[];
  calculators: (Sums & { calculator: string })[];
  keys: (Sums & { name: string })[];
  statuses: (Sums & { statusClass: number })[];
  pace: { used: number; limit: number; forecast: number; runsOutAt: string | null };
}
interface LogPage {
  calls: {
    at: string;
    calculator: string;
    status: number;
    code: string | null;
    units: number;
    requestId: string;
  }[];
  next: string | null;
}

const ask = async <T>(path: string) => (await owner.browser.call('GET', path)).body as unknown as T;
const usage = (query = '') => ask<Summary>(`/api/usage${query}`);
const log = (query = '') => ask<LogPage>(`/api/keys/${keyId}/log${query}`);

beforeAll(async () => {
  service = await startConsole();
  owner = await service.person();
  const made = await owner.browser.call('POST', '/api/keys', {
    name: 'Lantern',
    scopes: ['exposure', 'batch'],
  });
  ({
    key: { id: keyId },
    secret,
  } = made.body as unknown as { key: { id: string }; secret: string });
  for (let i = 0; i < 3; i += 1) await service.call('POST', '/v1/exposure/value', { key: secret, body });
  await service.call('POST', '/v1/exposure/value', { key: secret, body: { aperture: 0 } });
  await service.call('POST', '/v1/light/convert', { key: secret, body: { ev100: 1 } });
  await vi.waitFor(async () => expect((await usage()).total.calls).toBe(5), { timeout: 8_000 });
});
afterAll(() => service.stop());

describe('usage', () => {
  it('adds up to the same by day, calculator, key and status, and to the quota', async () => {
    const { total, days, calculators, keys, statuses, pace } = await usage();
    expect(total).toMatchObject({ calls: 5, units: 3, refused: 2 });
    for (const groups of [days, calculators, keys, statuses]) {
      expect(groups.reduce((sum, { calls }) => sum + calls, 0)).toBe(5);
      expect(groups.reduce((sum, { units }) => sum + units, 0)).toBe(3);
    }
    expect(calculators.map(({ calculator, calls }) => [calculator, calls])).toEqual([
      ['exposure/value', 4],
      ['light/convert', 1],
    ]);
    expect(statuses.map(({ statusClass, calls }) => [statusClass, calls])).toEqual([
      [2, 3],
      [4, 2],
    ]);
    expect(keys.map(({ name }) => name)).toEqual(['Lantern']);
    expect(pace.used).toBe(3);
    expect(total.p95Ms ?? 0).toBeGreaterThanOrEqual(total.p50Ms ?? Infinity);
  });

  it('has a line for each of thirty days where nothing is asked', async () => {
    const { from, to, days } = await usage();
    expect(days).toHaveLength(30);
    expect([days[0]?.day, days[29]?.day]).toEqual([from, to]);
  });

  it('says nothing was used where nothing was', async () => {
    const { total, days, calculators } = await usage('?from=2026-01-01&to=2026-01-03');
    expect(total).toMatchObject({ calls: 0, units: 0, p50Ms: null });
    expect(days.map(({ day }) => day)).toEqual(['2026-01-01', '2026-01-02', '2026-01-03']);
    expect(calculators).toEqual([]);
  });

  it('counts one key alone where it is named', async () => {
    const other = await owner.browser.call('POST', '/api/keys', { name: 'Unused' });
    const { key } = other.body as unknown as { key: { id: string } };
    expect((await usage(`?keyId=${key.id}`)).total.calls).toBe(0);
    expect((await usage(`?keyId=${keyId}`)).total.calls).toBe(5);
  });

  it.each([
    ['the last day before the first', '?from=2026-03-02&to=2026-03-01', '/from'],
    ['more than 92 days', '?from=2026-01-01&to=2026-12-31', '/from'],
    ['a day that is none', '?from=2026-02-30', '/from'],
    ['a field that is none', '?since=2026-02-01', '/since'],
  ])('refuses %s', async (_, query, pointer) => {
    const answer = await owner.browser.call('GET', `/api/usage${query}`);
    expect(answer.status).toBe(422);
    expect(answer.body.errors.map((error) => error.pointer)).toEqual([pointer]);
  });
});

describe('the log of a key', () => {
  it('says of each call when, what, how it ended, why, and under which name it stands in our logs', async () => {
    const refused = await service.call('POST', '/v1/exposure/value', { key: secret, body: { aperture: -1 } });
    await expect
      .poll(async () => (await log()).calls[0]?.requestId, { timeout: 8_000 })
      .toBe(refused.headers['x-request-id']);
    const { calls } = await log();
    expect(calls[0]).toMatchObject({
      calculator: 'exposure/value',
      status: 422,
      code: 'invalid_input',
      units: 0,
    });
    expect(calls.map(({ code }) => code)).toContain('scope_missing');
    expect(calls[calls.length - 1]).toMatchObject({ status: 200, code: null, units: 1 });
  });

  it('never holds what was asked, nor the key', async () => {
    const { text } = await owner.browser.call('GET', `/api/keys/${keyId}/log`);
    expect(text).not.toContain('aperture');
    expect(text).not.toContain(secret.slice(-12));
  });

  it('shows one class of status, or one calculator, alone', async () => {
    expect(new Set((await log('?status=4xx')).calls.map(({ status }) => status))).toEqual(
      new Set([403, 422]),
    );
    expect((await log('?calculator=light/convert')).calls.map(({ status }) => status)).toEqual([403]);
    expect((await log('?status=5xx')).calls).toEqual([]);
  });

  it('comes in pages that join without a gap, newest first', async () => {
    const many = Array.from({ length: 130 }, (_, i) => ({
      at: new Date(Date.UTC(2026, 0, 1, 0, 0, i)).toISOString(),
      calculator: 'exposure/solve',
      status: 200,
      units: 1,
      ms: 1,
      request: `demo-${i}`,
    }));
    for (let i = 0; i < many.length; i += 26)
      await service.sql(
        'INSERT INTO request_log (key_id, last_at, calls_held, calls) VALUES ($1, now(), 26, $2)',
        [keyId, JSON.stringify(many.slice(i, i + 26))],
      );
    const seen: string[] = [];
    let next: string | null = null;
    do {
      const page: LogPage = await log(
        `?calculator=exposure/solve${next ? `&before=${encodeURIComponent(next)}` : ''}`,
      );
      expect(page.calls.length).toBeLessThanOrEqual(50);
      seen.push(...page.calls.map(({ requestId }) => requestId));
      next = page.next;
    } while (next);
    expect(seen).toEqual(many.map(({ request }) => request).reverse());
  });
});
