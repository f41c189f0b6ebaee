import type { ConsoleDatabase } from '../../models/ConsoleDatabase';
import type { Outbox } from '../mail/Outbox';
import { remindOfExpiry } from '../keys/remindOfExpiry';

const EVERY_MS = 3_600_000;
/** The first look comes soon after the start, but not in its way. */
const FIRST_MS = 20_000;

/** What nobody needs any more. Links and passes are of no use once they are over; sent mails are a log for a while. */
const OVER = [
  "DELETE FROM sign_ups WHERE expires_at < service_now() - interval '1 day'",
  "DELETE FROM email_tokens WHERE expires_at < service_now() - interval '1 day'",
  'DELETE FROM key_passes WHERE expires_at < service_now()',
  `DELETE FROM sessions WHERE expires_at < service_now() - interval '30 days'
     OR ended_at < service_now() - interval '30 days'`,
  "DELETE FROM mail_outbox WHERE sealed IS NULL AND created_at < service_now() - interval '90 days'",
  'DELETE FROM throttles WHERE expire < extract(epoch FROM now()) * 1000 - 86400000',
];

/** Tidies up once an hour, and reminds of keys that are about to expire. Any number of processes may do it. */
export class Housekeeping {
  private timer: NodeJS.Timeout | null = null;
  private work: Promise<void> = Promise.resolve();

  constructor(
    private readonly database: ConsoleDatabase,
    private readonly outbox: Outbox,
    private readonly publicUrl: string,
    private readonly onTrouble: (reason: string) => void,
  ) {}

  start(): void {
    this.next(FIRST_MS);
  }

  async stop(): Promise<void> {
    if (this.timer) clearTimeout(this.timer);
    await this.work;
  }

  private next(inMs: number): void {
    this.timer = setTimeout(() => {
      this.work = this.tidy().then(() => this.next(EVERY_MS));
    }, inMs);
    this.timer.unref();
  }

  private async tidy(): Promise<void> {
    try {
      for (const sql of OVER) await this.database.rows(sql, []);
      await remindOfExpiry(this.database, this.outbox, this.publicUrl);
    } catch (error) {
      this.onTrouble(error instanceof Error ? error.name : 'unknown');
    }
  }
}
