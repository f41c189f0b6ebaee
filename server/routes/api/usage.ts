import { z } from 'zod';
import { calculatorList } from '../../../shared/calculators';
import { account as sentences } from '../../../shared/text';
import { presentUsage, usageSummarySchema } from '../../presenters/usageSummary';
import { accountStanding } from '../../services/accounts/standing';
import { ownKey } from '../../services/keys/ownKeys';
import { requestLog } from '../../services/usage/requestLog';
import { usageSummary } from '../../services/usage/usageSummary';
import { invalidInput } from '../v1/invalidInput';
import { idIn } from './fields';
import { keyParams } from './keys';
import { closedRoute, type Route } from './route';

const DAY_MS = 86_400_000;
/** Days that are shown where nothing is asked, and the most that may be asked. */
const USUAL_DAYS = 30;
const MOST_DAYS = 92;

const dayOf = (ms: number) => new Date(ms).toISOString().slice(0, 10);

/** The days to sum over. @throws ProblemError 422 where they are in the wrong order or too many */
function spanOf(query: { from?: string; to?: string }, now: Date): { from: string; to: string } {
  const to = query.to ?? dayOf(now.getTime());
  const from = query.from ?? dayOf(Date.parse(to) - (USUAL_DAYS - 1) * DAY_MS);
  const days = (Date.parse(to) - Date.parse(from)) / DAY_MS + 1;
  if (days >= 1 && days <= MOST_DAYS) return { from, to };
  const detail = sentences.span_not_valid({ maximum: MOST_DAYS });
  throw invalidInput([{ pointer: '/from', code: 'span_not_valid', detail }]);
}

export const usageRoute: Route = closedRoute({
  id: 'ReadUsage',
  method: 'GET',
  path: '/api/usage',
  tag: 'usage',
  summary: 'Calls and units by day (UTC), calculator, key and class of status, and the month’s pace',
  limit: 'usual',
  status: 200,
  problems: [404],
  query: z.strictObject({
    from: z.iso.date().optional().meta({ title: 'First day' }),
    to: z.iso.date().optional().meta({ title: 'Last day' }),
    keyId: idIn().optional(),
  }),
  answer: usageSummarySchema,
  async handle({ query }, { signedIn }, { database }) {
    const accountId = signedIn.account.id;
    const standing = await accountStanding(database, accountId);
    const span = spanOf(query, standing.now);
    if (query.keyId !== undefined) await ownKey(database, accountId, query.keyId);
    const groups = await usageSummary(database, { accountId, ...span, keyId: query.keyId ?? null });
    return presentUsage(span, groups, standing);
  },
});

const CURSOR = /^([1-9]\d{0,17})\.([1-9]\d{0,8})$/;
const OPERATIONS = [...calculatorList.map(({ id }) => id), 'batch', 'usage'];

export const keyLogRoute: Route = closedRoute({
  id: 'ReadKeyLog',
  method: 'GET',
  path: '/api/keys/:id/log',
  tag: 'usage',
  summary: 'The recent calls of a key, the latest first, a page at a time',
  limit: 'usual',
  status: 200,
  problems: [404],
  params: keyParams,
  query: z.strictObject({
    before: z.string().regex(CURSOR).optional().meta({ title: 'Where the page before ended' }),
    status: z.enum(['2xx', '3xx', '4xx', '5xx']).optional().meta({ title: 'Class of status' }),
    calculator: z.enum(OPERATIONS).optional().meta({ title: 'Calculator' }),
  }),
  answer: z.strictObject({
    calls: z.array(
      z.strictObject({
        at: z.iso.datetime(),
        calculator: z.string(),
        status: z.int(),
        code: z.string().nullable().meta({ description: 'of the problem; null where there was none' }),
        units: z.int(),
        ms: z.number(),
        requestId: z.string(),
      }),
    ),
    next: z.string().nullable(),
  }),
  async handle({ params, query }, { signedIn }, { database }) {
    await ownKey(database, signedIn.account.id, params.id);
    const [, row = '', line = ''] = CURSOR.exec(query.before ?? '') ?? [];
    const { lines, hasMore } = await requestLog(database, {
      keyId: params.id,
      before: row ? { row, line: Number(line) } : null,
      statusClass: query.status ? Number(query.status.charAt(0)) : null,
      calculator: query.calculator ?? null,
    });
    const last = lines[lines.length - 1];
    return {
      calls: lines.map(({ at, calculator, status, code = null, units, ms, request }) => ({
        at,
        calculator,
        status,
        code,
        units,
        ms,
        requestId: request,
      })),
      next: hasMore && last ? `${last.row}.${last.line}` : null,
    };
  },
});
