import type { DemoResponse } from '../../../shared/api/demo';
import type { Database } from '../../models/database';
import { demoAccounts } from '../../services/demo/demo-accounts';
import type { RouteHandlers } from '../register-routes';

export function demoRoutes(database: Database): RouteHandlers<'GET /api/demo'> {
  return {
    'GET /api/demo': async (_request, response) => {
      response.json((await demoAccounts(database)) satisfies DemoResponse);
    },
  };
}
