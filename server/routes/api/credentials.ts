import { z } from 'zod';
import { closeAccount } from '../../services/accounts/closeAccount';
import { confirmPassword } from '../../services/accounts/confirmPassword';
import { askForNewEmail, confirmNewEmail } from '../../services/accounts/emailChange';
import { changePassword } from '../../services/accounts/passwords';
import { emailIn, linkTokenIn, newPasswordIn, passwordIn } from './fields';
import { refuseOwnWords } from './passwordReset';
import { closedRoute, openRoute, type Route } from './route';
import { ownWords } from './signUp';

export const changePasswordRoute: Route = closedRoute({
  id: 'ChangePassword',
  method: 'POST',
  path: '/api/me/password',
  tag: 'account',
  summary: 'Change the password; ends the other sessions',
  limit: 'secrets',
  status: 204,
  problems: [],
  body: z.strictObject({ currentPassword: passwordIn(), newPassword: newPasswordIn() }),
  answer: null,
  async handle({ body }, { signedIn, origin }, services) {
    const { account: owner, sessionId } = signedIn;
    refuseOwnWords(body.newPassword, 'newPassword', ownWords(services.settings.publicUrl, owner));
    await confirmPassword(services, signedIn, body.currentPassword, origin);
    await changePassword(services, { owner, password: body.newPassword, sessionId }, origin);
  },
});

export const changeEmailRoute: Route = closedRoute({
  id: 'ChangeEmail',
  method: 'POST',
  path: '/api/me/email',
  tag: 'account',
  summary: 'Ask for another address; it holds when the link that is mailed there is used',
  limit: 'mails',
  status: 202,
  problems: [],
  body: z.strictObject({ email: emailIn(), password: passwordIn() }),
  answer: z.strictObject({ sentTo: z.string() }),
  async handle({ body }, { signedIn, origin }, services) {
    await confirmPassword(services, signedIn, body.password, origin);
    await askForNewEmail(services, signedIn, body.email, origin);
    return { sentTo: body.email };
  },
});

export const confirmEmailRoute: Route = openRoute({
  id: 'ConfirmEmail',
  method: 'POST',
  path: '/api/email-change/confirm',
  tag: 'account',
  summary: 'Confirm a new address by the link that was mailed there',
  limit: 'secrets',
  status: 200,
  problems: [410],
  body: z.strictObject({ token: linkTokenIn() }),
  answer: z.strictObject({ email: z.string() }),
  handle: ({ body }, { origin }, services) => confirmNewEmail(services, body.token, origin),
});

export const closeAccountRoute: Route = closedRoute({
  id: 'CloseAccount',
  method: 'POST',
  path: '/api/me/close',
  tag: 'account',
  summary: 'Close the account for good: keys are revoked, what is personal is removed',
  limit: 'secrets',
  status: 204,
  problems: [],
  body: z.strictObject({ password: passwordIn() }),
  answer: null,
  headers: ['Set-Cookie', 'Clear-Site-Data'],
  async handle({ body }, visit, services) {
    await confirmPassword(services, visit.signedIn, body.password, visit.origin);
    await closeAccount(services, visit.signedIn, visit.origin);
    visit.dropCookies();
    visit.setHeader('Clear-Site-Data', '"cache", "cookies", "storage"');
  },
});
