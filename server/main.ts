import { readFileSync } from 'node:fs';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { dirname, extname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { pino } from 'pino';
import { createApp } from './app';
import { readEnvironment } from './environment';
import { createMigrator } from './migrations/migrate';
import { openDatabase } from './models/database';
import { demoAccounts } from './services/demo/demo-accounts';
import { seedDemo } from './services/demo/seed-demo';
import { createExportFiles } from './services/exports/export-files';
import { createExportPool } from './services/exports/export-pool';
import { createExportRunner, exportLanes } from './services/exports/export-runner';
import { createReportPool } from './services/recorder/report-pool';
import { createRenderPool } from './services/rendering/render-pool';
import { createSheetPool } from './services/sheets/sheet-pool';
import { loadSessionSecret } from './services/session/session-secret';
import { shipGallery } from './services/strips/ship-gallery';
import { roleNames } from '../shared/api/roles';

/** Requests still running at a stop get this long to finish, ms. */
const graceMs = 5000;

const here = fileURLToPath(import.meta.url);
const isBuilt = extname(here) === '.js';
/** The file of a worker thread, beside the built server or among the sources. */
const workerFile = (name: string): string =>
  join(dirname(here), isBuilt ? `${name}.js` : `workers/${name}.ts`);

/** package.json lies above the server's folder, built or not. */
function packageVersion(): string {
  const file = join(dirname(here), isBuilt ? '../../package.json' : '../package.json');
  return (JSON.parse(readFileSync(file, 'utf8')) as { version: string }).version;
}

const environment = readEnvironment(process.env);
const logger = pino({
  level: environment.logLevel,
  redact: ['req.headers.cookie', 'res.headers["set-cookie"]'],
});

const dataDirectory = resolve(environment.dataDirectory);
const sessionSecret = await loadSessionSecret(join(dataDirectory, 'session-secret'));
const database = await openDatabase(join(dataDirectory, 'paceloom.sqlite'));
await createMigrator(database.sequelize).up();
await seedDemo(database, new Date());
await shipGallery(database, new Date());

const renderPool = createRenderPool({ workerFile: workerFile('render-worker') });
const reportPool = createReportPool(workerFile('report-worker'));
const exportFiles = createExportFiles(join(dataDirectory, 'exports'));
const exportRunner = createExportRunner({
  database,
  files: exportFiles,
  pool: createExportPool(workerFile('export-worker'), exportLanes),
  now: () => new Date(),
  logError: (error) => logger.error({ err: error as Error }, 'an export failed'),
});
await exportRunner.start();
const sheetPool = createSheetPool({ workerFile: workerFile('sheet-worker') });
const app = createApp({
  database,
  sessionSecret,
  renderPool,
  reportPool,
  exportRunner,
  exportFiles,
  sheetPool,
  productVersion: packageVersion(),
  logger,
  clientDirectory: resolve(environment.clientDirectory),
  trustedProxies: environment.trustedProxies,
});
const server = createServer(app);

async function announce(): Promise<void> {
  const { port } = server.address() as AddressInfo;
  const { organisation, accounts } = await demoAccounts(database);
  const signIns = accounts.map(
    ({ role, email, password }) => `  ${roleNames[role].padEnd(22)} ${email.padEnd(36)} ${password}`,
  );
  const heading = `Demonstration sign-ins of the ${organisation} (invented):`;
  const lines = accounts.length > 0 ? [heading, ...signIns] : [];
  console.log([`Paceloom is open at http://localhost:${port}`, ...lines].join('\n'));
}

let stopping = false;

async function stop(): Promise<void> {
  if (stopping) return;
  stopping = true;
  const closed = new Promise((done) => server.close(done));
  server.closeIdleConnections();
  setTimeout(() => server.closeAllConnections(), graceMs).unref();
  await closed;
  await renderPool.close();
  await reportPool.close();
  await exportRunner.close();
  await sheetPool.close();
  await database.close();
  process.exit(0);
}

server.on('error', (error: NodeJS.ErrnoException) => {
  const inUse = error.code === 'EADDRINUSE';
  console.error(inUse ? `Port ${environment.port} is taken. Choose another: PORT=4281 npm start` : error);
  process.exit(1);
});
process.on('SIGTERM', () => void stop());
process.on('SIGINT', () => void stop());
server.listen(environment.port, environment.host, () => void announce());
