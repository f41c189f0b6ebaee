import type { Role } from '../models/Account';

/** So many keys that have not ended may an account hold. */
export const KEYS_MAX = 50;
export const PASS_MINUTES = 10;

/** How long a rotated key keeps working. */
export const GRACES = { none: 0, hour: 3_600, day: 86_400, week: 604_800 } as const;
export type Grace = keyof typeof GRACES;

export interface KeyFacts {
  readonly kind: 'server' | 'page';
  readonly claimedAt: Date | null;
  readonly revokedAt: Date | null;
  readonly expiresAt: Date | null;
  readonly replacedBy: string | null;
}

export type KeyState = 'unclaimed' | 'live' | 'replaced' | 'expired' | 'revoked';

/** Where a key stands: `replaced` still works, until its grace is over. */
export function keyState(key: KeyFacts, now: Date): KeyState {
  if (key.revokedAt) return 'revoked';
  if (key.expiresAt && key.expiresAt <= now) return 'expired';
  if (!key.claimedAt) return 'unclaimed';
  return key.replacedBy ? 'replaced' : 'live';
}

const isWidgets = (key: KeyFacts) => key.kind === 'page';

/** A widget's key changes with its widget, and what has ended or was replaced stays as it was. */
export function mayChange(key: KeyFacts, now: Date): boolean {
  return !isWidgets(key) && ['live', 'unclaimed'].includes(keyState(key, now));
}

export function mayRotate(key: KeyFacts, now: Date): boolean {
  return !isWidgets(key) && keyState(key, now) === 'live';
}

/** Revoking is final; doing it again changes nothing and is no fault. */
export function mayRevoke(key: KeyFacts): boolean {
  return !isWidgets(key);
}

/** A key that an administrator issued has no secret until its owner asks for it, once. */
export function mayClaim(key: KeyFacts, now: Date): boolean {
  return !isWidgets(key) && keyState(key, now) === 'unclaimed';
}

export function mayPass(key: KeyFacts, now: Date): boolean {
  return !isWidgets(key) && ['live', 'replaced'].includes(keyState(key, now));
}

/** Server keys are for developers; administrators make theirs as developers. */
export function mayMakeKeys(roles: readonly Role[]): boolean {
  return roles.includes('developer');
}
