import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { PASSWORD, startConsole, type Browser, type ConsoleService } from '../../support/consoleService';

let service: ConsoleService;
beforeAll(async () => {
  service = await startConsole();
});
afterAll(() => service.stop());

interface Key {
  readonly id: string;
  readonly name: string;
  readonly state: string;
  readonly shownPrefix: string | null;
  readonly lastFour: string | null;
  readonly expiresAt: string | null;
  readonly lastUsedAt: string | null;
  readonly usedThisMonth: number;
  readonly replacedBy: string | null;
  readonly monthlyCap: number | null;
  readonly scopes: string[];
}
interface Fresh {
  readonly key: Key;
  readonly secret: string;
}

async function make(browser: Browser, wish: object = {}): Promise<Fresh> {
  const answer = await browser.call('POST', '/api/keys', { name: 'Booking page', ...wish });
  expect(answer.status).toBe(201);
  return answer.body as unknown as Fresh;
}

const keyOf = async (browser: Browser, id: string) =>
  ((await browser.call('GET', `/api/keys/${id}`)).body as unknown as { key: Key }).key;

const VALUE = { aperture: 'f/8', shutter: '1/125' };
const compute = (key: string, headers: Record<string, string> = {}) =>
  service.call('POST', '/v1/exposure/value', { key, body: VALUE, headers });

const eventsOf = async (accountId: string) =>
  (
    await service.sql<{ event: string }>('SELECT event FROM audit_events WHERE account_id = $1 ORDER BY id', [
      accountId,
    ])
  ).map(({ event }) => event);

describe('making a key', () => {
  it('shows it whole once; afterwards its first characters and last four', async () => {
    const { browser, id } = await service.person();
    const { key, secret } = await make(browser);
    expect(secret).toMatch(/^evenfall_server_[0-9A-Za-z]{38}$/);
    expect(key).toMatchObject({
      state: 'live',
      lastFour: secret.slice(-4),
      lastUsedAt: null,
      usedThisMonth: 0,
    });
    expect(secret.startsWith(key.shownPrefix ?? '?')).toBe(true);
    expect((await compute(secret)).status).toBe(200);
    const list = await browser.call('GET', '/api/keys');
    expect(list.text).not.toContain(secret);
    const [shown] = (list.body as unknown as { keys: Key[] }).keys;
    expect(shown).toMatchObject({ id: key.id, usedThisMonth: 1 });
    expect(shown?.lastUsedAt).not.toBeNull();
    const [row] = await service.sql<{ all: string }>('SELECT k::text AS all FROM api_keys k WHERE id = $1', [
      key.id,
    ]);
    expect(row?.all).not.toContain(secret);
    expect(await eventsOf(id)).toContain('key_made');
  });

  it('makes one for one Idempotency-Key, and says which on a repeat', async () => {
    const { browser } = await service.person();
    const wish = { name: 'Once' };
    const header = { 'Idempotency-Key': '"a-request-of-mine-1"' };
    const answers = await Promise.all([1, 2, 3].map(() => browser.call('POST', '/api/keys', wish, header)));
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409]);
    const made = answers.find(({ status }) => status === 201)?.body as unknown as Fresh;
    for (const { status, body, headers, text } of answers) {
      if (status === 201) continue;
      expect(body.code).toBe('already_made');
      expect(headers.location).toBe(`/api/keys/${made.key.id}`);
      expect(body.detail).toContain(made.key.id);
      expect(text).not.toContain(made.secret);
    }
    const other = await browser.call('POST', '/api/keys', { name: 'Another' }, header);
    expect(other.body.errors).toMatchObject([{ pointer: '/Idempotency-Key', code: 'used_before' }]);
    const bad = await browser.call('POST', '/api/keys', wish, { 'Idempotency-Key': 'no spaces please' });
    expect(bad.status).toBe(422);
    const elsewhere = await service.person();
    expect((await elsewhere.browser.call('POST', '/api/keys', wish, header)).status).toBe(201);
  });

  it('is for developers', async () => {
    const { browser } = await service.person({ roles: ['photographer', 'educator'] });
    const answer = await browser.call('POST', '/api/keys', { name: 'No' });
    expect([answer.status, answer.body.code]).toEqual([403, 'role_missing']);
    await browser.call('PUT', '/api/me/roles', { roles: ['photographer', 'developer'] });
    expect((await browser.call('POST', '/api/keys', { name: 'Yes' })).status).toBe(201);
  });

  it('makes none beyond the number that an account may hold', async () => {
    const { browser, id } = await service.person();
    await service.sql(
      "INSERT INTO api_keys (account_id, kind, name) SELECT $1, 'server', 'n' FROM generate_series(1, 49)",
      [id],
    );
    const answers = await Promise.all(
      [1, 2, 3].map(() => browser.call('POST', '/api/keys', { name: 'Last' })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409]);
  });

  it('tells every fault', async () => {
    const { browser } = await service.person();
    const body = { name: '', scopes: ['*', 'flash'], monthlyCap: -1, expiresAt: 'tomorrow', kind: 'page' };
    const { errors } = (await browser.call('POST', '/api/keys', body)).body;
    expect(errors.map(({ pointer }) => pointer).sort()).toEqual([
      '/expiresAt',
      '/kind',
      '/monthlyCap',
      '/name',
      '/scopes',
    ]);
    const past = await browser.call('POST', '/api/keys', { name: 'Late', expiresAt: '2020-01-01T00:00:00Z' });
    expect(past.body.errors).toMatchObject([{ pointer: '/expiresAt', code: 'expiry_in_past' }]);
  });
});

