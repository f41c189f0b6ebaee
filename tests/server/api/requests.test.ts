import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { consoleRoutes } from '../../../server/routes/api/consoleRoutes';
import { PASSWORD, startConsole, type ConsoleService, type Person } from '../../support/consoleService';

let service: ConsoleService;
let person: Person;
beforeAll(async () => {
  service = await startConsole();
  person = await service.person();
});
afterAll(() => service.stop());

const SOME_ID = '6f1c2a5e-0000-4000-8000-00000000000a';
const pathOf = (path: string) => path.replace(':id', SOME_ID);
const changing = consoleRoutes.filter(({ method }) => method !== 'GET');
const closed = consoleRoutes.filter(({ access }) => access === 'session');

describe('every route that changes something', () => {
  it.each(changing.map(({ method, path }) => [method, path]))(
    '%s %s is refused to pages of other sites, to forms and without the header',
    async (method, path) => {
      const cases: Record<string, string | undefined>[] = [
        { 'Sec-Fetch-Site': 'cross-site' },
        { 'Sec-Fetch-Site': 'same-site' },
        { 'Sec-Fetch-Site': 'none' },
        { 'Sec-Fetch-Site': 'cross-site', Origin: service.config.publicUrl },
        { 'Sec-Fetch-Site': undefined },
        { 'Sec-Fetch-Site': undefined, Origin: 'https://elsewhere.example' },
        { 'Sec-Fetch-Site': undefined, Origin: 'null' },
        { 'X-Evenfall-Console': undefined },
        { 'X-Evenfall-Console': '0' },
      ];
      const browser = person.browser.copy(service.newBrowser().address);
      for (const headers of cases) {
        const answer = await browser.call(method, pathOf(path), {}, headers);
        expect([answer.status, answer.body.code, headers]).toEqual([403, 'not_same_origin', headers]);
        expect(answer.cookies).toEqual([]);
      }
      const { status } = await browser.call(method, pathOf(path), 'a=1', {
        'Content-Type': 'application/x-www-form-urlencoded',
      });
      expect(status).toBe(415);
    },
  );

  it('is taken by its Origin alone from a browser that is too old to say more', async () => {
    const headers = { 'Sec-Fetch-Site': undefined, Origin: service.config.publicUrl };
    const answer = await person.browser.call('PATCH', '/api/me', { lengthUnit: 'feet' }, headers);
    expect([answer.status, answer.body.account]).toMatchObject([200, { lengthUnit: 'feet' }]);
  });
});

describe('every route for who is signed in', () => {
  it.each(closed.map(({ method, path }) => [method, path]))(
    '%s %s is refused without a session',
    async (method, path) => {
      const answer = await service.newBrowser().call(method, pathOf(path), {});
      expect([answer.status, answer.body.code]).toEqual([401, 'session_missing']);
      expect(answer.headers['www-authenticate']).toBe('Session realm="evenfall"');
    },
  );

  it('takes no API key for a session', async () => {
    const key = await service.key();
    const headers = { Authorization: `Bearer ${key}` };
    expect((await service.newBrowser().call('GET', '/api/me', undefined, headers)).status).toBe(401);
  });
});

describe('methods and addresses', () => {
  const paths = [...new Set(consoleRoutes.map(({ path }) => path))];

  it.each(paths)('%s answers other methods with 405 and those that it takes', async (path) => {
    const taken: string[] = consoleRoutes.filter((route) => route.path === path).map(({ method }) => method);
    const allowed = [...taken, ...(taken.includes('GET') ? ['HEAD'] : [])].sort().join(', ');
    for (const method of ['GET', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS']) {
      if (taken.includes(method)) continue;
      const answer = await person.browser.copy(service.newBrowser().address).call(method, pathOf(path), {});
      expect([method, answer.status, answer.headers.allow]).toEqual([method, 405, allowed]);
    }
  });

  it('answers an address that is none with 404 in problem details', async () => {
    for (const path of ['/api', '/api/', '/api/keys/', '/api/KEYS', '/api/me/other', '/api/keys/not-an-id']) {
      const answer = await person.browser.call('GET', path);
      expect([path, answer.status, answer.body.code]).toEqual([path, 404, 'not_found']);
      expect(answer.headers['content-type']).toBe('application/problem+json; charset=utf-8');
    }
  });

  it('answers HEAD as GET without a body', async () => {
    const answer = await person.browser.call('HEAD', '/api/me');
    expect([answer.status, answer.text]).toEqual([200, '']);
  });
});

describe('bodies and queries', () => {
  it.each([
    ['no JSON', '{"email":', 'application/json', 400, 'malformed_json'],
    ['a list', '[]', 'application/json', 422, 'invalid_input'],
    ['another type', '<a/>', 'application/xml', 415, 'unsupported_media_type'],
    ['too much', JSON.stringify({ email: 'x'.repeat(40_000) }), 'application/json', 413, 'too_large'],
  ])('refuses %s', async (_what, body, type, status, code) => {
    const answer = await service
      .newBrowser()
      .call('POST', '/api/password-reset', body, { 'Content-Type': type });
    expect([answer.status, answer.body.code]).toEqual([status, code]);
  });

  it('refuses a bad encoding and a name that stands twice in the query', async () => {
    for (const query of ['before=%E0%A4', 'before=1&before=2']) {
      const answer = await person.browser.call('GET', `/api/me/events?${query}`);
      expect([answer.status, answer.body.code]).toEqual([400, 'malformed_request']);
    }
    const unknown = await person.browser.call('GET', '/api/me?admin=1');
    expect(unknown.body.errors).toMatchObject([{ pointer: '/admin', code: 'unknown_field' }]);
  });
});

describe('headers', () => {
  it.each([
    ['an answer', 'GET', '/api/session', 200],
    ['a refusal', 'GET', '/api/nothing', 404],
    ['a sign-in', 'POST', '/api/session', 200],
  ])('of %s keep it from caches, frames and other sites', async (_what, method, path, status) => {
    const browser = person.browser.copy(service.newBrowser().address);
    const answer = await browser.call(method, path, { email: person.email, password: PASSWORD });
    expect(answer.status).toBe(status);
    expect(answer.headers).toMatchObject({
      'cache-control': 'no-store',
      'content-security-policy': "default-src 'none'; frame-ancestors 'none'",
      'cross-origin-resource-policy': 'same-origin',
      'cross-origin-opener-policy': 'same-origin',
      'referrer-policy': 'no-referrer',
      'strict-transport-security': 'max-age=31536000; includeSubDomains',
      'x-content-type-options': 'nosniff',
    });
    expect(answer.headers['x-request-id']).toMatch(/^[\w.-]{8,}$/);
    expect(answer.headers['access-control-allow-origin']).toBeUndefined();
    expect(answer.headers['x-powered-by']).toBeUndefined();
  });
});
