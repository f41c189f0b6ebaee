import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { hashOfKey, newKey, shownPartsOf } from '../../../server/services/keys/keyText';
import { startService, type TestService } from '../../support/service';

const OWN = 'http://127.0.0.1:4310';
const LISTED = 'https://lessons.example.org';
const path = '/v1/exposure/value';
const body = { aperture: 8, shutter: '1/125' };
let service: TestService;
let serverKey: string;
let pageKey: string;

/** A page key as a widget will have it: for some sites, with a scope. */
async function makePageKey(account: string): Promise<string> {
  const key = newKey('page');
  const { shownPrefix, lastFour } = shownPartsOf(key);
  await service.sql(
    `INSERT INTO api_keys (id, account_id, kind, name, hash, shown_prefix, last_four, scopes, allowed_sites, claimed_at)
     SELECT $1, id, 'page', 'lesson', $2, $3, $4, '{exposure}', $5, now() FROM accounts WHERE email = $6`,
    [randomUUID(), hashOfKey(key), shownPrefix, lastFour, `{${LISTED}}`, account],
  );
  return key;
}

beforeAll(async () => {
  service = await startService();
  serverKey = await service.key({ account: 'kinds@example.org' });
  pageKey = await makePageKey('kinds@example.org');
});
afterAll(() => service.stop());

describe('who may call from where', () => {
  it.each([
    ['a server key from no page', 'server', undefined, 200, undefined],
    ['a server key from a page of our own', 'server', OWN, 200, undefined],
    ['a server key from another site’s page', 'server', LISTED, 403, 'server_key_in_browser'],
    ['a server key from a page without a site', 'server', 'null', 403, 'server_key_in_browser'],
    ['a page key from a listed site', 'page', LISTED, 200, undefined],
    [
      'a page key from a site that only begins alike',
      'page',
      `${LISTED}.evil.example`,
      403,
      'origin_not_allowed',
    ],
    [
      'a page key from a listed host by plain http',
      'page',
      LISTED.replace('https', 'http'),
      403,
      'origin_not_allowed',
    ],
    ['a page key from another port of a listed host', 'page', `${LISTED}:8443`, 403, 'origin_not_allowed'],
    ['a page key from no page', 'page', undefined, 403, 'origin_not_allowed'],
    ['a page key from a page without a site', 'page', 'null', 403, 'origin_not_allowed'],
  ] as const)('%s', async (_, kind, origin, status, code) => {
    const key = kind === 'page' ? pageKey : serverKey;
    const headers: Record<string, string> = origin === undefined ? {} : { Origin: origin };
    const answer = await service.call('POST', path, { key, body, headers });
    expect([answer.status, answer.body.code]).toEqual([status, code]);
    // Also a refusal is readable where it came from, and never with cookies.
    expect(answer.headers['access-control-allow-origin']).toBe(origin);
    expect(answer.headers['access-control-allow-credentials']).toBeUndefined();
    expect(answer.headers.vary).toContain('Origin');
  });

  it('holds a page key to its scopes on a listed site', async () => {
    const headers = { Origin: LISTED };
    const answer = await service.call('POST', '/v1/light/convert', {
      key: pageKey,
      body: { ev100: 1 },
      headers,
    });
    expect([answer.status, answer.body.code]).toEqual([403, 'scope_missing']);
  });

  it('answers a preflight of any site, naming methods and headers, without a key', async () => {
    const headers = {
      Origin: 'https://anywhere.example',
      'Access-Control-Request-Method': 'POST',
      'Access-Control-Request-Headers': 'authorization, content-type',
    };
    const { status, headers: told } = await service.call('OPTIONS', path, { headers });
    expect(status).toBe(204);
    expect(told['access-control-allow-methods']?.split(', ').sort()).toEqual(['GET', 'HEAD', 'POST']);
    expect(told['access-control-allow-headers']).toMatch(/Authorization.*Content-Type/);
    expect(told['access-control-allow-origin']).toBe('*');
  });

  it('tells in a server key’s log that it was used in a page', async () => {
    const key = await service.key({ account: 'in-a-page@example.org' });
    const refused = await service.call('POST', path, { key, body, headers: { Origin: LISTED } });
    await vi.waitFor(
      async () => {
        const [line] = await service.sql<{ calls: { code?: string; request: string }[] }>(
          `SELECT l.calls FROM request_log l JOIN api_keys k ON k.id = l.key_id JOIN accounts a ON a.id = k.account_id
           WHERE a.email = 'in-a-page@example.org'`,
        );
        expect(line?.calls).toMatchObject([
          { code: 'server_key_in_browser', request: refused.headers['x-request-id'] },
        ]);
      },
      { timeout: 8_000 },
    );
  });

  it('costs nothing to be refused', async () => {
    const before = (await service.call('GET', '/v1/usage', { key: serverKey })).body as unknown as {
      used: number;
    };
    await service.call('POST', path, { key: serverKey, body, headers: { Origin: LISTED } });
    await service.call('POST', path, { key: pageKey, body });
    const after = (await service.call('GET', '/v1/usage', { key: serverKey })).body as unknown as {
      used: number;
    };
    expect(after.used).toBe(before.used);
  });
});

describe('limits that are told', () => {
  it('stand in the headers of every answer to a good key, and count down', async () => {
    const key = await service.key({ units: 5, rate: 7 });
    const first = await service.call('POST', path, { key, body });
    expect(first.headers['ratelimit-policy']).toMatch(/"burst";q=\d+;w=\d+, "month";q=5;w=\d+/);
    expect(first.headers.ratelimit).toMatch(/"burst";r=\d+;t=\d+, "month";r=4;t=\d+/);
    expect(first.headers['evenfall-quota-limit']).toBe('5');
    expect(first.headers['evenfall-quota-remaining']).toBe('4');
    expect(Number(first.headers['evenfall-quota-reset'])).toBeGreaterThan(0);
    const faulty = await service.call('POST', path, { key, body: {} });
    expect([faulty.status, faulty.headers['evenfall-quota-remaining']]).toEqual([422, '4']);
    for (let i = 0; i < 4; i += 1) await service.call('POST', path, { key, body });
    const over = await service.call('POST', path, { key, body });
    expect([over.status, over.body.code]).toEqual([429, 'quota_exhausted']);
    expect(over.headers['evenfall-quota-remaining']).toBe('0');
    // Until the month ends, which is when there is more.
    const waitS = Number(over.headers['retry-after']);
    expect(Math.abs(waitS - Number(over.headers['evenfall-quota-reset']))).toBeLessThanOrEqual(1);
  });

  it('say when to come back where calls come too fast', async () => {
    const key = await service.key({ rate: 1 });
    const answers = await Promise.all(
      Array.from({ length: 12 }, () => service.call('POST', path, { key, body })),
    );
    const refused = answers.filter(({ status }) => status === 429);
    expect(refused.length).toBeGreaterThan(0);
    for (const { body: problem, headers } of refused) {
      expect(problem.code).toBe('rate_limited');
      expect(Number(headers['retry-after'])).toBeGreaterThanOrEqual(1);
    }
  });
});
