/** What a call asks of the meter; every call costs one token of the rate, whatever its units. */
export interface Ask {
  /** SHA-256 of the key. */
  readonly keyHash: Buffer;
  /** Units of the month's quota; 0 for calls that cost nothing. */
  readonly units: number;
  /** Scopes that the key must hold, as calculator ids or group names. */
  readonly needs: readonly string[];
  /** The page's site for a page key, as the Origin header gives it. */
  readonly site: string | null;
  /** The hash is a pass's, which stands for a key. */
  readonly isPass?: boolean;
}

/** Where the account stands after the call. */
export interface Standing {
  readonly accountId: string;
  readonly keyId: string;
  readonly limit: number;
  readonly used: number;
  readonly cap: number | null;
  readonly keyUsed: number;
  readonly ratePerSecond: number;
  readonly burst: number;
  readonly tokens: number;
  /** The database's clock when it decided. */
  readonly at: Date;
}

export type Refusal =
  | 'key_invalid'
  | 'key_revoked'
  | 'key_expired'
  | 'account_blocked'
  | 'scope_missing'
  | 'origin_not_allowed'
  | 'rate_limited'
  | 'quota_exhausted'
  | 'key_cap_reached';

/** Granted: the units are taken. Refused: nothing is; the standing is known where the key is good. */
export type Decision =
  | { readonly granted: true; readonly standing: Standing }
  | {
      readonly granted: false;
      readonly refusal: Refusal;
      readonly keyId: string | null;
      readonly standing: Standing | null;
    };

/** The database can't be reached, so nothing was counted and nothing may be answered. */
export class MeterUnavailable extends Error {
  constructor(
    readonly retryAfterS: number,
    options?: ErrorOptions,
  ) {
    super('the counting database can’t be reached', options);
  }
}

/** The seam between the routes and how calls are counted. */
export interface Meter {
  /** Decides one call, in order of arrival. @throws MeterUnavailable when the database can't be reached */
  take(ask: Ask): Promise<Decision>;
  /** Gives units back for a call that we failed after granting it, as soon as the database takes it. */
  giveBack(standing: Standing, units: number): void;
  /** Waits for what is under way and closes its connections. */
  close(): Promise<void>;
}
