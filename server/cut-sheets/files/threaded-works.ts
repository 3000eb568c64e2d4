import { Worker } from 'node:worker_threads';
import { Refusal, refuseField } from '#server/refusal.ts';
import { type SheetWorks } from './works.ts';

/** What the thread is asked, and what it answers. */
export interface Job {
  readonly work: keyof SheetWorks;
  readonly given: unknown;
}
export type Answer = { readonly done: unknown } | { readonly failed: unknown };

export interface ThreadOptions {
  /** The script of the thread. */
  readonly script: URL;
  /** Longest time for one job, once the thread has begun, ms. */
  readonly timeLimitMs: number;
  /** Jobs that may wait, the one at work included. */
  readonly mostWaiting: number;
}

const usual: ThreadOptions = {
  script: new URL('./worker.mjs', import.meta.url),
  timeLimitMs: 45_000,
  mostWaiting: 40,
};
const RETRY_AFTER_SECONDS = 5;
/** Far above what the largest plan takes, so that a mistake ends the thread and not the server. */
const resourceLimits = { maxOldGenerationSizeMb: 512 };

/**
 * Works in a thread beside the server, one job after the other, so that requests are answered meanwhile. The thread begins with the first job and does not
 * keep the process alive. Where none can be begun the work is done in place.
 *
 * The works throw what the work itself throws; Refusal `unavailable` when too many jobs wait, and `invalid` naming `plan` when one takes too long.
 */
export function threadedWorks(options: Partial<ThreadOptions> = {}): SheetWorks {
  const { script, timeLimitMs, mostWaiting } = { ...usual, ...options };
  let thread: Promise<Worker | null> | null = null;
  let waiting = 0;
  let last: Promise<unknown> = Promise.resolve();

  async function run(job: Job): Promise<unknown> {
    thread ??= beginThread(script, () => {
      thread = null;
    });
    const worker = await thread;
    if (worker === null) return inPlace(job);
    try {
      return await ask(worker, job, timeLimitMs);
    } catch (error) {
      if (error instanceof ThreadEnded) {
        await worker.terminate();
        throw error.told;
      }
      throw error;
    }
  }

  async function inLine(job: Job): Promise<unknown> {
    if (waiting >= mostWaiting) throw busy();
    waiting += 1;
    const turn = last.then(() => run(job));
    last = turn.catch(() => undefined);
    try {
      return await turn;
    } finally {
      waiting -= 1;
    }
  }

  return {
    count: (given) => inLine({ work: 'count', given }) as ReturnType<SheetWorks['count']>,
    make: (given) => inLine({ work: 'make', given }) as ReturnType<SheetWorks['make']>,
    archive: (given) => inLine({ work: 'archive', given }) as ReturnType<SheetWorks['archive']>,
  };
}

/** Loaded only then: geometry and fonts are large, and the server starts without them. */
async function inPlace({ work, given }: Job): Promise<unknown> {
  const { worksInPlace } = await import('./works.ts');
  return (worksInPlace[work] as (given: unknown) => Promise<unknown>)(given);
}

function busy(): Refusal {
  return new Refusal('unavailable', {
    detail: 'Other plans are being worked out. Try again in a few seconds.',
    retryAfterSeconds: RETRY_AFTER_SECONDS,
  });
}

/** The thread is of no use any more. */
class ThreadEnded extends Error {
  constructor(readonly told: Error) {
    super(told.message);
  }
}

/** @returns null when no thread can be begun */
function beginThread(script: URL, onEnd: () => void): Promise<Worker | null> {
  return new Promise((resolve) => {
    const worker = new Worker(script, { execArgv: [], resourceLimits });
    worker.unref();
    worker.once('message', () => {
      worker.once('exit', onEnd);
      resolve(worker);
    });
    // An error that nobody listens to would end the process; after it the thread exits.
    worker.on('error', () => undefined);
    worker.once('exit', () => {
      resolve(null);
    });
  });
}

function ask(worker: Worker, job: Job, timeLimitMs: number): Promise<unknown> {
  return new Promise((resolve, reject) => {
    const settle = (how: () => void) => {
      clearTimeout(timer);
      worker.off('message', answered).off('error', failed).off('exit', exited);
      how();
    };
    const answered = (answer: Answer) => {
      settle(() => ('done' in answer ? resolve(answer.done) : reject(answer.failed as Error)));
    };
    const ended = (told: Error) => {
      settle(() => reject(new ThreadEnded(told)));
    };
    const failed = (error: unknown) => {
      ended(error instanceof Error ? error : new Error(String(error)));
    };
    const exited = () => {
      ended(new Error('The thread that makes files has ended.'));
    };
    const tooLong = `Working this plan out takes longer than ${timeLimitMs / 1000} s. Fewer points, features or ribs make it shorter.`;
    const timer = setTimeout(() => {
      ended(refuseField('plan', tooLong));
    }, timeLimitMs);
    worker.on('message', answered).on('error', failed).on('exit', exited);
    worker.postMessage(job);
  });
}
