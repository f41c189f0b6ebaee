import fc from 'fast-check';
import { expect, it } from 'vitest';
import { GroupCommitMeter } from '../../../server/services/metering/groupCommitMeter';
import { MeterUnavailable, type Decision, type Standing } from '../../../server/services/metering/meter';
import type { Refund } from '../../../server/services/metering/RefundQueue';
import { ScriptedDatabase, verdictOf, type Fate } from '../../support/ScriptedDatabase';

type Step = { take: number } | { giveBack: number } | { waitMs: number };

const steps = fc.array(
  fc.oneof(
    { weight: 6, arbitrary: fc.record({ take: fc.integer({ min: 0, max: 2 }) }) },
    { weight: 1, arbitrary: fc.record({ giveBack: fc.integer({ min: 1, max: 9 }) }) },
    { weight: 1, arbitrary: fc.record({ waitMs: fc.integer({ min: 0, max: 500 }) }) },
  ),
  { minLength: 1, maxLength: 40 },
);
const fates = fc.array(
  fc.oneof(
    { weight: 5, arbitrary: fc.constant<Fate>('done') },
    { weight: 1, arbitrary: fc.constantFrom<Fate>('lost before', 'lost after', 'refused') },
  ),
  { maxLength: 30 },
);
/** Whether the event loop turns between two steps of the schedule. */
const turns = fc.infiniteStream(fc.boolean());

const HASHES = ['a1', 'b2', 'c3'].map((digits) => Buffer.from(digits.repeat(32), 'hex'));
const STANDING = { accountId: 'a', keyId: 'k', at: new Date('2031-05-01T00:00:00Z') } as Standing;
const turn = () => new Promise<void>((resolve) => setImmediate(resolve));

const unavailable = expect.objectContaining({ name: 'Error', retryAfterS: 1 }) as MeterUnavailable;

type Taken = Decision | MeterUnavailable;

/** A meter over a scripted database, and everybody who asked it. */
class Pump {
  readonly database: ScriptedDatabase;
  readonly meter: GroupCommitMeter;
  readonly taken: Promise<Taken>[] = [];
  readonly decided: (Taken | undefined)[] = [];
  readonly lost: Refund[] = [];
  given = 0;
  refunds = 0;
  private nowMs = 0;

  constructor(
    private readonly scheduler: fc.Scheduler,
    fateList: readonly Fate[],
    private readonly turning: Iterator<boolean>,
  ) {
    this.database = new ScriptedDatabase(scheduler, fateList);
    this.meter = new GroupCommitMeter(
      this.database.pool,
      () => this.nowMs,
      (refund) => this.lost.push(refund),
    );
  }

  arrive(list: readonly Step[]): void {
    const labelled = list.map((step) => ({ label: JSON.stringify(step), builder: () => this.step(step) }));
    this.scheduler.scheduleSequence(labelled);
  }

  /** Number `i` asks for `i + 1` units, which tells the calls apart. */
  take(key: number): Promise<Taken> {
    const i = this.taken.length;
    const ask = { keyHash: HASHES[key] as Buffer, units: i + 1, needs: [], site: null };
    const note = (decision: Taken) => (this.decided[i] = decision);
    this.decided.push(undefined);
    const taken = this.meter.take(ask).then(note, note);
    this.taken.push(taken);
    return taken;
  }

  wait(ms: number): void {
    this.nowMs += ms;
  }

  /** Lets everything happen, in the scheduler's order. */
  async run(): Promise<void> {
    for (let idleTurns = 0; idleTurns < 4;) {
      if (this.scheduler.count() > 0) {
        idleTurns = 0;
        await this.scheduler.waitOne();
        if (this.turning.next().value) await turn();
      } else {
        idleTurns += 1;
        await turn();
      }
    }
  }

  private step(step: Step): Promise<void> {
    if ('take' in step) void this.take(step.take);
    else if ('waitMs' in step) this.wait(step.waitMs);
    else {
      this.meter.giveBack(STANDING, step.giveBack);
      this.given += step.giveBack;
      this.refunds += 1;
    }
    return Promise.resolve();
  }
}

const ascending = (numbers: readonly number[]) => [...numbers].sort((a, b) => a - b);
const sum = (numbers: Iterable<number>) => [...numbers].reduce((total, one) => total + one, 0);

/** Every one of the takers got one answer, its own, and was written at most once, in order of arrival. */
function expectFair({ database, decided }: Pump): void {
  expect(database.worst).toBeLessThanOrEqual(1);
  expect(database.calls).toEqual(ascending(database.calls));
  expect(new Set(database.calls).size).toBe(database.calls.length);
  const isWritten = new Set(database.calls);
  decided.forEach((decision, i) => {
    if (decision instanceof MeterUnavailable) return;
    expect(decision).toBeDefined();
    expect(isWritten.has(i + 1)).toBe(true);
    expect(decision?.granted).toBe(verdictOf(i + 1) === 'g');
  });
}

