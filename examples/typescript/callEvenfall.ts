/** A refusal as problem details (RFC 9457); `errors` names every field at fault. */
export interface Problem {
  readonly code: string;
  readonly status: number;
  readonly detail: string;
  readonly errors?: readonly { readonly pointer: string; readonly code: string; readonly detail: string }[];
}

export class EvenfallError extends Error {
  constructor(readonly problem: Problem) {
    super(`${problem.code}: ${problem.detail}`);
  }
}

export interface Answer<R> {
  readonly result: R;
  readonly notes: readonly { readonly code: string; readonly message: string }[];
  readonly cautions: readonly { readonly code: string; readonly message: string }[];
}

const pause = (seconds: number) => new Promise((resolve) => setTimeout(resolve, seconds * 1000));

/**
 * One call. Waits and tries again, a few times, where the service asks for it: too many calls in a second
 * (429 rate_limited) or a database out of reach (503). A quota that is used up is not waited for.
 */
export async function callEvenfall<R>(calculator: string, input: object, tries = 3): Promise<Answer<R>> {
  const address = `${process.env.EVENFALL_URL ?? 'http://127.0.0.1:4310'}/v1/${calculator}`;
  const response = await fetch(address, {
    method: 'POST',
    headers: {
      Authorization: `Bearer ${process.env.EVENFALL_KEY ?? ''}`,
      'Content-Type': 'application/json',
    },
    body: JSON.stringify(input),
    signal: AbortSignal.timeout(10_000),
  });
  if (response.ok) return (await response.json()) as Answer<R>;
  const problem = (await response.json()) as Problem;
  const isWorthWaiting = problem.code === 'rate_limited' || problem.code === 'unavailable';
  if (!isWorthWaiting || tries <= 1) throw new EvenfallError(problem);
  await pause(Number(response.headers.get('Retry-After') ?? 1));
  return callEvenfall<R>(calculator, input, tries - 1);
}
