import { LATENCY_BUCKETS, latencyBucket } from '../../../shared/math/latencyHistogram';
import { LineLog } from './LineLog';

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
  readonly logs: ReadonlyMap<string, LineLog>;
}

const HOUR_MS = 3_600_000;

/** The calls of one batch share their moment, so that its text is made once. */
interface Moment {
  readonly at: Date;
  readonly text: string;
  readonly hourMs: number;
}

function momentOf(at: Date): Moment {
  return { at, text: at.toISOString(), hourMs: Math.floor(at.getTime() / HOUR_MS) * HOUR_MS };
}

/** Gathers finished calls in memory until they are written; a call costs a few additions. */
export class UsageRecorder {
  private hours = new Map<string, HourCount>();
  private logs = new Map<string, LineLog>();
  private lastCount: HourCount | undefined;
  private moment: Moment = momentOf(new Date(0));

  record(call: FinishedCall): void {
    const { status, units, ms, at } = call;
    if (at !== this.moment.at) this.moment = momentOf(at);
    const count = this.countOf(call, this.moment.hourMs, status === 304 ? 2 : Math.floor(status / 100));
    count.calls += 1;
    count.units += units;
    count.totalMs += ms;
    const bucket = latencyBucket(ms);
    count.latency[bucket] = (count.latency[bucket] ?? 0) + 1;
    this.log(call, this.moment.text);
  }

  /** Hands over what was gathered and starts anew. */
  take(): Gathered {
    const gathered = { hours: [...this.hours.values()], logs: this.logs };
    this.hours = new Map();
    this.logs = new Map();
    this.lastCount = undefined;
    return gathered;
  }

  /** Most calls are like the one before; only another one pays for a look-up by name. */
  private countOf({ keyId, calculator }: FinishedCall, hourMs: number, statusClass: number): HourCount {
    const last = this.lastCount;
    if (
      last?.keyId === keyId &&
      last.calculator === calculator &&
      last.hourMs === hourMs &&
      last.statusClass === statusClass
    )
      return last;
    const name = `${keyId} ${calculator} ${hourMs} ${statusClass}`;
    let count = this.hours.get(name);
    if (!count) {
      const latency = new Array<number>(LATENCY_BUCKETS).fill(0);
      count = { keyId, calculator, hourMs, statusClass, calls: 0, units: 0, totalMs: 0, latency };
      this.hours.set(name, count);
    }
    this.lastCount = count;
    return count;
  }

  private log(call: FinishedCall, at: string): void {
    let log = this.logs.get(call.keyId);
    if (!log) this.logs.set(call.keyId, (log = new LineLog()));
    log.add(call, at);
  }
}
