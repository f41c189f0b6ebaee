import type { Role } from '../models/Account';

/** Roles that anyone may choose. */
export const CHOSEN_ROLES = ['developer', 'photographer', 'educator'] as const;
export type ChosenRole = (typeof CHOSEN_ROLES)[number];

/** Whether an address is the one that the operator named as the administrator's. */
export function isAdminAddress(email: string, adminEmail: string | null): boolean {
  return adminEmail !== null && email.toLowerCase() === adminEmail.toLowerCase();
}

/** The roles of an account that chooses anew: what was granted otherwise stays, and can't be chosen. */
export function rolesAfterChoice(chosen: readonly ChosenRole[], held: readonly Role[]): Role[] {
  return [...chosen, ...held.filter((role) => role === 'admin')];
}
