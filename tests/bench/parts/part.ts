import { spawn, type ChildProcess } from 'node:child_process';
import { closeSync, openSync } from 'node:fs';

/** What runs in a process of its own; the part's function is found by its name in `runPart`. */
export interface PartTask {
  readonly part: string;
  readonly given: unknown;
}

export interface PartOptions {
  /** The core that the process may use; null for any. */
  readonly core: number | null;
  /** The built file that exports `runPart`. */
  readonly entryUrl: string;
}

/** A process of the benchmark's own. */
export interface Part<Ready> {
  readonly pid: number;
  /** What the part said when it was ready. */
  readonly ready: Ready;
  /** Asks one thing; the next only after its answer. */
  ask<Answer>(question: unknown): Promise<Answer>;
  stop(): Promise<void>;
}

const RUN_PART = 'import(process.argv[1]).then((entry) => entry.runPart());';
const PROGRAM_FOLDERS = '/usr/local/bin:/usr/bin:/bin';

/** Starts Node on one core with no more environment than is given, so that runs are alike everywhere. */
export function spawnPinned(
  core: number | null,
  args: readonly string[],
  { env = {}, cwd, output }: { env?: Record<string, string>; cwd?: string; output: 'quiet' | number },
): ChildProcess {
  const command = [process.execPath, ...args];
  const [program = '', ...rest] = core === null ? command : ['taskset', '-c', String(core), ...command];
  const sink = output === 'quiet' ? openSync('/dev/null', 'w') : output;
  const child = spawn(program, rest, {
    cwd,
    stdio: ['ignore', sink, 'inherit', 'ipc'],
    env: { PATH: PROGRAM_FOLDERS, NODE_ENV: 'production', ...env },
  });
  if (output === 'quiet') closeSync(sink);
  return child;
}

function nextMessage(child: ChildProcess): Promise<unknown> {
  return new Promise((resolve, reject) => {
    const failed = (why: unknown) => reject(new Error(`a part of the benchmark ended: ${String(why)}`));
    child.once('exit', failed);
    child.once('error', failed);
    child.once('message', (message) => {
      child.off('exit', failed);
      child.off('error', failed);
      resolve(message);
    });
  });
}

/** Ends a process and waits until it is gone. */
export async function endProcess(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const gone = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  child.kill('SIGTERM');
  const cut = setTimeout(() => child.kill('SIGKILL'), 12_000);
  await gone;
  clearTimeout(cut);
}

/** Starts a part and waits until it is ready. */
export async function startPart<Ready>(task: PartTask, options: PartOptions): Promise<Part<Ready>> {
  const args = ['--input-type=module', '-e', RUN_PART, options.entryUrl];
  const child = spawnPinned(options.core, args, { output: 'quiet' });
  const first = nextMessage(child);
  child.send(task);
  const ready = (await first) as Ready;
  return {
    pid: child.pid ?? 0,
    ready,
    ask: async <Answer>(question: unknown) => {
      const answer = nextMessage(child);
      child.send(question as object);
      return (await answer) as Answer;
    },
    stop: () => endProcess(child),
  };
}
