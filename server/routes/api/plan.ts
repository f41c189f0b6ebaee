import { z } from 'zod';
import { account as sentences } from '../../../shared/text';
import { presentStanding, standingSchema } from '../../presenters/account';
import {
  askForPlan,
  planRequestsOf,
  plans,
  withdrawPlanRequest,
  type PlanRequest,
} from '../../services/accounts/planRequests';
import { accountStanding } from '../../services/accounts/standing';
import { invalidInput } from '../v1/invalidInput';
import { idIn } from './fields';
import { closedRoute, type ConsoleServices, type Route } from './route';

/** A wish for another plan, as its holder may see it. */
export const requestSchema = z.strictObject({
  id: z.uuid(),
  planId: z.string(),
  reason: z.string(),
  state: z.enum(['open', 'granted', 'declined']),
  answer: z.string().nullable(),
  createdAt: z.iso.datetime(),
  answeredAt: z.iso.datetime().nullable(),
});

const answerSchema = z.strictObject({
  standing: standingSchema,
  plans: z.array(standingSchema.shape.plan),
  requests: z.array(requestSchema).meta({ description: 'what was asked for, the latest first' }),
});

export const presentRequest = ({ createdAt, answeredAt, ...rest }: PlanRequest) => ({
  ...rest,
  createdAt: createdAt.toISOString(),
  answeredAt: answeredAt?.toISOString() ?? null,
});

async function planOf({ database }: ConsoleServices, accountId: string) {
  const standing = await accountStanding(database, accountId);
  const requests = await planRequestsOf(database, accountId);
  return {
    standing: presentStanding(standing),
    plans: await plans(database),
    requests: requests.map(presentRequest),
  };
}

const shared = { tag: 'plan', limit: 'usual', answer: answerSchema } as const;

export const planRoute: Route = closedRoute({
  ...shared,
  id: 'ReadPlan',
  method: 'GET',
  path: '/api/plan',
  summary: 'The plan, what is left of the month, the other plans, and what was asked for',
  status: 200,
  problems: [],
  handle: (_given, { signedIn }, services) => planOf(services, signedIn.account.id),
});

export const askForPlanRoute: Route = closedRoute({
  ...shared,
  id: 'AskForPlan',
  method: 'POST',
  path: '/api/plan/requests',
  summary: 'Ask for another plan, with a reason; an administrator answers',
  status: 201,
  problems: [409],
  body: z.strictObject({
    planId: z.string().max(40).meta({ title: 'Plan' }),
    reason: z
      .string()
      .trim()
      .refine((text) => text.length >= 10 && text.length <= 2000, {
        message: sentences.reason_not_valid(),
        params: { fault: 'contradiction', code: 'reason_not_valid' },
      })
      .meta({ title: 'Reason', minLength: 10, maxLength: 2000 }),
  }),
  async handle({ body }, { signedIn, origin }, services) {
    const { database } = services;
    const accountId = signedIn.account.id;
    const standing = await accountStanding(database, accountId);
    const others = (await plans(database)).filter(({ id }) => id !== standing.planId).map(({ id }) => id);
    if (!others.includes(body.planId)) {
      const detail = sentences.plan_not_valid({ plans: others });
      throw invalidInput([{ pointer: '/planId', code: 'plan_not_valid', detail }]);
    }
    await askForPlan(database, accountId, body, origin);
    return planOf(services, accountId);
  },
});

export const withdrawPlanRequestRoute: Route = closedRoute({
  id: 'WithdrawPlanRequest',
  method: 'DELETE',
  path: '/api/plan/requests/:id',
  tag: 'plan',
  summary: 'Take a wish back that has no answer yet',
  limit: 'usual',
  status: 204,
  problems: [404],
  params: z.strictObject({ id: idIn() }),
  answer: null,
  handle: ({ params }, { signedIn, origin }, { database }) =>
    withdrawPlanRequest(database, signedIn.account.id, params.id, origin),
});
