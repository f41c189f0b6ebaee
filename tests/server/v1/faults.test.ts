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
