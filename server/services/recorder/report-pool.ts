import { Piscina } from 'piscina';
import { renderQueueFull, renderTooLong } from '../../errors';
import type { ReportTask } from '../../workers/report-worker';

export interface ReportPool {
  /** Measures and writes a report in a worker thread. Throws `renderQueueFull`, `renderTooLong`. */
  report(task: ReportTask): Promise<Uint8Array>;
  close(): Promise<void>;
}

/** Reports that may wait, and how long one may take: four settings take about two seconds. */
const queueLength = 8;
const timeLimitMs = 30_000;
const idleMs = 30_000;

/** One thread, started with the first report and let go when idle. */
export function createReportPool(workerFile: string): ReportPool {
  const pool = new Piscina<ReportTask, Uint8Array>({
    filename: workerFile,
    execArgv: workerFile.endsWith('.ts') ? ['--import', 'tsx'] : [],
    minThreads: 0,
    maxThreads: 1,
    idleTimeout: idleMs,
  });
  let unfinished = 0;
  return {
    async report(task) {
      if (unfinished > queueLength) throw renderQueueFull();
      const limit = AbortSignal.timeout(timeLimitMs);
      unfinished++;
      try {
        return await pool.run(task, { signal: limit });
      } catch (error) {
        if (limit.aborted) throw renderTooLong(timeLimitMs);
        throw error;
      } finally {
        unfinished--;
      }
    },
    close: () => pool.destroy(),
  };
}
