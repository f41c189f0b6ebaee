import pino, { type Logger } from 'pino';
import type { Config } from '../config';

/** Lines are gathered and written together; what is left is written when the process ends. */
const GATHER_BYTES = 8192;
const FLUSH_MS = 500;

export interface ServiceLog {
  readonly logger: Logger;
  /** Writes what is gathered. */
  flush(): void;
}

/** A log of JSON lines on standard output. Keys, cookies and bodies never reach it: nothing passes them on. */
export function serviceLog({ logLevel }: Pick<Config, 'logLevel'>, fd = 1): ServiceLog {
  const destination = pino.destination({ fd, minLength: GATHER_BYTES, sync: false });
  const logger = pino({ level: logLevel, base: null, timestamp: pino.stdTimeFunctions.isoTime }, destination);
  const timer = setInterval(() => destination.flush(), FLUSH_MS);
  timer.unref();
  return {
    logger,
    flush: () => {
      clearInterval(timer);
      try {
        destination.flushSync();
      } catch {
        // Standard output may be closed already; there is nobody left to tell.
      }
    },
  };
}
