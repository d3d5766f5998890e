import { copyFileSync, mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { pino } from 'pino';
import { inject } from 'vitest';
import { createApp, type AppDependencies } from '../../../server/app';
import { openDatabase, type Database } from '../../../server/models/database';
import { createRenderPool, type RenderPoolOptions } from '../../../server/services/rendering/render-pool';
import { createExportFiles } from '../../../server/services/exports/export-files';
import { createExportPool, type ExportPool } from '../../../server/services/exports/export-pool';
import {
  createExportRunner,
  exportLanes,
  type ExportRunner,
} from '../../../server/services/exports/export-runner';
import { createReportPool } from '../../../server/services/recorder/report-pool';
import { createSheetPool, type SheetPoolOptions } from '../../../server/services/sheets/sheet-pool';
import { ApiClient, type Person } from './api-client';

export const workerFile = resolve('server/workers/render-worker.ts');

export interface TestServer {
  url: string;
  database: Database;
  exportRunner: ExportRunner;
  /** Where the files of exports lie. */
  exportDirectory: string;
  databaseFile: string;
  /** Errors the server logged: unexpected ones only. */
  logged: string[];
  /** A client without a session. */
  client(): ApiClient;
  signedIn(person: Person): Promise<ApiClient>;
  close(): Promise<void>;
}

interface TestServerOptions extends Partial<AppDependencies> {
  /** A database to go on with; otherwise a copy of the template. */
  databaseFile?: string;
  /** A folder of exports to go on with; otherwise a new one. */
  exportDirectory?: string;
  exportPool?: ExportPool;
  pool?: Partial<RenderPoolOptions>;
  sheets?: Partial<SheetPoolOptions>;
}

/** The application on a free port of this machine, over a copy of the template database. */
export async function startTestServer(options: TestServerOptions = {}): Promise<TestServer> {
  const { databaseFile, pool, sheets, exportDirectory: keptExports, exportPool, ...dependencies } = options;
  const directory = mkdtempSync(join(tmpdir(), 'paceloom-server-'));
  const file = databaseFile ?? join(directory, 'test.sqlite');
  if (databaseFile === undefined) copyFileSync(inject('templateDatabase'), file);
  const database = await openDatabase(file);
  const renderPool = createRenderPool({ workerFile, threads: 1, keepWarm: false, ...pool });
  const reportPool = createReportPool(resolve('server/workers/report-worker.ts'));
  const sheetPool = createSheetPool({ workerFile: resolve('server/workers/sheet-worker.ts'), ...sheets });
  const logged: string[] = [];
  const logger = pino({ level: 'error' }, { write: (line: string) => void logged.push(line) });
  const exportDirectory = keptExports ?? join(directory, 'exports');
  const exportFiles = createExportFiles(exportDirectory);
  const exportRunner = createExportRunner({
    database,
    files: exportFiles,
    pool: exportPool ?? createExportPool(resolve('server/workers/export-worker.ts'), exportLanes),
    now: options.now ?? (() => new Date()),
    logError: (error) => void logged.push(String(error)),
  });
  await exportRunner.start();
  const app = createApp({
    database,
    sessionSecret: 'a key for tests only, of no worth',
    renderPool,
    reportPool,
    exportRunner,
    exportFiles,
    sheetPool,
    productVersion: '0.0.0',
    logger,
    clientDirectory: join(directory, 'client'),
    ...dependencies,
  });
  const server = createServer(app);
  await new Promise<void>((done) => server.listen(0, '127.0.0.1', done));
  const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  return {
    url,
    database,
    exportRunner,
    exportDirectory,
    databaseFile: file,
    logged,
    client: () => new ApiClient(url),
    signedIn: (person) => new ApiClient(url).signIn(person),
    async close() {
      server.closeAllConnections();
      await new Promise((done) => server.close(done));
      await renderPool.close();
      await reportPool.close();
      await exportRunner.close();
      await sheetPool.close();
      await database.close();
      rmSync(directory, { recursive: true, force: true });
    },
  };
}
