import type pg from 'pg';
import { UsageRecorder, type FinishedCall } from './UsageRecorder';
import { FORGET_OLD, writeUsage } from './writeUsage';

const FLUSH_MS = 1_000;
const FORGET_EVERY = 3_600;

/**
 * Writes the gathered counts and log lines once a second. These are statistics: a process that dies loses at
 * most what it gathered since, while the quota has its own exact count.
 */
export class UsageWriter {
  private readonly recorder = new UsageRecorder();
  private readonly timer: NodeJS.Timeout;
  private underWay: Promise<void> = Promise.resolve();
  private flushes = 0;

  constructor(
    private readonly pool: pg.Pool,
    private readonly onError: (error: Error) => void,
  ) {
    this.timer = setInterval(() => void this.flush(), FLUSH_MS);
    this.timer.unref();
  }

  record(call: FinishedCall): void {
    this.recorder.record(call);
  }

  /** Writes what is gathered now; one writing at a time. */
  flush(): Promise<void> {
    this.underWay = this.underWay.then(() => this.write());
    return this.underWay;
  }

  async close(): Promise<void> {
    clearInterval(this.timer);
    await this.flush();
  }

  private async write(): Promise<void> {
    try {
      await writeUsage(this.pool, this.recorder.take());
      this.flushes += 1;
      if (this.flushes % FORGET_EVERY === 1) await this.pool.query(FORGET_OLD);
    } catch (error) {
      this.onError(error as Error);
    }
  }
}
