import { createTransport } from 'nodemailer';
import type { RenderedMail } from './renderMail';

export interface OutgoingMail extends RenderedMail {
  readonly to: string;
  /** The same at every attempt, so that a mail server that got it twice can tell. */
  readonly messageId: string;
}

/** Hands one mail to the mail server. */
export interface MailSender {
  send(mail: OutgoingMail): Promise<void>;
  close(): void;
}

/** Nobody waits for a mail, but the outbox holds a row meanwhile. */
const CONNECT_MS = 5_000;
const ANSWER_MS = 15_000;

/** Sends by the server that the settings name. */
export function smtpSender(smtpUrl: string, from: string): MailSender {
  const url = new URL(smtpUrl);
  const transport = createTransport({
    host: url.hostname,
    port: Number(url.port) || (url.protocol === 'smtps:' ? 465 : 587),
    secure: url.protocol === 'smtps:',
    auth: url.username
      ? { user: decodeURIComponent(url.username), pass: decodeURIComponent(url.password) }
      : undefined,
    connectionTimeout: CONNECT_MS,
    greetingTimeout: CONNECT_MS,
    socketTimeout: ANSWER_MS,
    dnsTimeout: CONNECT_MS,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  return {
    send: async ({ to, subject, text, html, messageId }) => {
      await transport.sendMail({ from, to: { name: '', address: to }, subject, text, html, messageId });
    },
    close: () => transport.close(),
  };
}
