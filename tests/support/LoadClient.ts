import { Agent, request } from 'node:http';

/** A call to be made. */
export interface Shot {
  readonly url: string;
  readonly key: string;
  readonly path?: string;
  readonly body?: unknown;
  /** What it costs, for whoever counts. */
  readonly units?: number;
}

/** What became of it, as the client saw it. */
export interface Hit {
  readonly shot: Shot;
  /** Null where no whole answer came. */
  readonly status: number | null;
  readonly code: string | null;
  readonly retryAfterS: number | null;
  readonly sentMs: number;
  readonly tookMs: number;
}

/** No call may take so long; one that does is given up and told as unanswered. */
const PATIENCE_MS = 8_000;
const ONE_CALL = { path: '/v1/exposure/value', body: { aperture: 8, shutter: '1/125' } };

/** A caller with many connections that are kept, who counts what was really answered. */
export class LoadClient {
  /** Calls that were sent and not yet answered, by the address they went to. */
  private readonly underWay = new Map<string, number>();
  private readonly agent = new Agent({ keepAlive: true });

  inFlight(url: string): number {
    return this.underWay.get(url) ?? 0;
  }

  ask(shot: Shot): Promise<Hit> {
    const { url, key, path, body } = { ...ONE_CALL, ...shot };
    const text = JSON.stringify(body);
    const sentMs = performance.now();
    this.note(url, 1);
    return new Promise<Hit>((resolve) => {
      const end = (status: number | null, headers: Record<string, unknown> = {}, answer = '') => {
        clearTimeout(patience);
        const retryAfter = headers['retry-after'];
        resolve({
          shot,
          status,
          code: status !== null && status >= 400 ? codeOf(answer) : null,
          retryAfterS: retryAfter === undefined ? null : Number(retryAfter),
          sentMs,
          tookMs: performance.now() - sentMs,
        });
      };
      const sent = request(`${url}${path}`, {
        method: 'POST',
        agent: this.agent,
        headers: {
          Authorization: `Bearer ${key}`,
          'Content-Type': 'application/json',
          'Content-Length': Buffer.byteLength(text),
        },
      });
      const patience = setTimeout(() => sent.destroy(new Error('no answer')), PATIENCE_MS);
      sent.on('error', () => end(null));
      sent.on('response', (response) => {
        let answer = '';
        response.setEncoding('utf8');
        response.on('data', (chunk: string) => (answer += chunk));
        response.on('end', () => end(response.statusCode ?? null, response.headers, answer));
        response.on('error', () => end(null));
      });
      sent.end(text);
    }).finally(() => this.note(url, -1));
  }

  /** Makes all calls, so many at a time, in order. */
  async offer(shots: readonly Shot[], width: number): Promise<Hit[]> {
    const hits: Hit[] = [];
    let next = 0;
    const work = async () => {
      for (let shot = shots[next++]; shot; shot = shots[next++]) hits.push(await this.ask(shot));
    };
    await Promise.all(Array.from({ length: width }, work));
    return hits;
  }

  close(): void {
    this.agent.destroy();
  }

  private note(url: string, change: number): void {
    this.underWay.set(url, this.inFlight(url) + change);
  }
}

function codeOf(answer: string): string | null {
  try {
    return (JSON.parse(answer) as { code?: string }).code ?? null;
  } catch {
    return null;
  }
}

export const served = (hits: readonly Hit[]): Hit[] => hits.filter(({ status }) => status === 200);

/** Units of the calls that were answered with 200. */
export const servedUnits = (hits: readonly Hit[]): number =>
  served(hits).reduce((sum, { shot }) => sum + (shot.units ?? 1), 0);

/** How many calls ended in which way, for printing and comparing: `200`, `429 quota_exhausted`, `unanswered`. */
export function outcomes(hits: readonly Hit[]): Record<string, number> {
  const counts: Record<string, number> = {};
  for (const { status, code } of hits) {
    const name = status === null ? 'unanswered' : [status, code].filter((part) => part !== null).join(' ');
    counts[name] = (counts[name] ?? 0) + 1;
  }
  return counts;
}
