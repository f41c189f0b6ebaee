import { z } from 'zod';
import { percentileMs } from '../../shared/math/latencyHistogram';
import { usagePace } from '../../shared/math/usagePace';
import type { UsageGroup } from '../services/usage/usageSummary';
import type { StandingFacts } from './account';
import { monthEnd } from './limitHeaders';

const sums = {
  calls: z.int(),
  units: z.int(),
  refused: z.int().meta({ description: 'answered with 4xx' }),
  failed: z.int().meta({ description: 'answered with 5xx' }),
  p50Ms: z.number().nullable(),
  p95Ms: z.number().nullable(),
};

export const usageSummarySchema = z.strictObject({
  from: z.iso.date(),
  to: z.iso.date(),
  total: z.strictObject(sums),
  days: z.array(z.strictObject({ day: z.iso.date(), ...sums })).meta({ description: 'each day of the span' }),
  calculators: z.array(z.strictObject({ calculator: z.string(), ...sums })),
  keys: z.array(z.strictObject({ keyId: z.uuid(), name: z.string(), ...sums })),
  statuses: z.array(z.strictObject({ statusClass: z.int(), ...sums })),
  pace: z
    .strictObject({
      used: z.int(),
      limit: z.int(),
      forecast: z.int().meta({ description: 'units at the month’s end if it goes on like this' }),
      runsOutAt: z.iso.datetime().nullable(),
      resetsAt: z.iso.datetime(),
    })
    .meta({ description: 'of this month and the whole account, whatever the span' }),
});

const DAY_MS = 86_400_000;

const NOTHING = { calls: 0, units: 0, refused: 0, failed: 0, latency: [] as number[] };

function summed({ calls, units, refused, failed, latency }: Omit<typeof NOTHING, never>) {
  const p50Ms = percentileMs(latency, 0.5);
  const p95Ms = percentileMs(latency, 0.95);
  return { calls, units, refused, failed, p50Ms, p95Ms };
}

function daysOf(from: string, to: string): string[] {
  const days: string[] = [];
  const end = Date.parse(to);
  for (let at = Date.parse(from); at <= end; at += DAY_MS) days.push(new Date(at).toISOString().slice(0, 10));
  return days;
}

function paceOf({ used, unitsPerMonth, now }: StandingFacts) {
  const start = Date.UTC(now.getUTCFullYear(), now.getUTCMonth(), 1);
  const resetsAt = monthEnd(now);
  const { forecast, runsOutAtMs } = usagePace(used, unitsPerMonth, start, resetsAt.getTime(), now.getTime());
  return {
    used,
    limit: unitsPerMonth,
    forecast: Math.round(forecast),
    runsOutAt: runsOutAtMs === null ? null : new Date(runsOutAtMs).toISOString(),
    resetsAt: resetsAt.toISOString(),
  };
}

/** Sums over a span of days, and how the month goes on. */
export function presentUsage(
  { from, to }: { from: string; to: string },
  groups: readonly UsageGroup[],
  standing: StandingFacts,
): z.output<typeof usageSummarySchema> {
  const of = (by: UsageGroup['by']) => groups.filter((group) => group.by === by);
  const byDay = new Map(of('day').map((group) => [group.day, group]));
  return {
    from,
    to,
    total: summed(of('all')[0] ?? NOTHING),
    days: daysOf(from, to).map((day) => ({ day, ...summed(byDay.get(day) ?? NOTHING) })),
    calculators: of('calculator').map((group) => ({
      calculator: group.calculator ?? '',
      ...summed(group),
    })),
    keys: of('key').map((group) => ({
      keyId: group.keyId ?? '',
      name: group.keyName ?? '',
      ...summed(group),
    })),
    statuses: of('status').map((group) => ({ statusClass: group.statusClass ?? 0, ...summed(group) })),
    pace: paceOf(standing),
  };
}
