import { availableParallelism } from 'node:os';
import pg from 'pg';
import { migrate } from '../../server/services/database/migrate';
import { issueKeyForOperator } from '../../server/services/keys/issueKey';
import type { LoadResult, LoadTask } from './load/loadTask';
import { startPart, type Part } from './parts/part';
import { startService, type BenchService } from './parts/service';

/** What the command hands over: an empty database that is the benchmark's alone, and the built parts. */
export interface BenchOptions {
  readonly args: readonly string[];
  readonly ownerUrl: string;
  readonly serviceUrl: string;
  readonly serverFolder: string;
  readonly clientFolder: string;
}

/** More than any load here reaches. */
const UNREACHED_UNITS = 1_000_000_000_000;
const UNREACHED_RATE = 10_000_000;

/** The processes that measurements share, each started when first asked for, all ended by `close`. */
export class BenchContext {
  /** With two cores or more, the server has one and the asking side another; the database goes where there is room. */
  readonly cores = availableParallelism() > 1 ? { server: 0, client: 1 } : { server: null, client: null };
  readonly #stops: (() => Promise<void>)[] = [];
  readonly #parts = new Map<string, Promise<Part<unknown>>>();
  #service: Promise<BenchService> | undefined;
  #key: Promise<string> | undefined;

  private constructor(
    readonly options: BenchOptions,
    private readonly entryUrl: string,
  ) {}

  static async open(options: BenchOptions, entryUrl: string): Promise<BenchContext> {
    await emptyDatabase(options.ownerUrl);
    await migrate(options.ownerUrl);
    return new BenchContext(options, entryUrl);
  }

  note(text: string): void {
    process.stderr.write(`${text}\n`);
  }

  /** A server key whose quota and rate no load here reaches. */
  key(): Promise<string> {
    const limits = { units: UNREACHED_UNITS, rate: UNREACHED_RATE };
    const wish = { account: 'bench@example.org', name: 'bench', ...limits };
    this.#key ??= issueKeyForOperator(this.options.ownerUrl, wish);
    return this.#key;
  }

  /** The service as in production. */
  service(): Promise<BenchService> {
    this.#service ??= this.startService(this.cores.server);
    return this.#service;
  }

  async startService(core: number | null): Promise<BenchService> {
    const service = await startService(this.options, core);
    this.#stops.push(() => service.stop());
    return service;
  }

  /** A part of the benchmark's own beside the service, on the server's core. */
  part<Ready>(name: string, given: unknown = null): Promise<Part<Ready>> {
    return this.#part<Ready>(name, given, this.cores.server);
  }

  /** Puts load on a server. */
  async load(task: LoadTask): Promise<LoadResult> {
    const part = await this.#part('load', null, this.cores.client);
    return part.ask<LoadResult>(task);
  }

  #part<Ready>(name: string, given: unknown, core: number | null): Promise<Part<Ready>> {
    const started = this.#parts.get(name) ?? this.#start(name, given, core);
    this.#parts.set(name, started);
    return started as Promise<Part<Ready>>;
  }

  async #start(part: string, given: unknown, core: number | null): Promise<Part<unknown>> {
    const started = await startPart<unknown>({ part, given }, { core, entryUrl: this.entryUrl });
    this.#stops.push(() => started.stop());
    return started;
  }

  async close(): Promise<void> {
    for (const stop of this.#stops.splice(0).reverse()) await stop();
  }
}

/** What an earlier run left would change the answers, and its tables may be of another version. */
async function emptyDatabase(ownerUrl: string): Promise<void> {
  const client = new pg.Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    await client.query('DROP SCHEMA public CASCADE; CREATE SCHEMA public');
  } finally {
    await client.end();
  }
}
