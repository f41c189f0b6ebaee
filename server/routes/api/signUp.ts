import { z } from 'zod';
import { confirmSignUp, signUp } from '../../services/accounts/signUp';
import { contextWords, passwordFault } from '../../policies/passwordRules';
import { isCommonPassword } from '../../services/passwords/commonPasswords';
import { emailIn, linkTokenIn, nameIn, newPasswordIn, rolesIn, sayPasswordFault } from './fields';
import { openRoute, type Route } from './route';

/** The product's own words, which a password must not be made of. */
const PRODUCT = 'evenfall';

/** Words that a password of this person must not be made of. */
export function ownWords(publicUrl: string, person: { email: string; name: string }): string[] {
  return contextWords(PRODUCT, new URL(publicUrl).hostname, person.email, person.name);
}

const bodySchema = z.strictObject({
  email: emailIn(),
  name: nameIn(),
  password: newPasswordIn(),
  roles: rolesIn(),
});

/** The body with the one rule between its fields, which holds whatever else is at fault. */
const signUpBody = bodySchema.superRefine((body, context) => {
  const { email, name, password } = body as Partial<Record<keyof typeof body, unknown>>;
  if (typeof email !== 'string' || typeof name !== 'string' || typeof password !== 'string') return;
  const words = contextWords(PRODUCT, email, name);
  const fault = passwordFault(password, { isCommon: isCommonPassword, words });
  if (fault !== 'password_about_you') return;
  const params = { fault: 'contradiction', code: fault };
  context.addIssue({
    code: 'custom',
    path: ['password'],
    message: sayPasswordFault(fault, password),
    params,
  });
});

export const signUpRoute: Route = openRoute({
  id: 'SignUp',
  method: 'POST',
  path: '/api/sign-up',
  tag: 'account',
  summary:
    'Ask for an account; a mail with a link to confirm the address goes out, whether or not it has one',
  limit: 'mails',
  status: 202,
  problems: [],
  body: signUpBody,
  answer: z.strictObject({ sentTo: z.string() }),
  async handle({ body }, _visit, services) {
    await signUp(services, body);
    return { sentTo: body.email };
  },
});

export const confirmSignUpRoute: Route = openRoute({
  id: 'ConfirmSignUp',
  method: 'POST',
  path: '/api/sign-up/confirm',
  tag: 'account',
  summary: 'Open the account by the link that was mailed; signing in comes after',
  limit: 'secrets',
  status: 201,
  problems: [410],
  body: z.strictObject({ token: linkTokenIn() }),
  answer: z.strictObject({ email: z.string() }),
  handle: ({ body }, visit, services) => confirmSignUp(services, body.token, visit.origin),
});
