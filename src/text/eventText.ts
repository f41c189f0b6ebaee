/** What happened to an account, in words; an event without words of its own is shown by its code. */
const EVENTS: Readonly<Record<string, string>> = {
  account_closed: 'Account closed',
  admin_granted: 'Admin role granted',
  data_exported: 'Own data exported',
  email_change_asked: 'New e-mail address asked for',
  email_changed: 'E-mail address changed',
  key_changed: 'Key changed',
  key_claimed: 'Key generated',
  key_made: 'Key made',
  key_revoked: 'Key revoked',
  key_rotated: 'Key rotated',
  pass_given: 'Pass for the try page given',
  password_asked: 'New password asked for',
  password_changed: 'Password changed',
  password_set: 'Password set by a mailed link',
  plan_asked: 'Another plan asked for',
  plan_wish_withdrawn: 'Wish for a plan taken back',
  profile_changed: 'Name or measure changed',
  roles_changed: 'Roles changed',
  session_ended: 'Session ended',
  sign_in_failed: 'Sign-in failed',
  signed_in: 'Signed in',
  signed_out: 'Signed out',
  signed_up: 'Account made',
};

/** Nobody is signed in when these happen. */
const BY_NOBODY: ReadonlySet<string> = new Set(['sign_in_failed', 'password_asked', 'password_set']);

export function eventText(event: string, isByYou: boolean): string {
  const text = EVENTS[event] ?? event.replaceAll('_', ' ');
  return isByYou || BY_NOBODY.has(event) ? text : `${text}, not by you`;
}
