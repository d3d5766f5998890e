import { Piscina } from 'piscina';
import { renderQueueFull, renderTooLong } from '../errors';

export interface BoundedPoolOptions {
  /** The worker's file, TypeScript or built. */
  workerFile: string;
  threads: number;
  /** Tasks that may wait for a thread. */
  queueLength: number;
  timeLimitMs: number;
  /** Whether threads are started at once and kept; otherwise with the first task, and let go when idle. */
  keepWarm?: boolean;
}

export interface BoundedPool<Task, Result> {
  /**
   * Runs a task in a worker thread. Throws `renderQueueFull`, `renderTooLong`, and `signal.reason` once the signal is
   * aborted, which frees the thread.
   */
  run(task: Task, signal?: AbortSignal): Promise<Result>;
  /** Tasks running and waiting. */
  load(): { running: number; waiting: number };
  close(): Promise<void>;
}

const idleMs = 30_000;

/** How a worker's file is run: TypeScript through tsx, a built one as it is. */
export function workerArguments(workerFile: string): string[] {
  return workerFile.endsWith('.ts') ? ['--import', 'tsx'] : [];
}

/** Worker threads with a queue of bounded length and a time limit for each task. */
export function createBoundedPool<Task, Result>(options: BoundedPoolOptions): BoundedPool<Task, Result> {
  const { workerFile, threads, queueLength, timeLimitMs, keepWarm = false } = options;
  const pool = new Piscina<Task, Result>({
    filename: workerFile,
    execArgv: workerArguments(workerFile),
    minThreads: keepWarm ? threads : 0,
    maxThreads: threads,
    idleTimeout: idleMs,
    concurrentTasksPerWorker: 1,
  });

  // Piscina's own limit does not hold for tasks with an abort signal, so the queue is bounded here.
  let unfinished = 0;

  return {
    async run(task, signal) {
      if (unfinished >= threads + queueLength) throw renderQueueFull();
      const limit = AbortSignal.timeout(timeLimitMs);
      unfinished++;
      try {
        return await pool.run(task, { signal: signal ? AbortSignal.any([signal, limit]) : limit });
      } catch (error) {
        if (signal?.aborted) throw signal.reason;
        if (limit.aborted) throw renderTooLong(timeLimitMs);
        throw error;
      } finally {
        unfinished--;
      }
    },
    load: () => ({
      running: Math.min(unfinished, threads),
      waiting: Math.max(0, unfinished - threads),
    }),
    close: () => pool.destroy(),
  };
}
