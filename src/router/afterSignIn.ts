import type { Role } from './navigation';

/** Where somebody goes after signing in: to the screen they were sent away from, else to where their work begins. */
export function afterSignIn(asked: unknown, roles: readonly Role[]): string {
  // Only a path of this site; two slashes, or one and a backslash, would lead to another.
  if (typeof asked === 'string' && /^\/(?![/\\])/.test(asked)) return asked;
  return roles.includes('developer') ? '/keys' : '/calculators';
}
