import { sheetsRequestSchema } from '../../../shared/api/sheets';
import { signedInAccount } from '../../middleware/authenticate';
import { untilClientLeaves } from '../../middleware/client-leaves';
import { bodyOf } from '../../middleware/validate';
import { makeSheets, type SheetDependencies } from '../../services/sheets/make-sheets';
import type { RouteHandlers } from '../register-routes';

/** Printed pages of strips, as PDF, SVG or PNG. */
export function sheetRoutes(dependencies: SheetDependencies): RouteHandlers<'POST /api/sheets'> {
  return {
    'POST /api/sheets': async (request, response) => {
      const account = signedInAccount(request);
      const signal = untilClientLeaves(response);
      try {
        const wanted = bodyOf(sheetsRequestSchema, request);
        const { fileName, mediaType, bytes } = await makeSheets(dependencies, account, wanted, signal);
        response
          .type(mediaType)
          .set('Content-Disposition', `attachment; filename="${fileName}"`)
          .send(Buffer.from(bytes.buffer));
      } catch (error) {
        if (!signal.aborted) throw error;
      }
    },
  };
}
