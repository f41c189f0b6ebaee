import { afterAll, beforeAll, expect, it, vi } from 'vitest';
import { loadCalculators } from '../../../shared/calculators';
import { startService, type TestService } from '../../support/service';

const body = { aperture: 8, shutter: '1/125' };
let service: TestService;

beforeAll(async () => {
  service = await startService();
});
afterAll(() => service.stop());

async function unitsUsed(key: string): Promise<unknown> {
  const { body: usage } = await service.call('GET', '/v1/usage', { key });
  return (usage as { used?: number }).used;
}

it('gives back what a call cost when the calculation fails, and tells the caller nothing of the inside', async () => {
  const calculator = (await loadCalculators()).find(({ id }) => id === 'exposure/value');
  if (!calculator) throw new Error('exposure/value is gone');
  const key = await service.key();
  await service.call('POST', '/v1/exposure/value', { key, body });
  const before = await unitsUsed(key);
  expect(before).toBe(1);
  const compute = vi.spyOn(calculator, 'compute').mockImplementation(() => {
    throw new Error('an inner secret');
  });
  const failed = await service.call('POST', '/v1/exposure/value', { key, body });
  compute.mockRestore();
  expect([failed.status, failed.body.code]).toEqual([500, 'internal_error']);
  expect(failed.text).not.toContain('secret');
  await vi.waitFor(async () => expect(await unitsUsed(key)).toBe(before), { timeout: 5_000 });
});

it('gives back a whole batch when one of its calculations fails, and counts it nowhere as used', async () => {
  const calculator = (await loadCalculators()).find(({ id }) => id === 'exposure/value');
  if (!calculator) throw new Error('exposure/value is gone');
  const key = await service.key({ account: 'batch-fault@example.org' });
  const light = { calculator: 'light/convert', input: { ev100: 9 } };
  const calls = [light, { calculator: 'exposure/value', input: body }, light];
  const compute = vi.spyOn(calculator, 'compute').mockImplementation(() => {
    throw new Error('an inner secret');
  });
  const failed = await service.call('POST', '/v1/batch', { key, body: { calls } });
  compute.mockRestore();
  expect([failed.status, failed.body.code]).toEqual([500, 'internal_error']);
  expect(failed.text).not.toContain('secret');
  await vi.waitFor(async () => expect(await unitsUsed(key)).toBe(0), { timeout: 5_000 });
  expect((await service.call('POST', '/v1/batch', { key, body: { calls } })).status).toBe(200);
  expect(await unitsUsed(key)).toBe(3);
  const hours = () =>
    service.sql<{ status_class: number; calls: number; units: string }>(
      `SELECT u.status_class, u.calls, u.units FROM usage_hours u JOIN api_keys k ON k.id = u.key_id
       JOIN accounts a ON a.id = k.account_id
       WHERE a.email = 'batch-fault@example.org' AND u.calculator = 'batch' ORDER BY 1`,
    );
  const expected = [
    { status_class: 2, calls: 1, units: '3' },
    { status_class: 5, calls: 1, units: '0' },
  ];
  await vi.waitFor(async () => expect(await hours()).toEqual(expected), { timeout: 8_000, interval: 50 });
});

it('serves nothing while it can’t count, says when to come back, and counts again by itself', async () => {
  const key = await service.key();
  await service.sql('ALTER FUNCTION meter_take RENAME TO meter_gone');
  const refused = await service.call('POST', '/v1/exposure/value', { key, body });
  const usage = await service.call('GET', '/v1/usage', { key });
  await service.sql('ALTER FUNCTION meter_gone RENAME TO meter_take');
  expect([refused.status, refused.body.code]).toEqual([503, 'unavailable']);
  expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0);
  expect(usage.status).toBe(503);
  const again = () => service.call('POST', '/v1/exposure/value', { key, body });
  await vi.waitFor(async () => expect((await again()).status).toBe(200), { timeout: 5_000 });
  expect(await unitsUsed(key)).toBe(1);
});
