export interface LocalMessage {
  readonly id: number;
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

/** What the local mail page shows. */
export interface ReadableMailbox {
  list(): readonly LocalMessage[];
}

interface OpenMailbox {
  readonly mailbox: ReadableMailbox;
  readonly smtpUrl: string;
  close(): Promise<void>;
}

/** Starts the mail server of this machine. Loaded only where it is asked for, so that production never has it. */
export async function openLocalMailbox(): Promise<OpenMailbox> {
  const { LocalMailbox } = await import('../../mail/LocalMailbox');
  const mailbox = new LocalMailbox();
  const smtpUrl = await mailbox.open();
  return { mailbox, smtpUrl, close: () => mailbox.close() };
}