it('gives everybody one decision, their own, in order of arrival, whatever is slow and whatever fails', async () => {
  await fc.assert(
    fc.asyncProperty(fc.scheduler(), steps, fates, turns, async (scheduler, list, fateList, turning) => {
      const pump = new Pump(scheduler, fateList, turning);
      pump.arrive(list);
      await pump.run();
      expectFair(pump);
      // A failure leaves nothing stuck: once the pause is over, the next one is served.
      pump.database.heal();
      pump.wait(400);
      const last = pump.take(0);
      await pump.run();
      expect(await last).toHaveProperty('standing');
      expectFair(pump);
      const closing = pump.meter.close();
      await pump.run();
      await closing;
      // Nothing that had to be given back is lost or given twice.
      expect(pump.lost).toEqual([]);
      expect(pump.database.refunds.size).toBe(pump.refunds);
      expect(sum(pump.database.refunds.values())).toBe(pump.given);
      expect(pump.database.released).toBe(pump.database.opened);
      expect(pump.database.ended).toBe(1);
    }),
    { numRuns: 400, timeout: 5_000 },
  );
});

it('answers everybody before it closes, makes the refunds that it can, and tells of the others', async () => {
  const moment = fc.record({ steps: fc.nat(40), isHealed: fc.boolean() });
  await fc.assert(
    fc.asyncProperty(
      fc.scheduler(),
      steps,
      fates,
      turns,
      moment,
      async (scheduler, list, fateList, turning, close) => {
        const pump = new Pump(scheduler, fateList, turning);
        pump.arrive(list);
        // Somewhere between the first arrival and the last; whoever comes afterwards is turned away.
        for (let i = close.steps; i > 0 && scheduler.count() > 0; i -= 1) await scheduler.waitOne();
        if (close.isHealed) pump.database.heal();
        const before = { taken: pump.taken.length, refunds: pump.refunds };
        let openAtClose = -1;
        const closing = pump.meter.close().then(() => {
          openAtClose = pump.decided.slice(0, before.taken).filter((one) => one === undefined).length;
        });
        await pump.run();
        await closing;
        expect(openAtClose).toBe(0);
        expectFair(pump);
        expect(pump.database.ended).toBe(1);
        expect(pump.database.released).toBe(pump.database.opened);
        const made = [...pump.database.refunds.keys()];
        expect(new Set([...made, ...pump.lost.map(({ id }) => id)]).size).toBe(pump.refunds);
        if (close.isHealed) expect(made.length).toBeGreaterThanOrEqual(before.refunds);
      },
    ),
    { numRuns: 400, timeout: 5_000 },
  );
});

it('sends calls that arrive together, or while a statement is under way, as one statement', async () => {
  await fc.assert(
    fc.asyncProperty(fc.scheduler(), fc.integer({ min: 2, max: 60 }), async (scheduler, count) => {
      const pump = new Pump(scheduler, [], [].values());
      for (let i = 0; i < count; i++) void pump.take(i % 3);
      await turn();
      await scheduler.waitOne();
      await turn();
      for (let i = 0; i < count; i++) void pump.take(i % 3);
      expect(pump.database.calls).toEqual([]);
      await pump.run();
      expect(pump.database.calls).toHaveLength(2 * count);
      expect(scheduler.report().filter(({ label }) => label === 'take')).toHaveLength(2);
    }),
    { numRuns: 50, timeout: 5_000 },
  );
});

it('turns away at once who waits behind a statement that failed, and who comes while the pause lasts', async () => {
  await fc.assert(
    fc.asyncProperty(fc.scheduler(), fc.nat(399), async (scheduler, waitedMs) => {
      const pump = new Pump(scheduler, ['done', 'lost before'], [].values());
      const first = pump.take(0);
      await turn();
      await scheduler.waitOne();
      await turn();
      const behind = pump.take(1);
      await scheduler.waitOne();
      expect(await Promise.all([first, behind])).toEqual([unavailable, unavailable]);
      pump.wait(waitedMs);
      expect(await pump.take(2)).toEqual(unavailable);
      expect(scheduler.count()).toBe(0);
    }),
    { numRuns: 50, timeout: 5_000 },
  );
});

it('tries a refund that failed once more when it closes, however short the time since', async () => {
  await fc.assert(
    fc.asyncProperty(
      fc.scheduler(),
      fc.constantFrom<Fate>('lost before', 'lost after', 'refused'),
      async (scheduler, fate) => {
        const pump = new Pump(scheduler, ['done', fate], [].values());
        pump.meter.giveBack(STANDING, 5);
        await pump.run();
        const closing = pump.meter.close();
        await pump.run();
        await closing;
        expect([...pump.database.refunds.values()]).toEqual([5]);
        expect(pump.lost).toEqual([]);
      },
    ),
    { numRuns: 20, timeout: 5_000 },
  );
});
