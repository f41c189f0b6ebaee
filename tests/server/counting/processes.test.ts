import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { countedDatabase, type CountedDatabase } from '../../support/countedDatabase';
import { openTestDatabase, type TestDatabase } from '../../support/database';
import { LoadClient, outcomes, served, servedUnits, type Shot } from '../../support/LoadClient';
import { startServiceProcess, type ServiceProcess } from '../../support/serviceProcess';

const LIMIT = 777;
/** Calls under way at a time, over all processes. */
const WIDTH = 48;

let database: TestDatabase;
let counted: CountedDatabase;
let processes: ServiceProcess[];
let client: LoadClient;

beforeAll(async () => {
  database = await openTestDatabase();
  counted = countedDatabase(database.ownerUrl);
  client = new LoadClient();
  processes = await Promise.all([1, 2, 3].map(() => startServiceProcess(database)));
}, 60_000);
afterAll(async () => {
  client.close();
  await Promise.all(processes.map((one) => one.stop()));
  await counted.close();
  await database.drop();
}, 30_000);

const urls = (count = 3) => processes.slice(0, count).map(({ url }) => url);

/** `count` things, each made from its number and the process whose turn it is. */
function shots(count: number, make: (i: number, url: string) => Shot, among = urls()): Shot[] {
  return Array.from({ length: count }, (_, i) => make(i, among[i % among.length] ?? ''));
}

const print = (line: string) => process.stdout.write(`  ${line}\n`);

