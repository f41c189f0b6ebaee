import { openSync } from 'node:fs';
import { pathToFileURL } from 'node:url';
import { Worker } from 'node:worker_threads';
import { afterAll, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import { serve, type Service } from '../../../server/main';
import {
  Browser,
  PASSWORD,
  startConsole,
  type Answer,
  type ConsoleService,
} from '../../support/consoleService';
import { testSettings } from '../../support/testSettings';

let known: ConsoleService;
let watched: Service;
let statements: string[] = [];
let hashings: string[] = [];
let email = '';

// A second server process over the same database, whose work is watched.
beforeAll(async () => {
  known = await startConsole();
  email = (await known.person()).email;
  const { ownerUrl, serviceUrl } = known.database;
  watched = await serve({
    config: known.config,
    ownerUrl,
    serviceUrl,
    clientFolder: null,
    logFd: openSync('/dev/null', 'a'),
    workerFolder: pathToFileURL(`${testSettings().serverFolder}/`),
    onStatement: (sql) => statements.push(sql.replace(/^Executing \([^)]*\): /, '')),
  });
  const post = Object.getOwnPropertyDescriptor(Worker.prototype, 'postMessage')
    ?.value as Worker['postMessage'];
  vi.spyOn(Worker.prototype, 'postMessage').mockImplementation(function (this: Worker, work: unknown) {
    const { hash, cost } = work as { hash?: string; cost?: number };
    hashings.push(hash === undefined ? `make at ${cost}` : `compare at ${hash.slice(4, 6)}`);
    post.call(this, work);
  });
});
afterAll(async () => {
  vi.restoreAllMocks();
  await watched.stop();
  await known.stop();
});
beforeEach(() => {
  statements = [];
  hashings = [];
});

/** The console's statements, without those of the outbox's worker, which runs by a clock of its own. */
function workDone() {
  const isWorkers = (sql: string) => /(FROM|UPDATE) mail_outbox|^(START TRANSACTION|COMMIT)/.test(sql);
  return { statements: statements.filter((sql) => !isWorkers(sql)), hashings: [...hashings] };
}

const bare = ({ status, headers, body, cookies }: Answer, address: string) => {
  const { 'x-request-id': _id, date: _date, ...rest } = headers;
  const { instance: _instance, ...told } = body as Record<string, unknown>;
  return JSON.parse(
    JSON.stringify({ status, headers: rest, told, cookies }).replaceAll(address, 'ADDRESS'),
  ) as object;
};

const routes: [string, string, (address: string) => object][] = [
  ['signing in', '/api/session', (address) => ({ email: address, password: 'not the password of anybody' })],
  [
    'signing up',
    '/api/sign-up',
    (address) => ({ email: address, name: 'Orla Wick', password: PASSWORD, roles: ['educator'] }),
  ],
  ['a forgotten password', '/api/password-reset', (address) => ({ email: address })],
];

describe('an address with an account and one without', () => {
  it.each(routes)('get the same answer for the same work: %s', async (_what, path, bodyFor) => {
    const unknown = email.replace('person-', 'nobody-');
    expect(unknown.length).toBe(email.length);
    const seen = [];
    for (const address of [email, unknown]) {
      statements = [];
      hashings = [];
      const answer = await new Browser(watched.url).call('POST', path, bodyFor(address));
      seen.push({ answer: bare(answer, address), work: workDone() });
    }
    expect(seen[0]?.answer).toEqual(seen[1]?.answer);
    expect(seen[0]?.work).toEqual(seen[1]?.work);
    expect(seen[0]?.work.statements.length).toBeGreaterThan(1);
  });

  it('cost one hashing at a sign-in, and so does an account that has no password', async () => {
    await known.sql("INSERT INTO accounts (email, name) VALUES ('keyholder@example.org', 'By key only')");
    for (const address of [email, 'nobody@example.org', 'keyholder@example.org']) {
      hashings = [];
      const answer = await new Browser(watched.url).signIn(address, 'not the password of anybody');
      expect([address, answer.status, hashings]).toEqual([address, 401, ['compare at 04']]);
    }
  });

  it('are slowed down alike', async () => {
    for (const address of [email, 'nobody-at-all@example.org']) {
      const browser = new Browser(watched.url);
      const statuses: number[] = [];
      for (let i = 0; i < 7; i++)
        statuses.push((await browser.signIn(address, 'wrong every single time')).status);
      expect([address, ...statuses]).toEqual([address, 401, 401, 401, 401, 401, 401, 429]);
    }
  });

  it('get mails that tell their owners apart, and only them', async () => {
    const taken = await known.person();
    const free = known.newAddress();
    for (const address of [taken.email, free])
      await new Browser(watched.url).call('POST', '/api/password-reset', { email: address });
    expect((await known.mail.next(taken.email, 1)).subject).toBe('Set a new password for Evenfall');
    expect((await known.mail.next(free)).subject).toBe('There is no Evenfall account with this address');
    const wish = { name: 'Orla Wick', password: PASSWORD, roles: ['educator'] };
    await new Browser(watched.url).call('POST', '/api/sign-up', { ...wish, email: taken.email });
    expect((await known.mail.next(taken.email, 2)).subject).toBe('You already have an account at Evenfall');
  });
});
