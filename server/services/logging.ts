import pino, { type Logger } from 'pino';
import type { Config } from '../config';

/** Lines are gathered and written together; what is left is written when the process ends. */
const GATHER_BYTES = 65_536;
const FLUSH_MS = 500;
/** A UTF-16 unit takes up to three bytes of UTF-8. */
const BYTES_PER_UNIT = 3;

export interface ServiceLog {
  readonly logger: Logger;
  /** Writes what is gathered. */
  flush(): void;
}

interface LineWriter {
  write(line: string): void;
}

/** Where a logger's lines go, for lines that are made elsewhere; each ends in a newline. */
export function lineWriterOf(logger: Logger): LineWriter {
  return (logger as unknown as Record<symbol, LineWriter>)[pino.symbols.streamSym] as LineWriter;
}

/**
 * Hands lines on many at a time: handing over each by itself costs more than all else about it. They are kept as
 * bytes, since thousands of strings that live for half a second are what the garbage collector likes least.
 */
class LineGatherer implements LineWriter {
  private bytes = Buffer.allocUnsafeSlow(GATHER_BYTES);
  private length = 0;

  constructor(private readonly handOn: (bytes: Buffer) => void) {}

  write(line: string): void {
    const most = line.length * BYTES_PER_UNIT;
    if (this.length + most > GATHER_BYTES) this.flush();
    if (most > GATHER_BYTES) this.handOn(Buffer.from(line));
    else this.length += this.bytes.write(line, this.length);
  }

  flush(): void {
    if (this.length === 0) return;
    const full = this.bytes.subarray(0, this.length);
    // What is handed on is written later, so it can't be written over.
    this.bytes = Buffer.allocUnsafeSlow(GATHER_BYTES);
    this.length = 0;
    this.handOn(full);
  }
}

/** A log of JSON lines on standard output. Keys, cookies and bodies never reach it: nothing passes them on. */
export function serviceLog({ logLevel }: Pick<Config, 'logLevel'>, fd = 1): ServiceLog {
  const destination = pino.destination({ fd, sync: false, contentMode: 'buffer' });
  // The destination's types know of texts alone, though bytes are what it takes in this mode.
  const gatherer = new LineGatherer((bytes) => destination.write(bytes as unknown as string));
  const logger = pino({ level: logLevel, base: null, timestamp: pino.stdTimeFunctions.isoTime }, gatherer);
  const timer = setInterval(() => gatherer.flush(), FLUSH_MS);
  timer.unref();
  return {
    logger,
    flush: () => {
      clearInterval(timer);
      gatherer.flush();
      try {
        destination.flushSync();
      } catch {
        // Standard output may be closed already; there is nobody left to tell.
      }
    },
  };
}
