import type { Fault } from '../../shared/contract/faults';
import type { ProblemCode } from '../../shared/contract/problems';

interface More {
  readonly errors?: readonly Fault[];
  readonly headers?: Readonly<Record<string, string>>;
  readonly cause?: unknown;
}

/** A refusal on its way to becoming problem details; one place turns it into an answer. */
export class ProblemError extends Error {
  readonly errors: readonly Fault[] | undefined;
  readonly headers: Readonly<Record<string, string>>;

  /** @param detail what happened here; left out, the catalogue's own words */
  constructor(
    readonly code: ProblemCode,
    readonly detail?: string,
    { errors, headers = {}, cause }: More = {},
  ) {
    super(detail ?? code, { cause });
    this.errors = errors;
    this.headers = headers;
  }
}
