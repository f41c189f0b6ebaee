import { afterAll, beforeAll, expect, it } from 'vitest';
import { loadCalculators } from '../../../shared/calculators';
import { startService, type TestService } from '../../support/service';

const calculators = await loadCalculators();
const examples = calculators.flatMap((calculator) =>
  calculator.examples.map(({ input }) => ({ calculator, input })),
);
let service: TestService;
let key: string;

beforeAll(async () => {
  service = await startService();
  key = await service.key({ units: 50_000 });
});
afterAll(() => service.stop());

const used = async (whose = key) =>
  Number((await service.call('GET', '/v1/usage', { key: whose })).body.used);

interface Result {
  status: number;
  result?: unknown;
  notes?: unknown;
  cautions?: unknown;
  problem?: { code: string; errors?: unknown; instance?: string };
}
const batch = async (calls: unknown, whose = key) => {
  const answer = await service.call('POST', '/v1/batch', { key: whose, body: { calls } });
  return { ...answer, results: (answer.body as unknown as { results: Result[] }).results };
};

it('gives for each item, in order, exactly what the single call gives, for the same units', async () => {
  const before = await used();
  const { results } = await batch(
    examples.map(({ calculator, input }) => ({ calculator: calculator.id, input })),
  );
  const cost = examples.reduce((sum, { calculator }) => sum + calculator.units, 0);
  expect(await used()).toBe(before + cost);
  expect(results).toHaveLength(examples.length);
  for (const [i, { calculator, input }] of examples.entries()) {
    const single = await service.call('POST', `/v1/${calculator.id}`, { key, body: input });
    expect(results[i]).toEqual({ status: 200, ...single.body });
  }
});

it('answers a thousand mixed calls in order', async () => {
  const calls = Array.from({ length: 1000 }, (_, i) =>
    i % 2 === 0
      ? { calculator: 'light/convert', input: { ev100: (i % 40) - 20 } }
      : { calculator: 'exposure/value', input: { aperture: 8, shutter: 1 / (i + 100), readAs: 'exact' } },
  );
  const { status, results } = await batch(calls);
  expect(status).toBe(200);
  expect(results).toHaveLength(1000);
  results.forEach(({ result }, i) => {
    const ev100 = i % 2 === 0 ? (i % 40) - 20 : Math.log2(64 * (i + 100));
    expect((result as { ev100: number }).ev100).toBeCloseTo(ev100, 9);
  });
});

it('lets bad items fail alone, with the single call’s problem, at no cost', async () => {
  const before = await used();
  const { status, results } = await batch([
    { calculator: 'exposure/value', input: { aperture: 0 } },
    { calculator: 'light/convert', input: { ev100: 3 } },
    { calculator: 'exposure/nothing', input: {} },
    { calculator: '__proto__', input: {} },
    { calculator: 'exposure/value', input: null },
  ]);
  expect(status).toBe(200);
  expect(results.map((one) => one.status)).toEqual([422, 200, 404, 404, 422]);
  expect(await used()).toBe(before + 1);
  const single = await service.call('POST', '/v1/exposure/value', { key, body: { aperture: 0 } });
  expect(results[0]?.problem?.errors).toEqual(single.body.errors);
});

it('takes all its units or none, and says what is left', async () => {
  const poor = await service.key({ units: 3 });
  const calls = Array.from({ length: 4 }, () => ({ calculator: 'light/convert', input: { ev100: 1 } }));
  const refused = await batch(calls, poor);
  expect(refused.status).toBe(429);
  expect(refused.body).toMatchObject({ code: 'quota_exhausted' });
  expect(refused.body.detail).toMatch(/costs 4 units; 3 of this month's 3 are left/);
  expect(await used(poor)).toBe(0);
  expect((await batch(calls.slice(1), poor)).status).toBe(200);
  expect(await used(poor)).toBe(3);
});

it.each([
  ['no calls', { calls: [] }, '/calls', /at least 1 item/],
  [
    'more than a thousand',
    { calls: new Array(1001).fill({ calculator: 'a', input: {} }) },
    '/calls',
    /at most 1,000 items/,
  ],
  ['a call without a calculator', { calls: [{ input: {} }] }, '/calls/0/calculator', /missing/],
  ['a field too many', { calls: [{ calculator: 'a', input: {}, key: 1 }] }, '/calls/0/key', /not a field/],
  ['a list in place of the object', [], '', /object/],
])('refuses %s and names the limit', async (_, body, pointer, words) => {
  const { status, body: problem } = await service.call('POST', '/v1/batch', { key, body });
  expect(status).toBe(422);
  expect(problem.errors[0]?.pointer).toBe(pointer);
  expect(problem.errors[0]?.detail).toMatch(words);
});

it('names the limit of a body over 2 MiB, and takes one that is just larger than a single call’s', async () => {
  const large = (bytes: number) => JSON.stringify({ calls: [{ calculator: 'x'.repeat(bytes), input: {} }] });
  const headers = { 'Content-Type': 'application/json' };
  const refused = await service.call('POST', '/v1/batch', { key, body: large(2_100_000), headers });
  expect(refused.status).toBe(413);
  expect(refused.body.detail).toMatch(/2 MiB/);
  expect((await service.call('POST', '/v1/batch', { key, body: large(300_000), headers })).status).toBe(200);
});

it('needs the scope batch and that of each calculator', async () => {
  const narrow = await service.key({ account: 'narrow@example.org' });
  const scopes = (list: string) =>
    service.sql(
      `UPDATE api_keys SET scopes = '${list}' WHERE account_id = (SELECT id FROM accounts WHERE email = 'narrow@example.org')`,
    );
  const calls = [{ calculator: 'light/convert', input: { ev100: 1 } }];
  await scopes('{batch,exposure}');
  expect((await batch(calls, narrow)).body).toMatchObject({ status: 403, code: 'scope_missing' });
  await scopes('{light}');
  expect((await batch(calls, narrow)).status).toBe(403);
  await scopes('{batch,light}');
  expect((await batch(calls, narrow)).status).toBe(200);
});
