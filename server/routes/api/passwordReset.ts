import { z } from 'zod';
import { passwordFault } from '../../policies/passwordRules';
import { askForPassword, ownerOfLink, setPasswordByLink } from '../../services/accounts/passwords';
import { isCommonPassword } from '../../services/passwords/commonPasswords';
import { invalidInput } from '../v1/invalidInput';
import { emailIn, linkTokenIn, newPasswordIn, sayPasswordFault } from './fields';
import { openRoute, type Route } from './route';
import { ownWords } from './signUp';

/** @throws ProblemError 422 at the named field where a password is made of what others know about its owner */
export function refuseOwnWords(password: string, field: string, words: readonly string[]): void {
  const fault = passwordFault(password, { isCommon: isCommonPassword, words });
  if (!fault) return;
  throw invalidInput([{ pointer: `/${field}`, code: fault, detail: sayPasswordFault(fault, password) }]);
}

export const askForPasswordRoute: Route = openRoute({
  id: 'AskForPassword',
  method: 'POST',
  path: '/api/password-reset',
  tag: 'account',
  summary: 'Ask for a link to set a new password; a mail goes out, whether or not the address has an account',
  limit: 'mails',
  status: 202,
  problems: [],
  body: z.strictObject({ email: emailIn() }),
  answer: z.strictObject({ sentTo: z.string() }),
  async handle({ body }, visit, services) {
    await askForPassword(services, body.email, visit.origin);
    return { sentTo: body.email };
  },
});

export const setPasswordRoute: Route = openRoute({
  id: 'SetPassword',
  method: 'POST',
  path: '/api/password-reset/confirm',
  tag: 'account',
  summary: 'Set a new password by the link that was mailed; ends all sessions, and signs nobody in',
  limit: 'secrets',
  status: 200,
  problems: [410],
  body: z.strictObject({ token: linkTokenIn(), password: newPasswordIn() }),
  answer: z.strictObject({ email: z.string() }),
  async handle({ body }, visit, services) {
    const owner = await ownerOfLink(services, body.token);
    refuseOwnWords(body.password, 'password', ownWords(services.settings.publicUrl, owner));
    await setPasswordByLink(services, { ...body, owner }, visit.origin);
    return { email: owner.email };
  },
});
