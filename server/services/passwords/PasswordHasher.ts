import { randomBytes } from 'node:crypto';
import { Worker } from 'node:worker_threads';
import { ProblemError } from '../../http/ProblemError';
import { preHash, type PasswordWork } from './bcryptWork';

export interface PasswordHasher {
  /** The hash of a new password, as it is stored. */
  hash(password: string): Promise<string>;
  /** Whether a password fits; where there is no hash, the same work is done and the answer is no. */
  verify(password: string, hash: string | null): Promise<boolean>;
  close(): Promise<void>;
}

interface HasherOptions {
  readonly cost: number;
  /** The built worker. */
  readonly workerUrl: URL;
}

interface Job {
  readonly work: PasswordWork;
  readonly resolve: (result: string | boolean) => void;
  readonly reject: (error: Error) => void;
}

/** So many hashings run at once; more would take the machine from everyone else. */
const AT_ONCE = 2;
/** So many may wait: about ten seconds' worth. */
const WAITING_MAX = 80;

/** Hashes in worker threads, a few at a time, so that a flood of sign-ins can't take the event loop. */
export class WorkerPasswordHasher implements PasswordHasher {
  private readonly idle: Worker[] = [];
  private readonly all = new Set<Worker>();
  private readonly waiting: Job[] = [];
  private readonly dummy: Promise<string>;
  private isClosed = false;

  constructor(private readonly options: HasherOptions) {
    this.dummy = this.hash(randomBytes(24).toString('base64'));
    // Whoever verifies against it learns of a failure; nobody else has to.
    this.dummy.catch(() => undefined);
  }

  async hash(password: string): Promise<string> {
    return String(await this.run({ text: preHash(password), cost: this.options.cost }));
  }

  async verify(password: string, hash: string | null): Promise<boolean> {
    const against = hash ?? (await this.dummy);
    const fits = await this.run({ text: preHash(password), hash: against });
    return fits === true && hash !== null;
  }

  async close(): Promise<void> {
    this.isClosed = true;
    for (const { reject } of this.waiting.splice(0)) reject(new Error('the service stops'));
    await Promise.all([...this.all].map((worker) => worker.terminate()));
  }

  private run(work: PasswordWork): Promise<string | boolean> {
    if (this.waiting.length >= WAITING_MAX) {
      const detail = 'Too many people sign in just now. Nothing was changed; try again shortly.';
      return Promise.reject(new ProblemError('unavailable', detail, { headers: { 'Retry-After': '5' } }));
    }
    return new Promise((resolve, reject) => {
      this.waiting.push({ work, resolve, reject });
      this.next();
    });
  }

  private next(): void {
    if (this.waiting.length === 0 || this.isClosed) return;
    const worker = this.idle.pop() ?? (this.all.size < AT_ONCE ? this.begin() : null);
    const job = worker && this.waiting.shift();
    if (!worker || !job) return;
    const finish = (settle: () => void) => {
      worker.removeAllListeners('message').removeAllListeners('error').removeAllListeners('exit');
      settle();
      this.next();
    };
    const fail = (error: Error) =>
      finish(() => {
        this.all.delete(worker);
        job.reject(error);
      });
    worker.on('message', ({ result, failure }: { result: string | boolean; failure?: string }) =>
      finish(() => {
        this.idle.push(worker);
        if (failure === undefined) job.resolve(result);
        else job.reject(new Error(failure));
      }),
    );
    worker.on('error', fail);
    worker.on('exit', () => fail(new Error('a hashing thread ended')));
    worker.postMessage(job.work);
  }

  private begin(): Worker {
    const worker = new Worker(this.options.workerUrl);
    worker.unref();
    this.all.add(worker);
    return worker;
  }
}
