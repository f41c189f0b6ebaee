export interface PeriodicOptions {
  readonly work: () => Promise<void>;
  readonly everyMs: number;
  /** The first time comes soon after the start, but not in its way. */
  readonly firstMs: number;
  readonly onTrouble: (reason: string) => void;
}

/** Does something again and again, the next time counted from the end of the last. Any number of processes may. */
export class Periodic {
  private timer: NodeJS.Timeout | null = null;
  private underWay: Promise<void> = Promise.resolve();
  private isOver = false;

  constructor(private readonly options: PeriodicOptions) {}

  start(): void {
    this.next(this.options.firstMs);
  }

  async stop(): Promise<void> {
    this.isOver = true;
    if (this.timer) clearTimeout(this.timer);
    await this.underWay;
  }

  private next(inMs: number): void {
    if (this.isOver) return;
    this.timer = setTimeout(() => {
      this.underWay = this.once().then(() => this.next(this.options.everyMs));
    }, inMs);
    this.timer.unref();
  }

  private async once(): Promise<void> {
    try {
      await this.options.work();
    } catch (error) {
      this.options.onTrouble(error instanceof Error ? error.name : 'unknown');
    }
  }
}
