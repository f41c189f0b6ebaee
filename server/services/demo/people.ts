import type { Role } from '../../models/Account';

export interface DemoPerson {
  readonly email: string;
  readonly name: string;
  readonly roles: readonly Role[];
  readonly planId: string;
  readonly password: string;
}

const at = (name: string) => `${name}@maren-heights.example`;

/**
 * The people of Maren Heights, all invented, one a role. Their passwords are printed by the start command and known to
 * all: the scenario never goes into a production's database.
 */
export const demoPeople = {
  developer: {
    email: at('developer'),
    name: 'Tamsin Orrel',
    roles: ['developer'],
    planId: 'studio',
    password: 'brass kettle under nine stairs',
  },
  photographer: {
    email: at('photographer'),
    name: 'Jory Fennimar',
    roles: ['photographer'],
    planId: 'starter',
    password: 'grey heron over the weir road',
  },
  educator: {
    email: at('educator'),
    name: 'Odile Pennarth',
    roles: ['educator', 'photographer'],
    planId: 'starter',
    password: 'chalk dust and a paper moon',
  },
  admin: {
    email: at('admin'),
    name: 'Bram Holloway-Quist',
    roles: ['admin', 'developer'],
    planId: 'starter',
    password: 'two keys in the copper bowl',
  },
} as const satisfies Record<string, DemoPerson>;
