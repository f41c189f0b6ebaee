import type { FinishedCall } from './UsageRecorder';

/** A key keeps this many calls in its log. */
export const LOG_LENGTH = 10_000;

/** Names, codes and request ids are of plain characters, which JSON takes as they are. */
function lineOf({ calculator, status, code, units, ms, requestId }: FinishedCall, at: string): string {
  const coded = code === undefined ? '' : `,"code":"${code}"`;
  const rounded = Math.round(ms * 1000) / 1000;
  return `{"at":"${at}","calculator":"${calculator}","status":${status}${coded},"units":${units},"ms":${rounded},"request":"${requestId}"}`;
}

/** The newest lines of one key's log until they are written, each ready as JSON: they are only ever handed on. */
export class LineLog {
  private readonly lines: string[] = [];
  private newest = '';

  /** @param at the call's moment as text */
  add(call: FinishedCall, at: string): void {
    this.newest = at;
    this.lines.push(lineOf(call, at));
    // Older ones would be deleted after writing; let them go in time, a thousand at once.
    if (this.lines.length > LOG_LENGTH + 1000) this.lines.splice(0, this.lines.length - LOG_LENGTH);
  }

  /** The log as one JSON object, its lines in order of arrival. */
  text(keyId: string): string {
    const kept = this.lines.slice(-LOG_LENGTH);
    return `{"key_id":"${keyId}","last_at":"${this.newest}","held":${kept.length},"calls":[${kept.join(',')}]}`;
  }
}
