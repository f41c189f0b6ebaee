import type { QueryPairs } from '../../../shared/contract/queryCodec';
import { ProblemError } from '../../http/ProblemError';
import { usageOf } from '../../presenters/usage';
import type { Operation } from './operation';

/** The key's own period: any key, no scope, no units; counts in the rate. */
export const usageOperation: Operation = {
  method: 'GET',
  path: '/v1/usage',
  name: 'usage',
  access: 'key',
  bodyLimit: 0,
  prepare: (pairs) => {
    const surplus = (pairs as QueryPairs)[0]?.[0];
    const problem =
      surplus === undefined
        ? undefined
        : new ProblemError('invalid_input', 'This address takes no query.', {
            errors: [
              {
                pointer: `/${surplus}`,
                code: 'unknown_field',
                detail: `"${surplus}" is not a field here; there are none.`,
              },
            ],
          });
    return { units: 0, needs: [], problem, answer: usageOf };
  },
};
