import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { alertsUpTo, quotaAlertFor } from '../../server/policies/quotaAlert';
import { ConsoleDatabase } from '../../server/models/ConsoleDatabase';
import { tidyUp } from '../../server/services/console/tidyUp';
import { Outbox } from '../../server/services/mail/Outbox';
import { alertQuotas } from '../../server/services/usage/alertQuotas';
import { startConsole, type ConsoleService } from '../support/consoleService';

describe('what an owner should know of a month', () => {
  const now = new Date('2026-11-11T00:00:00Z');
  const of = (used: number, limit = 1_000) => quotaAlertFor({ used, limit, now });

  it('is nothing while the units will last', () => {
    // Ten of thirty days are over: 333 of 1,000 are just the pace.
    expect([of(0), of(99), of(333)]).toEqual([null, null, null]);
  });

  it('is the pace, then that most are used, then that all are', () => {
    expect([of(334), of(799), of(800), of(999), of(1_000), of(2_000)]).toEqual([
      'pace',
      'pace',
      'most',
      'most',
      'all',
      'all',
    ]);
  });

  it('is no pace in the month’s first three days, nor of a handful of units', () => {
    const early = { used: 500, limit: 1_000, now: new Date('2026-11-03T23:00:00Z') };
    expect(quotaAlertFor(early)).toBeNull();
    expect(quotaAlertFor({ used: 5, limit: 10, now })).toBe('pace');
    expect(quotaAlertFor({ used: 5, limit: 0, now })).toBeNull();
  });

  it('makes the lesser alerts needless', () => {
    expect(alertsUpTo('pace')).toEqual(['pace']);
    expect(alertsUpTo('all')).toEqual(['pace', 'most', 'all']);
  });
});

describe('alerts of a month’s units', () => {
  const SECRET = 'a secret for these tests alone, 40 letters';
  const URL = 'https://light.example.org';
  let service: ConsoleService;
  let database: ConsoleDatabase;
  let outbox: Outbox;

  beforeAll(async () => {
    service = await startConsole({ sessionSecret: SECRET });
    database = new ConsoleDatabase({ url: service.database.serviceUrl, poolSize: 2 });
    outbox = new Outbox(database, SECRET);
    await service.setClock('2026-11-11 00:00:00+00');
  });
  afterAll(async () => {
    await database.close();
    await service.stop();
  });

  const use = (accountId: string, used: number) =>
    service.sql(
      `INSERT INTO quota_periods (account_id, month, used, tokens, refilled_at)
       VALUES ($1, month_of(service_now()), $2, 0, service_now())
       ON CONFLICT (account_id, month) DO UPDATE SET used = excluded.used`,
      [accountId, used],
    );
  const alerts = () => alertQuotas(database, outbox, URL);

  it('come once each as the month goes on, and again in the next month', async () => {
    const { id, email } = await service.person();
    const before = service.mail.to(email).length;
    await use(id, 3_000);
    expect(await alerts()).toBe(0);
    await use(id, 5_000);
    expect([await alerts(), await alerts()]).toEqual([1, 0]);
    await use(id, 8_000);
    expect([await alerts(), await alerts()]).toEqual([1, 0]);
    await use(id, 10_000);
    expect([await alerts(), await alerts()]).toEqual([1, 0]);
    const mails = await Promise.all([0, 1, 2].map((no) => service.mail.next(email, before + no)));
    expect(mails.map(({ subject }) => subject).sort()).toEqual([
      'At this pace your Evenfall units end before the month does',
      'Four fifths of your Evenfall units are used',
      'Your Evenfall units of this month are used up',
    ]);
    await service.setClock('2026-12-11 00:00:00+00');
    await use(id, 9_000);
    expect([await alerts(), await alerts()]).toEqual([1, 0]);
    const { subject } = await service.mail.next(email, before + 3);
    expect(subject).toBe('Four fifths of your Evenfall units are used');
  });

  it('say the most alone where several are due at once, and are sent once by two processes', async () => {
    const { id } = await service.person();
    await use(id, 10_000);
    const sent = await Promise.all([alerts(), alerts()]);
    expect(sent.sort()).toEqual([0, 1]);
    await use(id, 9_000);
    expect(await alerts()).toBe(0);
  });

  it('leave nothing behind: what is kept for a stated time goes when it is over', async () => {
    const { id } = await service.person();
    const key = await service.sql<{ id: string }>(
      "INSERT INTO api_keys (account_id, kind, name) VALUES ($1, 'server', 'old') RETURNING id",
      [id],
    );
    for (const months of [24, 26])
      await service.sql(
        `INSERT INTO usage_hours (key_id, hour, calculator, status_class, calls, units, total_ms, latency)
         VALUES ($1, service_now() - make_interval(months => $2), 'exposure/value', 2, 1, 1, 1, '{1}')`,
        [key[0]?.id, months],
      );
    await service.sql(
      "INSERT INTO quota_alerts (account_id, month, alert, created_at) VALUES ($1, '2026-01-01', 'all', service_now() - interval '61 days')",
      [id],
    );
    await tidyUp(database, outbox, URL);
    const kept = await service.sql<{ count: string }>('SELECT count(*) FROM usage_hours WHERE key_id = $1', [
      key[0]?.id,
    ]);
    expect(Number(kept[0]?.count)).toBe(1);
    const old = await service.sql('SELECT 1 FROM quota_alerts WHERE account_id = $1', [id]);
    expect(old).toEqual([]);
  });
});
