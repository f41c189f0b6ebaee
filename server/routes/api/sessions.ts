import { z } from 'zod';
import { ProblemError } from '../../http/ProblemError';
import { presentSession, sessionSchema } from '../../presenters/session';
import { audit } from '../../services/audit/audit';
import { endSessions } from '../../services/sessions/endSessions';
import { sessionsOf } from '../../services/sessions/sessionsOf';
import { idIn } from './fields';
import { closedRoute, type Route } from './route';

export const sessionsRoute: Route = closedRoute({
  id: 'ListSessions',
  method: 'GET',
  path: '/api/sessions',
  tag: 'session',
  summary: 'The sessions that have not ended',
  limit: 'usual',
  status: 200,
  problems: [],
  answer: z.strictObject({ sessions: z.array(sessionSchema) }),
  async handle(_given, { signedIn }, { database }) {
    const sessions = await sessionsOf(database, signedIn.account.id);
    return { sessions: sessions.map((session) => presentSession(session, signedIn.sessionId)) };
  },
});

export const endSessionRoute: Route = closedRoute({
  id: 'EndSession',
  method: 'DELETE',
  path: '/api/sessions/:id',
  tag: 'session',
  summary: 'End one session',
  limit: 'usual',
  status: 204,
  problems: [404],
  params: z.strictObject({ id: idIn() }),
  answer: null,
  async handle({ params }, { signedIn, origin }, { database }) {
    const accountId = signedIn.account.id;
    await database.transact(async (transaction) => {
      const ended = await endSessions(database, { accountId, only: params.id }, 'ended', transaction);
      if (ended.length === 0) throw new ProblemError('not_found');
      const subject = { kind: 'session', id: params.id } as const;
      await audit(database, origin, { event: 'session_ended', accountId, subject }, transaction);
    });
  },
});

export const endOtherSessionsRoute: Route = closedRoute({
  id: 'EndOtherSessions',
  method: 'DELETE',
  path: '/api/sessions',
  tag: 'session',
  summary: 'End all sessions but this one',
  limit: 'usual',
  status: 200,
  problems: [],
  answer: z.strictObject({ ended: z.int() }),
  async handle(_given, { signedIn, origin }, { database }) {
    const { sessionId: except } = signedIn;
    const accountId = signedIn.account.id;
    return database.transact(async (transaction) => {
      const ended = await endSessions(database, { accountId, except }, 'ended', transaction);
      for (const id of ended) {
        const subject = { kind: 'session', id } as const;
        await audit(database, origin, { event: 'session_ended', accountId, subject }, transaction);
      }
      return { ended: ended.length };
    });
  },
});
