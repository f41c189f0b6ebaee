import type { components } from '../../openapi/console';

export type Problem = components['schemas']['Problem'];
export type Fault = NonNullable<Problem['errors']>[number];

/** An answer that is not what was asked for, in words for whoever asked. */
export class Refused extends Error {
  override readonly name = 'Refused';

  constructor(
    message: string,
    /** 0 where no answer came at all. */
    readonly status: number,
    readonly code: string,
    readonly faults: readonly Fault[] = [],
    readonly requestId: string | null = null,
  ) {
    super(message);
  }
}

const isProblem = (given: unknown): given is Problem =>
  typeof given === 'object' && given !== null && 'code' in given && 'detail' in given;

/** The refusal that a response carries. */
export function refusedBy(response: Response, given: unknown): Refused {
  const requestId = response.headers.get('x-request-id');
  if (isProblem(given))
    return new Refused(given.detail, response.status, given.code, given.errors, requestId);
  const text = `The service answered with ${response.status} and no reason. Try again in a moment.`;
  return new Refused(text, response.status, 'unexplained', [], requestId);
}

/** What went wrong before any answer came. */
export function refusedByNetwork(error: unknown): Refused {
  const isLate = error instanceof DOMException && error.name === 'TimeoutError';
  const text = isLate
    ? 'No answer came in time. What you typed is still here; try again.'
    : 'The service can’t be reached. What you typed is still here; try again when you are connected.';
  return new Refused(text, 0, isLate ? 'no_answer' : 'not_connected');
}
