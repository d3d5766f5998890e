import { renderRequestSchema } from '../../../shared/api/render';
import { signedInAccount } from '../../middleware/authenticate';
import { untilClientLeaves } from '../../middleware/client-leaves';
import { bodyOf } from '../../middleware/validate';
import type { Database } from '../../models/database';
import type { RenderPool } from '../../services/rendering/render-pool';
import { renderRequested } from '../../services/rendering/render-strip';
import type { RouteHandlers } from '../register-routes';

export function renderRoutes(dependencies: {
  database: Database;
  renderPool: RenderPool;
}): RouteHandlers<'POST /api/strips/render'> {
  return {
    'POST /api/strips/render': async (request, response) => {
      const account = signedInAccount(request);
      const signal = untilClientLeaves(response);
      try {
        const wanted = bodyOf(renderRequestSchema, request);
        const bytes = await renderRequested(dependencies, account, wanted, signal);
        response.type('application/octet-stream').send(Buffer.from(bytes.buffer));
      } catch (error) {
        if (!signal.aborted) throw error;
      }
    },
  };
}
