import { setTimeout as wait } from 'node:timers/promises';
import { Counter, Gauge, Histogram, Registry, collectDefaultMetrics } from 'prom-client';
import type pg from 'pg';
import type { Finish } from '../../http/send';

/**
 * Units that the quota counted in this month and the hourly counts did not, over all accounts: calls under way,
 * what was gathered and not yet written, and what processes that died had gathered.
 */
const DIFFERENCE = `
SELECT coalesce((SELECT sum(used) FROM quota_periods WHERE month = month_of(service_now())), 0)
  - coalesce((SELECT sum(units) FROM usage_hours
      WHERE hour >= month_of(service_now())::timestamp AT TIME ZONE 'UTC'), 0) AS units`;
const DIFFERENCE_EVERY_MS = 30_000;
/** An operator needs the other figures most when the database does not answer. */
const PATIENCE_MS = 500;

export interface ServiceMetrics {
  /** Notes a finished call. */
  readonly finish: Finish;
  /** Everything, as Prometheus reads it. */
  text(): Promise<string>;
  readonly contentType: string;
}

function count(counted: Map<string, Map<number, number>>, operation: string, status: number): void {
  let statuses = counted.get(operation);
  if (!statuses) counted.set(operation, (statuses = new Map<number, number>()));
  statuses.set(status, (statuses.get(status) ?? 0) + 1);
}

/** What an operator watches: calls, their time, the process, and whether the books agree. */
export function serviceMetrics(pool: pg.Pool, clock: () => number): ServiceMetrics {
  const registry = new Registry();
  collectDefaultMetrics({ register: registry });
  const counted = new Map<string, Map<number, number>>();
  new Counter({
    name: 'evenfall_calls_total',
    help: 'Finished calls by operation and status',
    labelNames: ['operation', 'status'],
    registers: [registry],
    // Labels are put together when somebody asks, not at each call.
    collect() {
      this.reset();
      for (const [operation, statuses] of counted)
        for (const [status, calls] of statuses) this.inc({ operation, status }, calls);
    },
  });
  const seconds = new Histogram({
    name: 'evenfall_call_seconds',
    help: 'Time from a call’s arrival to its answer',
    buckets: [0.0005, 0.001, 0.002, 0.005, 0.01, 0.025, 0.05, 0.1, 0.25, 0.5, 1, 2.5],
    registers: [registry],
  });
  const units = new Counter({
    name: 'evenfall_units_total',
    help: 'Units served by this process',
    registers: [registry],
  });
  let askedAt = -Infinity;
  new Gauge({
    name: 'evenfall_uncounted_usage_units',
    help: 'Units in the quota of this month that the hourly counts lack; steady growth means lost statistics',
    registers: [registry],
    async collect() {
      if (clock() - askedAt < DIFFERENCE_EVERY_MS) return;
      askedAt = clock();
      const asked = pool.query<{ units: string }>(DIFFERENCE).then(
        ({ rows }) => this.set(Number(rows[0]?.units ?? 0)),
        () => (askedAt = -Infinity),
      );
      const patience = new AbortController();
      await Promise.race([asked, wait(PATIENCE_MS, null, patience).catch(() => null)]);
      patience.abort();
    },
  });
  return {
    finish: (call, status, ms) => {
      count(counted, call.facts.operation ?? 'other', status);
      seconds.observe(ms / 1000);
      if (call.facts.units > 0) units.inc(call.facts.units);
    },
    text: () => registry.metrics(),
    contentType: registry.contentType,
  };
}
