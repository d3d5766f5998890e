import { longestRenderS } from '../../../shared/api/render';
import { createExportLane, type LaneDependencies } from './export-lane';
import { requeueInterrupted, takeOutdated, type LaneRange } from './export-queue';

export interface ExportRunner {
  /** Takes up what a stopped server left, tidies the folder and begins. */
  start(): Promise<void>;
  /** Says that there may be something to do. */
  wake(): void;
  /** Ends the work on a job, if it runs. */
  stop(id: string): void;
  /** Share of a running job that is done, 0 to 1. */
  progressOf(id: string): number;
  /** Removes jobs and files whose time is over. */
  removeOutdated(): Promise<void>;
  /** Ends the work; what ran waits until the next start. */
  close(): Promise<void>;
}

const hourMs = 3_600_000;

/** Somebody waits for a short export; it must not stand behind an hour's recording. */
const laneRanges: readonly LaneRange[] = [
  { fromS: 0, toS: longestRenderS },
  { fromS: longestRenderS, toS: Number.MAX_SAFE_INTEGER },
];

/** Exports made at a time. */
export const exportLanes = laneRanges.length;

/** Works exports off: short ones in one lane, long ones in another. */
export function createExportRunner(dependencies: LaneDependencies): ExportRunner {
  const { database, files, pool, now, logError } = dependencies;
  const lanes = laneRanges.map((range) => createExportLane(dependencies, range));
  let timer: NodeJS.Timeout | undefined;
  const wake = (): void => lanes.forEach((lane) => lane.wake());
  const removeOutdated = async (): Promise<void> => {
    for (const id of await takeOutdated(database, now())) await files.remove(id);
  };
  return {
    async start() {
      await requeueInterrupted(database, now());
      await removeOutdated();
      const done = await database.exportJobs.findAll({ where: { state: 'done' }, attributes: ['id'] });
      await files.tidy(new Set(done.map(({ id }) => id)));
      timer = setInterval(() => void removeOutdated().catch(logError), hourMs).unref();
      wake();
    },
    wake,
    stop: (id) => lanes.forEach((lane) => lane.stop(id)),
    progressOf: (id) => Math.max(...lanes.map((lane) => lane.progressOf(id))),
    removeOutdated,
    async close() {
      clearInterval(timer);
      await Promise.all(lanes.map((lane) => lane.close()));
      await pool.close();
    },
  };
}
