import { calculatorGroup } from './calculatorGroups';
import { formatDay } from './formatMoment';

/** What a key's state means for calls. */
const STATES = {
  unclaimed: 'waits for you to generate it',
  live: 'works',
  replaced: 'replaced, still works',
  expired: 'expired',
  revoked: 'revoked',
} as const;

export type KeyState = keyof typeof STATES;

export const keyStateText = (state: KeyState): string => STATES[state];

/** A key's state with the day on which its time is over, or was. */
export function keyStateLine(state: KeyState, expiresAt: string | null): string {
  const text = keyStateText(state);
  if (expiresAt === null || state === 'revoked') return text;
  return state === 'expired'
    ? `${text} on ${formatDay(expiresAt)}`
    : `${text}, until ${formatDay(expiresAt)}`;
}

/** Whether no call with it will be answered any more. */
export const hasEnded = (state: KeyState): boolean => state === 'expired' || state === 'revoked';

/** Whether its name and limits may change: a widget's key changes with its widget, a replaced one stays as it was. */
export const mayChange = ({ kind, state }: { kind: 'server' | 'page'; state: KeyState }): boolean =>
  kind === 'server' && (state === 'live' || state === 'unclaimed');

const OTHER_SCOPES: Readonly<Record<string, string>> = { frames: 'Test frames', batch: 'Batches' };

export const scopeTitle = (scope: string): string => OTHER_SCOPES[scope] ?? calculatorGroup(scope).title;

/** What a key may call, in one line. */
export const scopesText = (scopes: readonly string[]): string =>
  scopes[0] === '*' ? 'everything' : scopes.map(scopeTitle).join(', ');

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
