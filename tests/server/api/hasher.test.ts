import { pathToFileURL } from 'node:url';
import { Worker } from 'node:worker_threads';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { WorkerPasswordHasher } from '../../../server/services/passwords/PasswordHasher';
import { testSettings } from '../../support/testSettings';

const hasher = () =>
  new WorkerPasswordHasher({
    cost: 6,
    workerUrl: new URL('password.worker.js', pathToFileURL(`${testSettings().serverFolder}/`)),
  });

afterEach(() => vi.restoreAllMocks());

describe('WorkerPasswordHasher', () => {
  it('runs two hashings at once and no more, and ends all that are asked for', async () => {
    let under = 0;
    let most = 0;
    const post = Object.getOwnPropertyDescriptor(Worker.prototype, 'postMessage')
      ?.value as Worker['postMessage'];
    vi.spyOn(Worker.prototype, 'postMessage').mockImplementation(function (this: Worker, work: unknown) {
      under += 1;
      most = Math.max(most, under);
      this.prependOnceListener('message', () => (under -= 1));
      post.call(this, work);
    });
    const one = hasher();
    const hashes = await Promise.all(
      Array.from({ length: 12 }, (_, i) => one.hash(`a password, number ${i}`)),
    );
    expect(most).toBe(2);
    expect(new Set(hashes).size).toBe(12);
    const fits = await Promise.all(hashes.map((hash, i) => one.verify(`a password, number ${i}`, hash)));
    expect(fits).toEqual(Array.from({ length: 12 }, () => true));
    expect(await one.verify('a password, number 0', hashes[1] ?? null)).toBe(false);
    expect(await one.verify('a password, number 0', null)).toBe(false);
    await one.close();
  });

  it('turns people away with a word when too many wait, instead of letting the queue grow', async () => {
    const one = hasher();
    const asked = Array.from({ length: 200 }, (_, i) => one.hash(`a password, number ${i}`));
    const settled = await Promise.allSettled(asked);
    const refused = settled.filter((result) => result.status === 'rejected');
    expect(refused.length).toBeGreaterThan(100);
    for (const { reason } of refused as PromiseRejectedResult[])
      expect(reason).toMatchObject({ code: 'unavailable', headers: { 'Retry-After': '5' } });
    await one.close();
  });

  it('tells who waits when it is closed', async () => {
    const one = hasher();
    const waiting = Array.from({ length: 10 }, (_, i) => one.hash(`a password, number ${i}`));
    const settled = Promise.allSettled(waiting);
    await one.close();
    expect((await settled).every(({ status }) => status === 'rejected')).toBe(true);
  });
});
