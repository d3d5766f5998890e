import type { HealthResponse } from '../../../shared/api/health';
import { engineVersion } from '../../../shared/engine/engine-version';
import type { RouteHandlers } from '../register-routes';

export const healthRoutes: RouteHandlers<'GET /api/health'> = {
  'GET /api/health': (_request, response) => {
    response.json({ status: 'ok', engineVersion } satisfies HealthResponse);
  },
};
