import { randomUUID } from 'node:crypto';
import { join } from 'node:path';
import type { Transaction } from 'sequelize';
import {
  exportSpaceBytes,
  longestExportS,
  mostUnfinishedExports,
  type CreateExport,
} from '../../../shared/api/exports';
import { parseStripParameters } from '../../../shared/parameters/parse';
import type { StripParameters } from '../../../shared/parameters/strip-parameters';
import { foldText } from '../../../shared/parameters/text';
import { exportCannotRestart, exportSpaceFull, invalidInput, notFound, tooManyExports } from '../../errors';
import { checkExport } from '../../exports/check-export';
import type { Database } from '../../models/database';
import type { ExportJobRow } from '../../models/models';
import type { Account } from '../session/account';
import { getStrip } from '../strips/keep-strips';
import { readKeptParameters } from '../strips/kept-parameters';
import type { ExportFiles } from './export-files';
import { endJob, usedBytes } from './export-queue';
import type { ExportRunner } from './export-runner';

export interface ExportDependencies {
  database: Database;
  files: ExportFiles;
  runner: ExportRunner;
  now: () => Date;
}

const unfinishedStates = ['waiting', 'running'] as const;

/** An export of the account's; `notFound` for anybody else's, as for one that is not there. */
async function own(
  { exportJobs }: Database,
  account: Account,
  id: string,
  transaction?: Transaction,
): Promise<ExportJobRow> {
  const job = await exportJobs.findOne({ where: { id, ownerId: account.userId }, transaction });
  if (!job) throw notFound('export');
  return job;
}

/** The parameters to export: complete, in the length asked for, and checked against every limit. */
async function wantedParameters(
  database: Database,
  account: Account,
  { stripId, parameters, durationS, formats }: CreateExport,
): Promise<StripParameters> {
  const given = parameters ?? readKeptParameters(await getStrip(database, account, stripId ?? ''));
  const wanted = durationS === undefined ? given : parseStripParameters({ ...given, durationS });
  const { sampleRateHz } = wanted.recorder;
  const longestS = longestExportS(sampleRateHz);
  if (wanted.durationS > longestS) {
    const allowed = `at most ${longestS} s at ${sampleRateHz} samples/s`;
    throw invalidInput([{ path: 'durationS', value: String(wanted.durationS), allowed }]);
  }
  checkExport(wanted, formats);
  return wanted;
}

/** Refuses more than a person may have waiting, running or kept. */
async function checkRoom(database: Database, ownerId: string, transaction: Transaction): Promise<void> {
  const where = { ownerId, state: [...unfinishedStates] };
  if ((await database.exportJobs.count({ where, transaction })) >= mostUnfinishedExports) {
    throw tooManyExports(mostUnfinishedExports);
  }
  if ((await usedBytes(database, ownerId, transaction)) >= exportSpaceBytes) {
    throw exportSpaceFull(exportSpaceBytes);
  }
}

/** Puts an export into the queue. Throws `notFound`, `invalidInput`, `tooManyExports`, `exportSpaceFull`. */
export async function createExport(
  { database, runner, now }: ExportDependencies,
  account: Account,
  request: CreateExport,
): Promise<ExportJobRow> {
  const parameters = await wantedParameters(database, account, request);
  const job = await database.write(async (transaction) => {
    await checkRoom(database, account.userId, transaction);
    const created = await database.exportJobs.create(
      {
        id: randomUUID(),
        ownerId: account.userId,
        stripId: request.stripId ?? null,
        title: parameters.title,
        parameters: JSON.stringify(parameters),
        formats: JSON.stringify(request.formats),
        durationS: parameters.durationS,
        bundle: request.bundle ? 1 : 0,
        state: 'waiting',
        createdAt: now().toISOString(),
      },
      { transaction },
    );
    return created.reload({ transaction });
  });
  runner.wake();
  return job;
}

/** The account's exports, the newest first, and the bytes they take. */
export async function listExports(
  database: Database,
  { userId: ownerId }: Account,
): Promise<{ jobs: ExportJobRow[]; usedBytes: number }> {
  const order: [string, string][] = [
    ['createdAt', 'DESC'],
    ['id', 'DESC'],
  ];
  const jobs = await database.exportJobs.findAll({ where: { ownerId }, order });
  return { jobs, usedBytes: await usedBytes(database, ownerId) };
}

export function getExport(database: Database, account: Account, id: string): Promise<ExportJobRow> {
  return own(database, account, id);
}

/** Stops an export that waits or runs; one that has ended stays as it is. */
export async function cancelExport(
  { database, runner, now }: ExportDependencies,
  account: Account,
  id: string,
): Promise<ExportJobRow> {
  await own(database, account, id);
  if (await endJob(database, id, now(), { state: 'cancelled' })) runner.stop(id);
  return own(database, account, id);
}

/** Puts an export that failed or was cancelled into the queue again, as it was asked for. */
export async function restartExport(
  { database, runner, now }: ExportDependencies,
  account: Account,
  id: string,
): Promise<ExportJobRow> {
  const job = await database.write(async (transaction) => {
    const found = await own(database, account, id, transaction);
    if (found.state !== 'failed' && found.state !== 'cancelled') throw exportCannotRestart();
    await checkRoom(database, account.userId, transaction);
    const fresh = { attempts: 0, failure: null, finishedAt: null, removedAt: null };
    return found.update({ state: 'waiting', createdAt: now().toISOString(), ...fresh }, { transaction });
  });
  runner.wake();
  return job;
}

/** Deletes an export and its file; one that runs is stopped. */
export async function deleteExport(
  { database, files, runner }: ExportDependencies,
  account: Account,
  id: string,
): Promise<void> {
  await database.write(async (transaction) => {
    await (await own(database, account, id, transaction)).destroy({ transaction });
  });
  runner.stop(id);
  await files.remove(id);
}

const longestName = 60;

/** Name of an export's file: the title in plain letters, and its ending. */
export function exportFileName({ title, ending }: Pick<ExportJobRow, 'title' | 'ending'>): string {
  const plain = foldText(title)
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, longestName)
    .replace(/^-+|-+$/g, '');
  return `${plain || 'strip'}.${ending ?? 'zip'}`;
}

/** Where the file of an export lies, and how it is called. Throws `notFound` when it is not done. */
export async function exportFileOf(
  { database, files }: ExportDependencies,
  account: Account,
  id: string,
): Promise<{ path: string; name: string; mediaType: string }> {
  const job = await own(database, account, id);
  if (job.state !== 'done') throw notFound('export file');
  return {
    path: join(files.directory, job.id),
    name: exportFileName(job),
    mediaType: job.mediaType ?? 'application/octet-stream',
  };
}
