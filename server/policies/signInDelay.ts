export interface DelayRule {
  /** So many failures cost nothing: people mistype. */
  readonly free: number;
  readonly longestS: number;
}

/** From one place, for one account. */
export const FROM_ONE_PLACE: DelayRule = { free: 5, longestS: 900 };
/** For one account from all places that it never signed in from; short, so that its owner gets a turn. */
export const FROM_ANYWHERE: DelayRule = { free: 30, longestS: 60 };

/**
 * Seconds until the next attempt after so many failures in a row: 1, 2, 4, … up to the longest. There is no
 * lock: however many failures there were, the right password works when the delay is over.
 */
export function delayAfterS(failures: number, { free, longestS }: DelayRule): number {
  return failures < free ? 0 : Math.min(longestS, 2 ** Math.min(30, failures - free));
}
