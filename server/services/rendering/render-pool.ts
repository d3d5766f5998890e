import { availableParallelism } from 'node:os';
import { longestRenderS } from '../../../shared/api/render';
import { longStrip } from '../../errors';
import type { RenderTask } from '../../workers/render-worker';
import { createBoundedPool } from '../bounded-pool';

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
  const pool = createBoundedPool<RenderTask, ArrayBuffer>({
    workerFile,
    threads,
    queueLength,
    timeLimitMs,
    keepWarm,
  });
  return {
    async render(task, signal) {
      const { durationS } = task.parameters;
      if (durationS > longestRenderS) throw longStrip(durationS, longestRenderS);
      return new Uint8Array(await pool.run(task, signal));
    },
    load: () => pool.load(),
    close: () => pool.close(),
  };
}
