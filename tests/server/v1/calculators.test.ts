import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { loadCalculators } from '../../../shared/calculators';
import { encodeQuery } from '../../../shared/contract/queryCodec';
import { expectAlike } from '../../support/closeTo';
import { startService, type TestService } from '../../support/service';

const calculators = await loadCalculators();
let service: TestService;
let key: string;

beforeAll(async () => {
  service = await startService();
  key = await service.key();
});
afterAll(() => service.stop());

const queryOf = (input: unknown) => new URLSearchParams(encodeQuery(input)).toString();

describe.each(calculators.map((calculator) => [calculator.id, calculator] as const))(
  '%s',
  (id, calculator) => {
    const path = `/v1/${id}`;

    it('answers its examples by POST', async () => {
      for (const { input, output } of calculator.examples) {
        const { status, body } = await service.call('POST', path, { key, body: input });
        expect(status).toBe(200);
        expectAlike(body.result, output);
      }
    });

    it('answers by GET exactly what it answers by POST, or says that GET is not offered', async () => {
      for (const { input } of calculator.examples) {
        const got = await service.call('GET', `${path}?${queryOf(input)}`, { key });
        if (!calculator.answersGet) {
          expect(got.status).toBe(405);
          expect(got.headers.allow).toBe('OPTIONS, POST');
          continue;
        }
        const posted = await service.call('POST', path, { key, body: input });
        // Lists can't be written into a query that the document describes, so such an example is left to POST.
        if (JSON.stringify(input).includes('[')) continue;
        expect(got.status).toBe(200);
        expect(got.body).toEqual(posted.body);
      }
    });

    it('is in the list with its cost, and its schemas can be fetched', async () => {
      const { body } = await service.call('GET', '/v1/calculators');
      const list = (body as unknown as { calculators: Record<string, string>[] }).calculators;
      const entry = list.find((one) => one.id === id);
      expect(entry).toMatchObject({ path, get: calculator.answersGet, units: calculator.units });
      for (const schema of [entry?.inputSchema, entry?.outputSchema]) {
        const fetched = await service.call('GET', schema ?? '');
        expect(fetched.status).toBe(200);
        expect(fetched.body).toHaveProperty('$schema');
      }
    });
  },
);

describe('a GET answer', () => {
  const path = '/v1/exposure/value?aperture=8&shutter=1/125';

  it('carries a tag, and the same call with it gets 304 at no cost', async () => {
    const first = await service.call('GET', path, { key });
    const before = await service.call('GET', '/v1/usage', { key });
    const again = await service.call('GET', path, {
      key,
      headers: { 'If-None-Match': first.headers.etag ?? '' },
    });
    const after = await service.call('GET', '/v1/usage', { key });
    expect(again.status).toBe(304);
    expect(again.text).toBe('');
    expect(again.headers.etag).toBe(first.headers.etag);
    expect(after.body.used).toBe(before.body.used);
    expect(first.headers['cache-control']).toBe('private, max-age=86400');
  });

  it('has another tag for another input, and the same for the same input written otherwise', async () => {
    const tag = async (query: string) =>
      (await service.call('GET', `/v1/exposure/value?${query}`, { key })).headers.etag;
    const first = await tag('aperture=8&shutter=1/125');
    expect(await tag('shutter=1/125&aperture=8')).toBe(first);
    expect(await tag('aperture=8&shutter=1/60')).not.toBe(first);
  });

  it('is headers alone for HEAD', async () => {
    const { status, text, headers } = await service.call('HEAD', path, { key });
    expect(status).toBe(200);
    expect(text).toBeFalsy();
    expect(Number(headers['content-length'])).toBeGreaterThan(100);
  });
});
