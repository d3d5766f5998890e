import type { Database } from '../../models/database';
import type { ExportJobRow } from '../../models/models';
import type { ExportFiles } from './export-files';
import type { ExportPool } from './export-pool';
import { doneColumns, endJob, requeueInterrupted, takeNextJob, takeOutdated, taskOf } from './export-queue';

export interface ExportRunner {
  /** Takes up what a stopped server left, tidies the folder and begins. */
  start(): Promise<void>;
  /** Says that there may be something to do. */
  wake(): void;
  /** Ends the work on a job, if it is the one that runs. */
  stop(id: string): void;
  /** Share of a running job that is done, 0 to 1. */
  progressOf(id: string): number;
  /** Removes jobs and files whose time is over. */
  removeOutdated(): Promise<void>;
  /** Ends the work; what ran waits until the next start. */
  close(): Promise<void>;
}

interface RunnerDependencies {
  database: Database;
  files: ExportFiles;
  pool: ExportPool;
  now: () => Date;
  logError(error: unknown): void;
}

const hourMs = 3_600_000;

const noSpace = 'Your exports would take more than 1 GB with it. Delete some, then try again.';
const diskFull = 'The disk of the server is full. Tell the administrator, then try again.';
const ours = 'Something went wrong on our side. Try again; if it stays, tell the administrator.';
const outOfMemory = 'It took more memory than an export may. A shorter strip or fewer formats may pass.';

function failureWords(error: unknown): string {
  const code = error instanceof Error && 'code' in error ? error.code : null;
  if (code === 'ENOSPC') return diskFull;
  return code === 'ERR_WORKER_OUT_OF_MEMORY' ? outOfMemory : ours;
}

/** Works exports off, one at a time, in the order in which they were asked for. */
export function createExportRunner(dependencies: RunnerDependencies): ExportRunner {
  const { database, files, pool, now, logError } = dependencies;
  let running: { id: string; progress: number; abort: AbortController } | null = null;
  let draining: Promise<void> | null = null;
  let awake = false;
  let closed = false;
  let timer: NodeJS.Timeout | undefined;

  const finish = async (id: string, end: Parameters<typeof endJob>[3]): Promise<void> => {
    const stays = await endJob(database, id, now(), end);
    if (!stays || end.state !== 'done') await files.remove(id);
  };
  const run = async (job: ExportJobRow): Promise<void> => {
    if (closed) return;
    const { id } = job;
    const current = { id, progress: 0, abort: new AbortController() };
    running = current;
    try {
      const task = await taskOf(database, job, files.unfinished(id));
      const outcome = await pool.make(task, current.abort.signal, (share) => (current.progress = share));
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
      for (let job = await takeNextJob(database); job; job = closed ? null : await takeNextJob(database)) {
        await run(job);
      }
    }
  };
  const removeOutdated = async (): Promise<void> => {
    for (const id of await takeOutdated(database, now())) await files.remove(id);
  };

  const runner: ExportRunner = {
    async start() {
      await requeueInterrupted(database, now());
      await removeOutdated();
      const done = await database.exportJobs.findAll({ where: { state: 'done' }, attributes: ['id'] });
      await files.tidy(new Set(done.map(({ id }) => id)));
      timer = setInterval(() => void removeOutdated().catch(logError), hourMs).unref();
      runner.wake();
    },
    wake() {
      awake = true;
      draining ??= drain()
        .catch(logError)
        .finally(() => {
          draining = null;
          if (awake && !closed) runner.wake();
        });
    },
    stop(id) {
      if (running?.id === id) running.abort.abort(new Error('the export was stopped'));
    },
    progressOf: (id) => (running?.id === id ? running.progress : 0),
    removeOutdated,
    async close() {
      closed = true;
      clearInterval(timer);
      const stopped = running?.id;
      running?.abort.abort(new Error('the server stops'));
      await draining;
      if (stopped !== undefined) {
        // A stop in good order does not count as an attempt.
        const where = { id: stopped, state: 'running' } as const;
        await database.exportJobs.update({ state: 'waiting', attempts: 0 }, { where });
      }
      await pool.close();
    },
  };
  return runner;
}
