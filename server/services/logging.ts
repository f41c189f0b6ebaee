import pino, { type Logger } from 'pino';
import type { Config } from '../config';

/** Lines are gathered and written together; what is left is written when the process ends. */
const GATHER_CHARACTERS = 65_536;
const FLUSH_MS = 500;

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

/** Hands lines on many at a time: handing over each by itself costs more than all else about it. */
class LineGatherer implements LineWriter {
  private lines: string[] = [];
  private length = 0;

  constructor(private readonly handOn: (text: string) => void) {}

  write(line: string): void {
    this.lines.push(line);
    this.length += line.length;
    if (this.length >= GATHER_CHARACTERS) this.flush();
  }

  flush(): void {
    if (this.length === 0) return;
    const text = this.lines.join('');
    this.lines = [];
    this.length = 0;
    this.handOn(text);
  }
}

/** A log of JSON lines on standard output. Keys, cookies and bodies never reach it: nothing passes them on. */
export function serviceLog({ logLevel }: Pick<Config, 'logLevel'>, fd = 1): ServiceLog {
  const destination = pino.destination({ fd, sync: false });
  const gatherer = new LineGatherer((text) => destination.write(text));
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
