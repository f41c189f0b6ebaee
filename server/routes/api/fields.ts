import { z } from 'zod';
import { KEY_SCOPES } from '../../../shared/calculators/scopes';
import { account as sentences } from '../../../shared/text';
import { CHOSEN_ROLES } from '../../policies/roles';
import { PASSWORD_MAX, PASSWORD_MIN, passwordFault, type PasswordFault } from '../../policies/passwordRules';
import { isCommonPassword } from '../../services/passwords/commonPasswords';

type Code = keyof typeof sentences;

/** A fault with a sentence of its own, which does not repeat what was given. */
function told(code: Code, message: string) {
  return { message, params: { fault: 'contradiction', code } };
}

/** The sentence of a fault of a password. */
export function sayPasswordFault(fault: PasswordFault, password: string): string {
  const given = [...password.normalize('NFKC')].length;
  if (fault === 'password_too_short') return sentences[fault]({ minimum: PASSWORD_MIN, given });
  if (fault === 'password_too_long') return sentences[fault]({ maximum: PASSWORD_MAX, given });
  return sentences[fault]();
}

const ADDRESS = z.email();
const ONE_LINE = /^[^\p{Cc}\p{Cf}\p{Zl}\p{Zp}]+$/u;

/** An e-mail address, without the spaces that a paste brings along. */
export const emailIn = () =>
  z
    .string()
    .trim()
    .refine((text) => text.length <= 254 && ADDRESS.safeParse(text).success, {
      ...told('email_not_valid', sentences.email_not_valid()),
    })
    .meta({ title: 'E-mail address', format: 'email' });

/** A name of one line. */
export const nameIn = (title = 'Name') =>
  z
    .string()
    .trim()
    .refine((text) => text.length >= 1 && text.length <= 100 && ONE_LINE.test(text), {
      ...told('name_not_valid', sentences.name_not_valid()),
    })
    .meta({ title, minLength: 1, maxLength: 100 });

/** A password that is to be taken from now on. */
export const newPasswordIn = () =>
  z
    .string()
    .superRefine((password, context) => {
      const fault = passwordFault(password, { isCommon: isCommonPassword });
      if (!fault) return;
      context.addIssue({ code: 'custom', ...told(fault, sayPasswordFault(fault, password)) });
    })
    .meta({ title: 'Password', minLength: PASSWORD_MIN, maxLength: PASSWORD_MAX, format: 'password' });

/** A password that is only compared. */
export const passwordIn = () => z.string().max(1_000).meta({ title: 'Password', format: 'password' });

const isUnique = (items: readonly string[]) => new Set(items).size === items.length;

export const rolesIn = () =>
  z
    .array(z.enum(CHOSEN_ROLES))
    .max(CHOSEN_ROLES.length)
    .refine((roles) => roles.length > 0 && isUnique(roles), {
      ...told('roles_not_valid', sentences.roles_not_valid()),
    })
    .meta({ title: 'Roles', minItems: 1, uniqueItems: true });

/** The token of a link, as it stands behind the # of its address. */
export const linkTokenIn = () =>
  z
    .string()
    .refine((text) => /^[A-Za-z0-9_-]{43}$/.test(text), {
      ...told('token_not_valid', sentences.token_not_valid()),
    })
    .meta({ title: 'Token of the link', pattern: '^[A-Za-z0-9_-]{43}$' });

export const scopesIn = () =>
  z
    .array(z.string())
    .max(KEY_SCOPES.length)
    .refine(
      (scopes) =>
        (scopes.length === 1 && scopes[0] === '*') ||
        (scopes.length > 0 && isUnique(scopes) && scopes.every((scope) => KEY_SCOPES.includes(scope))),
      { ...told('scopes_not_valid', sentences.scopes_not_valid()) },
    )
    .meta({ title: 'Scopes', description: `"*" alone, or some of ${KEY_SCOPES.join(', ')}`, minItems: 1 });

export const capIn = () =>
  z
    .int()
    .min(0)
    .max(1_000_000_000)
    .nullable()
    .meta({ title: 'Monthly cap', description: 'units; null: none' });

export const expiryIn = () =>
  z.iso.datetime({ offset: true }).nullable().meta({ title: 'Expiry', description: 'null: none' });

/** The id of something in the path. */
export const idIn = () =>
  z
    .string()
    .regex(/^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/)
    .meta({ title: 'Id', format: 'uuid' });

/** Where a page of a list begins, as the page before it said. */
export const cursorIn = () =>
  z
    .string()
    .refine((text) => /^[1-9]\d{0,17}$/.test(text), {
      ...told('cursor_not_valid', sentences.cursor_not_valid()),
    })
    .meta({ title: 'Before', pattern: '^[1-9][0-9]{0,17}$' });
