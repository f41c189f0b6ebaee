import { z } from 'zod';

export const sessionSchema = z.strictObject({
  id: z.uuid(),
  createdAt: z.iso.datetime(),
  lastSeenAt: z.iso.datetime(),
  endsAt: z.iso.datetime().meta({ description: 'however much it is used' }),
  agent: z.string().meta({ description: 'what the browser calls itself' }),
  address: z.string(),
  isThisOne: z.boolean(),
});

interface SessionFacts {
  readonly id: string;
  readonly createdAt: Date;
  readonly lastSeenAt: Date;
  readonly expiresAt: Date;
  readonly agent: string;
  readonly address: string;
}

export function presentSession(session: SessionFacts, currentId: string) {
  const { id, createdAt, lastSeenAt, expiresAt, agent, address } = session;
  return {
    id,
    createdAt: createdAt.toISOString(),
    lastSeenAt: lastSeenAt.toISOString(),
    endsAt: expiresAt.toISOString(),
    agent,
    address,
    isThisOne: id === currentId,
  };
}
