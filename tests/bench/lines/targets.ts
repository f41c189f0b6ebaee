import type { BenchContext } from '../BenchContext';
import { requestText } from '../load/requestText';
import type { LoadTask } from '../load/loadTask';

const PATH = '/v1/exposure/value';
const INPUT = { aperture: 5.6, shutter: '1/125', iso: 400 };
const QUERY = new URLSearchParams(Object.entries(INPUT).map(([name, value]) => [name, String(value)]));

/** Who is asked, and what. */
export type Target = Pick<LoadTask, 'ports' | 'request' | 'status'>;

async function post(context: BenchContext, port: number): Promise<Target> {
  const request = requestText('POST', PATH, { key: await context.key(), body: INPUT });
  return { ports: [port], request, status: 200 };
}

/** The metered call, everything on. */
export async function metered(context: BenchContext): Promise<Target> {
  const { port } = await context.service();
  return post(context, port);
}

/** The same by GET, by a caller that has the answer already. */
export async function unchanged(context: BenchContext): Promise<Target> {
  const { url, port } = await context.service();
  const key = await context.key();
  const path = `${PATH}?${QUERY.toString()}`;
  const answer = await fetch(url + path, { headers: { Authorization: `Bearer ${key}` } });
  const ifNoneMatch = answer.headers.get('etag');
  if (!ifNoneMatch) throw new Error('the answer has no ETag');
  return { ports: [port], request: requestText('GET', path, { key, ifNoneMatch }), status: 304 };
}

export async function rawHttp(context: BenchContext): Promise<Target> {
  return post(context, (await context.part<number>('rawHttp')).ready);
}

export async function expressEcho(context: BenchContext): Promise<Target> {
  return post(context, (await context.part<number>('expressEcho')).ready);
}

export async function stockFull(context: BenchContext): Promise<Target> {
  const { ownerUrl } = context.options;
  const part = await context.part<number>('stockFull', { ownerUrl, key: await context.key() });
  return post(context, part.ready);
}
