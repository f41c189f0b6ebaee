import { afterAll, beforeAll, expect, it } from 'vitest';
import { withClient } from '../../../server/scripts/cluster/prepareDatabase';
import { countedDatabase, type Caller, type CountedDatabase } from '../../support/countedDatabase';
import { FaultCluster } from '../../support/FaultCluster';
import { LoadClient, outcomes, served, type Hit } from '../../support/LoadClient';
import { startServiceProcess, type ServiceProcess } from '../../support/serviceProcess';

const WIDTH = 16;
/** What a caller waits before the next call when one was turned away. */
const PACE_MS = 20;
const AWAY_MS = 1_500;
/** No call may hang longer, whatever the database does. */
const HANG_MS = 1_000;
const RECOVERY_MS = 2_000;

let cluster: FaultCluster;
let counted: CountedDatabase;
let service: ServiceProcess;
let client: LoadClient;

beforeAll(async () => {
  cluster = await FaultCluster.open();
  counted = countedDatabase(cluster.ownerUrl);
  client = new LoadClient();
  service = await startServiceProcess(cluster);
}, 90_000);
afterAll(async () => {
  client.close();
  await service.stop();
  await counted.close();
  await cluster.close();
}, 60_000);

const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));
const look = async (path: string) => {
  const startedMs = performance.now();
  const answer = await fetch(service.url + path);
  await answer.text();
  const { status, headers } = answer;
  return { status, retryAfter: headers.get('retry-after'), tookMs: performance.now() - startedMs };
};

/** Keeps calls coming until it is told to stop. */
function keepAsking({ keys: [key = ''] }: Caller) {
  const hits: Hit[] = [];
  const end = new AbortController();
  const work = async () => {
    while (!end.signal.aborted) {
      const hit = await client.ask({ url: service.url, key });
      hits.push(hit);
      if (hit.status !== 200) await pause(PACE_MS);
    }
  };
  const done = Promise.all(Array.from({ length: WIDTH }, work));
  const stop = async () => {
    end.abort();
    await done;
    return hits;
  };
  return { hits, stop };
}

async function until(isThere: () => boolean, withinMs: number, what: string): Promise<void> {
  const end = performance.now() + withinMs;
  while (!isThere()) {
    if (performance.now() > end) throw new Error(`no ${what} within ${withinMs} ms`);
    await pause(2);
  }
}

const END_CONNECTIONS = `
SELECT pg_terminate_backend(pid) FROM pg_stat_activity
WHERE datname = current_database() AND usename = current_user AND application_name LIKE 'evenfall-%'`;

interface Outage {
  /** Takes the database away. */
  readonly begin: () => unknown;
  /** Brings it back; what is measured as recovery begins when this is done. */
  readonly end: () => unknown;
}

/** An outage in mid-load: what the callers saw, and what was counted in the end. */
async function outage({ begin, end }: Outage) {
  const caller = await counted.caller({ units: 10_000_000 });
  const load = keepAsking(caller);
  const answered = () => served(load.hits).length;
  await until(() => answered() >= 100, 10_000, 'service before the outage');
  await begin();
  const awayMs = performance.now();
  await until(() => load.hits.some(({ status }) => status === 503), 2_000, '503');
  const meanwhile = [
    await look('/health/ready'),
    await look('/health/live'),
    await look('/metrics'),
  ] as const;
  await pause(Math.max(0, awayMs + AWAY_MS - performance.now()));
  const whileAway = load.hits.filter(({ sentMs }) => sentMs > awayMs).length;
  await end();
  const backMs = performance.now();
  const isServedAnew = ({ status, sentMs }: Hit) => status === 200 && sentMs > awayMs + AWAY_MS;
  await until(() => load.hits.some(isServedAnew), RECOVERY_MS, 'service after the outage');
  const recoveryMs = performance.now() - backMs;
  const ready = await look('/health/ready');
  await until(() => load.hits.filter(isServedAnew).length >= 100, 10_000, 'steady service');
  const hits = await load.stop();
  const used = await counted.used(caller);
  return { hits, used, recoveryMs, meanwhile, ready, whileAway };
}

/** What holds for every outage. */
function expectHonest(name: string, seen: Awaited<ReturnType<typeof outage>>, bound = WIDTH): void {
  const { hits, used, recoveryMs, meanwhile, ready, whileAway } = seen;
  const answered = served(hits).length;
  const longestMs = Math.max(...hits.map(({ tookMs }) => tookMs));
  process.stdout.write(
    `  ${name}: ${answered} served, ${used} counted (bound ${bound}), ${whileAway} asked while away, longest ${Math.round(longestMs)} ms, back after ${Math.round(recoveryMs)} ms\n`,
  );
  expect(Object.keys(outcomes(hits)).sort()).toEqual(['200', '503 unavailable']);
  for (const { status, retryAfterS } of hits) if (status === 503) expect(retryAfterS).toBe(1);
  expect(used).toBeGreaterThanOrEqual(answered);
  expect(used - answered).toBeLessThanOrEqual(bound);
  expect(longestMs).toBeLessThan(HANG_MS);
  expect(whileAway).toBeGreaterThan(WIDTH);
  expect(recoveryMs).toBeLessThan(RECOVERY_MS);
  const [notReady, live, metrics] = meanwhile;
  expect(notReady).toMatchObject({ status: 503, retryAfter: '1' });
  expect(live.status).toBe(200);
  // Who looks after the service needs its figures most of all now.
  expect(metrics.status).toBe(200);
  for (const { tookMs } of meanwhile) expect(tookMs).toBeLessThan(HANG_MS);
  expect(ready.status).toBe(200);
}

it('turns calls away while the database is killed, and serves again as soon as it is back', async () => {
  expectHonest('killed', await outage({ begin: () => cluster.kill(), end: () => cluster.start() }));
}, 60_000);

it('turns calls away while the database is stopped, and serves again as soon as it is back', async () => {
  expectHonest('stopped', await outage({ begin: () => cluster.stop(), end: () => cluster.start() }));
}, 60_000);

it('lets no call hang while the database is frozen, and serves again as soon as it moves', async () => {
  expectHonest('frozen', await outage({ begin: () => cluster.freeze(), end: () => cluster.thaw() }));
}, 60_000);

it('loses no count when its connections are ended again and again in mid-load', async () => {
  const caller = await counted.caller({ units: 10_000_000 });
  const load = keepAsking(caller);
  const ROUNDS = 4;
  let recoveryMs = 0;
  for (let round = 0; round < ROUNDS; round += 1) {
    const before = served(load.hits).length;
    await until(() => served(load.hits).length >= before + 50, 10_000, 'service');
    await withClient(cluster.serviceUrl, (service) => service.query(END_CONNECTIONS));
    const endedMs = performance.now();
    const isAfter = ({ status, sentMs }: Hit) => status === 200 && sentMs > endedMs;
    await until(() => load.hits.some(isAfter), RECOVERY_MS, 'service after the connections were ended');
    recoveryMs = Math.max(recoveryMs, performance.now() - endedMs);
  }
  const hits = await load.stop();
  const used = await counted.used(caller);
  const answered = served(hits).length;
  const bound = ROUNDS * WIDTH;
  process.stdout.write(
    `  connections ended ${ROUNDS} times: ${answered} served, ${used} counted (bound ${bound}), back after ${Math.round(recoveryMs)} ms at most\n`,
  );
  for (const { status } of hits) expect([200, 503]).toContain(status);
  expect(used).toBeGreaterThanOrEqual(answered);
  expect(used - answered).toBeLessThanOrEqual(bound);
}, 60_000);
