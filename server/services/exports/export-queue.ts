import { Op, type Transaction } from 'sequelize';
import { exportKeptDays, exportSpaceBytes } from '../../../shared/api/exports';
import type { ExportFormat } from '../../../shared/formats/export-format';
import { parseStripParameters } from '../../../shared/parameters/parse';
import type { Database } from '../../models/database';
import type { ExportJobRow } from '../../models/models';
import type { ExportOutcome, ExportTask } from '../../workers/export-worker';

/** Starts of one job; after as many the server no longer believes that it will end well. */
const mostAttempts = 3;
const msPerDay = 86_400_000;

/** When a job that ends now is removed. */
export function removalTime(now: Date): string {
  return new Date(now.getTime() + exportKeptDays * msPerDay).toISOString();
}

/** Bytes that a person's exports take. */
export async function usedBytes(
  { exportJobs }: Database,
  ownerId: string,
  transaction?: Transaction,
): Promise<number> {
  return (await exportJobs.sum('bytes', { where: { ownerId }, transaction })) || 0;
}

/** Ends jobs; one that was cancelled or deleted meanwhile stays so. */
export async function endJob(
  database: Database,
  id: string,
  now: Date,
  end: Pick<ExportJobRow, 'state'> &
    Partial<Pick<ExportJobRow, 'failure' | 'bytes' | 'ending' | 'mediaType' | 'warnings'>>,
): Promise<boolean> {
  const columns = { ...end, finishedAt: now.toISOString(), removedAt: removalTime(now) };
  const [count] = await database.write((transaction) =>
    database.exportJobs.update(columns, {
      where: { id, state: { [Op.in]: ['waiting', 'running'] } },
      transaction,
    }),
  );
  return count === 1;
}

/** What a stopped server left running waits again; what it was started with too often has failed. */
export async function requeueInterrupted(database: Database, now: Date): Promise<void> {
  const running = await database.exportJobs.findAll({ where: { state: 'running' } });
  for (const { id, attempts } of running) {
    if (attempts >= mostAttempts) {
      const failure = `It was started ${attempts} times, and each time the server ended before it did. A shorter strip or fewer formats may pass.`;
      await endJob(database, id, now, { state: 'failed', failure });
    } else {
      await database.write((transaction) =>
        database.exportJobs.update({ state: 'waiting' }, { where: { id }, transaction }),
      );
    }
  }
}

/** Which exports a lane takes: longer than `fromS`, up to `toS`. */
export interface LaneRange {
  fromS: number;
  toS: number;
}

/** Takes the job of a lane that waits longest and marks it as running; null when none waits. */
export async function takeNextJob(
  database: Database,
  { fromS, toS }: LaneRange,
): Promise<ExportJobRow | null> {
  return database.write(async (transaction) => {
    const job = await database.exportJobs.findOne({
      where: { state: 'waiting', durationS: { [Op.gt]: fromS, [Op.lte]: toS } },
      order: ['createdAt', 'id'],
      transaction,
    });
    if (!job) return null;
    return job.update({ state: 'running', attempts: job.attempts + 1 }, { transaction });
  });
}

/** Jobs whose time is over, removed from the table; returns their ids. */
export async function takeOutdated(database: Database, now: Date): Promise<string[]> {
  const where = { removedAt: { [Op.lte]: now.toISOString() } };
  return database.write(async (transaction) => {
    const jobs = await database.exportJobs.findAll({ where, transaction });
    await database.exportJobs.destroy({ where: { id: jobs.map(({ id }) => id) }, transaction });
    return jobs.map(({ id }) => id);
  });
}

/** What the worker is told of a job; its file may take what the person has left. */
export async function taskOf(
  database: Database,
  job: ExportJobRow,
  path: string,
): Promise<Omit<ExportTask, 'progress'>> {
  return {
    parameters: parseStripParameters(JSON.parse(job.parameters)),
    formats: JSON.parse(job.formats) as ExportFormat[],
    bundle: job.bundle === 1,
    path,
    mostBytes: exportSpaceBytes - (await usedBytes(database, job.ownerId)),
  };
}

type Made = Extract<ExportOutcome, { kind: 'made' }>;

/** Columns of a job that is done. */
export function doneColumns({ bytes, ending, mediaType, warnings }: Made) {
  return { state: 'done', bytes, ending, mediaType, warnings: JSON.stringify(warnings) } as const;
}
