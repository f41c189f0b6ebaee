/** A key as the model knows it. */
export interface ModelKey {
  readonly holds: 'everything' | 'light';
  isRevoked: boolean;
  expiresMs: number | null;
  cap: number | null;
  /** Units by month. */
  readonly used: Map<string, number>;
}

export interface Verdict {
  readonly status: number;
  readonly code: string | null;
  readonly retryAfterS: number | null;
}

/** What a call would be given if it took nothing. */
interface Wish {
  readonly key: ModelKey;
  readonly units: number;
  readonly needs: readonly string[];
}

const ok: Verdict = { status: 200, code: null, retryAfterS: null };
const refused = (status: number, code: string, retryAfterS: number | null = null): Verdict => ({
  status,
  code,
  retryAfterS,
});

/**
 * What the metered API promises of one account, as plain counters and a token bucket: no statement, no batch, no
 * second process. All times are milliseconds since 1970.
 */
export class QuotaModel {
  readonly keys: ModelKey[] = [];
  /** Units by month. */
  readonly used = new Map<string, number>();
  isBlocked = false;
  /** Null until the first call fills the bucket. */
  bucket: { tokens: number; refilledMs: number } | null = null;

  constructor(
    public nowMs: number,
    public units: number,
    public ratePerSecond: number,
  ) {}

  get month(): string {
    return new Date(this.nowMs).toISOString().slice(0, 7);
  }

  /** An account's own rate comes with four seconds' worth at once. */
  get burst(): number {
    return 4 * this.ratePerSecond;
  }

  get usedNow(): number {
    return this.used.get(this.month) ?? 0;
  }

  keyUsedNow(key: ModelKey): number {
    return key.used.get(this.month) ?? 0;
  }

  get secondsToNextMonth(): number {
    const now = new Date(this.nowMs);
    return Math.ceil((Date.UTC(now.getUTCFullYear(), now.getUTCMonth() + 1, 1) - this.nowMs) / 1000);
  }

  /** Decides a call and takes what it costs. */
  take({ key, units, needs }: Wish): Verdict {
    if (key.isRevoked) return refused(401, 'key_revoked');
    if (key.expiresMs !== null && key.expiresMs <= this.nowMs) return refused(401, 'key_expired');
    if (this.isBlocked) return refused(403, 'account_blocked');
    const bucket = this.refill();
    const holds = (need: string) => key.holds === 'everything' || need.split('/')[0] === key.holds;
    if (!needs.every(holds)) return refused(403, 'scope_missing');
    if (bucket.tokens < 1) {
      return refused(429, 'rate_limited', Math.ceil((1 - bucket.tokens) / this.ratePerSecond));
    }
    bucket.tokens -= 1;
    if (units > 0 && this.usedNow + units > this.units)
      return refused(429, 'quota_exhausted', this.secondsToNextMonth);
    if (units > 0 && key.cap !== null && this.keyUsedNow(key) + units > key.cap)
      return refused(429, 'key_cap_reached', this.secondsToNextMonth);
    this.used.set(this.month, this.usedNow + units);
    key.used.set(this.month, this.keyUsedNow(key) + units);
    return ok;
  }

  private refill() {
    const { nowMs, burst, ratePerSecond } = this;
    const { tokens, refilledMs } = this.bucket ?? { tokens: burst, refilledMs: nowMs };
    const refilled = Math.min(burst, tokens + (ratePerSecond * (nowMs - refilledMs)) / 1000);
    this.bucket = { tokens: refilled, refilledMs: nowMs };
    return this.bucket;
  }
}
