import type { ConsoleDatabase, Transaction } from '../../models/ConsoleDatabase';
import type { Outbox } from '../mail/Outbox';
import type { PasswordHasher } from '../passwords/PasswordHasher';
import type { AttemptThrottle } from '../throttle/AttemptThrottle';

export interface ConsoleSettings {
  readonly publicUrl: string;
  readonly sessionSecret: string;
  readonly adminEmail: string | null;
}

/** What the console's routes and services work with. */
export interface ConsoleServices {
  readonly database: ConsoleDatabase;
  readonly hasher: PasswordHasher;
  readonly throttle: AttemptThrottle;
  readonly outbox: Outbox;
  readonly settings: ConsoleSettings;
  /** The process's clock, for access tokens; everything stored goes by the database's. */
  readonly now: () => Date;
}

/** Where a request came from, as sessions and the audit trail note it. */
export interface Origin {
  readonly address: string;
  /** What throttles take for one place. */
  readonly addressGroup: string;
  readonly agent: string;
  readonly requestId: string;
}

export type { Transaction };
