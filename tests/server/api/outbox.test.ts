import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { OutboxWorker } from '../../../server/services/mail/OutboxWorker';
import { Outbox } from '../../../server/services/mail/Outbox';
import { ConsoleDatabase } from '../../../server/models/ConsoleDatabase';
import { remindOfExpiry } from '../../../server/services/keys/remindOfExpiry';
import type { MailSender, OutgoingMail } from '../../../server/mail/smtpSender';
import { startConsole, type ConsoleService } from '../../support/consoleService';

const SECRET = 'a session secret for the tests, long enough';
let service: ConsoleService;
let database: ConsoleDatabase;
beforeAll(async () => {
  service = await startConsole({ sessionSecret: SECRET });
  database = new ConsoleDatabase({ url: service.database.serviceUrl, poolSize: 8 });
});
afterEach(async () => {
  service.mail.refusal = null;
});
afterAll(async () => {
  await database.close();
  await service.stop();
});

interface Row {
  readonly attempts: number;
  readonly last_error: string | null;
  readonly sealed: Buffer | null;
  readonly sent_at: Date | null;
  readonly failed_at: Date | null;
  readonly wait: number;
}

const rowsOf = (recipient: string) =>
  service.sql<Row>(
    `SELECT attempts, last_error, sealed, sent_at, failed_at,
       extract(epoch FROM next_attempt_at - service_now())::float8 AS wait
     FROM mail_outbox WHERE recipient = $1 ORDER BY created_at`,
    [recipient],
  );

const until = (check: () => Promise<unknown>) =>
  vi.waitFor(async () => expect(await check()).toBe(true), { timeout: 15_000, interval: 50 });

/** Makes what waits due at once. */
const due = () =>
  service.sql('UPDATE mail_outbox SET next_attempt_at = service_now() WHERE sealed IS NOT NULL');

const askFor = (email: string) => service.newBrowser().call('POST', '/api/password-reset', { email });

describe('the outbox', () => {
  it('keeps mails through an outage of the mail server, tries again later each time, and sends each once', async () => {
    const people = [service.newAddress(), service.newAddress(), service.newAddress()];
    await service.mail.down();
    for (const email of people) expect((await askFor(email)).status).toBe(202);
    for (const email of people) await until(async () => ((await rowsOf(email))[0]?.attempts ?? 0) === 1);
    const waits: number[] = [];
    for (let attempt = 2; attempt <= 4; attempt++) {
      await due();
      for (const email of people)
        await until(async () => ((await rowsOf(email))[0]?.attempts ?? 0) === attempt);
      waits.push((await rowsOf(people[0] ?? ''))[0]?.wait ?? 0);
    }
    expect(waits[0]).toBeGreaterThan(5);
    expect(waits[1]).toBeGreaterThan(waits[0] ?? 0);
    expect(waits[2]).toBeGreaterThan(waits[1] ?? 0);
    await service.mail.up();
    await due();
    for (const email of people) await service.mail.next(email);
    for (const email of people) await until(async () => (await rowsOf(email))[0]?.sent_at !== null);
    for (const email of people) expect(service.mail.to(email)).toHaveLength(1);
    const [row] = await rowsOf(people[0] ?? '');
    expect(row).toMatchObject({ sealed: null, last_error: null, failed_at: null });
  });

  it('gives up what the mail server will never take, and says why without the address', async () => {
    service.mail.refusal = { code: 550, text: 'no such mailbox' };
    const email = service.newAddress();
    await askFor(email);
    await until(
      async () => (await rowsOf(email))[0]?.failed_at !== null && (await rowsOf(email)).length === 1,
    );
    const [row] = await rowsOf(email);
    expect(row).toMatchObject({ sealed: null, sent_at: null, last_error: 'EENVELOPE 550' });
  });

  it('tries again what the mail server won’t take just now', async () => {
    service.mail.refusal = { code: 451, text: 'later' };
    const email = service.newAddress();
    await askFor(email);
    await until(async () => ((await rowsOf(email))[0]?.attempts ?? 0) === 1);
    expect((await rowsOf(email))[0]).toMatchObject({ failed_at: null, last_error: 'EENVELOPE 451' });
    service.mail.refusal = null;
    await due();
    await service.mail.next(email);
  });

  it('sends no link that is over by then', async () => {
    await service.mail.down();
    const email = service.newAddress();
    await askFor(email);
    await until(async () => ((await rowsOf(email))[0]?.attempts ?? 0) === 1);
    await service.sql('UPDATE mail_outbox SET expires_at = service_now() WHERE recipient = $1', [email]);
    await service.mail.up();
    await due();
    await until(async () => (await rowsOf(email))[0]?.failed_at !== null);
    expect((await rowsOf(email))[0]?.last_error).toBe('too late');
    expect(service.mail.to(email)).toEqual([]);
  });

  it('keeps what a mail says sealed, and drops it when it is sent', async () => {
    await service.mail.down();
    const { newAddress, newBrowser } = service;
    const email = newAddress();
    const wish = {
      email,
      name: 'Ottoline Marsh',
      password: 'one more long phrase of words',
      roles: ['educator'],
    };
    await newBrowser().call('POST', '/api/sign-up', wish);
    const [row] = await service.sql<{ all: string; sealed: Buffer }>(
      'SELECT m::text AS all, sealed FROM mail_outbox m WHERE recipient = $1',
      [email],
    );
    expect(row?.sealed.length).toBeGreaterThan(60);
    expect(row?.all).not.toMatch(/Ottoline|verify/);
    expect(row?.sealed.toString('utf8')).not.toMatch(/Ottoline|verify/);
    await service.mail.up();
    await due();
    expect((await service.mail.next(email)).text).toContain('Ottoline Marsh');
  });

  it('is emptied by several workers at once, each mail by one of them', async () => {
    const outbox = new Outbox(database, SECRET);
    const sent: OutgoingMail[] = [];
    let under = 0;
    let together = 0;
    const sender: MailSender = {
      send: async (mail) => {
        under += 1;
        together = Math.max(together, under);
        await new Promise((resolve) => setImmediate(resolve));
        await database.rows('SELECT 1', []);
        sent.push(mail);
        under -= 1;
      },
      close: () => undefined,
    };
    await service.mail.down();
    const people = Array.from({ length: 40 }, () => service.newAddress());
    await database.transact(async (transaction) => {
      for (const to of people)
        await outbox.put({ accountId: null, to, kind: 'address_taken', params: {} }, transaction);
      await database.rows(
        "UPDATE mail_outbox SET next_attempt_at = service_now() - interval '1 hour' WHERE kind = 'address_taken'",
        [],
        transaction,
      );
    });
    const workers = [1, 2, 3].map(
      () =>
        new OutboxWorker({
          database,
          outbox: new Outbox(database, SECRET),
          sender,
          publicUrl: 'https://light.example.org',
          onTrouble: () => undefined,
          everyMs: 20,
        }),
    );
    for (const worker of workers) worker.start();
    await until(async () => {
      const [left] = await service.sql<{ left: string }>(
        "SELECT count(*) AS left FROM mail_outbox WHERE sealed IS NOT NULL AND kind = 'address_taken'",
      );
      return left?.left === '0';
    });
    await Promise.all(workers.map((worker) => worker.stop()));
    const to = sent.map((mail) => mail.to);
    expect(new Set(to).size).toBe(to.length);
    expect(new Set(sent.map(({ messageId }) => messageId)).size).toBe(sent.length);
    expect(together).toBeGreaterThan(1);
    await service.mail.up();
    for (const mail of sent) expect(service.mail.to(mail.to)).toEqual([]);
  });
});

