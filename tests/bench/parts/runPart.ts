import type { PartTask } from './part';

/** A part starts, says that it is ready, and answers what it is asked, one thing at a time. */
export interface RunningPart {
  readonly ready: unknown;
  answer?(question: unknown): unknown;
}

type StartPart = (given: never) => Promise<RunningPart> | RunningPart;

// Loaded by name, so that a peer's process holds nothing of the others.
const parts: Record<string, () => Promise<StartPart>> = {
  rawHttp: async () => (await import('../peers/rawHttp')).rawHttp,
  expressEcho: async () => (await import('../peers/expressEcho')).expressEcho,
  stockFull: async () => (await import('../peers/stockFull')).stockFull,
  calculatorLoop: async () => (await import('./calculatorLoop')).calculatorLoop,
  load: async () => (await import('../load/loadPart')).loadPart,
};

async function begin({ part, given }: PartTask): Promise<void> {
  const start = await parts[part]?.();
  if (!start) throw new Error(`no part is called ${part}`);
  const { ready, answer } = await start(given as never);
  process.on('message', (question) => void Promise.resolve(answer?.(question)).then(say));
  say(ready);
}

const say = (message: unknown) => process.send?.(message);

/** What a child process of the benchmark does: the part that its first message names. */
export function runPart(): void {
  process.on('disconnect', () => process.exit());
  process.once('message', (task: PartTask) => void begin(task));
}
