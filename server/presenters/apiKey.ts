import { z } from 'zod';

/** What may be shown of a key after it was shown whole once. */
export const keySchema = z.strictObject({
  id: z.uuid(),
  kind: z.enum(['server', 'page']),
  name: z.string(),
  state: z.enum(['unclaimed', 'live', 'replaced', 'expired', 'revoked']).meta({
    description: 'unclaimed: issued to you, not generated yet; replaced: rotated, working until its expiry',
  }),
  shownPrefix: z.string().nullable().meta({ description: 'its first characters; null until claimed' }),
  lastFour: z.string().nullable(),
  scopes: z.array(z.string()),
  monthlyCap: z.int().nullable(),
  usedThisMonth: z.int(),
  createdAt: z.iso.datetime(),
  expiresAt: z.iso.datetime().nullable(),
  lastUsedAt: z.iso.datetime().nullable(),
  revokedAt: z.iso.datetime().nullable(),
  replacedBy: z.uuid().nullable(),
});

export interface KeyRow {
  readonly id: string;
  readonly kind: 'server' | 'page';
  readonly name: string;
  readonly shownPrefix: string | null;
  readonly lastFour: string | null;
  readonly scopes: string[];
  readonly monthlyCap: number | null;
  readonly usedThisMonth: number;
  readonly createdAt: Date;
  readonly expiresAt: Date | null;
  readonly lastUsedAt: Date | null;
  readonly claimedAt: Date | null;
  readonly revokedAt: Date | null;
  readonly replacedBy: string | null;
}

const iso = (moment: Date | null) => moment?.toISOString() ?? null;

export function presentKey(row: KeyRow, state: z.output<typeof keySchema>['state']) {
  const { id, kind, name, shownPrefix, lastFour, scopes, monthlyCap, usedThisMonth, replacedBy } = row;
  return {
    id,
    kind,
    name,
    state,
    shownPrefix,
    lastFour,
    scopes,
    monthlyCap,
    usedThisMonth,
    createdAt: row.createdAt.toISOString(),
    expiresAt: iso(row.expiresAt),
    lastUsedAt: iso(row.lastUsedAt),
    revokedAt: iso(row.revokedAt),
    replacedBy,
  };
}
