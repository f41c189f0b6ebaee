import { afterAll, beforeAll, expect, it } from 'vitest';
import { withClient } from '../../../server/scripts/cluster/prepareDatabase';
import { FaultCluster } from '../../support/FaultCluster';

let cluster: FaultCluster;
beforeAll(async () => {
  cluster = await FaultCluster.open();
}, 60_000);
afterAll(() => cluster.close());

const answersOf = () =>
  withClient(cluster.ownerUrl, async (client) => (await client.query<{ n: number }>('SELECT 1 AS n')).rows);

it('stands still while it is frozen, and answers what was asked meanwhile once it is thawed', async () => {
  await withClient(cluster.ownerUrl, async (client) => {
    cluster.freeze();
    let isAnswered = false;
    const answer = client.query('SELECT 1').then(() => {
      isAnswered = true;
    });
    await expect
      .poll(() => isAnswered, { timeout: 300 })
      .toBe(true)
      .catch(() => undefined);
    expect(isAnswered).toBe(false);
    cluster.thaw();
    await answer;
    expect(isAnswered).toBe(true);
  });
});

it('is gone at once when it is killed, and comes back on the same port with what was committed', async () => {
  await withClient(cluster.ownerUrl, async (client) => {
    client.on('error', () => undefined);
    await client.query('CREATE TABLE kept AS SELECT 7 AS n');
  });
  cluster.kill();
  await expect(answersOf()).rejects.toThrow();
  await cluster.start();
  await withClient(cluster.serviceUrl, async (client) => {
    expect((await client.query('SELECT n FROM kept')).rows).toEqual([{ n: 7 }]);
  });
});

it('cuts off its clients when it is stopped, and can be started again', async () => {
  await cluster.stop();
  await expect(answersOf()).rejects.toThrow();
  await cluster.start();
  expect(await answersOf()).toEqual([{ n: 1 }]);
});
