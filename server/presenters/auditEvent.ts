import { z } from 'zod';

export const eventSchema = z.strictObject({
  id: z.string(),
  at: z.iso.datetime(),
  event: z.string(),
  byYou: z.boolean(),
  subject: z.strictObject({ kind: z.string(), id: z.string() }).nullable(),
  details: z.record(z.string(), z.unknown()),
  address: z.string().nullable(),
  agent: z.string().nullable(),
});

interface EventFacts {
  readonly id: string;
  readonly at: Date;
  readonly event: string;
  readonly actorId: string | null;
  readonly accountId: string | null;
  readonly subjectKind: string | null;
  readonly subjectId: string | null;
  readonly details: Record<string, unknown>;
  readonly address: string | null;
  readonly agent: string | null;
}

/** What its holder may see of what happened to an account. */
export function presentEvent(facts: EventFacts) {
  const { id, at, event, actorId, accountId, subjectKind, subjectId, details, address, agent } = facts;
  const subject = subjectKind !== null && subjectId !== null ? { kind: subjectKind, id: subjectId } : null;
  return { id, at: at.toISOString(), event, byYou: actorId === accountId, subject, details, address, agent };
}
