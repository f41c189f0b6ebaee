import type { AddressInfo } from 'node:net';
import PostalMime from 'postal-mime';
import { SMTPServer } from 'smtp-server';

export interface ReceivedMail {
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  readonly messageId: string;
  /** What stands behind the # of its first link. */
  readonly token: string | null;
}

/** A mail server of a test's own, which may go and come back at the same port. */
export class TestMailServer {
  readonly mails: ReceivedMail[] = [];
  private server: SMTPServer | null = null;
  private listeners: (() => void)[] = [];
  private port = 0;
  /** What the server answers to each mail instead of taking it. */
  refusal: { code: number; text: string } | null = null;

  get url(): string {
    return `smtp://127.0.0.1:${this.port}`;
  }

  async up(): Promise<this> {
    const server = new SMTPServer({
      disabledCommands: ['STARTTLS', 'AUTH'],
      disableReverseLookup: true,
      logger: false,
      onRcptTo: (_address, _session, done) => {
        if (!this.refusal) return done();
        done(Object.assign(new Error(this.refusal.text), { responseCode: this.refusal.code }));
      },
      onData: (stream, session, done) => {
        const chunks: Buffer[] = [];
        stream.on('data', (chunk: Buffer) => chunks.push(chunk));
        stream.on('end', () => {
          const to = session.envelope.rcptTo.map(({ address }) => address).join(', ');
          this.keep(to, Buffer.concat(chunks)).then(() => done(), done);
        });
      },
    });
    server.on('error', () => undefined);
    await new Promise<void>((resolve) => server.listen(this.port, '127.0.0.1', resolve));
    this.port = (server.server.address() as AddressInfo).port;
    this.server = server;
    return this;
  }

  down(): Promise<void> {
    const { server } = this;
    this.server = null;
    return new Promise((resolve) => (server ? server.close(() => resolve()) : resolve()));
  }

  /** The latest mail to an address that is newer than `after` others, waiting for it to come. */
  async next(to: string, after = 0): Promise<ReceivedMail> {
    for (;;) {
      const mail = this.to(to)[after];
      if (mail) return mail;
      await new Promise<void>((resolve) => this.listeners.push(resolve));
    }
  }

  /** Mails to an address in the order in which they came. */
  to(address: string): ReceivedMail[] {
    return this.mails.filter((mail) => mail.to.toLowerCase() === address.toLowerCase());
  }

  private async keep(to: string, raw: Buffer): Promise<void> {
    const { subject = '', text = '', html = '', messageId = '' } = await PostalMime.parse(raw);
    const token = /#([A-Za-z0-9_-]{43})/.exec(text)?.[1] ?? null;
    this.mails.push({ to, subject, text, html, messageId, token });
    for (const listener of this.listeners.splice(0)) listener();
  }
}
