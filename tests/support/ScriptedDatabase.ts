import type fc from 'fast-check';
import type pg from 'pg';

/** How a statement ends: as it should, or with the connection lost before or after it was written. */
export type Fate = 'done' | 'lost before' | 'lost after' | 'refused';

interface Statement {
  readonly name: string;
  readonly values: readonly unknown[];
}

const numbersOf = (text: unknown) =>
  String(text)
    .replace(/[{}]/g, '')
    .split(',')
    .map((one) => Number(one));

/** What the verdict of a call is to be, so that a caller can tell its own from another's. */
export const verdictOf = (units: number) => (units % 3 === 0 ? 'q' : 'g');

/**
 * A pool whose connections and statements end when a scheduler says so, and as a list of fates says. It keeps what
 * was written: the units of each call, which are its number, and the refunds by their ids.
 */
export class ScriptedDatabase {
  /** Calls in the order in which they were written. */
  readonly calls: number[] = [];
  readonly refunds = new Map<string, number>();
  /** Statements under way at once on the worst moment. */
  worst = 0;
  opened = 0;
  released = 0;
  ended = 0;
  private underWay = 0;
  private step = 0;

  constructor(
    private readonly scheduler: fc.Scheduler,
    private readonly fates: readonly Fate[],
  ) {}

  /** As much of a pool as the meter uses. */
  get pool(): pg.Pool {
    const pool = {
      connect: async () => {
        if (this.ended > 0) throw new Error('the pool has ended');
        await this.scheduler.schedule(Promise.resolve(), 'connecting');
        if (this.nextFate() === 'lost before') throw new Error('no connection');
        this.opened += 1;
        return this.client();
      },
      end: () => {
        this.ended += 1;
        return Promise.resolve();
      },
    };
    return pool as unknown as pg.Pool;
  }

  /** From now on nothing fails. */
  heal(): void {
    this.step = Infinity;
  }

  private nextFate(): Fate {
    const fate = this.fates[this.step] ?? 'done';
    this.step += 1;
    return fate;
  }

  private client() {
    let isReleased = false;
    let isBroken = false;
    const breakOff = () => {
      isBroken = true;
      throw new Error('connection lost');
    };
    return {
      on: () => undefined,
      release: () => {
        if (isReleased) throw new Error('released twice');
        isReleased = true;
        this.released += 1;
      },
      query: async (statement: Statement) => {
        if (isReleased) throw new Error('used after its release');
        this.underWay += 1;
        this.worst = Math.max(this.worst, this.underWay);
        await this.scheduler.schedule(Promise.resolve(), statement.name);
        this.underWay -= 1;
        const fate = this.nextFate();
        if (isBroken || fate === 'lost before') breakOff();
        if (fate === 'refused') throw Object.assign(new Error('refused'), { severity: 'ERROR' });
        const answer = statement.name === 'refund' ? this.giveBack(statement) : this.take(statement);
        if (fate === 'lost after') breakOff();
        return answer;
      },
    };
  }

  private take({ values: [hashes, , units] }: Statement) {
    const numbers = numbersOf(units);
    this.calls.push(...numbers);
    const keys = String(hashes).split(',');
    const state = { limit: 9, used: 1, cap: null, keyUsed: 1, rate: 1, burst: 4, tokens: 3 };
    const rows = [
      {
        verdicts: numbers.map(verdictOf).join(''),
        at: new Date('2031-05-01T00:00:00Z'),
        keys: keys.map((hash) => ({ ...state, id: hash.replace(/[^0-9a-f]/g, ''), account: 'a' })),
      },
    ];
    return { rows };
  }

  private giveBack({ values }: Statement) {
    const [ids, , , , units] = values as [string[], unknown, unknown, unknown, number[]];
    ids.forEach((id, i) => this.refunds.set(id, units[i] ?? 0));
    return { rows: [] };
  }
}
