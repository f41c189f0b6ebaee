import type pg from 'pg';
import { MeterUnavailable, type Ask, type Decision, type Meter, type Standing } from './meter';
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
  private pausedUntil = 0;
  /** Kept between batches: fetching one from the pool for each costs as much as the statement's own sending. */
  private client: pg.PoolClient | null = null;
  private readonly idle: (() => void)[] = [];

  /**
   * @param pool connections with short time-outs, apart from the console's
   * @param clock monotonic milliseconds, for the pause after a failure
   */
  constructor(
    private readonly pool: pg.Pool,
    private readonly clock: () => number,
  ) {}

  take(ask: Ask): Promise<Decision> {
    if (this.clock() < this.pausedUntil) return Promise.reject(new MeterUnavailable(RETRY_AFTER_S));
    return new Promise((resolve, reject) => {
      this.waiting.push({ ask, resolve, reject });
      if (!this.isUnderWay) {
        this.isUnderWay = true;
        // The calls of this turn of the event loop go together.
        setImmediate(() => this.decideWaiting());
      }
    });
  }

  giveBack(standing: Standing, units: number): void {
    if (units === 0) return;
    this.pool
      .query('SELECT meter_give_back($1, $2, $3, $4)', [
        standing.accountId,
        standing.keyId,
        standing.at,
        units,
      ])
      // A refund that fails leaves the customer charged for our fault; the 500 is in the log with its request.
      .catch(() => undefined);
  }

  async close(): Promise<void> {
    if (this.isUnderWay) await new Promise<void>((resolve) => this.idle.push(resolve));
    this.letGo(this.client);
    await this.pool.end();
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

  private async ask(client: pg.PoolClient, asks: readonly Ask[]): Promise<Decision[]> {
    const parameters = takeParameters(asks);
    const values = parameters.map(arrayText);
    const { rows } = await client.query<TakeRow>({ ...takeStatement(asks), values });
    return decisionsOf(rows[0] as TakeRow, parameters[1]);
  }

  /** Decides those who wait; what arrives meanwhile goes next. */
  private decideWaiting(): void {
    const batch = this.waiting.splice(0, BATCH_MAX);
    if (batch.length === 0) {
      this.isUnderWay = false;
      this.idle.splice(0).forEach((resolve) => resolve());
      return;
    }
    const asks = batch.map(({ ask }) => ask);
    const decided = this.client
      ? this.ask(this.client, asks)
      : this.connect().then((client) => this.ask(client, asks));
    decided.then(
      (decisions) => {
        // First the next batch, so that the database works while these are answered.
        this.decideWaiting();
        batch.forEach(({ resolve }, i) => resolve(decisions[i] as Decision));
      },
      (error: Error) => this.fail(batch, error),
    );
  }

  private fail(batch: readonly Waiter[], error: Error): void {
    this.letGo(this.client, error);
    this.pausedUntil = this.clock() + PAUSE_MS;
    for (const { reject } of [...batch, ...this.waiting.splice(0)])
      reject(new MeterUnavailable(RETRY_AFTER_S, { cause: error }));
    this.decideWaiting();
  }
}
