import type { AddressInfo } from 'node:net';
import PostalMime from 'postal-mime';
import { SMTPServer } from 'smtp-server';

export interface LocalMail {
  readonly id: number;
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

const KEPT = 200;

/**
 * A mail server on loopback for working on one's own machine: it takes every mail, keeps the latest in memory, and
 * sends nothing on. Production never loads this file.
 */
export class LocalMailbox {
  private readonly mails: LocalMail[] = [];
  private count = 0;
  private readonly server: SMTPServer;

  constructor() {
    this.server = new SMTPServer({
      authOptional: true,
      disabledCommands: ['STARTTLS', 'AUTH'],
      disableReverseLookup: true,
      logger: false,
      onData: (stream, session, done) => {
        const chunks: Buffer[] = [];
        stream.on('data', (chunk: Buffer) => chunks.push(chunk));
        stream.on('end', () => {
          const to = session.envelope.rcptTo.map(({ address }) => address).join(', ');
          this.keep(to, Buffer.concat(chunks)).then(() => done(), done);
        });
      },
    });
    this.server.on('error', () => undefined);
  }

  /** Listens on a free port of loopback; the address for SMTP_URL. */
  async open(): Promise<string> {
    const listening = await new Promise<SMTPServer['server']>((resolve, reject) => {
      this.server.server.once('error', reject);
      this.server.listen(0, '127.0.0.1', () => resolve(this.server.server));
    });
    return `smtp://127.0.0.1:${(listening.address() as AddressInfo).port}`;
  }

  /** The mails, the newest first. */
  list(): readonly LocalMail[] {
    return [...this.mails].reverse();
  }

  close(): Promise<void> {
    return new Promise((resolve) => this.server.close(() => resolve()));
  }

  private async keep(to: string, raw: Buffer): Promise<void> {
    const { subject = '', text = '', html = '' } = await PostalMime.parse(raw);
    this.count += 1;
    this.mails.push({ id: this.count, to, subject, text, html });
    if (this.mails.length > KEPT) this.mails.shift();
  }
}
