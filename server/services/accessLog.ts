import pino, { type Logger } from 'pino';
import type { Finish } from '../http/send';
import { lineWriterOf } from './logging';

const text = (value: string) => JSON.stringify(value);

/**
 * One line a finished call: who asked what, how it ended, how long it took; never a key, a query or a body. The line
 * has the logger's form, put together here at a fifth of its price.
 */
export function accessLog(logger: Logger): Finish {
  const isOn = logger.isLevelEnabled('info');
  const lines = lineWriterOf(logger);
  const start = `{"level":${logger.levels.values.info}`;
  return (call, status, ms) => {
    if (!isOn) return;
    const { operation, keyId, units, code } = call.facts;
    lines.write(
      `${start}${pino.stdTimeFunctions.isoTime()},"request":"${call.requestId}","method":"${call.request.method}"` +
        `,"operation":${text(operation ?? call.path.slice(0, 200))},"status":${status}` +
        `${code === undefined ? '' : `,"code":"${code}"`}${keyId === undefined ? '' : `,"key":"${keyId}"`}` +
        `,"units":${units},"ms":${ms}}\n`,
    );
  };
}
