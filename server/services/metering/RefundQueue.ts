import { randomUUID } from 'node:crypto';
import type { Standing } from './meter';

/** Units of one call to be given back. The id sees to it that they are given back once, however often it is sent. */
export interface Refund {
  readonly id: string;
  readonly accountId: string;
  readonly keyId: string;
  readonly grantedAt: Date;
  readonly units: number;
}

/** Refunds are for our own faults; so many wait only if both the service and its database are broken. */
const KEPT = 10_000;
const AT_ONCE = 500;

/** Refunds that wait to be written; one that can't be kept is told, not forgotten. */
export class RefundQueue {
  private waiting: Refund[] = [];

  constructor(private readonly onLost: (refund: Refund) => void) {}

  get isEmpty(): boolean {
    return this.waiting.length === 0;
  }

  add({ accountId, keyId, at }: Standing, units: number): void {
    const refund = { id: randomUUID(), accountId, keyId, grantedAt: at, units };
    if (this.waiting.length < KEPT) this.waiting.push(refund);
    else this.onLost(refund);
  }

  /** Hands over the oldest ones. */
  take(): Refund[] {
    return this.waiting.splice(0, AT_ONCE);
  }

  /** Those that were not written, or of which nobody knows, go in front again. */
  putBack(refunds: readonly Refund[]): void {
    this.waiting.unshift(...refunds);
  }

  /** Tells of what is left; nothing waits afterwards. */
  giveUp(): void {
    for (const refund of this.waiting.splice(0)) this.onLost(refund);
  }
}

/** The statement that gives units back, at most once an id. */
export function refundStatement(refunds: readonly Refund[]) {
  return {
    name: 'refund',
    text: 'SELECT meter_refund($1::uuid[], $2::uuid[], $3::uuid[], $4::timestamptz[], $5::int[])',
    values: [
      refunds.map(({ id }) => id),
      refunds.map(({ accountId }) => accountId),
      refunds.map(({ keyId }) => keyId),
      refunds.map(({ grantedAt }) => grantedAt),
      refunds.map(({ units }) => units),
    ],
  };
}
