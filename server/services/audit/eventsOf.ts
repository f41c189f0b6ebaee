import { Op } from 'sequelize';
import type { AuditEvent } from '../../models/AuditEvent';
import type { ConsoleDatabase } from '../../models/ConsoleDatabase';

const PAGE = 50;

/** A page of what happened to an account, the latest first. */
export async function eventsOf(
  { auditEvents }: ConsoleDatabase,
  accountId: string,
  before: string | null,
): Promise<{ events: AuditEvent[]; next: string | null }> {
  const events = await auditEvents.findAll({
    where: { accountId, ...(before === null ? {} : { id: { [Op.lt]: before } }) },
    order: [['id', 'DESC']],
    limit: PAGE + 1,
  });
  const page = events.slice(0, PAGE);
  return { events: page, next: events.length > PAGE ? (page[PAGE - 1]?.id ?? null) : null };
}

const EXPORTED = 10_000;

/** What happened to an account, the latest first, as its holder takes it along. */
export function allEventsOf({ auditEvents }: ConsoleDatabase, accountId: string): Promise<AuditEvent[]> {
  return auditEvents.findAll({ where: { accountId }, order: [['id', 'DESC']], limit: EXPORTED });
}
