import type { Request, Response } from 'express';
import { stripListQuerySchema, type StripListResponse } from '../../../shared/api/strip-list';
import {
  createStripSchema,
  duplicateStripSchema,
  updateStripSchema,
  type Strip,
  type StripResponse,
} from '../../../shared/api/strips';
import { staleStrip } from '../../errors';
import { signedInAccount } from '../../middleware/authenticate';
import { bodyOf, optionalBodyOf, queryOf, stripIdOf } from '../../middleware/validate';
import type { StripRecord } from '../../models/strip-records';
import type { Account } from '../../services/session/account';
import { duplicateStrip } from '../../services/strips/duplicate-strip';
import {
  createStrip,
  deleteStrip,
  getStrip,
  restoreStrip,
  updateStrip,
  type StripDependencies,
} from '../../services/strips/keep-strips';
import { listStrips } from '../../services/strips/list-strips';
import type { RouteHandlers } from '../register-routes';
import { presentStrip } from './presenter';

type Keys =
  | 'GET /api/strips'
  | 'POST /api/strips'
  | 'GET /api/strips/:stripId'
  | 'PUT /api/strips/:stripId'
  | 'DELETE /api/strips/:stripId'
  | 'POST /api/strips/:stripId/duplicate'
  | 'POST /api/strips/:stripId/restore';

function answer(response: Response, account: Account, strip: StripRecord, status = 200): void {
  response.status(status).json({ strip: presentStrip(strip, account) } satisfies StripResponse);
}

/** Presents a page; a strip that cannot be read is logged and left out, so that one does not hide the others. */
function presentPage(request: Request, account: Account, strips: readonly StripRecord[]): Strip[] {
  return strips.flatMap((strip) => {
    try {
      return [presentStrip(strip, account)];
    } catch (error) {
      request.log.error({ err: error as Error }, 'a strip is missing from a list');
      return [];
    }
  });
}

export function stripRoutes(dependencies: StripDependencies): RouteHandlers<Keys> {
  const { database } = dependencies;
  return {
    'GET /api/strips': async (request, response) => {
      const account = signedInAccount(request);
      const query = queryOf(stripListQuerySchema, request);
      const { strips, total, facets } = await listStrips(database, account, query);
      const { page, pageSize } = query;
      const presented = presentPage(request, account, strips);
      response.json({ strips: presented, total, page, pageSize, facets } satisfies StripListResponse);
    },
    'POST /api/strips': async (request, response) => {
      const account = signedInAccount(request);
      const strip = await createStrip(dependencies, account, bodyOf(createStripSchema, request));
      response.location(`/api/strips/${strip.id}`);
      answer(response, account, strip, 201);
    },
    'GET /api/strips/:stripId': async (request, response) => {
      const account = signedInAccount(request);
      answer(response, account, await getStrip(database, account, stripIdOf(request)));
    },
    'PUT /api/strips/:stripId': async (request, response) => {
      const account = signedInAccount(request);
      const id = stripIdOf(request);
      const outcome = await updateStrip(dependencies, account, id, bodyOf(updateStripSchema, request));
      if (outcome.stale) throw staleStrip(presentStrip(outcome.current, account));
      answer(response, account, outcome.strip);
    },
    'DELETE /api/strips/:stripId': async (request, response) => {
      await deleteStrip(dependencies, signedInAccount(request), stripIdOf(request));
      response.status(204).end();
    },
    'POST /api/strips/:stripId/duplicate': async (request, response) => {
      const account = signedInAccount(request);
      const { title } = optionalBodyOf(duplicateStripSchema, request);
      const strip = await duplicateStrip(dependencies, account, stripIdOf(request), title);
      response.location(`/api/strips/${strip.id}`);
      answer(response, account, strip, 201);
    },
    'POST /api/strips/:stripId/restore': async (request, response) => {
      const account = signedInAccount(request);
      answer(response, account, await restoreStrip(dependencies, account, stripIdOf(request)));
    },
  };
}
