import type pg from 'pg';
import { MeterUnavailable, type Ask, type Decision, type Meter, type Standing } from './meter';
import { RefundQueue, refundStatement, type Refund } from './RefundQueue';
import { arrayText, decisionsOf, takeParameters, takeStatement, type TakeRow } from './takeStatement';

interface Waiter {
  readonly ask: Ask;
  readonly resolve: (decision: Decision) => void;
  readonly reject: (error: Error) => void;
}

/** Calls in one statement; more would make a single lock last too long. */
const BATCH_MAX = 512;
/** After a failure, calls are turned away for this long before one batch tries again. */
const PAUSE_MS = 400;
const RETRY_AFTER_S = 1;

/**
 * Counts by group commit: calls that arrive while a statement is under way join the next one, so that one
 * statement and one commit decide many calls. Each call is decided before it is served:
 * - no call beyond a limit is ever granted, whatever the number of processes;
 * - a process that dies loses no count of a call that it served; calls in the statement under way may be
 *   counted though not served;
 * - a database that can't be reached means no answer (MeterUnavailable), never an uncounted one.
 */
export class GroupCommitMeter implements Meter {
  private waiting: Waiter[] = [];
  private isUnderWay = false;
  private isClosed = false;
  private pausedUntil = 0;
  private refundsPausedUntil = 0;
  private readonly refunds: RefundQueue;
  private nextTry: NodeJS.Timeout | undefined;
  /** Kept between batches: fetching one from the pool for each costs as much as the statement's own sending. */
  private client: pg.PoolClient | null = null;
  private readonly idle: (() => void)[] = [];

  /**
   * @param pool connections with short time-outs, apart from the console's
   * @param clock monotonic milliseconds, for the pause after a failure
   * @param onLostRefund hears of units that could not be given back
   */
  constructor(
    private readonly pool: pg.Pool,
    private readonly clock: () => number,
    onLostRefund: (refund: Refund) => void,
  ) {
    this.refunds = new RefundQueue(onLostRefund);
  }

  take(ask: Ask): Promise<Decision> {
    if (this.clock() < this.pausedUntil) return Promise.reject(new MeterUnavailable(RETRY_AFTER_S));
    return new Promise((resolve, reject) => {
      this.waiting.push({ ask, resolve, reject });
      this.begin();
    });
  }

  giveBack(standing: Standing, units: number): void {
    if (units === 0) return;
    this.refunds.add(standing, units);
    this.begin();
  }

  async close(): Promise<void> {
    clearTimeout(this.nextTry);
    await this.rest();
    // What an outage has left over is tried once more.
    this.refundsPausedUntil = 0;
    this.begin();
    await this.rest();
    clearTimeout(this.nextTry);
    this.isClosed = true;
    this.refunds.giveUp();
    this.letGo(this.client);
    await this.pool.end();
  }

  private begin(): void {
    if (this.isUnderWay) return;
    this.isUnderWay = true;
    // The calls of this turn of the event loop go together.
    setImmediate(() => this.goOn());
  }

  /** Until nothing is under way. */
  private async rest(): Promise<void> {
    while (this.isUnderWay) await new Promise<void>((resolve) => this.idle.push(resolve));
  }

  private async connect(): Promise<pg.PoolClient> {
    const client = await this.pool.connect();
    client.on('error', (error) => this.letGo(client, error));
    this.client = client;
    return client;
  }

  /** Gives the connection back; one that failed is closed, and the next batch opens another. */
  private letGo(client: pg.PoolClient | null, failure?: Error): void {
    if (client === null || client !== this.client) return;
    this.client = null;
    client.release(failure);
  }

  private async ask(asks: readonly Ask[]): Promise<Decision[]> {
    const parameters = takeParameters(asks);
    const values = parameters.map(arrayText);
    const client = this.client ?? (await this.connect());
    const { rows } = await client.query<TakeRow>({ ...takeStatement(asks), values });
    return decisionsOf(rows[0] as TakeRow, parameters[1]);
  }

  /** Decides those who wait; what arrives meanwhile goes next. Refunds go where they hold nobody up. */
  private goOn(): void {
    const batch = this.waiting.splice(0, BATCH_MAX);
    if (batch.length > 0) this.decide(batch);
    else if (this.mayRefund()) this.refund();
    else {
      this.isUnderWay = false;
      if (this.isClosed) this.refunds.giveUp();
      else if (!this.refunds.isEmpty) this.tryLater();
      this.idle.splice(0).forEach((resolve) => resolve());
    }
  }

  private decide(batch: readonly Waiter[]): void {
    this.ask(batch.map(({ ask }) => ask)).then(
      (decisions) => {
        // First the next statement, so that the database works while these are answered.
        if (this.mayRefund()) this.refund();
        else this.goOn();
        batch.forEach(({ resolve }, i) => resolve(decisions[i] as Decision));
      },
      (error: Error) => this.fail(batch, error),
    );
  }

  private mayRefund(): boolean {
    return !this.refunds.isEmpty && this.clock() >= this.refundsPausedUntil;
  }

  private refund(): void {
    const refunds = this.refunds.take();
    this.giveBackNow(refunds).then(
      () => this.goOn(),
      (error: Error) => {
        this.refunds.putBack(refunds);
        this.refundsPausedUntil = this.clock() + PAUSE_MS;
        // The database's own refusal is about the refunds alone; anything else means that it is away.
        if ('severity' in error && error.severity === 'ERROR') this.goOn();
        else this.fail([], error);
      },
    );
  }

  private async giveBackNow(refunds: readonly Refund[]): Promise<void> {
    const client = this.client ?? (await this.connect());
    await client.query(refundStatement(refunds));
  }

  private tryLater(): void {
    clearTimeout(this.nextTry);
    this.nextTry = setTimeout(() => this.begin(), PAUSE_MS);
    this.nextTry.unref();
  }

  private fail(batch: readonly Waiter[], error: Error): void {
    this.letGo(this.client, error);
    this.pausedUntil = this.clock() + PAUSE_MS;
    this.refundsPausedUntil = this.pausedUntil;
    for (const { reject } of [...batch, ...this.waiting.splice(0)])
      reject(new MeterUnavailable(RETRY_AFTER_S, { cause: error }));
    this.goOn();
  }
}
