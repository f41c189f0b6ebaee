import { usagePace } from '../../shared/math/usagePace';
import { monthEnd } from '../presenters/limitHeaders';

export type QuotaAlert = 'pace' | 'most' | 'all';

/** From so much of the month's units on, the owner is told. */
const MOST_SHARE = 0.8;
/** A pace tells something once so much is used, and once three days are over. */
const LEAST_SHARE = 0.1;
const LEAST_DAYS = 3;
const DAY_MS = 86_400_000;

export interface MonthsUse {
  readonly used: number;
  readonly limit: number;
  readonly now: Date;
}

/**
 * What an account's owner should know of this month: that everything is used, that four fifths are, or that at this
 * pace the units end before the month does. Null where all is well.
 */
export function quotaAlertFor({ used, limit, now }: MonthsUse): QuotaAlert | null {
  if (limit <= 0) return null;
  if (used >= limit) return 'all';
  if (used >= MOST_SHARE * limit) return 'most';
  const startMs = Date.UTC(now.getUTCFullYear(), now.getUTCMonth(), 1);
  if (used < LEAST_SHARE * limit || now.getTime() < startMs + LEAST_DAYS * DAY_MS) return null;
  const { runsOutAtMs } = usagePace(used, limit, startMs, monthEnd(now).getTime(), now.getTime());
  return runsOutAtMs === null ? null : 'pace';
}

/** The alerts that this one makes needless: who knows the more knows the less. */
export function alertsUpTo(alert: QuotaAlert): readonly QuotaAlert[] {
  const all: readonly QuotaAlert[] = ['pace', 'most', 'all'];
  return all.slice(0, all.indexOf(alert) + 1);
}
