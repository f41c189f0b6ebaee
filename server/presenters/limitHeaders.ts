import type { HeaderList } from '../http/send';
import type { Standing } from '../services/metering/meter';

/** The first moment of the UTC month after the one that `at` lies in. */
export function monthEnd(at: Date): Date {
  return new Date(Date.UTC(at.getUTCFullYear(), at.getUTCMonth() + 1, 1));
}

function monthStart(at: Date): Date {
  return new Date(Date.UTC(at.getUTCFullYear(), at.getUTCMonth(), 1));
}

const seconds = (milliseconds: number) => Math.max(1, Math.ceil(milliseconds / 1000));

/** Whole seconds until the quota starts anew. */
export function secondsToReset(at: Date): number {
  return seconds(monthEnd(at).getTime() - at.getTime());
}

/** Whole seconds until one more call is allowed by the rate. */
export function secondsToToken(standing: Standing): number {
  return Math.max(1, Math.ceil((1 - standing.tokens) / standing.ratePerSecond));
}

/**
 * The limits and what is left of them, as header names and values by turns: the IETF draft's RateLimit-Policy
 * and RateLimit (structured fields) with a policy for the burst and one for the month, and our quota headers.
 */
export function limitHeaders(standing: Standing): HeaderList {
  const { limit, used, ratePerSecond, burst, tokens, at } = standing;
  const window = Math.max(1, Math.ceil(burst / ratePerSecond));
  const month = seconds(monthEnd(at).getTime() - monthStart(at).getTime());
  const reset = secondsToReset(at);
  const left = Math.max(0, limit - used);
  const refill = Math.max(1, Math.ceil((burst - tokens) / ratePerSecond));
  return [
    'RateLimit-Policy',
    `"burst";q=${burst};w=${window}, "month";q=${limit};w=${month}`,
    'RateLimit',
    `"burst";r=${Math.floor(tokens)};t=${refill}, "month";r=${left};t=${reset}`,
    'Evenfall-Quota-Limit',
    String(limit),
    'Evenfall-Quota-Remaining',
    String(left),
    'Evenfall-Quota-Reset',
    String(reset),
  ];
}
