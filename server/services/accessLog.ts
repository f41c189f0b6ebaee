import type { Logger } from 'pino';
import type { Finish } from '../http/send';

/** One line a finished call: who asked what, how it ended, how long it took; never a key, a query or a body. */
export function accessLog(logger: Logger): Finish {
  const isOn = logger.isLevelEnabled('info');
  return (call, status, ms) => {
    if (!isOn) return;
    const { operation, keyId, units, code } = call.facts;
    logger.info({
      request: call.requestId,
      method: call.request.method,
      operation: operation ?? call.path.slice(0, 200),
      status,
      code,
      key: keyId,
      units,
      ms,
    });
  };
}
