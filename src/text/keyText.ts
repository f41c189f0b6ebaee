/** What a key's state means for calls. */
const STATES = {
  unclaimed: 'waits for you to generate it',
  live: 'works',
  replaced: 'replaced, works until it expires',
  expired: 'expired',
  revoked: 'revoked',
} as const;

export type KeyState = keyof typeof STATES;

export const keyStateText = (state: KeyState): string => STATES[state];

/** Whether calls with it may still be answered. */
export const isWorking = (state: KeyState): boolean => state === 'live' || state === 'replaced';

/** A key as it may be shown: its first characters and its last. */
export function shownKey({
  shownPrefix,
  lastFour,
}: {
  readonly shownPrefix: string | null;
  readonly lastFour: string | null;
}): string {
  return shownPrefix === null ? 'not generated yet' : `${shownPrefix}…${lastFour ?? ''}`;
}
