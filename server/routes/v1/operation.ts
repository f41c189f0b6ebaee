import type { Call } from '../../http/Call';
import type { ProblemError } from '../../http/ProblemError';
import type { Standing } from '../../services/metering/meter';

export type Method = 'GET' | 'POST';

/** What a metered call turns out to be once its input was read. */
export interface Prepared {
  readonly units: number;
  readonly needs: readonly string[];
  /** Why it can't be answered; it then costs nothing but counts in the rate. */
  readonly problem?: ProblemError;
  /** Known before the calculation; a matching If-None-Match gets 304 and costs nothing. */
  readonly etag?: string;
  /** The answer's body. */
  readonly answer: (standing: Standing) => unknown;
}

/** Method, path, who may, what comes in and what goes out stand together, one object an operation. */
export type Operation = {
  readonly method: Method;
  readonly path: string;
  /** For logs and usage: the calculator's id or a name of its own. */
  readonly name: string;
} & (
  | {
      readonly access: 'open';
      /** JSON, ready made. */
      readonly body: string;
    }
  | {
      readonly access: 'key';
      /** Bytes of body that POST takes. */
      readonly bodyLimit: number;
      /** Reads the body (POST) or the query's pairs (GET). */
      readonly prepare: (given: unknown, call: Call) => Prepared | Promise<Prepared>;
    }
);
