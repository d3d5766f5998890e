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
import { createRenderPool } from './services/rendering/render-pool';
import { loadSessionSecret } from './services/session/session-secret';
import { shipGallery } from './services/strips/ship-gallery';
import { roleNames } from '../shared/api/roles';

/** Requests still running at a stop get this long to finish, ms. */
const graceMs = 5000;

const here = fileURLToPath(import.meta.url);
const isBuilt = extname(here) === '.js';
const workerFile = join(dirname(here), isBuilt ? 'render-worker.js' : 'workers/render-worker.ts');

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

const renderPool = createRenderPool({ workerFile });
const app = createApp({
  database,
  sessionSecret,
  renderPool,
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
