import { recorderReportRequestSchema } from '../../../shared/api/recorder-report';
import { bodyOf } from '../../middleware/validate';
import type { ReportPool } from '../../services/recorder/report-pool';
import type { RouteHandlers } from '../register-routes';

/** The conformance report of recorder settings. */
export function recorderRoutes(dependencies: {
  reportPool: ReportPool;
  productVersion: string;
  now: () => Date;
}): RouteHandlers<'POST /api/recorder-report'> {
  const { reportPool, productVersion, now } = dependencies;
  return {
    'POST /api/recorder-report': async (request, response) => {
      const { settings } = bodyOf(recorderReportRequestSchema, request);
      const madeOn = now().toISOString().slice(0, 10);
      const bytes = await reportPool.report({ settings, madeOn, productVersion });
      response
        .type('application/pdf')
        .set('Content-Disposition', `attachment; filename="recorder-conformance-${madeOn}.pdf"`)
        .send(Buffer.from(bytes));
    },
  };
}
