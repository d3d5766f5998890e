import { availableParallelism } from 'node:os';
import { Piscina } from 'piscina';
import { longestRenderS } from '../../../shared/api/render';
import { longStrip, renderQueueFull, renderTooLong } from '../../errors';
import type { RenderTask } from '../../workers/render-worker';

export interface RenderPoolOptions {
  /** The worker's file, TypeScript or built. */
  workerFile: string;
  /** Worker threads; one core is left to the server itself. */
  threads?: number;
  /** Renders that may wait for a thread. */
  queueLength?: number;
  timeLimitMs?: number;
  /** Whether threads are started at once and kept; otherwise with the first render, and let go when idle. */
  keepWarm?: boolean;
}

export interface RenderPool {
  /**
   * Renders in a worker thread; the bytes are as shared/formats/strip-binary.ts has them. Throws `longStrip`,
   * `renderQueueFull`, `renderTooLong`, and `signal.reason` once the signal is aborted, which frees the thread.
   */
  render(task: RenderTask, signal: AbortSignal): Promise<Uint8Array<ArrayBuffer>>;
  /** Renders running and waiting. */
  load(): { running: number; waiting: number };
  close(): Promise<void>;
}

const idleMs = 30_000;

export const usualQueueLength = 16;
export const usualThreads = Math.max(1, availableParallelism() - 1);

/** Starts a pool. A TypeScript worker is run through tsx, a built one as it is. */
export function createRenderPool(options: RenderPoolOptions): RenderPool {
  const {
    workerFile,
    threads = usualThreads,
    queueLength = usualQueueLength,
    timeLimitMs = 20_000,
    keepWarm = true,
  } = options;
  const pool = new Piscina<RenderTask, ArrayBuffer>({
    filename: workerFile,
    execArgv: workerFile.endsWith('.ts') ? ['--import', 'tsx'] : [],
    minThreads: keepWarm ? threads : 0,
    maxThreads: threads,
    idleTimeout: idleMs,
    concurrentTasksPerWorker: 1,
  });

  // Piscina's own limit does not hold for tasks with an abort signal, so the queue is bounded here.
  let unfinished = 0;

  return {
    async render(task, signal) {
      if (task.parameters.durationS > longestRenderS) {
        throw longStrip(task.parameters.durationS, longestRenderS);
      }
      if (unfinished >= threads + queueLength) throw renderQueueFull();
      const limit = AbortSignal.timeout(timeLimitMs);
      unfinished++;
      try {
        return new Uint8Array(await pool.run(task, { signal: AbortSignal.any([signal, limit]) }));
      } catch (error) {
        if (signal.aborted) throw signal.reason;
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
