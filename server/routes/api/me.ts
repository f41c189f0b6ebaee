import { z } from 'zod';
import { rolesAfterChoice } from '../../policies/roles';
import { accountSchema, presentAccount, presentStanding, standingSchema } from '../../presenters/account';
import { eventSchema, presentEvent } from '../../presenters/auditEvent';
import { audit } from '../../services/audit/audit';
import { accountStanding } from '../../services/accounts/standing';
import { changeProfile, setRoles } from '../../services/accounts/profile';
import { eventsOf } from '../../services/audit/eventsOf';
import { cursorIn, nameIn, rolesIn } from './fields';
import { closedRoute, type Route } from './route';

export const meRoute: Route = closedRoute({
  id: 'Me',
  method: 'GET',
  path: '/api/me',
  tag: 'account',
  summary: 'The account, its plan, and how much of this month is used',
  limit: 'usual',
  status: 200,
  problems: [],
  answer: z.strictObject({ account: accountSchema, standing: standingSchema }),
  async handle(_given, { signedIn: { account } }, { database }) {
    const standing = await accountStanding(database, account.id);
    return { account: presentAccount(account), standing: presentStanding(standing) };
  },
});

export const changeMeRoute: Route = closedRoute({
  id: 'ChangeMe',
  method: 'PATCH',
  path: '/api/me',
  tag: 'account',
  summary: 'Change the name or the units of measure',
  limit: 'usual',
  status: 200,
  problems: [],
  body: z.strictObject({
    name: nameIn().optional(),
    lengthUnit: z.enum(['metres', 'feet']).meta({ title: 'Units of measure' }).optional(),
  }),
  answer: z.strictObject({ account: accountSchema }),
  async handle({ body }, { signedIn: { account }, origin }, { database }) {
    const after = { name: body.name ?? account.name, lengthUnit: body.lengthUnit ?? account.lengthUnit };
    await database.transact(async (transaction) => {
      await changeProfile(database, account.id, after, transaction);
      const event = 'profile_changed';
      const details = { fields: Object.keys(body) };
      await audit(database, origin, { event, accountId: account.id, details }, transaction);
    });
    return { account: presentAccount({ ...account, ...after }) };
  },
});

export const rolesRoute: Route = closedRoute({
  id: 'SetRoles',
  method: 'PUT',
  path: '/api/me/roles',
  tag: 'account',
  summary: 'Choose the roles anew; admin is neither chosen nor lost here',
  limit: 'usual',
  status: 200,
  problems: [],
  body: z.strictObject({ roles: rolesIn() }),
  answer: z.strictObject({ account: accountSchema }),
  async handle({ body }, { signedIn: { account }, origin }, { database }) {
    const roles = rolesAfterChoice(body.roles, account.roles);
    await database.transact(async (transaction) => {
      await setRoles(database, account.id, roles, transaction);
      const details = { before: account.roles, after: roles };
      await audit(database, origin, { event: 'roles_changed', accountId: account.id, details }, transaction);
    });
    return { account: presentAccount({ ...account, roles }) };
  },
});

export const eventsRoute: Route = closedRoute({
  id: 'ListEvents',
  method: 'GET',
  path: '/api/me/events',
  tag: 'account',
  summary: 'What happened to the account, the latest first, a page at a time',
  limit: 'usual',
  status: 200,
  problems: [],
  query: z.strictObject({ before: cursorIn().optional() }),
  answer: z.strictObject({ events: z.array(eventSchema), next: z.string().nullable() }),
  async handle({ query }, { signedIn: { account } }, { database }) {
    const { events, next } = await eventsOf(database, account.id, query.before ?? null);
    return { events: events.map(presentEvent), next };
  },
});
