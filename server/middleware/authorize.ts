import type { RequestHandler } from 'express';
import type { Role } from '../../shared/api/roles';
import { notAllowed, signInRequired } from '../errors';
import { accountOf } from './authenticate';

/** Who may send a request: anyone, whoever is signed in, or these roles. */
export type Access = 'everyone' | 'signedIn' | readonly Role[];

const makesStrips = ['educator', 'technician', 'administrator'] as const;

/**
 * The one table of what each role may ask for. A route exists only with a line here (`registerRoutes` takes its
 * handlers by these keys), so none can be reached unguarded.
 */
export const routeAccess = {
  'GET /api/health': 'everyone',
  'GET /api/demo': 'everyone',
  'POST /api/session': 'everyone',
  'GET /api/session': 'signedIn',
  'DELETE /api/session': 'everyone',
  'POST /api/recorder-report': 'signedIn',
  'GET /api/exports': makesStrips,
  'POST /api/exports': makesStrips,
  'GET /api/exports/:exportId': makesStrips,
  'DELETE /api/exports/:exportId': makesStrips,
  'GET /api/exports/:exportId/file': makesStrips,
  'POST /api/exports/:exportId/cancel': makesStrips,
  'POST /api/exports/:exportId/restart': makesStrips,
  'POST /api/sheets': makesStrips,
  'GET /api/strips': makesStrips,
  'POST /api/strips': makesStrips,
  'POST /api/strips/render': makesStrips,
  'POST /api/strips/export': makesStrips,
  'POST /api/strips/import': makesStrips,
  'GET /api/strips/:stripId': makesStrips,
  'PUT /api/strips/:stripId': makesStrips,
  'DELETE /api/strips/:stripId': makesStrips,
  'POST /api/strips/:stripId/duplicate': makesStrips,
  'POST /api/strips/:stripId/restore': makesStrips,
} as const satisfies Record<string, Access>;

export type RouteKey = keyof typeof routeAccess;

/** Lets a request through if its session's role is in the table. */
export function authorize(route: RouteKey): RequestHandler {
  const access: Access = routeAccess[route];
  return (request, _response, next) => {
    if (access === 'everyone') return next();
    const account = accountOf(request);
    if (!account) throw signInRequired();
    if (access !== 'signedIn' && !access.includes(account.role)) throw notAllowed();
    next();
  };
}
