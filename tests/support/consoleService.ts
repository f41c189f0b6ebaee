import { randomBytes } from 'node:crypto';
import request from 'supertest';
import { afterAll } from 'vitest';
import type { Config } from '../../server/config';
import { buildConsoleOpenapi } from '../../server/openapi/buildConsoleOpenapi';
import { consoleRoutes } from '../../server/routes/api/consoleRoutes';
import { Contract, type ApiDocument } from './contract';
import { startService, type TestService } from './service';
import { TestMailServer } from './TestMailServer';

const document = buildConsoleOpenapi(consoleRoutes, { version: '0.0.0', publicUrl: 'http://127.0.0.1' });
const contract = new Contract(document as unknown as ApiDocument, 'console');
afterAll(() => contract.leave());

export const PASSWORD = 'seven lanterns on the upper terrace';

/** The headers that a page of the console sends with what changes something. */
const OWN_PAGE = {
  'Sec-Fetch-Site': 'same-origin',
  'X-Evenfall-Console': '1',
  'Content-Type': 'application/json',
} as const;

export interface Answer {
  readonly status: number;
  readonly headers: Record<string, string>;
  readonly cookies: string[];
  // Answers of many shapes; the contract has checked this one's.
  readonly body: Record<string, never> & { errors: { pointer: string; code: string; detail: string }[] };
  readonly text: string;
}

let places = 0;

/** An address of its own for each browser, so that limits by address don't meet. */
function newPlace(): string {
  places += 1;
  return `198.18.${Math.floor(places / 250)}.${(places % 250) + 1}`;
}

/** A browser with the console open: keeps cookies by their path, and sends what such a page sends. */
export class Browser {
  private readonly jar = new Map<string, { value: string; path: string }>();

  constructor(
    private readonly url: string,
    readonly address = newPlace(),
    readonly agent = 'Test browser',
  ) {}

  cookie(name: string): string | null {
    return this.jar.get(name)?.value ?? null;
  }

  setCookie(name: string, value: string, path = '/'): void {
    this.jar.set(name, { value, path });
  }

  forget(name: string): void {
    this.jar.delete(name);
  }

  /** The same cookies in another browser, as a thief would have them. */
  copy(address = this.address): Browser {
    const other = new Browser(this.url, address, this.agent);
    for (const [name, cookie] of this.jar) other.jar.set(name, cookie);
    return other;
  }

  async call(
    method: string,
    path: string,
    body?: unknown,
    headers: Readonly<Record<string, string | undefined>> = {},
  ): Promise<Answer> {
    const verb = method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete' | 'head' | 'options';
    let sent = request(this.url)[verb](path);
    const changes = !['GET', 'HEAD', 'OPTIONS'].includes(method);
    const cookies = [...this.jar]
      .filter(([, cookie]) => path.startsWith(cookie.path))
      .map(([name, cookie]) => `${name}=${cookie.value}`);
    const all: Record<string, string | undefined> = {
      'X-Forwarded-For': this.address,
      'User-Agent': this.agent,
      ...(cookies.length > 0 && { Cookie: cookies.join('; ') }),
      ...(changes && OWN_PAGE),
      ...headers,
    };
    for (const [name, value] of Object.entries(all)) if (value !== undefined) sent = sent.set(name, value);
    const answer = await (changes && body !== undefined ? sent.send(body as object | string) : sent);
    const set = (answer.headers['set-cookie'] ?? []) as unknown as string[];
    for (const line of set) this.take(line);
    const isJson = /json/.test(answer.headers['content-type'] ?? '');
    const given: unknown = isJson && answer.text ? JSON.parse(answer.text) : undefined;
    const answered = { status: answer.status, headers: answer.headers as Record<string, string> };
    contract.check({ method, path: path.split('?')[0] ?? path, ...answered, body: given });
    return { ...answered, cookies: set, body: given, text: answer.text ?? '' } as unknown as Answer;
  }

  signIn(email: string, password = PASSWORD): Promise<Answer> {
    return this.call('POST', '/api/session', { email, password });
  }

  private take(line: string): void {
    const [, name = '', value = ''] = /^([^=]+)=([^;]*)/.exec(line) ?? [];
    const path = /; Path=([^;]+)/.exec(line)?.[1] ?? '/';
    if (/; Max-Age=0/.test(line)) this.jar.delete(name);
    else this.jar.set(name, { value, path });
  }
}

export interface Person {
  readonly id: string;
  readonly email: string;
  readonly browser: Browser;
}

export interface ConsoleService extends TestService {
  readonly mail: TestMailServer;
  newBrowser(address?: string, agent?: string): Browser;
  newAddress(): string;
  /** Somebody with a confirmed account, signed in. */
  person(options?: { roles?: readonly string[]; name?: string; email?: string }): Promise<Person>;
}

/** The service with a mail server of its own behind it. */
export async function startConsole(
  overrides: Partial<Config> = {},
  logFile?: string,
  clientFolder?: string,
): Promise<ConsoleService> {
  const mail = await new TestMailServer().up();
  const config = { trustProxyHops: 1, smtpUrl: mail.url, mailFrom: 'Evenfall <evenfall@example.org>' };
  const service = await startService({ ...config, ...overrides }, undefined, logFile, clientFolder);
  const newBrowser = (address?: string, agent?: string) => new Browser(service.url, address, agent);
  const newAddress = () => `person-${randomBytes(6).toString('hex')}@example.org`;
  return {
    ...service,
    mail,
    newBrowser,
    newAddress,
    person: async ({
      roles = ['developer'],
      name = 'Orla Wick',
      email = newAddress(),
    } = {}): Promise<Person> => {
      const browser = newBrowser();
      const before = mail.to(email).length;
      await browser.call('POST', '/api/sign-up', { email, name, password: PASSWORD, roles });
      const { token } = await mail.next(email, before);
      await browser.call('POST', '/api/sign-up/confirm', { token });
      const answer = await browser.signIn(email);
      if (answer.status !== 200) throw new Error(`signing in failed: ${answer.text}`);
      const { account } = answer.body as unknown as { account: { id: string } };
      return { id: account.id, email, browser };
    },
    stop: async () => {
      await service.stop();
      await mail.down();
    },
  };
}
