import { mails } from '../../../shared/text';
import type { MailWords } from '../../../shared/text/en/mails';
import { renderMail } from '../../mail/renderMail';
import type { MailSender } from '../../mail/smtpSender';
import type { ConsoleDatabase, Transaction } from '../../models/ConsoleDatabase';
import type { MailKind, Outbox } from './Outbox';
import { unseal } from './sealed';

interface Waiting {
  readonly id: string;
  readonly recipient: string;
  readonly kind: MailKind;
  readonly sealed: Buffer;
  readonly isLate: boolean;
}

interface WorkerOptions {
  readonly database: ConsoleDatabase;
  readonly outbox: Outbox;
  readonly sender: MailSender;
  readonly publicUrl: string;
  /** Hears of failures, without addresses and without what was said. */
  readonly onTrouble: (reason: string) => void;
  /** Milliseconds between looks at the outbox where nothing nudges; other processes put mails there too. */
  readonly everyMs?: number;
}

const EVERY_MS = 2_000;

// A row that another process is sending is skipped; the lock lasts until it is marked, so nobody sends it twice.
const NEXT = `
SELECT id, recipient, kind, sealed, expires_at <= service_now() AS "isLate" FROM mail_outbox
WHERE sealed IS NOT NULL AND next_attempt_at <= service_now()
ORDER BY next_attempt_at, id LIMIT 1 FOR UPDATE SKIP LOCKED`;
// What was said is dropped with its link. A closed account's last mail takes its address with it.
const SENT = `
UPDATE mail_outbox SET sent_at = service_now(), attempts = attempts + 1, sealed = NULL, last_error = NULL,
  recipient = CASE WHEN kind = 'account_closed' THEN 'closed' ELSE recipient END WHERE id = $1`;
const GIVEN_UP = `
UPDATE mail_outbox SET failed_at = service_now(), sealed = NULL, last_error = $2,
  recipient = CASE WHEN kind = 'account_closed' THEN 'closed' ELSE recipient END WHERE id = $1`;
// 5 s, 10 s, 20 s, … up to half an hour.
const LATER = `
UPDATE mail_outbox SET attempts = attempts + 1, last_error = $2,
  next_attempt_at = service_now() + make_interval(secs => least(1800, 5 * 2 ^ least(attempts, 12))) WHERE id = $1`;

/** A mail server's final no (RFC 5321, 4.2.1: 5yz); anything else may pass. */
const isFinal = (error: unknown) => {
  const code = (error as { responseCode?: number } | null)?.responseCode ?? 0;
  return code >= 550 && code <= 559;
};

/** What went wrong, in a word that holds no address. */
function wordOf(error: unknown): string {
  const { code, responseCode } = (error ?? {}) as { code?: string; responseCode?: number };
  return [code ?? 'failed', responseCode].filter((part) => part !== undefined).join(' ');
}

function wordsOf(kind: MailKind, params: unknown): MailWords {
  return (mails[kind] as (given: unknown) => MailWords)(params);
}

/** Sends what waits in the outbox, one mail after the other, until it is stopped. Any number may run at once. */
export class OutboxWorker {
  private timer: NodeJS.Timeout | null = null;
  private work: Promise<void> | null = null;
  private isNudged = false;
  private isStopped = false;

  constructor(private readonly options: WorkerOptions) {
    options.outbox.whenWaiting(() => this.wake());
  }

  start(): void {
    this.timer = setInterval(() => this.wake(), this.options.everyMs ?? EVERY_MS);
    this.timer.unref();
    this.wake();
  }

  async stop(): Promise<void> {
    this.isStopped = true;
    if (this.timer) clearInterval(this.timer);
    await this.work;
    this.options.sender.close();
  }

  private wake(): void {
    if (this.isStopped) return;
    this.isNudged = true;
    this.work ??= this.run().finally(() => {
      this.work = null;
      if (this.isNudged) this.wake();
    });
  }

  private async run(): Promise<void> {
    try {
      let goesOn = true;
      while (goesOn && !this.isStopped) {
        this.isNudged = false;
        goesOn = await this.options.database.transact((transaction) => this.sendNext(transaction));
      }
    } catch (error) {
      // The database is away; the next look tries again.
      this.options.onTrouble(wordOf(error));
      this.isNudged = false;
    }
  }

  /** Whether there may be more to send now. */
  private async sendNext(transaction: Transaction): Promise<boolean> {
    const { database, sender, outbox, publicUrl, onTrouble } = this.options;
    const [mail] = await database.rows<Waiting>(NEXT, [], transaction);
    if (!mail) return false;
    const { id, kind, recipient, sealed, isLate } = mail;
    if (isLate) {
      await database.rows(GIVEN_UP, [id, 'too late'], transaction);
      return true;
    }
    try {
      const words = wordsOf(kind, JSON.parse(unseal(sealed, outbox.key)));
      const messageId = `<${id}@${new URL(publicUrl).hostname}>`;
      await sender.send({ ...renderMail(words), to: recipient, messageId });
    } catch (error) {
      const word = wordOf(error).slice(0, 200);
      onTrouble(word);
      await database.rows(isFinal(error) ? GIVEN_UP : LATER, [id, word], transaction);
      return true;
    }
    await database.rows(SENT, [id], transaction);
    return true;
  }
}
