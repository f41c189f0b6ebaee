/** A session that nobody uses for so long has ended. */
export const IDLE_HOURS = 24;
/** However much it is used, a session ends after so long (NIST SP 800-63B-4, AAL1: 30 days). */
export const ABSOLUTE_DAYS = 30;
/** How long an access token holds before it has to be refreshed. */
export const ACCESS_S = 5 * 60;
/** A refresh token that was used may come once more within this time: two tabs that refresh at once. */
const GRACE_S = 10;

export interface RefreshFacts {
  /** Seconds since the token was used; null for one that was not. */
  readonly usedAgoS: number | null;
  /** Whether the token that took its place has been used in turn. */
  readonly isSuccessorUsed: boolean;
  readonly isSessionLive: boolean;
}

/**
 * What a refresh token is worth:
 * - `renew`: a new access token and a new refresh token; this one is used up.
 * - `grace`: another tab was quicker. A new access token alone, so that nothing is gained by it: whoever copied
 *   the token gets minutes, and no way to prolong them.
 * - `reuse`: it was copied, by one of the two who came with it. The session ends for both.
 * - `ended`: there is no session to go on with.
 */
export function refreshVerdict(facts: RefreshFacts): 'renew' | 'grace' | 'reuse' | 'ended' {
  const { usedAgoS, isSuccessorUsed, isSessionLive } = facts;
  if (!isSessionLive) return 'ended';
  if (usedAgoS === null) return 'renew';
  return usedAgoS <= GRACE_S && !isSuccessorUsed ? 'grace' : 'reuse';
}
