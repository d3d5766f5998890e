import { unzipSync } from 'fflate';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { errorIdOf, type Answer, type ApiClient } from '../support/server/api-client';
import { startTestServer, type TestServer } from '../support/server/test-server';
import type { ApiErrorBody } from '../../shared/api/errors';

let server: TestServer;
let educator: ApiClient;

async function start(options: Parameters<typeof startTestServer>[0] = {}): Promise<void> {
  server = await startTestServer(options);
  educator = await server.signedIn('educator');
}
afterEach(() => server.close());

const strip = { stripId: 'av-sequential-pacing' };
const request = { strips: [strip], setup: {}, format: 'pdf' };

function post(body: unknown, signal?: AbortSignal): Promise<Response> {
  return educator.raw('POST', '/api/sheets', {
    body: JSON.stringify(body),
    headers: { 'content-type': 'application/json' },
    signal,
  });
}

async function file(body: unknown): Promise<{ name: string; type: string; bytes: Uint8Array }> {
  const response = await post(body);
  expect(response.status).toBe(200);
  const name = /^attachment; filename="([^"]*)"$/u.exec(
    response.headers.get('content-disposition') ?? '',
  )?.[1];
  return {
    name: name ?? '',
    type: response.headers.get('content-type') ?? '',
    bytes: new Uint8Array(await response.arrayBuffer()),
  };
}

const text = (bytes: Uint8Array): string => Buffer.from(bytes).toString('latin1');

async function refused(body: unknown): Promise<NonNullable<ApiErrorBody['error']['problems']>> {
  const answer: Answer<ApiErrorBody> = await educator.send('POST', '/api/sheets', body);
  expect(answer.status).toBe(400);
  return answer.body.error.problems ?? [];
}

describe('a file of sheets', () => {
  beforeEach(() => start());

  it('is a PDF with a question and an answer page, and its name tells no answer', async () => {
    const { name, type, bytes } = await file(request);
    // ISO 32000-1, 7.5.2: a PDF starts with its version, and ends with %%EOF (7.5.5).
    expect(text(bytes).startsWith('%PDF-1.7')).toBe(true);
    expect(text(bytes).trimEnd().endsWith('%%EOF')).toBe(true);
    expect(text(bytes).match(/\/Type \/Page\b(?!s)/gu)).toHaveLength(2);
    expect(type).toBe('application/pdf');
    expect(name).toBe('question-and-answer-sheets.pdf');
  });

  it('of one page of it is a PDF of one page', async () => {
    const { name, bytes } = await file({ ...request, page: 2 });
    expect(text(bytes).match(/\/Type \/Page\b(?!s)/gu)).toHaveLength(1);
    expect(name).toBe('question-and-answer-sheets-page-2.pdf');
  });

  it('without a question carries the title in its name, as plain ASCII', async () => {
    const parameters = { durationS: 2 };
    const title = 'Überleitung "1" / ../ etc';
    const body = { ...request, strips: [{ parameters, title }], setup: { sheets: 'plain' } };
    expect((await file(body)).name).toBe('uberleitung-1-etc.pdf');
    const greek = { ...body, strips: [{ parameters, title: 'λόγος' }] };
    expect((await file(greek)).name).toBe('sheet.pdf');
  });

  it('is an SVG of the page that is asked for, in true size', async () => {
    const { name, type, bytes } = await file({ ...request, format: 'svg', page: 1 });
    const svg = Buffer.from(bytes).toString('utf8');
    // ISO 216: A4 is 210 × 297 mm.
    expect(svg).toMatch(/^<svg [^>]*width="297mm" height="210mm"/u);
    expect(type).toContain('image/svg+xml');
    expect(name).toBe('question-and-answer-sheets-page-1.svg');
  });

  it('hides title and teaching point on a question sheet and tells them on an answer sheet', async () => {
    const body = {
      ...request,
      strips: [
        { parameters: { durationS: 4 }, title: 'Tell-tale title', teachingPoint: 'Look at the T wave.' },
      ],
      format: 'svg',
    };
    const question = Buffer.from((await file({ ...body, page: 1 })).bytes).toString('utf8');
    const answer = Buffer.from((await file({ ...body, page: 2 })).bytes).toString('utf8');
    expect(question).not.toContain('Tell-tale');
    expect(question).not.toContain('T wave');
    expect(answer).toContain('Tell-tale title');
    expect(answer).toContain('Look at the T wave.');
  });

  it.each([
    [150, 1754],
    [300, 3508],
    [600, 7016],
  ])('is a PNG of %i dots per inch, %i wide', async (dpi, width) => {
    const { type, bytes } = await file({ ...request, format: 'png', page: 1, dpi });
    expect(type).toBe('image/png');
    // ISO/IEC 15948 (PNG): signature, then IHDR with the width at byte 16. 297 mm / 25.4 mm × dpi, rounded up.
    expect(text(bytes.subarray(1, 4))).toBe('PNG');
    const view = new DataView(bytes.buffer, bytes.byteOffset);
    expect(Math.abs(view.getUint32(16) - width)).toBeLessThanOrEqual(1);
  });

  it.each(['svg', 'png'])('of all pages as %s is a ZIP with one picture a page', async (format) => {
    const { name, type, bytes } = await file({ ...request, format });
    expect(type).toBe('application/zip');
    expect(name).toBe(`question-and-answer-sheets.${format}.zip`);
    expect(Object.keys(unzipSync(bytes))).toEqual([`page-1.${format}`, `page-2.${format}`]);
  });

  it('takes twelve strips of a minute', { timeout: 120_000 }, async () => {
    const strips = new Array(12).fill({ parameters: { durationS: 60 } });
    const { bytes } = await file({ ...request, strips });
    expect(text(bytes).match(/\/Type \/Page\b(?!s)/gu)?.length).toBeGreaterThanOrEqual(24);
  });

  it('carries the organisation and the cohort', async () => {
    const setup = { cohort: 'Autumn B' };
    const { bytes } = await file({ ...request, setup, format: 'svg', page: 1 });
    const svg = Buffer.from(bytes).toString('utf8');
    expect(svg).toContain('Tarn Valley Ambulance College, cohort Autumn B');
  });
});

