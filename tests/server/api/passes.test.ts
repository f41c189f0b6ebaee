import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startConsole, type Browser, type ConsoleService } from '../../support/consoleService';

let service: ConsoleService;
beforeAll(async () => {
  service = await startConsole();
});
afterAll(() => service.stop());

interface Fresh {
  readonly key: { readonly id: string };
  readonly secret: string;
}

async function make(browser: Browser, wish: object = {}): Promise<Fresh> {
  const answer = await browser.call('POST', '/api/keys', { name: 'Booking page', ...wish });
  expect(answer.status).toBe(201);
  return answer.body as unknown as Fresh;
}

const keyOf = async (browser: Browser, id: string) =>
  ((await browser.call('GET', `/api/keys/${id}`)).body as unknown as { key: { usedThisMonth: number } }).key;

const VALUE = { aperture: 'f/8', shutter: '1/125' };
const compute = (key: string, headers: Record<string, string> = {}) =>
  service.call('POST', '/v1/exposure/value', { key, body: VALUE, headers });

describe('a pass', () => {
  const OWN = { 'Sec-Fetch-Site': 'same-origin' };

  async function passOf(browser: Browser, keyId: string): Promise<string> {
    const answer = await browser.call('POST', `/api/keys/${keyId}/pass`, {});
    expect(answer.status).toBe(201);
    const { pass, expiresAt } = answer.body as unknown as { pass: string; expiresAt: string };
    const minutes = (new Date(expiresAt).getTime() - Date.now()) / 60_000;
    expect(minutes).toBeGreaterThan(9.8);
    expect(minutes).toBeLessThanOrEqual(10.1);
    return pass;
  }

  it('works like its key, and is charged to it', async () => {
    const { browser } = await service.person();
    const { key, secret } = await make(browser, { scopes: ['exposure'], monthlyCap: 4 });
    const pass = await passOf(browser, key.id);
    expect(pass).toMatch(/^evenfall_pass_[0-9A-Za-z]{38}$/);
    const own = { ...OWN, Origin: service.config.publicUrl };
    const together = await Promise.all([compute(pass, OWN), compute(secret), compute(pass, own)]);
    expect(together.map(({ status }) => status)).toEqual([200, 200, 200]);
    expect((await keyOf(browser, key.id)).usedThisMonth).toBe(3);
    const mixed = await Promise.all([
      compute(secret),
      compute(pass, OWN),
      compute(secret),
      compute(pass, OWN),
    ]);
    expect(mixed.filter(({ status }) => status === 200)).toHaveLength(1);
    expect((await keyOf(browser, key.id)).usedThisMonth).toBe(4);
    const usage = await service.call('GET', '/v1/usage', { key: pass, headers: OWN });
    expect(usage.body).toMatchObject({ used: 4, key: { used: 4, cap: 4 } });
    const flash = await service.call('POST', '/v1/flash/falloff', {
      key: pass,
      body: { distanceM: [1, 2], referenceM: 1 },
      headers: OWN,
    });
    expect(flash.status).toBe(403);
  });

  it('is good for the console’s own pages alone, at every call', async () => {
    const { browser } = await service.person();
    const { key } = await make(browser);
    const pass = await passOf(browser, key.id);
    expect((await compute(pass, OWN)).status).toBe(200);
    for (const headers of [
      {},
      { 'Sec-Fetch-Site': 'cross-site' },
      { 'Sec-Fetch-Site': 'none' },
      { ...OWN, Origin: 'https://elsewhere.example' },
      { Origin: service.config.publicUrl },
    ]) {
      const { status, body } = await compute(pass, headers as Record<string, string>);
      expect([headers, status, body.code]).toEqual([headers, 403, 'origin_not_allowed']);
    }
  });

  it.each([
    [
      'its ten minutes',
      async (passHash: string) => {
        await service.sql("UPDATE key_passes SET expires_at = now() WHERE encode(hash, 'hex') = $1", [
          passHash,
        ]);
      },
    ],
    [
      'its session',
      async (passHash: string) => {
        await service.sql(
          `UPDATE sessions SET ended_at = now(), end_reason = 'ended'
         WHERE id = (SELECT session_id FROM key_passes WHERE encode(hash, 'hex') = $1)`,
          [passHash],
        );
      },
    ],
  ])('ends with %s', async (_what, end) => {
    const { browser } = await service.person();
    const { key } = await make(browser);
    const pass = await passOf(browser, key.id);
    await end(createHash('sha256').update(pass).digest('hex'));
    const { status, body } = await compute(pass, OWN);
    expect([status, body.code]).toEqual([401, 'key_expired']);
  });

  it('ends with its key, and with signing out', async () => {
    const { browser } = await service.person();
    const { key } = await make(browser);
    const pass = await passOf(browser, key.id);
    await browser.call('POST', `/api/keys/${key.id}/revoke`, {});
    expect((await compute(pass, OWN)).status).toBe(401);
    const second = await make(browser);
    const other = await passOf(browser, second.key.id);
    await browser.call('DELETE', '/api/session');
    expect((await compute(other, OWN)).status).toBe(401);
  });

  it('is stored as a hash only, and made up ones are not known', async () => {
    const { browser } = await service.person();
    const { key } = await make(browser);
    const pass = await passOf(browser, key.id);
    const [row] = await service.sql<{ all: string }>(
      'SELECT p::text AS all FROM key_passes p WHERE key_id = $1',
      [key.id],
    );
    expect(row?.all).not.toContain(pass);
    expect((await compute(`${pass.slice(0, -1)}${pass.endsWith('A') ? 'B' : 'A'}`, OWN)).status).toBe(401);
  });
});
