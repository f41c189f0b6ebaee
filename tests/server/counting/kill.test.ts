import { afterAll, beforeAll, expect, it } from 'vitest';
import { countedDatabase, type Caller, type CountedDatabase } from '../../support/countedDatabase';
import { openTestDatabase, type TestDatabase } from '../../support/database';
import { LoadClient, outcomes, served, type Hit } from '../../support/LoadClient';
import { startServiceProcess, type ServiceProcess } from '../../support/serviceProcess';

const ROUNDS = 3;
/** Calls under way at a time, on each process. */
const WIDTH = 32;
/** Answers after which a process is killed; the rounds differ, so that the blow falls elsewhere. */
const UNTIL = [150, 333, 512];

let database: TestDatabase;
let counted: CountedDatabase;
let steady: ServiceProcess;
let client: LoadClient;

beforeAll(async () => {
  database = await openTestDatabase();
  counted = countedDatabase(database.ownerUrl);
  client = new LoadClient();
  steady = await startServiceProcess(database);
}, 60_000);
afterAll(async () => {
  client.close();
  await steady.stop();
  await counted.close();
  await database.drop();
}, 30_000);

/** Keeps calls coming, on `WIDTH` connections, until one of them breaks or it is told to stop. */
function keepAsking(url: string, { keys: [key = ''] }: Caller) {
  const hits: Hit[] = [];
  let isOver = false;
  const work = async () => {
    while (!isOver) {
      const hit = await client.ask({ url, key });
      hits.push(hit);
      if (hit.status === null) isOver = true;
    }
  };
  const done = Promise.all(Array.from({ length: WIDTH }, work));
  const stop = async () => {
    isOver = true;
    await done;
  };
  return { hits, stop, done };
}

async function until(isThere: () => boolean | Promise<boolean>, what: string): Promise<void> {
  const end = performance.now() + 15_000;
  while (!(await isThere())) {
    if (performance.now() > end) throw new Error(`${what} did not happen`);
    await new Promise((resolve) => setTimeout(resolve, 2));
  }
}

/** The database ends what a dead process had sent before its connections are gone. */
const isSettled = async () => {
  const [row] = await counted.sql<{ busy: string }>(
    `SELECT count(*) AS busy FROM pg_stat_activity
     WHERE datname = current_database() AND application_name = 'evenfall-counting' AND state <> 'idle'`,
  );
  return row?.busy === '0';
};

it('that is killed in mid-load has counted all that it served, and no more beside than was under way', async () => {
  for (let round = 0; round < ROUNDS; round += 1) {
    const victim = await startServiceProcess(database);
    const caller = await counted.caller({ units: 1_000_000 });
    const beside = await counted.caller({ units: 1_000_000 });
    const dying = keepAsking(victim.url, caller);
    const living = keepAsking(steady.url, beside);
    await until(() => dying.hits.length >= (UNTIL[round] ?? 0), 'enough answers');
    const inFlight = client.inFlight(victim.url);
    await victim.kill();
    await dying.done;
    await living.stop();
    await until(isSettled, 'an end of the statements');
    const used = await counted.used(caller);
    const answered = served(dying.hits).length;
    process.stdout.write(
      `  kill -9, round ${round + 1}: ${answered} served, ${used} counted: ${used - answered} over; bound: ${inFlight} in flight\n`,
    );
    expect(answered).toBeGreaterThanOrEqual((UNTIL[round] ?? 0) - WIDTH);
    expect(used).toBeGreaterThanOrEqual(answered);
    expect(used - answered).toBeLessThanOrEqual(inFlight);
    // The process beside it went on, undisturbed and exact.
    expect(outcomes(living.hits)).toEqual({ '200': living.hits.length });
    expect(await counted.used(beside)).toBe(living.hits.length);
  }
}, 60_000);

it('that is asked to stop in mid-load answers what it took, to the last call, and counts no other', async () => {
  const leaving = await startServiceProcess(database);
  const caller = await counted.caller({ units: 1_000_000 });
  const load = keepAsking(leaving.url, caller);
  await until(() => load.hits.length >= 200, 'enough answers');
  const askedMs = performance.now();
  const code = await leaving.stop();
  const tookMs = performance.now() - askedMs;
  await load.stop();
  const used = await counted.used(caller);
  process.stdout.write(
    `  stopped: ${served(load.hits).length} served, ${used} counted, gone after ${Math.round(tookMs)} ms\n`,
  );
  expect(code).toBe(0);
  expect(used).toBe(served(load.hits).length);
  expect(tookMs).toBeLessThan(4_000);
}, 60_000);