describe('one quota over several processes', () => {
  it.each([2, 3])(
    'of %i is served to the last unit and not beyond, with three times as much asked',
    async (count) => {
      const caller = await counted.caller({ units: LIMIT });
      const [key = ''] = caller.keys;
      const hits = await client.offer(
        shots(3 * LIMIT, (_, url) => ({ url, key }), urls(count)),
        WIDTH,
      );
      const used = await counted.used(caller);
      print(`${count} processes, one key: ${served(hits).length} served, ${used} counted of ${LIMIT}`);
      expect(outcomes(hits)).toEqual({ '200': LIMIT, '429 quota_exhausted': 2 * LIMIT });
      expect(used).toBe(LIMIT);
    },
  );

  it('holds for all keys of the account together', async () => {
    const caller = await counted.caller({ units: LIMIT, keys: 5 });
    const hits = await client.offer(
      shots(3 * LIMIT, (i, url) => ({ url, key: caller.keys[i % 5] ?? '' })),
      WIDTH,
    );
    expect(outcomes(hits)).toEqual({ '200': LIMIT, '429 quota_exhausted': 2 * LIMIT });
    expect(await counted.used(caller)).toBe(LIMIT);
    const byKey = await Promise.all(caller.keys.map((key) => counted.keyUsed(key)));
    print(`5 keys of one account: ${served(hits).length} served, ${byKey.join(' + ')} counted`);
    expect(byKey).toEqual(
      caller.keys.map((key) => served(hits).filter(({ shot }) => shot.key === key).length),
    );
  });

  it('leaves a key’s own cap exact as well, and its account’s other keys alone', async () => {
    const caller = await counted.caller({ units: LIMIT, keys: 2 });
    const [capped = '', free = ''] = caller.keys;
    const cap = 150;
    await counted.sql(`UPDATE api_keys SET monthly_cap = $1 WHERE hash = sha256(convert_to($2, 'UTF8'))`, [
      cap,
      capped,
    ]);
    const hits = await client.offer(
      shots(3 * cap + 500, (i, url) => ({ url, key: i % 19 < 9 ? capped : free })),
      WIDTH,
    );
    const ofCapped = hits.filter(({ shot }) => shot.key === capped);
    const ofFree = hits.filter(({ shot }) => shot.key === free);
    print(
      `cap ${cap}: ${served(ofCapped).length} served of ${ofCapped.length}, ${served(ofFree).length} beside it`,
    );
    expect(ofCapped.length).toBeGreaterThanOrEqual(3 * cap);
    expect(outcomes(ofCapped)).toEqual({ '200': cap, '429 key_cap_reached': ofCapped.length - cap });
    expect(outcomes(ofFree)).toEqual({ '200': ofFree.length });
    expect(await counted.keyUsed(capped)).toBe(cap);
    expect(await counted.used(caller)).toBe(cap + ofFree.length);
  });

  it('takes batches of mixed sizes whole or not at all', async () => {
    const caller = await counted.caller({ units: LIMIT });
    const [key = ''] = caller.keys;
    const sizes = [1, 40, 3, 17, 8, 64, 2, 29];
    const batch = (size: number, url: string): Shot => ({
      url,
      key,
      path: '/v1/batch',
      body: {
        calls: Array.from({ length: size }, () => ({ calculator: 'light/convert', input: { ev100: 9 } })),
      },
      units: size,
    });
    const hits = await client.offer(
      shots(120, (i, url) => batch(sizes[i % sizes.length] ?? 1, url)),
      12,
    );
    const used = await counted.used(caller);
    const left = LIMIT - used;
    print(`batches: ${servedUnits(hits)} units served, ${used} counted of ${LIMIT}`);
    expect(used).toBe(servedUnits(hits));
    expect(used).toBeLessThanOrEqual(LIMIT);
    const refused = hits.filter(({ code }) => code === 'quota_exhausted');
    expect(refused.length + served(hits).length).toBe(hits.length);
    // Whoever was refused would not have fitted, neither then nor into what was left in the end.
    for (const { shot } of refused) expect(shot.units).toBeGreaterThan(left);
  });

  it('is each account’s own', async () => {
    const limits = [300, 500];
    const callers = await Promise.all(limits.map((units) => counted.caller({ units })));
    const hits = await client.offer(
      shots(3 * 800, (i, url) => ({ url, key: callers[i % 8 < 3 ? 0 : 1]?.keys[0] ?? '' })),
      WIDTH,
    );
    for (const [i, caller] of callers.entries()) {
      const own = hits.filter(({ shot }) => caller.keys.includes(shot.key));
      const limit = limits[i] ?? 0;
      expect(outcomes(own)).toEqual({ '200': limit, '429 quota_exhausted': own.length - limit });
      expect(await counted.used(caller)).toBe(limit);
    }
  });

  it('never lets batches of statements wait for each other in a circle, in whatever order accounts come', async () => {
    const callers = await Promise.all(
      Array.from({ length: 24 }, () => counted.caller({ units: 40, keys: 2 })),
    );
    const keys = callers.flatMap(({ keys: own }) => own);
    // A stride that has no factor in common with the number of keys brings them in another order to each process.
    const hits = await client.offer(
      shots(2400, (i, url) => ({ url, key: keys[(i * 29 + (i % 3) * 7) % keys.length] ?? '' })),
      WIDTH,
    );
    for (const caller of callers) {
      const own = hits.filter(({ shot }) => caller.keys.includes(shot.key));
      expect(await counted.used(caller)).toBe(Math.min(40, own.length));
      expect(served(own)).toHaveLength(Math.min(40, own.length));
    }
    expect(Object.keys(outcomes(hits)).sort()).toEqual(['200', '429 quota_exhausted']);
    expect(await counted.deadlocks()).toBe(0);
  });
});

describe('a key that is revoked', () => {
  it('is refused by every process within a second, under load', async () => {
    const { keys } = await counted.caller({ units: 1_000_000 });
    const [key = ''] = keys;
    let revokedMs = Infinity;
    const until = performance.now() + 15_000;
    const hold = async (url: string): Promise<number> => {
      for (;;) {
        const hit = await client.ask({ url, key });
        if (hit.code === 'key_revoked') return performance.now();
        // Nothing that was sent after the revocation may be served a second later.
        if (hit.sentMs > revokedMs + 1_000 || hit.sentMs > until) throw new Error('still served');
        expect(hit.status).toBe(200);
      }
    };
    const holding = urls().flatMap((url) => [hold(url), hold(url), hold(url), hold(url)]);
    await client.ask({ url: urls()[0] ?? '', key });
    await counted.sql(`UPDATE api_keys SET revoked_at = now() WHERE hash = sha256(convert_to($1, 'UTF8'))`, [
      key,
    ]);
    revokedMs = performance.now();
    const refusedMs = await Promise.all(holding);
    const latest = Math.max(...refusedMs) - revokedMs;
    print(`revoked: the last of 3 processes refused it ${latest.toFixed(1)} ms later`);
    expect(latest).toBeLessThan(1_000);
  });
});