describe('mails', () => {
  it('say the same as text and as HTML, and load nothing', async () => {
    const email = service.newAddress();
    const name = 'Ada <b>Lantern</b> & Co';
    const wish = { email, name, password: 'one more long phrase of words', roles: ['educator'] };
    await service.newBrowser().call('POST', '/api/sign-up', wish);
    const { text, html, messageId } = await service.mail.next(email);
    expect(text).toContain(name);
    expect(html).toContain('Ada &lt;b&gt;Lantern&lt;/b&gt; &amp; Co');
    expect(html).not.toMatch(/<script|<img|<link|src=|@import|url\(/);
    expect(messageId).toMatch(/^<[0-9a-f-]{36}@127\.0\.0\.1>$/);
  });
});

describe('reminders of keys that expire', () => {
  it('come two weeks and three days before, once each, and only for keys that would be missed', async () => {
    const outbox = new Outbox(database, SECRET);
    const { id, email } = await service.person();
    const insert = (name: string, days: number, more = '') =>
      service.sql(
        `INSERT INTO api_keys (account_id, kind, name, hash, shown_prefix, last_four, claimed_at, created_at, expires_at ${more && ', revoked_at'})
         VALUES ($1, 'server', $2, sha256(convert_to($2::text, 'UTF8')), 'evenfall_server_AbCd', 'wxyz', now(), now() - interval '90 days',
           now() + make_interval(days => $3) ${more})`,
        [id, name, days],
      );
    await insert('in ten days', 10);
    await insert('in two days', 2);
    await insert('in a month', 30);
    await insert('revoked', 2, ', now()');
    expect(await remindOfExpiry(database, outbox, 'https://light.example.org')).toBe(2);
    expect(await remindOfExpiry(database, outbox, 'https://light.example.org')).toBe(0);
    await service.sql("UPDATE api_keys SET expires_at = now() + interval '1 day' WHERE name = 'in ten days'");
    expect(await remindOfExpiry(database, outbox, 'https://light.example.org')).toBe(1);
    await due();
    const mails = [1, 2, 3].map((no) => service.mail.next(email, no));
    const subjects = (await Promise.all(mails)).map(({ subject }) => subject).sort();
    expect(subjects).toEqual([
      'Your Evenfall key “in ten days” expires within 14 days',
      'Your Evenfall key “in ten days” expires within 3 days',
      'Your Evenfall key “in two days” expires within 3 days',
    ]);
  });
});
