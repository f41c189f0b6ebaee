import { createHash } from 'node:crypto';
import {
  RateLimiterMemory,
  RateLimiterPostgres,
  RateLimiterRes,
  type RateLimiterAbstract,
} from 'rate-limiter-flexible';
import type { Sequelize } from 'sequelize';
import { ProblemError } from '../../http/ProblemError';
import { delayAfterS, FROM_ANYWHERE, FROM_ONE_PLACE, type DelayRule } from '../../policies/signInDelay';

const DAY_S = 86_400;
const HOUR_S = 3_600;
/** So many mails an hour may one address be sent for one purpose, whoever asks. */
const MAILS_AN_HOUR = 3;

interface Attempt {
  /** Who is meant: an address, known or not, or an account's id. */
  readonly name: string;
  readonly addressGroup: string;
  /** The account was signed in from this place before: strangers elsewhere don't slow it down. */
  readonly isKnownPlace: boolean;
}

/** Throttles keep no addresses, only what stands for them. */
const keyOf = (...parts: string[]) =>
  createHash('sha256').update(parts.join('\n').toLowerCase()).digest('base64url');

function tooMany(waitMs: number): ProblemError {
  const wait = Math.max(1, Math.ceil(waitMs / 1000));
  const detail = `There were many attempts; wait ${wait} s. The right password works again then.`;
  return new ProblemError('too_many_attempts', detail, { headers: { 'Retry-After': String(wait) } });
}

/**
 * Slows down who guesses, by account and place, with a delay that grows by each failure and locks nobody out. The
 * counts are in the database, for all processes; should it fail, each process counts for itself.
 */
export class AttemptThrottle {
  private readonly failures: RateLimiterAbstract;
  private readonly gate: RateLimiterAbstract;
  private readonly mails: RateLimiterAbstract;

  constructor(sequelize: Sequelize) {
    const limiter = (keyPrefix: string, points: number, duration: number) =>
      new RateLimiterPostgres({
        storeClient: sequelize,
        storeType: 'sequelize',
        tableName: 'throttles',
        tableCreated: true,
        clearExpiredByTimeout: false,
        keyPrefix,
        points,
        duration,
        insuranceLimiter: new RateLimiterMemory({ keyPrefix, points, duration }),
      });
    this.failures = limiter('failures', 1_000_000, DAY_S);
    this.gate = limiter('gate', 1, 1);
    this.mails = limiter('mails', MAILS_AN_HOUR, HOUR_S);
  }

  /**
   * Lets an attempt through, counted as a failure until `succeeded` says otherwise, so that many at once don't slip by.
   * @throws ProblemError 429 while a delay lasts
   */
  async admit({ name, addressGroup, isKnownPlace }: Attempt): Promise<void> {
    await this.admitBy(keyOf(name, addressGroup), FROM_ONE_PLACE);
    if (!isKnownPlace) await this.admitBy(keyOf(name), FROM_ANYWHERE);
  }

  /** Forgets the failures from this place. */
  async succeeded({ name, addressGroup }: Attempt): Promise<void> {
    const key = keyOf(name, addressGroup);
    await this.failures.delete(key);
    await this.gate.delete(key);
  }

  /** Whether one more mail for this purpose may go to an address. */
  async mayMail(purpose: string, email: string): Promise<boolean> {
    return this.mails.consume(keyOf(purpose, email)).then(
      () => true,
      (reason: unknown) => {
        if (reason instanceof RateLimiterRes) return false;
        throw reason;
      },
    );
  }

  private async admitBy(key: string, rule: DelayRule): Promise<void> {
    const { consumedPoints } = await this.failures.penalty(key);
    const delayS = delayAfterS((consumedPoints ?? 1) - 1, rule);
    if (delayS === 0) return;
    try {
      await this.gate.consume(key, 1, { customDuration: delayS });
    } catch (reason) {
      if (!(reason instanceof RateLimiterRes)) throw reason;
      // It was not tried, so it is no failure: the delay must not grow by asking.
      await this.failures.reward(key);
      throw tooMany(reason.msBeforeNext);
    }
  }
}
