import {
  copyFileSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterEach, beforeEach, expect, inject, it } from 'vitest';
import { createExportPool } from '../../server/services/exports/export-pool';
import { exportLanes } from '../../server/services/exports/export-runner';
import { followExport, listExports, readExport, startExport } from '../support/server/export-client';
import { startTestServer, type TestServer } from '../support/server/test-server';

let directory: string;
let kept: { databaseFile: string; exportDirectory: string };
let server: TestServer;
beforeEach(async () => {
  directory = mkdtempSync(join(tmpdir(), 'paceloom-exports-'));
  kept = { databaseFile: join(directory, 'test.sqlite'), exportDirectory: join(directory, 'exports') };
  copyFileSync(inject('templateDatabase'), kept.databaseFile);
  server = await startTestServer(kept);
});
afterEach(async () => {
  await server.close();
  rmSync(directory, { recursive: true, force: true });
});

it('goes on with what ran and what waited when the server is stopped and started again', async () => {
  const educator = await server.signedIn('educator');
  const running = await startExport(educator, { parameters: { durationS: 1800 }, formats: ['csv'] });
  const waiting = await startExport(educator, { parameters: {}, formats: ['events'] });
  await followExport(educator, running.id, ['running']);
  await server.close();
  expect(readdirSync(kept.exportDirectory)).toEqual([]);
  server = await startTestServer(kept);
  const again = await server.signedIn('educator');
  for (const { id } of [running, waiting]) expect((await followExport(again, id)).state).toBe('done');
  expect(readdirSync(kept.exportDirectory).sort()).toEqual([running.id, waiting.id].sort());
});

it('after a crash starts a job again, but not one that was started three times', async () => {
  const educator = await server.signedIn('educator');
  const jobs = [];
  for (let i = 0; i < 2; i++) {
    jobs.push(await startExport(educator, { parameters: {}, formats: ['events'] }));
    await followExport(educator, jobs[i].id);
  }
  const crashed = { state: 'running', bytes: null, finishedAt: null, removedAt: null } as const;
  for (const [i, attempts] of [1, 3].entries()) {
    await server.database.exportJobs.update({ ...crashed, attempts }, { where: { id: jobs[i].id } });
  }
  await server.close();
  server = await startTestServer(kept);
  const again = await server.signedIn('educator');
  expect((await followExport(again, jobs[0].id)).state).toBe('done');
  const failed = await readExport(again, jobs[1].id);
  expect(failed).toMatchObject({ state: 'failed', file: null });
  expect(failed.failure).toContain('It was started 3 times');
});

it('fails in words when a worker runs out of memory, and goes on with the next one', async () => {
  await server.close();
  const exportPool = createExportPool(resolve('server/workers/export-worker.ts'), exportLanes, 150);
  server = await startTestServer({ ...kept, exportPool });
  const educator = await server.signedIn('educator');
  // Twelve thousand beats as JSON and XML do not fit into 150 MB beside the encoders themselves.
  const parameters = { durationS: 3600, patient: { atrialRateBpm: 200 } };
  const large = await startExport(educator, { parameters, formats: ['json', 'aecg'] });
  const failed = await followExport(educator, large.id);
  expect(failed).toMatchObject({ state: 'failed', file: null });
  expect(failed.failure).toContain('more memory than an export may');
  const next = await startExport(educator, { parameters: { durationS: 2 }, formats: ['events'] });
  expect((await followExport(educator, next.id)).state).toBe('done');
  expect(readdirSync(kept.exportDirectory)).toEqual([next.id]);
  expect(server.logged).toEqual([]);
}, 180_000);

it('removes files at the start that belong to no job, or are incomplete', async () => {
  await server.close();
  mkdirSync(kept.exportDirectory, { recursive: true });
  const strays = ['stray', '6f1c1d5e-64a5-4f3f-9d3f-0d6a3b1f5b11.unfinished'];
  for (const name of strays) writeFileSync(join(kept.exportDirectory, name), 'x');
  server = await startTestServer(kept);
  for (const name of strays) expect(existsSync(join(kept.exportDirectory, name))).toBe(false);
  expect((await listExports(await server.signedIn('educator'))).exports).toEqual([]);
});
