import type { SheetFile, SheetTask } from '../../workers/sheet-worker';
import { createBoundedPool } from '../bounded-pool';

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

/** One thread, started with the first document and let go when idle. */
export function createSheetPool({
  workerFile,
  queueLength = 8,
  timeLimitMs = 60_000,
}: SheetPoolOptions): SheetPool {
  const pool = createBoundedPool<SheetTask, SheetFile>({ workerFile, threads: 1, queueLength, timeLimitMs });
  return { make: (task, signal) => pool.run(task, signal), close: () => pool.close() };
}