describe('changing a key', () => {
  it('holds at the next call: scopes, cap and expiry', async () => {
    const { browser, id } = await service.person();
    const { key, secret } = await make(browser);
    const change = { name: 'Desk', scopes: ['flash'], monthlyCap: 5, expiresAt: '2099-01-01T00:00:00.000Z' };
    const answer = await browser.call('PATCH', `/api/keys/${key.id}`, change);
    expect([answer.status, answer.body.key]).toMatchObject([200, change]);
    expect((await compute(secret)).status).toBe(403);
    await browser.call('PATCH', `/api/keys/${key.id}`, { scopes: ['exposure'], monthlyCap: 0 });
    expect((await compute(secret)).body).toMatchObject({ code: 'key_cap_reached' });
    await browser.call('PATCH', `/api/keys/${key.id}`, { monthlyCap: null });
    expect((await compute(secret)).status).toBe(200);
    const [event] = await service.sql<{ details: object }>(
      "SELECT details FROM audit_events WHERE account_id = $1 AND event = 'key_changed' ORDER BY id LIMIT 1",
      [id],
    );
    expect(event?.details).toMatchObject({ before: { name: 'Booking page' }, after: { name: 'Desk' } });
  });

  it.each([
    ['revoked', 'revoked_at = now()'],
    ['expired', "expires_at = now() - interval '1 second'"],
    ['a widget’s', "kind = 'page'"],
  ])('changes and rotates no key that is %s', async (_what, sql) => {
    const { browser } = await service.person();
    const { key } = await make(browser);
    await service.sql(`UPDATE api_keys SET ${sql} WHERE id = $1`, [key.id]);
    const answers = [
      await browser.call('PATCH', `/api/keys/${key.id}`, { name: 'Other' }),
      await browser.call('POST', `/api/keys/${key.id}/rotate`, {}),
      await browser.call('POST', `/api/keys/${key.id}/claim`, {}),
      await browser.call('POST', `/api/keys/${key.id}/pass`, {}),
    ];
    for (const { status, body } of answers) expect([status, body.code]).toEqual([409, 'key_settled']);
  });
});

