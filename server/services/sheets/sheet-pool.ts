import { Piscina } from 'piscina';
import { renderQueueFull, renderTooLong } from '../../errors';
import type { SheetFile, SheetTask } from '../../workers/sheet-worker';

export interface SheetPoolOptions {
  /** The worker's file, TypeScript or built. */
  workerFile: string;
  /** Documents that may wait for the thread. */
  queueLength?: number;
  timeLimitMs?: number;
}

export interface SheetPool {
  /**
   * Makes a file of sheets in a worker thread. Throws `renderQueueFull`, `renderTooLong`, and `signal.reason` once the
   * signal is aborted, which frees the thread.
   */
  make(task: SheetTask, signal: AbortSignal): Promise<SheetFile>;
  close(): Promise<void>;
}

const idleMs = 30_000;

/** One thread, started with the first document and let go when idle. */
export function createSheetPool({
  workerFile,
  queueLength = 8,
  timeLimitMs = 60_000,
}: SheetPoolOptions): SheetPool {
  const pool = new Piscina<SheetTask, SheetFile>({
    filename: workerFile,
    execArgv: workerFile.endsWith('.ts') ? ['--import', 'tsx'] : [],
    minThreads: 0,
    maxThreads: 1,
    idleTimeout: idleMs,
  });
  let unfinished = 0;
  return {
    async make(task, signal) {
      if (unfinished > queueLength) throw renderQueueFull();
      const limit = AbortSignal.timeout(timeLimitMs);
      unfinished++;
      try {
        return await pool.run(task, { signal: AbortSignal.any([signal, limit]) });
      } catch (error) {
        if (signal.aborted) throw signal.reason;
        if (limit.aborted) throw renderTooLong(timeLimitMs);
        throw error;
      } finally {
        unfinished--;
      }
    },
    close: () => pool.destroy(),
  };
}
