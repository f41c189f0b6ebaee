import { z } from 'zod';
import { accountSchema, presentAccount, presentStanding, standingSchema } from '../../presenters/account';
import { keySchema } from '../../presenters/apiKey';
import { eventSchema, presentEvent } from '../../presenters/auditEvent';
import { presentSession, sessionSchema } from '../../presenters/session';
import { audit } from '../../services/audit/audit';
import { allEventsOf } from '../../services/audit/eventsOf';
import { planRequestsOf } from '../../services/accounts/planRequests';
import { accountStanding } from '../../services/accounts/standing';
import { usageMonths } from '../../services/accounts/usageMonths';
import { ownKeys } from '../../services/keys/ownKeys';
import { kitOf } from '../../services/saved/kits';
import { savedWhole } from '../../services/saved/savedThings';
import { sessionsOf } from '../../services/sessions/sessionsOf';
import { shown } from './keys';
import { presentRequest, requestSchema } from './plan';
import { closedRoute, type Route } from './route';
import { presentThing, thingSchema } from './saved';

export const exportRoute: Route = closedRoute({
  id: 'ExportData',
  method: 'GET',
  path: '/api/me/export',
  tag: 'account',
  summary: 'Everything that the service knows of the account, as a file',
  limit: 'secrets',
  status: 200,
  problems: [],
  answer: z.strictObject({
    exportedAt: z.iso.datetime(),
    account: accountSchema,
    standing: standingSchema,
    usage: z.array(z.strictObject({ month: z.string(), units: z.int() })),
    keys: z.array(keySchema),
    kit: z.record(z.string(), z.unknown()),
    saved: z.array(thingSchema),
    planRequests: z.array(requestSchema),
    sessions: z.array(sessionSchema),
    events: z.array(eventSchema),
  }),
  headers: ['Content-Disposition'],
  async handle(_given, visit, services) {
    const { database } = services;
    const { signedIn, origin } = visit;
    const { account, sessionId } = signedIn;
    await audit(database, origin, { event: 'data_exported', accountId: account.id });
    const standing = await accountStanding(database, account.id);
    const keys = await ownKeys(database, account.id);
    const saved = await savedWhole(database, account.id);
    const planRequests = await planRequestsOf(database, account.id);
    const sessions = await sessionsOf(database, account.id);
    const events = await allEventsOf(database, account.id);
    visit.setHeader('Content-Disposition', 'attachment; filename="evenfall-account.json"');
    return {
      exportedAt: standing.now.toISOString(),
      account: presentAccount(account),
      standing: presentStanding(standing),
      usage: await usageMonths(database, account.id),
      keys: keys.map(shown),
      kit: (await kitOf(database, account.id)).kit,
      saved: saved.map((thing) => presentThing(thing, services)),
      planRequests: planRequests.map(presentRequest),
      sessions: sessions.map((session) => presentSession(session, sessionId)),
      events: events.map(presentEvent),
    };
  },
});
