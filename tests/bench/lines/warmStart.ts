import { randomBytes } from 'node:crypto';
import { setTimeout as wait } from 'node:timers/promises';
import { freePort } from '../../../server/scripts/support/freePort';
import type { BenchContext } from '../BenchContext';
import type { Measurement } from '../benchLine';
import { endProcess, spawnPinned } from '../parts/part';
import { median } from '../statistics';

const NAME = 'start-warm';
const ROUNDS = 3;
const PATIENCE_MS = 60_000;

/** From the start command to a service that is ready, with everything built and migrated. */
async function startedS({ options }: BenchContext): Promise<number> {
  const port = await freePort('127.0.0.1', {});
  const from = performance.now();
  const child = spawnPinned(null, ['server/scripts/start.mjs'], {
    output: 'quiet',
    env: {
      PORT: String(port),
      DATABASE_URL: options.serviceUrl,
      DATABASE_OWNER_URL: options.ownerUrl,
      SESSION_SECRET: randomBytes(32).toString('base64url'),
    },
  });
  try {
    for (;;) {
      const isReady = await fetch(`http://127.0.0.1:${port}/health/ready`).then(
        ({ ok }) => ok,
        () => false,
      );
      if (isReady) return (performance.now() - from) / 1000;
      if (child.exitCode !== null || performance.now() - from > PATIENCE_MS)
        throw new Error('npm start did not get ready');
      await wait(20);
    }
  } finally {
    await endProcess(child);
  }
}

export const warmStart: Measurement<BenchContext> = {
  names: [NAME],
  async measure(context) {
    await startedS(context);
    const values: number[] = [];
    for (let round = 0; round < ROUNDS; round += 1) values.push(await startedS(context));
    return [{ name: NAME, value: median(values), unit: 's', goal: '< 5' }];
  },
};
