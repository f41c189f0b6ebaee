import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { newKey } from '../../../server/services/keys/keyText';
import { startService, type CallAnswer, type TestService } from '../../support/service';

let service: TestService;
let key: string;
const path = '/v1/exposure/value';
const body = { aperture: 8, shutter: '1/125' };

beforeAll(async () => {
  service = await startService();
  key = await service.key();
});
afterAll(() => service.stop());

/** What every refusal has in common. */
function expectProblem(answer: CallAnswer, status: number, code: string): void {
  expect(answer.status).toBe(status);
  expect(answer.body).toMatchObject({ status, code });
  expect(answer.body.type).toBe(`http://127.0.0.1:4310/problems/${code}`);
  expect(answer.body.instance).toBe(`urn:evenfall:request:${answer.headers['x-request-id']}`);
  expect(answer.headers['cache-control']).toBe('no-store');
  expect(answer.text).not.toMatch(/node_modules|at .*\.ts|select |zod/i);
}

describe('a call without a good key', () => {
  it.each([
    ['no key', {}, 'key_missing'],
    ['another scheme', { headers: { Authorization: 'Basic abc' } }, 'key_missing'],
    ['an empty bearer', { headers: { Authorization: 'Bearer ' } }, 'key_missing'],
    ['nonsense', { key: 'nonsense' }, 'key_invalid'],
    ['an unknown key', { key: newKey('server') }, 'key_invalid'],
  ])('%s is refused with 401 and says how to authenticate', async (_, options, code) => {
    const answer = await service.call('POST', path, { body, ...options });
    expectProblem(answer, 401, code);
    expect(answer.headers['www-authenticate']).toMatch(/^Bearer realm="evenfall"/);
  });

  it('is told a typing error from an unknown key', async () => {
    const mistyped = key.slice(0, -1) + (key.endsWith('a') ? 'b' : 'a');
    const [typo, unknown] = await Promise.all([
      service.call('POST', path, { body, key: mistyped }),
      service.call('POST', path, { body, key: newKey('server') }),
    ]);
    expect(typo.body.detail).toMatch(/typing error/);
    expect(unknown.body.detail).not.toMatch(/typing error/);
  });

  it('is refused when the key was revoked, has expired, or its account is blocked', async () => {
    const other = await service.key({ account: 'blocked@example.org' });
    const where = `WHERE account_id = (SELECT id FROM accounts WHERE email = 'blocked@example.org')`;
    await service.sql(`UPDATE accounts SET blocked_at = now() WHERE email = 'blocked@example.org'`);
    expectProblem(await service.call('POST', path, { key: other, body }), 403, 'account_blocked');
    await service.sql(`UPDATE api_keys SET expires_at = now() ${where}`);
    expectProblem(await service.call('POST', path, { key: other, body }), 401, 'key_expired');
    await service.sql(`UPDATE api_keys SET revoked_at = now() ${where}`);
    expectProblem(await service.call('POST', path, { key: other, body }), 401, 'key_revoked');
  });
});

describe('a call that can’t be read', () => {
  it.each([
    ['text', 'text', { 'Content-Type': 'application/json' }, 400, 'malformed_json'],
    ['an empty body', '', { 'Content-Type': 'application/json' }, 400, 'malformed_json'],
    ['half an object', '{"aperture":', { 'Content-Type': 'application/json' }, 400, 'malformed_json'],
    ['plain text', 'aperture=8', { 'Content-Type': 'text/plain' }, 415, 'unsupported_media_type'],
    [
      'another charset',
      '{}',
      { 'Content-Type': 'application/json; charset=latin1' },
      415,
      'unsupported_media_type',
    ],
    [
      'a compressed body',
      '{}',
      { 'Content-Type': 'application/json', 'Content-Encoding': 'br' },
      415,
      'unsupported_media_type',
    ],
    [
      'a body over 256 KiB',
      JSON.stringify({ a: 'x'.repeat(270_000) }),
      { 'Content-Type': 'application/json' },
      413,
      'too_large',
    ],
  ])('%s is refused', async (_, text, headers, status, code) => {
    expectProblem(await service.call('POST', path, { key, body: text, headers }), status, code);
  });

  it.each([
    ['a repeated name', '?aperture=8&aperture=9&shutter=1', 'malformed_request'],
    ['a bad encoding', '?aperture=%E0%A4%A&shutter=1', 'malformed_request'],
    ['a key in the address', '?aperture=8&shutter=1&api_key=abc', 'malformed_request'],
  ])('%s in the query is refused', async (_, query, code) => {
    expectProblem(await service.call('GET', path + query, { key }), 400, code);
  });

  it('keeps the connection usable after a body that was too large', async () => {
    await service.call('POST', path, {
      key,
      body: JSON.stringify({ a: 'x'.repeat(400_000) }),
      headers: { 'Content-Type': 'application/json' },
    });
    expect((await service.call('POST', path, { key, body })).status).toBe(200);
  });
});

describe('input that can’t be computed', () => {
  it('is told every fault at once, each with its pointer, and costs nothing', async () => {
    const before = await service.call('GET', '/v1/usage', { key });
    const answer = await service.call('POST', path, {
      key,
      body: { aperture: 0, shutter: '1/0', isoo: 100, ndStops: -1, scale: 'quarter' },
    });
    expectProblem(answer, 422, 'invalid_input');
    const pointers = answer.body.errors.map(({ pointer }) => pointer).sort();
    expect(pointers).toEqual(['/aperture', '/isoo', '/ndStops', '/scale', '/shutter']);
    const after = await service.call('GET', '/v1/usage', { key });
    expect(after.body.used).toBe(before.body.used);
  });

  it('names a query’s field as a body’s', async () => {
    const answer = await service.call('GET', `${path}?aperture=wide&shutter=1/125`, { key });
    expectProblem(answer, 422, 'invalid_input');
    expect(answer.body.errors[0]).toMatchObject({ pointer: '/aperture', code: 'not_a_setting' });
  });

  it('is refused by the list of usage’s query too', async () => {
    const answer = await service.call('GET', '/v1/usage?month=5', { key });
    expectProblem(answer, 422, 'invalid_input');
  });
});

describe('an address or method that is not there', () => {
  it('gets 404 in problem details', async () => {
    expectProblem(await service.call('POST', '/v1/exposure/nothing', { key, body }), 404, 'not_found');
    expectProblem(await service.call('GET', '/v1/', { key }), 404, 'not_found');
    expectProblem(await service.call('GET', '/nothing'), 404, 'not_found');
  });

  it.each([
    ['DELETE', path, 'GET, HEAD, OPTIONS, POST'],
    ['PUT', '/v1/exposure/difference', 'OPTIONS, POST'],
    ['POST', '/v1/calculators', 'GET, HEAD, OPTIONS'],
    ['POST', '/v1/usage', 'GET, HEAD, OPTIONS'],
  ])('%s %s gets 405 with what is allowed', async (method, address, allow) => {
    const answer = await service.call(method, address, { key });
    expectProblem(answer, 405, 'method_not_allowed');
    expect(answer.headers.allow).toBe(allow);
  });
});

describe('request ids', () => {
  it('are taken from the caller where they are plain, and made otherwise', async () => {
    const given = await service.call('POST', path, {
      key,
      body,
      headers: { 'X-Request-Id': 'my-request-42' },
    });
    expect(given.headers['x-request-id']).toBe('my-request-42');
    const hostile = await service.call('POST', path, { key, body, headers: { 'X-Request-Id': '<script>' } });
    expect(hostile.headers['x-request-id']).not.toMatch(/script/);
  });
});
