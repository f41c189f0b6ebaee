import { z } from 'zod';
import { accountSchema, presentAccount } from '../../presenters/account';
import { audit } from '../../services/audit/audit';
import { signIn } from '../../services/accounts/signIn';
import { endSessions } from '../../services/sessions/endSessions';
import { liveSession } from '../../services/sessions/liveSession';
import { refreshSession } from '../../services/sessions/refreshSession';
import { emailIn, passwordIn } from './fields';
import { openRoute, type Route } from './route';
import { REFRESH_PATH } from './Visit';

const endsSchema = { accessEndsAt: z.iso.datetime(), sessionEndsAt: z.iso.datetime() };

export const signInRoute: Route = openRoute({
  id: 'SignIn',
  method: 'POST',
  path: '/api/session',
  tag: 'session',
  summary: 'Sign in',
  limit: 'secrets',
  status: 200,
  problems: [401, 503],
  body: z.strictObject({ email: emailIn(), password: passwordIn() }),
  answer: z.strictObject({ account: accountSchema, ...endsSchema }),
  headers: ['Set-Cookie'],
  async handle({ body }, visit, services) {
    const { given, account } = await signIn(services, body, visit.origin, visit.claims);
    visit.giveCookies(given);
    return {
      account: presentAccount(account),
      accessEndsAt: given.accessEndsAt.toISOString(),
      sessionEndsAt: given.sessionEndsAt.toISOString(),
    };
  },
});

export const sessionStateRoute: Route = openRoute({
  id: 'SessionState',
  method: 'GET',
  path: '/api/session',
  tag: 'session',
  summary: 'Who is signed in; `stale`: refresh the session first',
  limit: 'usual',
  status: 200,
  problems: [],
  answer: z.strictObject({
    state: z.enum(['none', 'stale', 'live']),
    account: accountSchema.nullable(),
    accessEndsAt: z.iso.datetime().nullable(),
  }),
  async handle(_given, visit, { database }) {
    const { claims } = visit;
    if (!claims) return { state: 'none', account: null, accessEndsAt: null };
    if (claims.isStale) return { state: 'stale', account: null, accessEndsAt: null };
    const signedIn = await liveSession(database, claims);
    if (!signedIn || signedIn.account.isBlocked) return { state: 'none', account: null, accessEndsAt: null };
    const accessEndsAt = claims.expiresAt.toISOString();
    return { state: 'live', account: presentAccount(signedIn.account), accessEndsAt };
  },
});

export const refreshRoute: Route = openRoute({
  id: 'RefreshSession',
  method: 'POST',
  path: REFRESH_PATH,
  tag: 'session',
  summary:
    'Go on with the session; each refresh token is good for one use, and a second use ends the session',
  limit: 'usual',
  status: 200,
  problems: [401],
  answer: z.strictObject(endsSchema),
  headers: ['Set-Cookie'],
  async handle(_given, visit, services) {
    try {
      const given = await refreshSession(services, visit.refreshToken, visit.origin);
      visit.giveCookies(given);
      return {
        accessEndsAt: given.accessEndsAt.toISOString(),
        sessionEndsAt: given.sessionEndsAt.toISOString(),
      };
    } catch (error) {
      visit.dropCookies();
      throw error;
    }
  },
});

export const signOutRoute: Route = openRoute({
  id: 'SignOut',
  method: 'DELETE',
  path: '/api/session',
  tag: 'session',
  summary: 'Sign out; also by an access token whose minutes are over',
  limit: 'usual',
  status: 204,
  problems: [],
  answer: null,
  headers: ['Set-Cookie', 'Clear-Site-Data'],
  async handle(_given, visit, { database }) {
    const { claims, origin } = visit;
    if (claims) {
      const { accountId, sessionId } = claims;
      await database.transact(async (transaction) => {
        const ended = await endSessions(database, { accountId, only: sessionId }, 'signed_out', transaction);
        if (ended.length === 0) return;
        const subject = { kind: 'session', id: sessionId } as const;
        await audit(database, origin, { event: 'signed_out', accountId, subject }, transaction);
      });
    }
    visit.dropCookies();
    visit.setHeader('Clear-Site-Data', '"cache", "cookies", "storage"');
  },
});
