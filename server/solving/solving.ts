import { once } from 'node:events';
import { availableParallelism } from 'node:os';
import { Worker } from 'node:worker_threads';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import { Refusal } from '#shared/api/refusal';

/** Solves circuits on threads of their own, so that no circuit, however heavy, delays an edit or another request. */
export interface Solving {
  /**
   * The circuit's record. Each asker has one circuit solved at a time and a few waiting. Rejects with a refusal where too
   * many wait, or where this one takes too long.
   */
  operatingPoint(circuit: unknown, asker: string): Promise<OperatingPointRecord>;
  /** Stops the threads; what is not answered by then never is. */
  end(): Promise<void>;
}

interface SolvingBounds {
  readonly threads: number;
  /** Milliseconds that one circuit may take. */
  readonly timeLimit: number;
  readonly mostWaiting: number;
  readonly mostWaitingOfOne: number;
}

interface Job {
  readonly circuit: unknown;
  readonly asker: string;
  resolve(record: OperatingPointRecord): void;
  reject(error: unknown): void;
}

/** Two at least, or one person's heavy circuit would keep all others waiting; a thread costs about as much as a page. */
const BOUNDS: SolvingBounds = {
  threads: Math.min(4, Math.max(2, availableParallelism() - 1)),
  timeLimit: 20_000,
  mostWaiting: 64,
  mostWaitingOfOne: 8,
};
const MOST_MEGABYTES = 512;

export function createSolving(bounds: Partial<SolvingBounds> = {}): Solving {
  const { threads, timeLimit, mostWaiting, mostWaitingOfOne } = { ...BOUNDS, ...bounds };
  const waiting: Job[] = [];
  const running = new Set<Job>();
  const workers = new Set<Worker>();
  const idle: Worker[] = [];

  const start = () => {
    const worker = startWorker();
    workers.add(worker);
    return worker;
  };

  const next = () => {
    if (running.size >= threads) return;
    const busy = new Set([...running].map(({ asker }) => asker));
    const index = waiting.findIndex(({ asker }) => !busy.has(asker));
    const [job] = index < 0 ? [] : waiting.splice(index, 1);
    if (job) void run(job);
  };

  const run = async (job: Job) => {
    running.add(job);
    const worker = idle.pop() ?? start();
    try {
      job.resolve(await answerOf(worker, job.circuit, timeLimit));
      idle.push(worker);
    } catch (error) {
      workers.delete(worker);
      void worker.terminate();
      job.reject(error);
    }
    running.delete(job);
    next();
  };

  return {
    operatingPoint: (circuit, asker) =>
      new Promise((resolve, reject) => {
        if (waiting.length >= mostWaiting)
          throw new Refusal('busy', 'The server is busy: try again.', { retryAfter: 5 });
        if (waiting.filter((job) => job.asker === asker).length >= mostWaitingOfOne) {
          throw new Refusal('too-many', 'Your other circuits are still being solved: wait for them.', {
            retryAfter: 5,
          });
        }
        waiting.push({ circuit, asker, resolve, reject });
        next();
      }),
    async end() {
      waiting.length = 0;
      await Promise.all([...workers].map((worker) => worker.terminate()));
    },
  };
}

async function answerOf(worker: Worker, circuit: unknown, timeLimit: number): Promise<OperatingPointRecord> {
  const tooLong = AbortSignal.timeout(timeLimit);
  worker.postMessage(circuit);
  try {
    // Rejects when the worker fails, too.
    const [record] = await once(worker, 'message', { signal: tooLong });
    return record;
  } catch (error) {
    if (!tooLong.aborted) throw error;
    const message = `This circuit takes more than ${timeLimit / 1000} s to solve here. The command line has no limit.`;
    throw new Refusal('took-too-long', message, { retryAfter: 60 });
  }
}

/** A thread begins at its file in the bundle, beside the one that this is then in, or at its source, with tsx to read it. */
function startWorker(): Worker {
  const resourceLimits = { maxOldGenerationSizeMb: MOST_MEGABYTES };
  const source = new URL('./solve.worker.ts', import.meta.url).href;
  const worker = import.meta.url.endsWith('.ts')
    ? new Worker(
        `import('tsx/esm/api').then(({ register }) => { register(); return import(${JSON.stringify(source)}); })`,
        { eval: true, execArgv: [], resourceLimits },
      )
    : new Worker(new URL('./solve.worker.js', import.meta.url), { resourceLimits });
  worker.unref();
  return worker;
}
