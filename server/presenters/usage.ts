import { z } from 'zod';
import type { Standing } from '../services/metering/meter';
import { monthEnd } from './limitHeaders';

/** What a key may know of its period. */
export const usageSchema = z.strictObject({
  used: z
    .int()
    .meta({ description: 'units that the account used in this calendar month (UTC), by all its keys' }),
  limit: z.int().meta({ description: 'units of the account’s plan in this month' }),
  remaining: z
    .int()
    .meta({ description: 'units left to this key: of the plan, or of its own cap if that is less' }),
  resetsAt: z.iso.datetime().meta({ description: 'when the next month begins (UTC)' }),
  key: z
    .strictObject({
      used: z.int().meta({ description: 'units that this key used in this month' }),
      cap: z.int().nullable().meta({ description: 'the key’s own monthly cap; null where it has none' }),
    })
    .meta({ title: 'This key' }),
});

export function usageOf(standing: Standing): z.output<typeof usageSchema> {
  const { used, limit, cap, keyUsed, at } = standing;
  const ofPlan = Math.max(0, limit - used);
  const ofCap = cap === null ? ofPlan : Math.max(0, cap - keyUsed);
  return {
    used,
    limit,
    remaining: Math.min(ofPlan, ofCap),
    resetsAt: monthEnd(at).toISOString(),
    key: { used: keyUsed, cap },
  };
}
