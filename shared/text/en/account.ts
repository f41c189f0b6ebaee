import { counted } from './format';

/** Sentences about accounts, sessions and keys, by code. */
export const account = {
  password_too_short: (p: { minimum: number; given: number }) =>
    `The password needs at least ${counted(p.minimum, 'character')}; ${p.given} ${p.given === 1 ? 'was' : 'were'} given. A few words together do well.`,
  password_too_long: (p: { maximum: number; given: number }) =>
    `The password may have up to ${counted(p.maximum, 'character')}; ${p.given} were given.`,
  password_common: () =>
    'This password is among the first that anyone would try. Take one that nobody else has.',
  password_about_you: () =>
    'Too much of this password is your name, your address or ours. Take out what others know about you.',
  email_not_valid: () => 'Give an e-mail address such as name@example.org.',
  name_not_valid: () => 'Give a name of 1 to 100 characters, in one line.',
  token_not_valid: () => 'This is not a link that we sent. Open the link of the mail again.',
  roles_not_valid: () => 'Choose at least one of developer, photographer and educator, each once.',
  scopes_not_valid: () => 'Give "*" alone for everything, or the groups that the key may call, each once.',
  expiry_in_past: () => 'The expiry must lie in the future.',
  id_not_valid: () => 'This is not an id that we give.',
  cursor_not_valid: () => 'This is not a place in the list that we gave.',
  span_not_valid: (p: { maximum: number }) =>
    `The last day must not lie before the first, and at most ${p.maximum} days may be asked for.`,
  reason_not_valid: () => 'Say in 10 to 2,000 characters what the plan is needed for.',
  plan_not_valid: (p: { plans: readonly string[] }) =>
    `Choose one of the other plans: ${p.plans.join(', ')}.`,
} as const;
