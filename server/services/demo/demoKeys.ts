import { hashOfKey, newKey, shownPartsOf } from '../keys/keyText';
import type pg from 'pg';

export interface DemoKey {
  readonly name: string;
  readonly scopes: readonly string[];
  readonly monthlyCap: number | null;
  readonly state: 'live' | 'revoked' | 'unclaimed';
  /** Days from now to its expiry. */
  readonly expiresInDays: number | null;
  readonly ageDays: number;
}

export const demoKeys = {
  booking: {
    name: 'Lantern Row booking page',
    scopes: ['*'],
    monthlyCap: null,
    state: 'live',
    expiresInDays: null,
    ageDays: 40,
  },
  rental: {
    name: 'Upper Terrace Grip, rental desk',
    scopes: ['exposure', 'flash'],
    monthlyCap: 40_000,
    state: 'live',
    expiresInDays: 60,
    ageDays: 38,
  },
  tablet: {
    name: 'Old tablet',
    scopes: ['exposure'],
    monthlyCap: 500,
    state: 'revoked',
    expiresInDays: null,
    ageDays: 39,
  },
  kiosk: {
    name: 'Workshop kiosk',
    scopes: ['exposure', 'light'],
    monthlyCap: 5_000,
    state: 'unclaimed',
    expiresInDays: 365,
    ageDays: 1,
  },
} as const satisfies Record<string, DemoKey>;

const DAY_MS = 86_400_000;

/** Puts one key in; what it would be whole is thrown away, as for any other key. */
export async function insertDemoKey(
  client: pg.Client,
  accountId: string,
  key: DemoKey,
  now: Date,
): Promise<string> {
  const days = (count: number) => new Date(now.getTime() + count * DAY_MS);
  const secret = key.state === 'unclaimed' ? null : newKey('server');
  const shown = secret === null ? null : shownPartsOf(secret);
  const madeAt = days(-key.ageDays);
  const { rows } = await client.query<{ id: string }>(
    `INSERT INTO api_keys (account_id, kind, name, hash, shown_prefix, last_four, claimed_at, scopes, monthly_cap,
       expires_at, revoked_at, created_at) VALUES ($1, 'server', $2, $3, $4, $5, $6, $7, $8, $9, $10, $11) RETURNING id`,
    [
      accountId,
      key.name,
      secret && hashOfKey(secret),
      shown?.shownPrefix ?? null,
      shown?.lastFour ?? null,
      secret && madeAt,
      key.scopes,
      key.monthlyCap,
      key.expiresInDays === null ? null : days(key.expiresInDays),
      key.state === 'revoked' ? days(-20) : null,
      madeAt,
    ],
  );
  return rows[0]?.id ?? '';
}
