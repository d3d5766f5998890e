import type { Database } from '../../models/database';
import type { ExportJobRow } from '../../models/models';
import type { ExportFiles } from './export-files';
import type { ExportPool } from './export-pool';
import { doneColumns, endJob, takeNextJob, taskOf, type LaneRange } from './export-queue';

export interface LaneDependencies {
  database: Database;
  files: ExportFiles;
  pool: ExportPool;
  now: () => Date;
  logError(error: unknown): void;
}

/** Works off the exports of a range of lengths, one at a time, in the order in which they were asked for. */
export interface ExportLane {
  /** Says that there may be something to do. */
  wake(): void;
  /** Ends the work on a job, if it is the one that runs here. */
  stop(id: string): void;
  /** Share of a job that is done, 0 to 1; 0 when it does not run here. */
  progressOf(id: string): number;
  /** Ends the work; what ran waits until the next start. */
  close(): Promise<void>;
}

const noSpace = 'Your exports would take more than 1 GB with it. Delete some, then try again.';
const diskFull = 'The disk of the server is full. Tell the administrator, then try again.';
const ours = 'Something went wrong on our side. Try again; if it stays, tell the administrator.';
const outOfMemory = 'It took more memory than an export may. A shorter strip or fewer formats may pass.';

function failureWords(error: unknown): string {
  const code = error instanceof Error && 'code' in error ? error.code : null;
  if (code === 'ENOSPC') return diskFull;
  return code === 'ERR_WORKER_OUT_OF_MEMORY' ? outOfMemory : ours;
}

export function createExportLane(dependencies: LaneDependencies, range: LaneRange): ExportLane {
  const { database, files, pool, now, logError } = dependencies;
  let running: { id: string; progress: number; abort: AbortController } | null = null;
  let draining: Promise<void> | null = null;
  let awake = false;
  let closed = false;

  const finish = async (id: string, end: Parameters<typeof endJob>[3]): Promise<void> => {
    const stays = await endJob(database, id, now(), end);
    if (!stays || end.state !== 'done') await files.remove(id);
  };
  const run = async (job: ExportJobRow): Promise<void> => {
    const { id } = job;
    const current = { id, progress: 0, abort: new AbortController() };
    running = current;
    try {
      const task = await taskOf(database, job, files.unfinished(id));
      const outcome = await pool.make(task, current.abort.signal, (share) => {
        current.progress = Math.max(current.progress, share);
      });
      if (outcome.kind === 'tooLarge') return await finish(id, { state: 'failed', failure: noSpace });
      await files.complete(id);
      await finish(id, doneColumns(outcome));
    } catch (error) {
      if (current.abort.signal.aborted) return await files.remove(id);
      const failure = failureWords(error);
      if (failure === ours) logError(error);
      await finish(id, { state: 'failed', failure });
    } finally {
      running = null;
    }
  };
  const drain = async (): Promise<void> => {
    while (awake && !closed) {
      awake = false;
      for (let job = await takeNextJob(database, range); job; job = await takeNextJob(database, range)) {
        if (closed) return putBack(database, job.id);
        await run(job);
        if (closed) return putBack(database, job.id);
      }
    }
  };
  const lane: ExportLane = {
    wake() {
      awake = true;
      draining ??= drain()
        .catch(logError)
        .finally(() => {
          draining = null;
          if (awake && !closed) lane.wake();
        });
    },
    stop(id) {
      if (running?.id === id) running.abort.abort(new Error('the export was stopped'));
    },
    progressOf: (id) => (running?.id === id ? running.progress : 0),
    async close() {
      closed = true;
      running?.abort.abort(new Error('the server stops'));
      await draining;
    },
  };
  return lane;
}

/** A job that did not end because the server stopped waits again; a stop in good order does not count as an attempt. */
async function putBack({ exportJobs }: Database, id: string): Promise<void> {
  await exportJobs.update({ state: 'waiting', attempts: 0 }, { where: { id, state: 'running' } });
}
