import type { Config } from '../../config';
import { smtpSender } from '../../mail/smtpSender';
import { ConsoleDatabase } from '../../models/ConsoleDatabase';
import { grantAdmin } from '../accounts/grantAdmin';
import { Outbox } from '../mail/Outbox';
import { OutboxWorker } from '../mail/OutboxWorker';
import { WorkerPasswordHasher } from '../passwords/PasswordHasher';
import { AttemptThrottle } from '../throttle/AttemptThrottle';
import { alertQuotas } from '../usage/alertQuotas';
import type { ConsoleServices } from './ConsoleServices';
import { openLocalMailbox, type ReadableMailbox } from './openLocalMailbox';
import { Periodic } from './Periodic';
import { tidyUp } from './tidyUp';

export interface ConsoleOptions {
  readonly config: Config;
  readonly serviceUrl: string;
  /** Where the built workers lie. */
  readonly workerFolder: URL;
  readonly now: () => Date;
  /** Hears of what went wrong in the background, in words that name nobody. */
  readonly onTrouble: (what: string, reason: string) => void;
  /** Hears the text of each statement, for tests that count the work done. */
  readonly onStatement?: (sql: string) => void;
}

export interface Console {
  readonly services: ConsoleServices;
  /** The mails that stay on this machine; null where a mail server sends them. */
  readonly mailbox: ReadableMailbox | null;
  stop(): Promise<void>;
}

/** OWASP's advice for bcrypt is a cost of 10 and more; 12 takes a quarter of a second here. Tests hash often. */
const COST = 12;
const COST_UNDER_TESTS = 4;
const MINUTE_MS = 60_000;
const HOUR_MS = 60 * MINUTE_MS;

/** Connects what the console works with, and starts what runs behind it. */
export async function openConsole(options: ConsoleOptions): Promise<Console> {
  const { config, serviceUrl, workerFolder, now, onTrouble, onStatement } = options;
  const { publicUrl, sessionSecret, adminEmail, mode } = config;
  const database = new ConsoleDatabase({ url: serviceUrl, poolSize: config.databasePoolSize, onStatement });
  const hasher = new WorkerPasswordHasher({
    cost: mode === 'test' ? COST_UNDER_TESTS : COST,
    workerUrl: new URL('password.worker.js', workerFolder),
  });
  const outbox = new Outbox(database, sessionSecret);
  const local = config.smtpUrl === null && mode !== 'production' ? await openLocalMailbox() : null;
  const smtpUrl = config.smtpUrl ?? local?.smtpUrl ?? null;
  if (smtpUrl === null) onTrouble('mails wait', 'no SMTP_URL is set');
  const worker =
    smtpUrl === null
      ? null
      : new OutboxWorker({
          database,
          outbox,
          sender: smtpSender(smtpUrl, config.mailFrom),
          publicUrl,
          onTrouble: (reason) => onTrouble('a mail was not sent', reason),
        });
  const tidying = new Periodic({
    work: () => tidyUp(database, outbox, publicUrl),
    everyMs: HOUR_MS,
    firstMs: 20_000,
    onTrouble: (reason) => onTrouble('the housekeeping failed', reason),
  });
  const alerting = new Periodic({
    work: async () => void (await alertQuotas(database, outbox, publicUrl)),
    everyMs: MINUTE_MS,
    firstMs: MINUTE_MS,
    onTrouble: (reason) => onTrouble('the quotas were not looked at', reason),
  });
  if (adminEmail !== null) await grantAdmin(database, adminEmail);
  worker?.start();
  tidying.start();
  alerting.start();
  const settings = { publicUrl, sessionSecret, adminEmail };
  return {
    services: { database, hasher, throttle: new AttemptThrottle(database.sequelize), outbox, settings, now },
    mailbox: local?.mailbox ?? null,
    stop: async () => {
      await tidying.stop();
      await alerting.stop();
      await worker?.stop();
      await local?.close();
      await hasher.close();
      await database.close();
    },
  };
}
