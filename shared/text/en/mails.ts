import { readable } from './format';

/** A mail before it is set as text and as HTML: sentences, and one thing to press. */
export interface MailWords {
  readonly subject: string;
  readonly paragraphs: readonly string[];
  readonly action?: { readonly label: string; readonly link: string };
}

interface Linked {
  readonly link: string;
  readonly minutes: number;
}

interface Quota {
  readonly used: number;
  readonly limit: number;
  /** The first day of the next month. */
  readonly resetsOn: string;
  readonly link: string;
}

const IGNORE = 'If this was not you, leave this mail alone: nothing happens.';
const NOT_YOU = 'If this was not you, set a new password at once and end the other sessions under Settings.';

/** Every mail of the service, by kind. */
export const mails = {
  confirm_address: (p: Linked & { name: string }): MailWords => ({
    subject: 'Confirm your address for Evenfall',
    paragraphs: [
      `Good evening, ${p.name}.`,
      `Someone, we hope you, opened an account at Evenfall with this address. Confirm it within ${p.minutes} minutes, then sign in with the password you chose.`,
      IGNORE,
    ],
    action: { label: 'Confirm the address', link: p.link },
  }),
  already_registered: (p: { link: string }): MailWords => ({
    subject: 'You already have an account at Evenfall',
    paragraphs: [
      'Someone, perhaps you, tried to open an account with this address. There is one already, so nothing was changed.',
      'If you don’t remember its password, ask for a link to set a new one.',
      IGNORE,
    ],
    action: { label: 'Set a new password', link: p.link },
  }),
  set_password: (p: Linked): MailWords => ({
    subject: 'Set a new password for Evenfall',
    paragraphs: [
      `A new password was asked for. This link works once, for ${p.minutes} minutes; the old password works until a new one is set.`,
      IGNORE,
    ],
    action: { label: 'Set a new password', link: p.link },
  }),
  no_account: (p: { link: string }): MailWords => ({
    subject: 'There is no Evenfall account with this address',
    paragraphs: [
      'A new password was asked for, but no account has this address. Perhaps you used another one.',
      IGNORE,
    ],
    action: { label: 'Open an account', link: p.link },
  }),
  password_changed: (p: { link: string }): MailWords => ({
    subject: 'Your Evenfall password was changed',
    paragraphs: ['The password of your account was changed, and its other sessions were ended.', NOT_YOU],
    action: { label: 'Set a new password', link: p.link },
  }),
  confirm_new_address: (p: Linked): MailWords => ({
    subject: 'Confirm your new address for Evenfall',
    paragraphs: [
      `An account at Evenfall is to have this address from now on. Confirm it within ${p.minutes} minutes; until then the old address holds.`,
      IGNORE,
    ],
    action: { label: 'Confirm the new address', link: p.link },
  }),
  address_taken: (_p: Record<string, never>): MailWords => ({
    subject: 'This address already has an Evenfall account',
    paragraphs: [
      'Another account was to be given this address, which has an account already. Nothing was changed.',
      IGNORE,
    ],
  }),
  address_change_asked: (p: { newAddress: string; link: string }): MailWords => ({
    subject: 'A new address was asked for',
    paragraphs: [
      `Your Evenfall account is to have the address ${p.newAddress}. It holds as soon as that address is confirmed.`,
      NOT_YOU,
    ],
    action: { label: 'Set a new password', link: p.link },
  }),
  address_changed: (p: { newAddress: string }): MailWords => ({
    subject: 'Your Evenfall address was changed',
    paragraphs: [
      `Your account now has the address ${p.newAddress}. This is the last mail to the old one.`,
      'If this was not you, write to the service’s contact address from this mailbox.',
    ],
  }),
  session_reused: (p: { link: string }): MailWords => ({
    subject: 'We ended one of your Evenfall sessions',
    paragraphs: [
      'A sign-in token was used a second time, which happens when someone has copied it. We ended that session; sign in again.',
      'If you did nothing unusual, set a new password.',
    ],
    action: { label: 'Set a new password', link: p.link },
  }),
  key_expires: (p: { name: string; shown: string; days: number; link: string }): MailWords => ({
    subject: `Your Evenfall key “${p.name}” expires within ${p.days} days`,
    paragraphs: [
      `The key “${p.name}” (${p.shown}) expires within ${p.days} days. Calls with it are refused from then on.`,
      'Rotate it in time: the new key works beside the old one for as long as you choose.',
    ],
    action: { label: 'Look at the key', link: p.link },
  }),
  quota_will_end: (p: Quota & { endsOn: string }): MailWords => ({
    subject: 'At this pace your Evenfall units end before the month does',
    paragraphs: [
      `${readable(p.used)} of this month’s ${readable(p.limit)} units are used. At this pace they end on ${p.endsOn} (UTC); a new month begins on ${p.resetsOn}.`,
      'Look at what uses them, or ask for another plan.',
    ],
    action: { label: 'Look at the usage', link: p.link },
  }),
  quota_nearly_used: (p: Quota): MailWords => ({
    subject: 'Four fifths of your Evenfall units are used',
    paragraphs: [
      `${readable(p.used)} of this month’s ${readable(p.limit)} units are used. When all are, calls get 429 until ${p.resetsOn} (UTC).`,
      'Look at what uses them, or ask for another plan.',
    ],
    action: { label: 'Look at the usage', link: p.link },
  }),
  quota_used_up: (p: Quota): MailWords => ({
    subject: 'Your Evenfall units of this month are used up',
    paragraphs: [
      `All ${readable(p.limit)} units of this month are used. Calls get 429 until ${p.resetsOn} (UTC), when a new month begins.`,
      'Another plan can be asked for; nothing is charged by itself.',
    ],
    action: { label: 'Look at the usage', link: p.link },
  }),
  account_closed: (_p: Record<string, never>): MailWords => ({
    subject: 'Your Evenfall account is closed',
    paragraphs: [
      'Your account is closed, its keys are revoked, and what we knew of you is removed. This is the last mail.',
    ],
  }),
} as const;
