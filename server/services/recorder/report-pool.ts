import type { ReportTask } from '../../workers/report-worker';
import { createBoundedPool } from '../bounded-pool';

export interface ReportPool {
  /** Measures and writes a report in a worker thread. Throws `renderQueueFull`, `renderTooLong`. */
  report(task: ReportTask): Promise<Uint8Array>;
  close(): Promise<void>;
}

/** One thread, started with the first report and let go when idle. A report of four settings takes about two seconds. */
export function createReportPool(workerFile: string): ReportPool {
  const pool = createBoundedPool<ReportTask, Uint8Array>({
    workerFile,
    threads: 1,
    queueLength: 8,
    timeLimitMs: 30_000,
  });
  return { report: (task) => pool.run(task), close: () => pool.close() };
}
