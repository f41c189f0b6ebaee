// npm hands on a signal that the terminal has sent to both: the second of such a pair is no second wish.
const SAME_WISH_MS = 1_000;

/** Aborts at the first SIGINT or SIGTERM; whoever insists a while later ends the process at once. */
export function stopSignal(): AbortSignal {
  const controller = new AbortController();
  let askedAtMs: number | null = null;
  const stop = () => {
    const nowMs = Date.now();
    if (askedAtMs !== null && nowMs - askedAtMs > SAME_WISH_MS) process.exit(130);
    askedAtMs ??= nowMs;
    controller.abort();
  };
  process.on('SIGINT', stop).on('SIGTERM', stop);
  return controller.signal;
}

export function untilAborted(signal: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    if (signal.aborted) resolve();
    else signal.addEventListener('abort', () => resolve(), { once: true });
  });
}
