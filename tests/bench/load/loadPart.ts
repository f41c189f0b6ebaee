import type { RunningPart } from '../parts/runPart';
import { HttpConnection } from './HttpConnection';
import type { LoadResult, LoadTask } from './loadTask';

const TICK_MS = 1;

/** Sends one request over and over; every answer must have the status that is expected. */
class Load {
  readonly #request: Buffer;
  readonly #free: HttpConnection[] = [];
  /** When each call that waits for a connection was due. */
  readonly #due: number[] = [];
  readonly #askedAt = new Map<HttpConnection, number>();
  readonly #latencies: number[] = [];
  #connections: HttpConnection[] = [];
  #answers = 0;
  #isOver = false;
  #fault: Error | undefined;

  constructor(private readonly task: LoadTask) {
    this.#request = Buffer.from(task.request);
  }

  async run(): Promise<LoadResult> {
    const { ports, connections, seconds, rate } = this.task;
    const openings = ports.flatMap((port) => Array.from({ length: connections }, () => this.#open(port)));
    this.#connections = await Promise.all(openings);
    const from = performance.now();
    const pacing = rate === undefined ? this.#askAlways() : this.#askAt(rate, from);
    await new Promise((resolve) => setTimeout(resolve, seconds * 1000));
    const took = (performance.now() - from) / 1000;
    const answers = this.#answers;
    this.#isOver = true;
    clearInterval(pacing);
    for (const connection of this.#connections) connection.close();
    if (this.#fault) throw this.#fault;
    return { perSecond: answers / took, latenciesMs: this.#latencies };
  }

  #open(port: number): Promise<HttpConnection> {
    return HttpConnection.open(
      port,
      (connection, status) => this.#answered(connection, status),
      (error) => this.#failed(error),
    );
  }

  #failed(error: Error): void {
    if (!this.#isOver) this.#fault ??= error;
  }

  /** Each connection asks again as soon as it is answered. */
  #askAlways(): undefined {
    for (const connection of this.#connections) connection.ask(this.#request);
  }

  /** Calls fall due at a steady rate whatever the answers do; one that finds no connection free waits for one. */
  #askAt(rate: number, from: number): NodeJS.Timeout {
    this.#free.push(...this.#connections);
    let asked = 0;
    return setInterval(() => {
      const now = performance.now();
      for (const dueByNow = ((now - from) / 1000) * rate; asked < dueByNow; asked += 1) {
        const connection = this.#free.pop();
        if (connection) this.#askDue(connection, now);
        else this.#due.push(now);
      }
    }, TICK_MS);
  }

  #askDue(connection: HttpConnection, due: number): void {
    this.#askedAt.set(connection, due);
    connection.ask(this.#request);
  }

  #answered(connection: HttpConnection, status: number): void {
    if (this.#isOver) return;
    if (status !== this.task.status) this.#failed(new Error(`an answer had status ${status}`));
    this.#answers += 1;
    if (this.task.rate === undefined) return connection.ask(this.#request);
    this.#latencies.push(performance.now() - (this.#askedAt.get(connection) ?? 0));
    const due = this.#due.shift();
    if (due === undefined) this.#free.push(connection);
    else this.#askDue(connection, due);
  }
}

/** The asking side, in a process of its own. */
export function loadPart(): RunningPart {
  return { ready: true, answer: (task) => new Load(task as LoadTask).run() };
}
