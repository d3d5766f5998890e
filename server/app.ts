import compression from 'compression';
import cookieParser from 'cookie-parser';
import express, { type Express } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import { authenticate } from './middleware/authenticate';
import { answerErrors, noSuchRoute } from './middleware/errors';
import { sameOrigin } from './middleware/same-origin';
import { securityHeaders } from './middleware/security-headers';
import { signInLimit, usualSignInLimits, type SignInLimits } from './middleware/sign-in-limit';
import { staticClient } from './middleware/static-client';
import type { Database } from './models/database';
import { demoRoutes } from './routes/demo/demo-routes';
import { exportRoutes } from './routes/exports/export-routes';
import { healthRoutes } from './routes/health/health-routes';
import { registerRoutes } from './routes/register-routes';
import { sessionRoutes } from './routes/session/session-routes';
import { recorderRoutes } from './routes/recorder/recorder-routes';
import { presetRoutes } from './routes/presets/preset-routes';
import { sheetRoutes } from './routes/sheets/sheet-routes';
import { renderRoutes } from './routes/strips/render-routes';
import { stripRoutes } from './routes/strips/strip-routes';
import type { ExportFiles } from './services/exports/export-files';
import type { ExportRunner } from './services/exports/export-runner';
import type { ReportPool } from './services/recorder/report-pool';
import type { RenderPool } from './services/rendering/render-pool';
import { findSession } from './services/session/sessions';
import type { SheetPool } from './services/sheets/sheet-pool';

export interface AppDependencies {
  database: Database;
  /** Signs sessions. */
  sessionSecret: string;
  renderPool: RenderPool;
  reportPool: ReportPool;
  /** Works exports off; started and closed by whoever made it. */
  exportRunner: ExportRunner;
  exportFiles: ExportFiles;
  sheetPool: SheetPool;
  /** Of package.json; stands on reports. */
  productVersion: string;
  logger: Logger;
  /** Directory of the built client. */
  clientDirectory: string;
  now?: () => Date;
  signInLimits?: SignInLimits;
  /** How many proxies stand before the server; their word on address and scheme is taken. */
  trustedProxies?: number;
}

/** The whole application, not listening. */
export function createApp(dependencies: AppDependencies): Express {
  const { exportRunner: runner, exportFiles: files } = dependencies;
  const { database, sessionSecret, renderPool, reportPool, sheetPool } = dependencies;
  const { productVersion, logger, clientDirectory } = dependencies;
  const { now = () => new Date(), signInLimits = usualSignInLimits, trustedProxies = 0 } = dependencies;
  const session = { database, secret: sessionSecret, now };

  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', trustedProxies);
  app.use(
    pinoHttp({
      logger,
      quietReqLogger: true,
      autoLogging: { ignore: ({ url }) => !url?.startsWith('/api/') },
    }),
  );
  app.use(securityHeaders);
  app.use(compression());

  app.use('/api', (_request, response, next) => {
    response.set('Cache-Control', 'no-store');
    next();
  });
  app.use(
    '/api',
    sameOrigin,
    cookieParser(),
    authenticate((token) => findSession(session, token)),
  );
  registerRoutes(app, {
    ...healthRoutes,
    ...demoRoutes(database),
    ...sessionRoutes(session, signInLimit(signInLimits)),
    ...renderRoutes({ database, renderPool }),
    ...recorderRoutes({ reportPool, productVersion, now }),
    ...exportRoutes({ database, runner, files, now }),
    ...presetRoutes({ database, now }),
    ...sheetRoutes({ database, sheetPool, now }),
    ...stripRoutes({ database, now }),
  });
  app.use('/api', noSuchRoute);

  app.use(staticClient(clientDirectory));
  app.use((_request, response) => {
    response.status(404).type('text').send('There is nothing at this address.\n');
  });
  app.use(answerErrors((error) => logger.error({ err: error }, 'unexpected failure')));
  return app;
}
