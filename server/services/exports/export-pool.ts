import { MessageChannel } from 'node:worker_threads';
import { Piscina } from 'piscina';
import { workerArguments } from '../bounded-pool';
import type { ExportOutcome, ExportTask } from '../../workers/export-worker';

export interface ExportPool {
  /**
   * Writes an export in a worker thread. Throws `signal.reason` once the signal is aborted, which ends the thread at
   * once, whatever it is doing.
   */
  make(
    task: Omit<ExportTask, 'progress'>,
    signal: AbortSignal,
    onProgress: (share: number) => void,
  ): Promise<ExportOutcome>;
  close(): Promise<void>;
}

const idleMs = 30_000;
/** Heap of a thread; an hour of 84 beats/min in every format was measured at 320 MB. Samples lie outside of it. */
const usualHeapMb = 2048;

/** Threads started as they are needed and let go when idle: one for each lane of the queue. */
export function createExportPool(workerFile: string, threads: number, mostHeapMb = usualHeapMb): ExportPool {
  const pool = new Piscina<ExportTask, ExportOutcome>({
    filename: workerFile,
    execArgv: workerArguments(workerFile),
    minThreads: 0,
    maxThreads: threads,
    idleTimeout: idleMs,
    resourceLimits: { maxOldGenerationSizeMb: mostHeapMb },
  });
  return {
    async make(task, signal, onProgress) {
      const { port1, port2 } = new MessageChannel();
      port1.on('message', (share: number) => onProgress(share));
      try {
        return await pool.run({ ...task, progress: port2 }, { signal, transferList: [port2] });
      } catch (error) {
        if (signal.aborted) throw signal.reason;
        throw error;
      } finally {
        port1.close();
      }
    },
    close: () => pool.destroy(),
  };
}
