import { LATENCY_BUCKETS, latencyBucket } from '../../../shared/math/latencyHistogram';

/** One finished call as the counts and the log keep it: never a body, a query or a key. */
export interface FinishedCall {
  readonly keyId: string;
  readonly calculator: string;
  readonly at: Date;
  readonly status: number;
  readonly code: string | undefined;
  readonly units: number;
  readonly ms: number;
  readonly requestId: string;
}

/** Calls of one key on one calculator in one hour with one class of status. */
export interface HourCount {
  readonly keyId: string;
  readonly calculator: string;
  readonly hourMs: number;
  readonly statusClass: number;
  calls: number;
  units: number;
  totalMs: number;
  readonly latency: number[];
}

/** A line of a key's log, as it is stored. */
export interface LoggedCall {
  readonly at: string;
  readonly calculator: string;
  readonly status: number;
  readonly code?: string;
  readonly units: number;
  readonly ms: number;
  readonly request: string;
}

export interface Gathered {
  readonly hours: readonly HourCount[];
  readonly logs: ReadonlyMap<string, readonly LoggedCall[]>;
}

/** A key keeps this many calls in its log. */
export const LOG_LENGTH = 10_000;
const HOUR_MS = 3_600_000;

/** Gathers finished calls in memory until they are written; a call costs a few additions. */
export class UsageRecorder {
  private hours = new Map<string, HourCount>();
  private logs = new Map<string, LoggedCall[]>();

  record(call: FinishedCall): void {
    const { keyId, calculator, status, units, ms } = call;
    const hourMs = Math.floor(call.at.getTime() / HOUR_MS) * HOUR_MS;
    const statusClass = status === 304 ? 2 : Math.floor(status / 100);
    const name = `${keyId} ${calculator} ${hourMs} ${statusClass}`;
    let count = this.hours.get(name);
    if (!count) {
      const latency = new Array<number>(LATENCY_BUCKETS).fill(0);
      count = { keyId, calculator, hourMs, statusClass, calls: 0, units: 0, totalMs: 0, latency };
      this.hours.set(name, count);
    }
    count.calls += 1;
    count.units += units;
    count.totalMs += ms;
    const bucket = latencyBucket(ms);
    count.latency[bucket] = (count.latency[bucket] ?? 0) + 1;
    this.log(call);
  }

  /** Hands over what was gathered and starts anew. */
  take(): Gathered {
    const gathered = { hours: [...this.hours.values()], logs: this.logs };
    this.hours = new Map();
    this.logs = new Map();
    return gathered;
  }

  private log({ keyId, calculator, at, status, code, units, ms, requestId }: FinishedCall): void {
    let lines = this.logs.get(keyId);
    if (!lines) this.logs.set(keyId, (lines = []));
    const rounded = Math.round(ms * 1000) / 1000;
    lines.push({ at: at.toISOString(), calculator, status, code, units, ms: rounded, request: requestId });
    // Older ones would be deleted after writing; let them go in time, a thousand at once.
    if (lines.length > LOG_LENGTH + 1000) lines.splice(0, lines.length - LOG_LENGTH);
  }
}
