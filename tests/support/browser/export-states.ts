import type { Page } from 'playwright-core';
import { exportListResponseSchema, type ExportJob } from '../../../shared/api/exports';
import { seen, type PageState } from './page-state';

const longTitle =
  'Wenckebach behind a dual-chamber pacemaker at the upper rate, with ventricular extrasystoles and one failure to capture';

const plain: ExportJob = {
  id: '6f1c1d5e-64a5-4f3f-9d3f-0d6a3b1f5b11',
  title: 'AV sequential pacing',
  stripId: 'av-sequential-pacing',
  formats: ['csv'],
  durationS: 10,
  sampleRateHz: 500,
  state: 'done',
  progress: 1,
  failure: null,
  warnings: [],
  file: { name: 'av-sequential-pacing.csv', bytes: 412_000 },
  createdAt: '2026-03-02T08:00:00.000Z',
  finishedAt: '2026-03-02T08:00:01.000Z',
  removedAt: '2026-03-09T08:00:01.000Z',
};
const unfinished = { progress: 0, file: null, finishedAt: null, removedAt: null } as const;

/** Exports in every state, which the product only reaches by waiting or by misfortune. */
const jobs: ExportJob[] = (
  [
    { ...plain, ...unfinished, title: longTitle, state: 'running', progress: 0.42, durationS: 3600 },
    { ...plain, ...unfinished, title: '', stripId: null, state: 'waiting', durationS: 90 },
    {
      ...plain,
      title: longTitle,
      formats: ['csv', 'events', 'reading', 'json', 'svg', 'png', 'edf', 'wfdb', 'dicom', 'aecg', 'wav'],
      warnings: [
        { format: 'edf', text: 'the title stands in the header cut or without accents' },
        { format: 'wav', text: 'For isolated, attenuated simulator inputs only; never connect to a person.' },
      ],
    },
    { ...plain, file: null, state: 'failed', failure: 'The disk of the server is full.' },
    { ...plain, file: null, state: 'cancelled' },
  ] satisfies ExportJob[]
).map((job, index): ExportJob => ({ ...job, id: plain.id.replace(/.$/, String(index)) }));

async function answer(page: Page, status: number, body: unknown): Promise<void> {
  await page.route('**/api/exports', (route) =>
    route.fulfill({ status, contentType: 'application/json', body: JSON.stringify(body) }),
  );
}

async function openDownload(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'More actions' }).click();
  await page.getByRole('menuitem', { name: 'Download …' }).click();
  await page.getByRole('checkbox', { name: /^WAV/ }).check();
  await seen(page, 'WAV can drive hardware.');
}

const brokenFile = {
  format: 'paceloom-presets',
  fileVersion: 2,
  strips: [{ title: longTitle, parameters: { pacing: { lowerRateBpm: 900, speed: 1 } } }, {}],
};

async function openImport(page: Page, buffer: Buffer): Promise<void> {
  await page.getByRole('button', { name: 'Import presets' }).click();
  const file = { name: 'presets.json', mimeType: 'application/json', buffer };
  await page.getByLabel('Choose a file').first().setInputFiles(file);
}

/** States of the exports page, the download dialog and the import dialog. */
export function exportStates(presetFile: Buffer): PageState[] {
  const library = (page: Page): Promise<void> =>
    page.getByRole('heading', { name: /Recognise the chamber/ }).waitFor();
  return [
    { name: 'no exports', path: '/exports', ready: (page) => seen(page, 'No exports yet') },
    {
      name: 'exports in every state',
      path: '/exports',
      before: (page) =>
        answer(
          page,
          200,
          exportListResponseSchema.parse({ exports: jobs, usedBytes: 412_000, spaceBytes: 1e9 }),
        ),
      ready: (page) => seen(page, 'The export failed.'),
    },
    {
      name: 'exports that cannot be listed',
      path: '/exports',
      before: (page) => answer(page, 404, { error: { id: 'notFound', message: 'There is no such page.' } }),
      ready: (page) => seen(page, 'The exports could not be listed.'),
    },
    {
      name: 'download dialog',
      path: '/strips/av-sequential-pacing',
      ready: (page) => seen(page, 'stimulated in sequence'),
      act: openDownload,
    },
    {
      name: 'import dialog',
      path: '/strips',
      ready: library,
      act: (page) => page.getByRole('button', { name: 'Import presets' }).click(),
    },
    {
      name: 'import with a choice',
      path: '/strips',
      ready: library,
      act: async (page) => {
        await openImport(page, presetFile);
        await seen(page, 'Nothing would change.');
      },
    },
    {
      name: 'import refused',
      path: '/strips',
      ready: library,
      act: async (page) => {
        await openImport(page, Buffer.from(JSON.stringify(brokenFile)));
        await seen(page, 'Not imported.');
      },
    },
  ];
}
