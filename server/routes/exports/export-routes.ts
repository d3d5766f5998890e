import { basename, dirname } from 'node:path';
import type { Request, Response } from 'express';
import {
  createExportSchema,
  exportIdSchema,
  exportSpaceBytes,
  type ExportJob,
  type ExportList,
} from '../../../shared/api/exports';
import { badRange, notFound } from '../../errors';
import { signedInAccount } from '../../middleware/authenticate';
import { bodyOf } from '../../middleware/validate';
import type { ExportJobRow } from '../../models/models';
import {
  cancelExport,
  createExport,
  deleteExport,
  exportFileOf,
  getExport,
  listExports,
  restartExport,
  type ExportDependencies,
} from '../../services/exports/export-jobs';
import type { RouteHandlers } from '../register-routes';
import { presentExport } from './presenter';

type Keys =
  | 'GET /api/exports'
  | 'POST /api/exports'
  | 'GET /api/exports/:exportId'
  | 'DELETE /api/exports/:exportId'
  | 'GET /api/exports/:exportId/file'
  | 'POST /api/exports/:exportId/cancel'
  | 'POST /api/exports/:exportId/restart';

/** The export's id in the address; one that cannot be an id is `notFound`, like one that is none. */
function exportIdOf(request: Request): string {
  const id = exportIdSchema.safeParse(request.params.exportId);
  if (!id.success) throw notFound('export');
  return id.data;
}

/** Sends a file, or a part of it when the request names a range. */
function sendFile(response: Response, { path, name, mediaType }: Awaited<ReturnType<typeof exportFileOf>>) {
  return new Promise<void>((done, fail) => {
    response.attachment(name).type(mediaType);
    // Compressed on the way, ranges would count other bytes.
    const headers = { 'Cache-Control': 'private, no-store, no-transform' };
    const options = { root: dirname(path), headers, cacheControl: false, dotfiles: 'deny' } as const;
    response.sendFile(basename(path), options, (error?: Error & { status?: number; code?: string }) => {
      if (!error || error.code === 'ECONNABORTED' || error.code === 'EPIPE') done();
      else if (error.status === 404) fail(notFound('export file'));
      else fail(error.status === 416 ? badRange() : error);
    });
  });
}

/** Exports as jobs: asked for, followed, fetched, deleted; each person's own. */
export function exportRoutes(dependencies: ExportDependencies): RouteHandlers<Keys> {
  const { database, runner } = dependencies;
  const present = (job: ExportJobRow): ExportJob => presentExport(job, runner.progressOf(job.id));
  const answer = (response: Response, job: ExportJobRow): void => {
    response.json({ export: present(job) });
  };
  return {
    'GET /api/exports': async (request, response) => {
      const { jobs, usedBytes } = await listExports(database, signedInAccount(request));
      const list: ExportList = { exports: jobs.map(present), usedBytes, spaceBytes: exportSpaceBytes };
      response.json(list);
    },
    'POST /api/exports': async (request, response) => {
      const wanted = bodyOf(createExportSchema, request);
      const job = await createExport(dependencies, signedInAccount(request), wanted);
      response.status(201).location(`/api/exports/${job.id}`);
      answer(response, job);
    },
    'GET /api/exports/:exportId': async (request, response) => {
      answer(response, await getExport(database, signedInAccount(request), exportIdOf(request)));
    },
    'DELETE /api/exports/:exportId': async (request, response) => {
      await deleteExport(dependencies, signedInAccount(request), exportIdOf(request));
      response.status(204).end();
    },
    'GET /api/exports/:exportId/file': async (request, response) => {
      const file = await exportFileOf(dependencies, signedInAccount(request), exportIdOf(request));
      await sendFile(response, file);
    },
    'POST /api/exports/:exportId/cancel': async (request, response) => {
      answer(response, await cancelExport(dependencies, signedInAccount(request), exportIdOf(request)));
    },
    'POST /api/exports/:exportId/restart': async (request, response) => {
      answer(response, await restartExport(dependencies, signedInAccount(request), exportIdOf(request)));
    },
  };
}
