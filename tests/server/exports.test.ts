import { createHash } from 'node:crypto';
import { existsSync, readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { strFromU8, unzipSync } from 'fflate';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { exportKeptDays, exportSpaceBytes } from '../../shared/api/exports';
import { renderStrip } from '../../shared/engine/render';
import { csvHeader, stripCsvRows } from '../../shared/formats/csv';
import { exportFormats } from '../../shared/formats/export-format';
import type { BundleManifest } from '../../server/exports/bundle';
import { errorIdOf, type ApiClient } from '../support/server/api-client';
import {
  askForExport,
  fetchExport,
  followExport,
  listExports,
  readExport,
  startExport,
} from '../support/server/export-client';
import { startTestServer, type TestServer } from '../support/server/test-server';

const shared = 'tarn-valley-week-one-av-sequential';
const draft = 'tarn-valley-failing-output-draft';
/** Long enough to be seen running. */
const longCsv = { parameters: { durationS: 1800 }, formats: ['csv'] } as const;

let server: TestServer;
let educator: ApiClient;
let technician: ApiClient;
let now: Date;
beforeEach(async () => {
  now = new Date('2026-03-02T08:00:00.000Z');
  server = await startTestServer({ now: () => now });
  educator = await server.signedIn('educator');
  technician = await server.signedIn('technician');
});
afterEach(async () => {
  expect(server.logged).toEqual([]);
  await server.close();
});

describe('an export', () => {
  it('of one file comes as it is, under the strip’s title, whole or in ranges', async () => {
    const job = await startExport(educator, { stripId: shared, formats: ['csv'] });
    expect(job).toMatchObject({ title: 'Week 1 opener: two spikes a beat', stripId: shared, durationS: 10 });
    const done = await followExport(educator, job.id);
    expect(done).toMatchObject({ state: 'done', progress: 1, warnings: [], failure: null });
    const whole = await fetchExport(educator, job.id);
    // The same text that the encoder gives; its own tests read it back.
    const recording = renderStrip((await educator.read(shared)).parameters);
    expect(whole.bytes.toString()).toBe(`${csvHeader}\n${stripCsvRows(recording, 0, 5000)}`);
    expect(whole.headers.get('content-type')).toContain('text/csv');
    expect(whole.headers.get('content-disposition')).toBe(
      'attachment; filename=week-1-opener-two-spikes-a-beat.csv',
    );
    expect(done.file).toEqual({ name: 'week-1-opener-two-spikes-a-beat.csv', bytes: whole.bytes.length });
    const part = await fetchExport(educator, job.id, { range: 'bytes=10-19' });
    expect([part.status, part.bytes.toString()]).toEqual([206, whole.bytes.toString().slice(10, 20)]);
    const past = await fetchExport(educator, job.id, { range: `bytes=${whole.bytes.length + 5}-` });
    expect(past.status).toBe(416);
  });

  it('of every format comes as an archive whose checksums hold, with the warnings of each', async () => {
    const formats = [...exportFormats];
    const job = await startExport(educator, { stripId: draft, formats });
    const done = await followExport(educator, job.id);
    expect(done.state).toBe('done');
    const { bytes, headers } = await fetchExport(educator, job.id);
    expect(headers.get('content-type')).toBe('application/zip');
    const files = unzipSync(bytes);
    const manifest = JSON.parse(strFromU8(files['manifest.json'])) as BundleManifest;
    expect([...new Set(manifest.files.map(({ format }) => format))]).toEqual(formats);
    for (const { name, sha256 } of manifest.files) {
      expect(createHash('sha256').update(files[name]).digest('hex')).toBe(sha256);
    }
    expect(done.warnings).toEqual(manifest.warnings);
    const wav = done.warnings.filter(({ format }) => format === 'wav');
    expect(wav[0].text).toContain('never connect to a person');
  });

  it('of several files or when asked is an archive, and of a draft is the draft in the length asked for', async () => {
    const parameters = { pacing: { source: 'implanted', lowerRateBpm: 77 } } as const;
    const asked = [
      { parameters, formats: ['wfdb'], durationS: 20 },
      { parameters, formats: ['json'], durationS: 20, bundle: true },
    ] as const;
    for (const { formats, ...rest } of asked) {
      const job = await startExport(educator, { ...rest, formats: [...formats] });
      expect(job).toMatchObject({ stripId: null, title: '', durationS: 20 });
      const done = await followExport(educator, job.id);
      expect(done.file?.name).toBe('strip.zip');
      const files = unzipSync((await fetchExport(educator, job.id)).bytes);
      const manifest = JSON.parse(strFromU8(files['manifest.json'])) as BundleManifest;
      expect(manifest.durationS).toBe(20);
      if (formats[0] !== 'json') continue;
      const strip = JSON.parse(strFromU8(files['strip.json'])) as {
        parameters: { pacing: { lowerRateBpm: number } };
      };
      expect(strip.parameters.pacing.lowerRateBpm).toBe(77);
    }
  });

  it('shows its progress while it runs, and is listed with the space it takes', async () => {
    const shares: number[] = [];
    const job = await startExport(technician, { ...longCsv, formats: ['csv'] });
    const done = await followExport(technician, job.id, ['done'], ({ progress }) => shares.push(progress));
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    expect(shares.filter((share) => share > 0 && share < 1).length).toBeGreaterThan(0);
    const list = await listExports(technician);
    expect(list).toMatchObject({ usedBytes: done.file?.bytes, spaceBytes: exportSpaceBytes });
    expect(list.exports).toEqual([done]);
    expect((await listExports(educator)).exports).toEqual([]);
  });
});

describe('what is refused', () => {
  const cases: [string, Record<string, unknown>, string, string][] = [
    ['no format', { parameters: {}, formats: [] }, 'formats', 'one or more of csv'],
    ['a format twice', { parameters: {}, formats: ['csv', 'csv'] }, 'formats', 'each once'],
    ['an unknown format', { parameters: {}, formats: ['mp3'] }, 'formats.0', 'one of csv'],
    ['neither strip nor parameters', { formats: ['csv'] }, '(root)', 'one of the two'],
    ['both', { stripId: shared, parameters: {}, formats: ['csv'] }, '(root)', 'one of the two'],
    [
      'more than an hour at 500/s',
      { parameters: {}, formats: ['csv'], durationS: 3601 },
      'durationS',
      'at most 3600 s at 500 samples/s',
    ],
    [
      'more than fits at 2000/s',
      {
        parameters: { durationS: 901, recorder: { sampleRateHz: 2000, bandwidth: 'diagnostic' } },
        formats: ['edf'],
      },
      'durationS',
      'at most 900 s at 2000 samples/s',
    ],
    ['more than a day', { parameters: {}, formats: ['csv'], durationS: 1e6 }, 'durationS', '1 to 86400 s'],
    [
      'a picture of more than five minutes',
      { parameters: {}, formats: ['csv', 'svg'], durationS: 301 },
      'durationS',
      'at most 300 s for svg',
    ],
    [
      'a bad parameter',
      { parameters: { pacing: { lowerRateBpm: 900 } }, formats: ['csv'] },
      'parameters.pacing.lowerRateBpm',
      '20 to 200 /min',
    ],
  ];
  it.each(cases)('%s, with field, value and range', async (_, body, path, allowed) => {
    const { status, body: answer } = await askForExport(educator, body);
    expect([status, answer.error.id]).toEqual([400, 'invalidInput']);
    expect(answer.error.problems?.find((one) => one.path === path)?.allowed).toContain(allowed);
    expect((await listExports(educator)).exports).toEqual([]);
  });

  it('a colleague’s private strip', async () => {
    const answer = await askForExport(technician, { stripId: draft, formats: ['csv'] });
    expect([answer.status, errorIdOf(answer)]).toEqual([404, 'notFound']);
  });

  it('more than five at a time, until one is cancelled', async () => {
    const jobs = [];
    for (let i = 0; i < 5; i++) jobs.push(await startExport(educator, { ...longCsv, formats: ['csv'] }));
    const sixth = await askForExport(educator, { parameters: {}, formats: ['csv'] });
    expect([sixth.status, errorIdOf(sixth)]).toEqual([409, 'tooManyExports']);
    // Another person's queue is their own, and a short export does not wait behind long ones.
    const other = await startExport(technician, { parameters: {}, formats: ['events'] });
    expect((await followExport(technician, other.id)).state).toBe('done');
    expect((await readExport(educator, jobs[4].id)).state).toBe('waiting');
    const cancelled = await educator.send('POST', `/api/exports/${jobs[4].id}/cancel`);
    expect(cancelled.body).toMatchObject({ export: { state: 'cancelled' } });
    await startExport(educator, { parameters: {}, formats: ['csv'] });
  });

  it('anything when the space is used up; and a file that would not fit fails in words', async () => {
    const first = await startExport(educator, { parameters: {}, formats: ['csv'] });
    await followExport(educator, first.id);
    const { exportJobs } = server.database;
    await exportJobs.update({ bytes: exportSpaceBytes }, { where: { id: first.id } });
    const refused = await askForExport(educator, { parameters: {}, formats: ['csv'] });
    expect([refused.status, errorIdOf(refused)]).toEqual([409, 'exportSpaceFull']);
    expect(refused.body.error.message).toBe(
      'Your exports take all of the 1 GB they may. Delete some, then try again.',
    );
    await exportJobs.update({ bytes: exportSpaceBytes - 1000 }, { where: { id: first.id } });
    const second = await startExport(educator, { parameters: {}, formats: ['csv'] });
    const failed = await followExport(educator, second.id);
    expect(failed).toMatchObject({ state: 'failed', file: null });
    expect(failed.failure).toContain('more than 1 GB');
    expect(readdirSync(server.exportDirectory)).toEqual([first.id]);
    await educator.send('DELETE', `/api/exports/${first.id}`);
    const again = await educator.send('POST', `/api/exports/${second.id}/restart`);
    expect(again.status).toBe(200);
    expect((await followExport(educator, second.id)).state).toBe('done');
  });
});

describe('whose an export is', () => {
  it('nobody else sees, stops, fetches or deletes it, not even an administrator', async () => {
    const { id } = await startExport(educator, { parameters: {}, formats: ['csv'] });
    await followExport(educator, id);
    for (const who of ['technician', 'administrator', 'otherDepartment'] as const) {
      const client = await server.signedIn(who);
      for (const [method, path] of [
        ['GET', ''],
        ['GET', '/file'],
        ['POST', '/cancel'],
        ['POST', '/restart'],
        ['DELETE', ''],
      ] as const) {
        expect((await client.send(method, `/api/exports/${id}${path}`)).status).toBe(404);
      }
    }
    expect((await readExport(educator, id)).state).toBe('done');
  });

  it.each([
    '..%2F..%2Ftest.sqlite',
    '%2e%2e%2ftest.sqlite',
    '....//test.sqlite',
    'x',
    '6f1c1d5e-64a5-4f3f-9d3f-0d6a3b1f5b11%00',
  ])('no address leads out of the folder: %s', async (id) => {
    const { status, bytes } = await fetchExport(educator, id);
    expect([400, 404]).toContain(status);
    expect(bytes.toString()).not.toContain('SQLite');
  });
});

describe('cancelling, starting again, deleting', () => {
  it('stops a running job, leaves no file, and takes it up again when asked', async () => {
    const { id } = await startExport(educator, { ...longCsv, formats: ['csv'] });
    await followExport(educator, id, ['running']);
    expect((await educator.send('POST', `/api/exports/${id}/restart`)).status).toBe(409);
    await educator.send('POST', `/api/exports/${id}/cancel`);
    expect((await readExport(educator, id)).state).toBe('cancelled');
    expect((await fetchExport(educator, id)).status).toBe(404);
    // The queue goes on with the next one.
    const next = await startExport(educator, { parameters: {}, formats: ['events'] });
    expect((await followExport(educator, next.id)).state).toBe('done');
    expect(readdirSync(server.exportDirectory)).toEqual([next.id]);
    await educator.send('POST', `/api/exports/${id}/restart`);
    expect((await followExport(educator, id)).state).toBe('done');
    // Too late to cancel: it stays as it is.
    const late = await educator.send('POST', `/api/exports/${id}/cancel`);
    expect(late.body).toMatchObject({ export: { state: 'done' } });
  });

  it('deletes the file with the job, also while it runs', async () => {
    const done = await startExport(educator, { parameters: {}, formats: ['csv'] });
    await followExport(educator, done.id);
    const running = await startExport(educator, { ...longCsv, formats: ['csv'] });
    await followExport(educator, running.id, ['running']);
    for (const { id } of [done, running]) {
      expect((await educator.send('DELETE', `/api/exports/${id}`)).status).toBe(204);
      expect((await educator.get(`/api/exports/${id}`)).status).toBe(404);
    }
    const last = await startExport(educator, { parameters: {}, formats: ['events'] });
    await followExport(educator, last.id);
    expect(readdirSync(server.exportDirectory)).toEqual([last.id]);
  });

  it('removes what is older than it is kept, and answers in words when a file is gone', async () => {
    const { id } = await startExport(educator, { parameters: {}, formats: ['csv'] });
    const done = await followExport(educator, id);
    const msPerDay = 86_400_000;
    expect(done.removedAt).toBe(new Date(now.getTime() + exportKeptDays * msPerDay).toISOString());
    now = new Date(now.getTime() + exportKeptDays * msPerDay - 1);
    await server.exportRunner.removeOutdated();
    const file = join(server.exportDirectory, id);
    expect(existsSync(file)).toBe(true);
    now = new Date(now.getTime() + 1);
    await server.exportRunner.removeOutdated();
    expect(existsSync(file)).toBe(false);
    const fresh = await server.signedIn('educator');
    expect((await fresh.get(`/api/exports/${id}`)).status).toBe(404);

    const lost = await startExport(fresh, { parameters: {}, formats: ['csv'] });
    await followExport(fresh, lost.id);
    rmSync(join(server.exportDirectory, lost.id));
    const answer = await fetchExport(fresh, lost.id);
    expect([answer.status, answer.bytes.toString()]).toEqual([
      404,
      expect.stringContaining('There is no such export file.'),
    ]);
  });
});