describe('sheets are refused', () => {
  beforeEach(() => start());

  it('with a page that is not there', async () => {
    expect(await refused({ ...request, page: 3 })).toEqual([{ path: 'page', value: '3', allowed: '1 to 2' }]);
    expect(await refused({ ...request, page: 0 })).toMatchObject([{ path: 'page', value: '0' }]);
    expect(await refused({ ...request, setup: { sheets: 'plain' }, page: 2 })).toEqual([
      { path: 'page', value: '2', allowed: '1: the document has one page' },
    ]);
  });

  it('for a strip longer than a sheet draws', async () => {
    expect(await refused({ ...request, strips: [strip, { parameters: { durationS: 301 } }] })).toEqual([
      { path: 'strips.1.parameters.durationS', value: '301', allowed: '1 to 300 s' },
    ]);
    const long = await educator.keep({ title: 'Long', parameters: { durationS: 600 } });
    expect(await refused({ ...request, strips: [{ stripId: long.id }] })).toEqual([
      {
        path: 'strips.0.stripId',
        value: `${long.id}, which lasts 600 s`,
        allowed: 'a strip of 1 to 300 s',
      },
    ]);
  });

  it('as an archive of more pictures than there is time for', { timeout: 60_000 }, async () => {
    const strips = new Array(2).fill({ parameters: { durationS: 60 } });
    const body = { ...request, strips, setup: { layout: '12x1' }, format: 'png', dpi: 600 };
    const [problem] = await refused(body);
    expect(problem).toMatchObject({ path: 'page', value: 'missing' });
    expect(problem.allowed).toMatch(/^1 to \d+; all pages at once up to 30 at 600 dpi$/u);
  });

  it('for strips that are too long together', async () => {
    const strips = new Array(3).fill({ parameters: { durationS: 250 } });
    expect(await refused({ ...request, strips })).toEqual([
      { path: 'strips', value: '750 s together', allowed: 'strips of at most 720 s together' },
    ]);
  });

  it('without strips, with too many, and with a strip that is both or neither', async () => {
    expect(await refused({ ...request, strips: [] })).toMatchObject([{ path: 'strips', value: '[]' }]);
    expect(await refused({ ...request, strips: new Array(13).fill(strip) })).toMatchObject([
      { path: 'strips' },
    ]);
    const allowed = 'parameters or stripId, one of the two';
    expect(await refused({ ...request, strips: [{}] })).toEqual([{ path: 'strips.0', value: '{}', allowed }]);
    expect(await refused({ ...request, strips: [{ ...strip, parameters: {} }] })).toMatchObject([
      { path: 'strips.0', allowed },
    ]);
  });

  it('with words for a saved strip, which has its own', async () => {
    expect(await refused({ ...request, strips: [{ ...strip, title: 'Mine' }] })).toMatchObject([
      {
        path: 'strips.0',
        allowed: expect.stringContaining('title and teachingPoint beside parameters only'),
      },
    ]);
  });

  it.each([
    ['format', { format: 'gif' }, '"gif"', 'one of pdf, svg, png'],
    ['dpi', { format: 'png', dpi: 72 }, '72', 'one of 150, 300, 600'],
    ['dpi', { dpi: 300 }, '300', 'only with the format png'],
    ['setup.paper', { setup: { paper: 'a3' } }, '"a3"', 'one of a4, letter'],
    ['setup.answerLines', { setup: { answerLines: 9 } }, '9', 'whole number 0 to 8'],
    ['setup.speedMmPerS', { setup: { speedMmPerS: 30 } }, '30', 'one of 25, 50'],
  ])('naming %s, its value and what is allowed', async (path, change, value, allowed) => {
    expect(await refused({ ...request, ...change })).toEqual([{ path, value, allowed }]);
  });

  it('for a strip that does not exist or is another’s, as if it did not exist', async () => {
    for (const stripId of ['no-such-strip', 'tarn-valley-failing-output-draft']) {
      const stranger = await server.signedIn('technician');
      const answer = await stranger.send('POST', '/api/sheets', { ...request, strips: [strip, { stripId }] });
      expect(answer.status).toBe(404);
      expect(errorIdOf(answer)).toBe('notFound');
    }
  });
});

describe('the queue of sheets', () => {
  it('refuses what no thread has time for, and says when to come back', async () => {
    await start({ sheets: { queueLength: 0 } });
    const first = post({ ...request, strips: new Array(8).fill({ parameters: { durationS: 60 } }) });
    let busy: Response;
    do busy = await post(request);
    while (busy.status === 200);
    expect(busy.status).toBe(503);
    expect(Number(busy.headers.get('retry-after'))).toBeGreaterThan(0);
    expect((await first).status).toBe(200);
  });

  it('stops what takes too long', async () => {
    await start({ sheets: { timeLimitMs: 50 } });
    const answer = await educator.send('POST', '/api/sheets', request);
    expect(answer.status).toBe(504);
    expect(errorIdOf(answer)).toBe('renderTooLong');
    expect(server.logged).toEqual([]);
  });
});
