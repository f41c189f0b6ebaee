import { QueryTypes, Sequelize, type Transaction } from 'sequelize';
import { accountModel } from './Account';
import { apiKeyModel } from './ApiKey';
import { auditEventModel } from './AuditEvent';
import { mailMessageModel } from './MailMessage';
import { sessionModel } from './Session';

export type { Transaction };

export interface DatabaseOptions {
  /** The service's own role, which may touch rows only. */
  readonly url: string;
  readonly poolSize: number;
  /** Hears the text of each statement, for tests that count the work done. */
  readonly onStatement?: (sql: string) => void;
}

/** A person waits for the console's answers, so nothing may take long. */
const STATEMENT_MS = 5_000;
const CONNECT_MS = 2_000;
const ACQUIRE_MS = 4_000;
/** The outbox holds a transaction while a mail server is being talked to. */
const IDLE_IN_TRANSACTION_MS = 60_000;

/** The console's connections and its models on them. */
export class ConsoleDatabase {
  readonly sequelize: Sequelize;
  readonly accounts;
  readonly sessions;
  readonly apiKeys;
  readonly auditEvents;
  readonly mails;

  constructor({ url, poolSize, onStatement }: DatabaseOptions) {
    this.sequelize = new Sequelize(url, {
      dialect: 'postgres',
      logging: onStatement ? (sql) => onStatement(sql) : false,
      pool: { max: poolSize, min: 0, idle: 30_000, acquire: ACQUIRE_MS },
      dialectOptions: {
        application_name: 'evenfall-console',
        statement_timeout: STATEMENT_MS,
        query_timeout: STATEMENT_MS + 1_000,
        connectionTimeoutMillis: CONNECT_MS,
        idle_in_transaction_session_timeout: IDLE_IN_TRANSACTION_MS,
        keepAlive: true,
      },
    });
    this.accounts = accountModel(this.sequelize);
    this.sessions = sessionModel(this.sequelize);
    this.apiKeys = apiKeyModel(this.sequelize);
    this.auditEvents = auditEventModel(this.sequelize);
    this.mails = mailMessageModel(this.sequelize);
  }

  /** One parameterised statement ($1, $2, …); its rows. */
  rows<Row extends object>(sql: string, bind: readonly unknown[], transaction?: Transaction): Promise<Row[]> {
    return this.sequelize.query<Row>(sql, { bind: [...bind], type: QueryTypes.SELECT, transaction });
  }

  /** Everything in `work` happens, or nothing of it. */
  transact<Result>(work: (transaction: Transaction) => Promise<Result>): Promise<Result> {
    return this.sequelize.transaction(work);
  }

  close(): Promise<void> {
    return this.sequelize.close();
  }
}
