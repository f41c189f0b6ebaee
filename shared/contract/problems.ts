import { problems } from '../text';
import type { Fault } from './faults';

export type ProblemCode = keyof typeof problems;

/** RFC 9457 problem details with our members. */
export interface Problem {
  readonly type: string;
  readonly title: string;
  readonly status: number;
  readonly detail: string;
  readonly instance: string;
  readonly code: ProblemCode;
  readonly errors?: readonly Fault[];
}

export const PROBLEM_CODES = Object.keys(problems) as ProblemCode[];

/** The HTTP status of a problem. */
export function statusOf(code: ProblemCode): number {
  return problems[code].status;
}

/**
 * Problem details for one occurrence.
 * @param publicUrl where the service is reached, without a slash at the end
 * @param requestId becomes the instance, as a URN
 * @param detail what happened here; the catalogue's cure where nothing is known beyond the code
 */
export function problemOf(
  code: ProblemCode,
  {
    publicUrl,
    requestId,
    detail,
    errors,
  }: { publicUrl: string; requestId: string; detail?: string; errors?: readonly Fault[] },
): Problem {
  const { title, status, cause, cure } = problems[code];
  return {
    type: `${publicUrl}/problems/${code}`,
    title,
    status,
    detail: detail ?? `${cause} ${cure}`,
    instance: `urn:evenfall:request:${requestId}`,
    code,
    ...(errors && { errors }),
  };
}
