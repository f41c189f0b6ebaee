import type { mails } from '../../../shared/text';
import type { ConsoleDatabase, Transaction } from '../../models/ConsoleDatabase';
import { derivedKey } from '../console/derivedKey';
import { seal } from './sealed';

export type MailKind = keyof typeof mails;

export type MailWish = {
  readonly [Kind in MailKind]: {
    readonly accountId: string | null;
    readonly to: string;
    readonly kind: Kind;
    readonly params: Parameters<(typeof mails)[Kind]>[0];
    /** After so long it is of no use any more; a day where left out. */
    readonly minutes?: number;
  };
}[MailKind];

const DAY_MINUTES = 1_440;

/** Where mails wait for the mail server: a row in the transaction that they belong to. */
export class Outbox {
  readonly key: Buffer;
  private onWaiting: () => void = () => undefined;

  constructor(
    private readonly database: ConsoleDatabase,
    sessionSecret: string,
  ) {
    this.key = derivedKey(sessionSecret, 'mails');
  }

  async put(
    { accountId, to, kind, params, minutes = DAY_MINUTES }: MailWish,
    transaction: Transaction,
  ): Promise<void> {
    await this.database.rows(
      `INSERT INTO mail_outbox (account_id, recipient, kind, sealed, expires_at)
       VALUES ($1, $2, $3, $4, service_now() + make_interval(mins => $5))`,
      [accountId, to, kind, seal(JSON.stringify(params), this.key), minutes],
      transaction,
    );
  }

  /** Says, after the commit, that something may be waiting. */
  nudge(): void {
    this.onWaiting();
  }

  whenWaiting(listener: () => void): void {
    this.onWaiting = listener;
  }
}