describe('rotating a key', () => {
  const left = ({ expiresAt }: Key) => (new Date(expiresAt ?? 0).getTime() - Date.now()) / 3_600_000;

  it.each([
    ['hour', 1],
    ['day', 24],
    ['week', 168],
  ])('keeps the old one working for a %s', async (grace, hours) => {
    const { browser, id } = await service.person();
    const { key, secret } = await make(browser, { scopes: ['exposure'], monthlyCap: 100 });
    const answer = await browser.call('POST', `/api/keys/${key.id}/rotate`, { grace });
    expect(answer.status).toBe(201);
    const fresh = answer.body as unknown as Fresh;
    expect(fresh.key).toMatchObject({
      scopes: ['exposure'],
      monthlyCap: 100,
      state: 'live',
      expiresAt: null,
    });
    expect((await compute(secret)).status).toBe(200);
    expect((await compute(fresh.secret)).status).toBe(200);
    const old = await keyOf(browser, key.id);
    expect(old).toMatchObject({ state: 'replaced', replacedBy: fresh.key.id });
    expect(left(old)).toBeGreaterThan(hours - 0.1);
    expect(left(old)).toBeLessThanOrEqual(hours);
    await service.sql('UPDATE api_keys SET expires_at = now() WHERE id = $1', [key.id]);
    expect((await compute(secret)).body).toMatchObject({ code: 'key_expired' });
    expect((await browser.call('POST', `/api/keys/${key.id}/rotate`, { grace })).status).toBe(409);
    expect(await eventsOf(id)).toContain('key_rotated');
  });

  it('ends the old one at once without grace, and asks for the password then', async () => {
    const { browser } = await service.person();
    const { key, secret } = await make(browser);
    const rotate = (body: object) => browser.call('POST', `/api/keys/${key.id}/rotate`, body);
    expect((await rotate({ grace: 'none' })).body.code).toBe('password_wrong');
    expect((await rotate({ grace: 'none', password: 'something else entirely' })).status).toBe(403);
    expect((await compute(secret)).status).toBe(200);
    expect((await rotate({ grace: 'none', password: PASSWORD })).status).toBe(201);
    expect((await compute(secret)).status).toBe(401);
  });

  it('never goes beyond the key’s own expiry', async () => {
    const { browser } = await service.person();
    const expiresAt = new Date(Date.now() + 7_200_000).toISOString();
    const { key } = await make(browser, { expiresAt });
    const fresh = (await browser.call('POST', `/api/keys/${key.id}/rotate`, { grace: 'week' }))
      .body as unknown as Fresh;
    expect((await keyOf(browser, key.id)).expiresAt).toBe(expiresAt);
    expect(fresh.key.expiresAt).toBe(expiresAt);
  });
});

describe('revoking a key', () => {
  it('is final, takes effect at the next call, and may be said twice', async () => {
    const { browser, id } = await service.person();
    const { key, secret } = await make(browser);
    for (let i = 0; i < 2; i++)
      expect((await browser.call('POST', `/api/keys/${key.id}/revoke`, {})).body.key).toMatchObject({
        state: 'revoked',
      });
    expect((await compute(secret)).body).toMatchObject({ code: 'key_revoked' });
    expect((await eventsOf(id)).filter((event) => event === 'key_revoked')).toHaveLength(1);
  });
});

describe('an issued key', () => {
  it('is generated by its owner, once, and by nobody else', async () => {
    const { browser, id } = await service.person({ roles: ['photographer'] });
    const [issued] = await service.sql<{ id: string }>(
      "INSERT INTO api_keys (account_id, kind, name, monthly_cap) VALUES ($1, 'server', 'Issued', 10) RETURNING id",
      [id],
    );
    const path = `/api/keys/${issued?.id}/claim`;
    const stranger = await service.person();
    expect((await stranger.browser.call('POST', path, {})).status).toBe(404);
    expect(await keyOf(browser, issued?.id ?? '')).toMatchObject({ state: 'unclaimed', shownPrefix: null });
    const answers = await Promise.all([1, 2, 3].map(() => browser.call('POST', path, {})));
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409]);
    const { secret } = answers.find(({ status }) => status === 201)?.body as unknown as Fresh;
    expect((await compute(secret)).status).toBe(200);
    expect(await eventsOf(id)).toContain('key_claimed');
  });
});
