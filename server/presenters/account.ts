import { z } from 'zod';
import type { LengthUnit, Role } from '../models/Account';
import { monthEnd } from './limitHeaders';

const roleSchema = z.enum(['developer', 'photographer', 'educator', 'admin']);

/** What its holder may see of an account. */
export const accountSchema = z.strictObject({
  id: z.uuid(),
  email: z.string(),
  name: z.string(),
  roles: z.array(roleSchema),
  lengthUnit: z.enum(['metres', 'feet']),
});

interface AccountFacts {
  readonly id: string;
  readonly email: string;
  readonly name: string;
  readonly roles: readonly Role[];
  readonly lengthUnit: LengthUnit;
}

export function presentAccount({ id, email, name, roles, lengthUnit }: AccountFacts) {
  return { id, email, name, roles: [...roles], lengthUnit };
}

/** The plan with what was agreed on for this account, and how much of this month is used. */
export const standingSchema = z.strictObject({
  plan: z.strictObject({
    id: z.string(),
    title: z.string(),
    unitsPerMonth: z.int(),
    ratePerSecond: z.int(),
    burst: z.int(),
  }),
  quota: z.strictObject({
    used: z.int(),
    limit: z.int(),
    remaining: z.int(),
    resetsAt: z.iso.datetime(),
  }),
});

export interface StandingFacts {
  readonly planId: string;
  readonly planTitle: string;
  readonly unitsPerMonth: number;
  readonly ratePerSecond: number;
  readonly burst: number;
  readonly used: number;
  readonly now: Date;
}

export function presentStanding(facts: StandingFacts) {
  const { planId: id, planTitle: title, unitsPerMonth, ratePerSecond, burst, used, now } = facts;
  return {
    plan: { id, title, unitsPerMonth, ratePerSecond, burst },
    quota: {
      used,
      limit: unitsPerMonth,
      remaining: Math.max(0, unitsPerMonth - used),
      resetsAt: monthEnd(now).toISOString(),
    },
  };
}
