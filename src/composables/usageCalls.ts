import { consoleApi, taken } from '../api/consoleApi';

export type Usage = Awaited<ReturnType<typeof usageCalls.usage>>;
export type LogPage = Awaited<ReturnType<typeof usageCalls.log>>;
export type PlanPage = Awaited<ReturnType<typeof usageCalls.plan>>;
export type StatusClass = '2xx' | '3xx' | '4xx' | '5xx';

/** What was used, and what may be. */
export const usageCalls = {
  usage: (query: { from?: string; to?: string; keyId?: string }) =>
    taken(consoleApi.GET('/api/usage', { params: { query } })),
  log: (id: string, query: { before?: string; status?: StatusClass }) =>
    taken(consoleApi.GET('/api/keys/{id}/log', { params: { path: { id }, query } })),
  plan: () => taken(consoleApi.GET('/api/plan')),
  askForPlan: (planId: string, reason: string) =>
    taken(consoleApi.POST('/api/plan/requests', { body: { planId, reason } })),
  withdraw: (id: string) => taken(consoleApi.DELETE('/api/plan/requests/{id}', { params: { path: { id } } })),
};
