import type { Finish } from '../../http/send';
import type { UsageWriter } from './UsageWriter';

/** Notes each finished call of a known key for the usage counts and the key's log. */
export function recordFinished(writer: Pick<UsageWriter, 'record'>, now: () => Date): Finish {
  return (call, status, ms) => {
    const { keyId, operation, code, units, at } = call.facts;
    if (keyId === undefined || operation === undefined) return;
    const { requestId } = call;
    writer.record({ keyId, calculator: operation, at: at ?? now(), status, code, units, ms, requestId });
  };
}
