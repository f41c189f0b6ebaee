import { ProblemError } from '../../http/ProblemError';
import type { ConsoleDatabase } from '../../models/ConsoleDatabase';
import { audit } from '../audit/audit';
import type { Origin } from '../console/ConsoleServices';

export interface Plan {
  readonly id: string;
  readonly title: string;
  readonly unitsPerMonth: number;
  readonly ratePerSecond: number;
  readonly burst: number;
}

export interface PlanRequest {
  readonly id: string;
  readonly planId: string;
  readonly reason: string;
  readonly state: 'open' | 'granted' | 'declined';
  readonly answer: string | null;
  readonly createdAt: Date;
  readonly answeredAt: Date | null;
}

const SHOWN = 20;

/** Every plan, the smallest first. */
export function plans(database: ConsoleDatabase): Promise<Plan[]> {
  return database.rows<Plan>(
    `SELECT id, title, units_per_month::float8 AS "unitsPerMonth", rate_per_second AS "ratePerSecond", burst
     FROM plans ORDER BY units_per_month, id`,
    [],
  );
}

/** What an account asked for, the latest first. */
export function planRequestsOf(database: ConsoleDatabase, accountId: string): Promise<PlanRequest[]> {
  return database.rows<PlanRequest>(
    `SELECT id, plan_id AS "planId", reason, state, answer, created_at AS "createdAt", answered_at AS "answeredAt"
     FROM plan_requests WHERE account_id = $1 ORDER BY created_at DESC, id LIMIT ${SHOWN}`,
    [accountId],
  );
}

/**
 * Asks for another plan.
 * @throws ProblemError 409 where another wish waits for its answer
 */
export async function askForPlan(
  database: ConsoleDatabase,
  accountId: string,
  { planId, reason }: Pick<PlanRequest, 'planId' | 'reason'>,
  origin: Origin,
): Promise<void> {
  await database.transact(async (transaction) => {
    const made = await database.rows(
      `INSERT INTO plan_requests (account_id, plan_id, reason) VALUES ($1, $2, $3)
       ON CONFLICT (account_id) WHERE state = 'open' DO NOTHING RETURNING id`,
      [accountId, planId, reason],
      transaction,
    );
    if (made.length === 0) throw new ProblemError('request_waiting');
    await audit(database, origin, { event: 'plan_asked', accountId, details: { planId } }, transaction);
  });
}

/** Takes a wish back that has no answer yet. @throws ProblemError 404 where the account has no such wish */
export async function withdrawPlanRequest(
  database: ConsoleDatabase,
  accountId: string,
  id: string,
  origin: Origin,
): Promise<void> {
  await database.transact(async (transaction) => {
    const gone = await database.rows(
      "DELETE FROM plan_requests WHERE account_id = $1 AND id = $2 AND state = 'open' RETURNING id",
      [accountId, id],
      transaction,
    );
    if (gone.length === 0) throw new ProblemError('not_found');
    await audit(database, origin, { event: 'plan_wish_withdrawn', accountId }, transaction);
  });
}
