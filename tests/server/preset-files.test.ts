import { readFileSync } from 'node:fs';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { StripListResponse } from '../../shared/api/strip-list';
import { presetFileLimitMb } from '../../shared/api/preset-files';
import { readPresetFile } from '../../shared/formats/preset-file';
import { errorIdOf, updateOf, type ApiClient } from '../support/server/api-client';
import { exportPresetsOf, importPresetsWith, uploadPresets } from '../support/server/preset-upload';
import { startTestServer, type TestServer } from '../support/server/test-server';

const shared = 'tarn-valley-week-one-av-sequential';
const draft = 'tarn-valley-failing-output-draft';
const shipped = 'av-sequential-pacing';

let server: TestServer;
let educator: ApiClient;
let technician: ApiClient;
beforeEach(async () => {
  server = await startTestServer();
  educator = await server.signedIn('educator');
  technician = await server.signedIn('technician');
});
afterEach(async () => {
  expect(server.logged).toEqual([]);
  await server.close();
});

const frozen = (version: number): string =>
  readFileSync(`tests/fixtures/preset-file-${version}.json`, 'utf8');
const countOf = async (client: ApiClient): Promise<number> =>
  (await client.get<StripListResponse>('/api/strips')).body.total;

/** A file of one preset, from a strip, with some of it changed. */
function changedFile(text: string, change: Record<string, unknown>): string {
  const file = JSON.parse(text) as { strips: Record<string, unknown>[] };
  return JSON.stringify({ ...file, strips: file.strips.map((strip) => ({ ...strip, ...change })) });
}

describe('saving presets', () => {
  it('gives the strips asked for, in that order, as an attachment that reads back', async () => {
    const answer = await educator.send<object>('POST', '/api/strips/export', {
      ids: [draft, shipped, draft],
    });
    expect(answer.status).toBe(200);
    expect(answer.headers.get('content-disposition')).toBe('attachment; filename=paceloom-presets.json');
    const { strips } = readPresetFile(answer.body);
    expect(strips.map(({ presetId }) => presetId)).toEqual([draft, shipped]);
    const kept = await educator.read(draft);
    expect(strips[0]).toMatchObject({
      title: kept.title,
      teachingPoint: kept.teachingPoint,
      tags: kept.tags,
      group: kept.group,
      engineVersion: kept.engineVersion,
      parameters: kept.parameters,
    });
    expect(JSON.stringify(answer.body)).not.toMatch(/demo-educator|visibility|owner/);
  });

  it('gives what filters leave, on all pages', async () => {
    const all = await countOf(educator);
    const answer = await educator.send('POST', '/api/strips/export', { filter: {} });
    expect(readPresetFile(answer.body).strips).toHaveLength(all);
    const own = await educator.send('POST', '/api/strips/export', { filter: { keptBy: 'me' } });
    expect(readPresetFile(own.body).strips).toHaveLength(3);
  });

  it.each([
    [{}, '(root)', 'ids or filter, one of the two'],
    [{ ids: [], filter: {} }, 'ids', '1 to 500 ids'],
    [{ ids: Array.from({ length: 501 }, (_, i) => `x${i}`) }, 'ids', '1 to 500 ids'],
    [{ filter: { search: 'zzzz' } }, 'filter', 'filters that leave 1 to 500 strips'],
    [{ ids: ['../secret'] }, 'ids.0', 'small letters, digits and single hyphens'],
  ])('refuses %j in words', async (body, path, allowed) => {
    const answer = await educator.send<{ error: { problems: { path: string; allowed: string }[] } }>(
      'POST',
      '/api/strips/export',
      body,
    );
    expect(answer.status).toBe(400);
    expect(answer.body.error.problems.find((one) => one.path === path)?.allowed).toContain(allowed);
  });

  it('does not give a colleague’s private strip, or one that is not there', async () => {
    for (const ids of [[draft], [shared, 'nothing-here']]) {
      const answer = await technician.send('POST', '/api/strips/export', { ids });
      expect([answer.status, errorIdOf(answer)]).toEqual([404, 'notFound']);
    }
  });
});

describe('looking at a file', () => {
  it('tells new from known, changes nothing, and says what upgrading filled in', async () => {
    const before = await countOf(technician);
    const { status, analysis } = await uploadPresets(technician, frozen(1));
    expect(status).toBe(200);
    expect(analysis?.upgrades).toHaveLength(1);
    expect(analysis?.fileVersion).toBe(1);
    // Without an id and a group they are known by their content alone, and the group differs.
    expect(analysis?.presets.map(({ status: one }) => one)).toEqual(['new', 'new', 'new']);
    expect(await countOf(technician)).toBe(before);
  });

  it('knows presets by their id and by their content, and whether they may be replaced', async () => {
    const { analysis } = await uploadPresets(educator, frozen(2));
    expect(analysis?.presets.map((one) => [one.status, one.match?.keptBy, one.match?.replaceable])).toEqual([
      ['same', 'gallery', false],
      ['same', 'me', true],
      ['same', 'me', true],
    ]);
    const asTechnician = await uploadPresets(technician, frozen(2));
    expect(asTechnician.analysis?.presets.map(({ status }) => status)).toEqual(['same', 'same', 'new']);
    const byContent = await uploadPresets(educator, changedFile(frozen(2), { presetId: null }));
    expect(byContent.analysis?.presets.map(({ status }) => status)).toEqual(['same', 'same', 'same']);
  });

  it('says when the course has no such group', async () => {
    const text = changedFile(await exportPresetsOf(educator, [draft]), { group: 'a-later-lesson' });
    const { analysis } = await uploadPresets(educator, text);
    expect(analysis?.presets).toMatchObject([{ status: 'changed', groupUnknown: true }]);
  });
});

describe('importing', () => {
  it('keeps new presets under one’s own name, private, with the engine they came with', async () => {
    const text = changedFile(frozen(2), { engineVersion: '1.4.2' });
    const { added } = await importPresetsWith(technician, text, 'skip');
    expect(added.map(({ title }) => title)).toEqual(['Assessment draft: output just short']);
    const strip = await technician.read(added[0].id);
    expect(strip).toMatchObject({
      keptBy: 'me',
      visibility: 'private',
      version: 1,
      engineVersion: '1.4.2',
      group: 'capture',
      tags: ['assessment', 'no capture', 'threshold'],
    });
    expect(strip.parameters).toEqual((await educator.read(draft)).parameters);
  });

  it('takes a version-1 file, and knows it when it comes again', async () => {
    const first = await importPresetsWith(technician, frozen(1), 'skip');
    expect(first.added).toHaveLength(3);
    const { analysis } = await uploadPresets(technician, frozen(1));
    expect(analysis?.presets.map(({ status }) => status)).toEqual(['same', 'same', 'same']);
    expect(analysis?.presets.map(({ match }) => match?.id)).toEqual(first.added.map(({ id }) => id));
    const again = await importPresetsWith(technician, frozen(1), 'skip');
    expect(again).toEqual({ added: [], replaced: [], skipped: 3, notReplaceable: [] });
  });

  it('asks the second time: skip leaves, keep both adds, replace brings back', async () => {
    const text = await exportPresetsOf(educator, [draft]);
    const [{ id }] = (await importPresetsWith(technician, text, 'skip')).added;
    const strip = await technician.read(id);
    const edited = updateOf(strip, { title: 'Edited since', tags: ['mine'] });
    expect((await technician.send('PUT', `/api/strips/${id}`, edited)).status).toBe(200);
    const { analysis } = await uploadPresets(technician, text);
    expect(analysis?.presets).toMatchObject([{ status: 'changed', match: { id, replaceable: true } }]);

    expect(await importPresetsWith(technician, text, 'skip')).toMatchObject({ added: [], skipped: 1 });
    expect((await technician.read(id)).title).toBe('Edited since');

    const both = await importPresetsWith(technician, text, 'keepBoth');
    expect(both.added).toHaveLength(1);
    expect(both.added[0].id).not.toBe(id);
    expect((await technician.read(id)).title).toBe('Edited since');

    const replaced = await importPresetsWith(technician, text, 'replace');
    expect(replaced).toMatchObject({ added: [], replaced: [{ id }], skipped: 0 });
    expect(await technician.read(id)).toMatchObject({
      title: strip.title,
      tags: strip.tags,
      version: 3,
      parameters: strip.parameters,
    });
  });

  it('decides preset by preset where asked to', async () => {
    const text = await exportPresetsOf(educator, [shared, draft]);
    const one = changedFile(text, { teachingPoint: 'Another point.' });
    const result = await importPresetsWith(educator, one, 'replace', [{ number: 2, choice: 'skip' }]);
    expect(result).toMatchObject({ replaced: [{ id: shared }], skipped: 1 });
    expect((await educator.read(shared)).teachingPoint).toBe('Another point.');
    expect((await educator.read(draft)).teachingPoint).not.toBe('Another point.');
  });

  it('replaces a colleague’s strip of the department as an edit does, and leaves who sees it', async () => {
    const text = changedFile(await exportPresetsOf(educator, [shared]), { title: 'Replaced' });
    await importPresetsWith(technician, text, 'replace');
    expect(await educator.read(shared)).toMatchObject({
      title: 'Replaced',
      keptBy: 'me',
      visibility: 'department',
      version: 2,
    });
  });

  it('never replaces the gallery, and says so', async () => {
    const text = changedFile(await exportPresetsOf(educator, [shipped]), { title: 'Mine now' });
    const before = await educator.read(shipped);
    const result = await importPresetsWith(educator, text, 'replace');
    expect(result).toEqual({
      added: [],
      replaced: [],
      skipped: 0,
      notReplaceable: [{ id: shipped, title: before.title }],
    });
    expect(await educator.read(shipped)).toEqual(before);
  });

  it('does nothing when the library changed since the look', async () => {
    const text = changedFile(await exportPresetsOf(educator, [shared]), { title: 'Replaced' });
    const { analysis } = await uploadPresets(technician, text);
    const meanwhile = updateOf(await educator.read(shared), { title: 'Saved meanwhile' });
    await educator.send('PUT', `/api/strips/${shared}`, meanwhile);
    const decision = { token: analysis?.token ?? '', choice: 'replace' } as const;
    const { status, error } = await uploadPresets(technician, text, decision);
    expect([status, error?.id]).toEqual([409, 'staleImport']);
    expect((await educator.read(shared)).title).toBe('Saved meanwhile');
    const fresh = (error?.details?.analysis as { token: string }).token;
    expect((await uploadPresets(technician, text, { ...decision, token: fresh })).status).toBe(200);
  });

  it('is whole or nothing: a failure in the middle leaves no strip', async () => {
    const before = await countOf(technician);
    const { analysis } = await uploadPresets(technician, frozen(1));
    // The third preset's tags cannot be written.
    await server.database.sequelize.query(`CREATE TRIGGER broken BEFORE INSERT ON strip_tags
      WHEN NEW.tag = 'threshold' BEGIN SELECT RAISE(ABORT, 'broken'); END`);
    const decision = { token: analysis?.token ?? '', choice: 'skip' } as const;
    const answer = await uploadPresets(technician, frozen(1), decision);
    expect(answer.status).toBe(500);
    expect(server.logged.splice(0)).toHaveLength(1);
    await server.database.sequelize.query('DROP TRIGGER broken');
    expect(await countOf(technician)).toBe(before);
  });

  it('of 500 presets works, in one go', async () => {
    const [strip] = (JSON.parse(frozen(2)) as { strips: object[] }).strips;
    const strips = Array.from({ length: 500 }, (_, i) => ({
      ...strip,
      presetId: `p${i}`,
      title: `Preset ${i}`,
    }));
    const text = JSON.stringify({ format: 'paceloom-presets', fileVersion: 2, strips });
    expect((await importPresetsWith(technician, text, 'skip')).added).toHaveLength(500);
    const { analysis } = await uploadPresets(technician, text);
    expect(analysis?.presets.every(({ status }) => status === 'same')).toBe(true);
  });
});

describe('what is refused', () => {
  const cases: [string, string | Uint8Array<ArrayBuffer>, number, string, string][] = [
    ['no JSON', 'hello', 400, 'invalidInput', 'JSON'],
    ['nothing', '', 400, 'invalidInput', 'JSON'],
    ['bytes that are not text', Uint8Array.of(0xff, 0xfe, 0x41), 400, 'invalidInput', 'JSON in UTF-8'],
    ['too deep a nest', '['.repeat(5000), 400, 'invalidInput', '24 levels'],
    ['another kind of JSON', '{"parameters":{}}', 400, 'invalidInput', 'paceloom-presets'],
  ];
  it.each(cases)('%s, in words', async (_, content, status, id, allowed) => {
    const { error, ...answer } = await uploadPresets(educator, content);
    expect([answer.status, error?.id]).toEqual([status, id]);
    expect(error?.problems?.some((one) => one.allowed.includes(allowed))).toBe(true);
  });

  it('a newer file, in a sentence', async () => {
    const text = '{"format":"paceloom-presets","fileVersion":7,"strips":[]}';
    const { status, error } = await uploadPresets(educator, text);
    expect([status, error?.id]).toEqual([400, 'newerFile']);
    expect(error?.message).toMatch(/^This file was written by a newer version of the product/);
  });

  it('a file that is too large, with the limit', async () => {
    const { status, error } = await uploadPresets(educator, ' '.repeat(presetFileLimitMb * 1_000_000 + 1));
    expect([status, error?.id]).toEqual([413, 'tooLarge']);
    expect(error?.message).toBe('The file is larger than 8 MB, the most a preset file may have.');
  });

  it('a wrong value, with preset, field, value and range; the rest of many is counted', async () => {
    const one = changedFile(await exportPresetsOf(educator, [draft]), {
      parameters: { pacing: { lowerRateBpm: 900 } },
    });
    const { error } = await uploadPresets(educator, one);
    expect(error?.message).toBe(
      'This file cannot be imported. One thing in it is wrong. Nothing was changed.',
    );
    expect(error?.problems).toEqual([
      {
        item: 'strip 1, “Assessment draft: output just short”',
        path: 'parameters.pacing.lowerRateBpm',
        value: '900',
        allowed: '20 to 200 /min',
      },
    ]);
    const strips = Array.from({ length: 120 }, () => ({}));
    const many = JSON.stringify({ format: 'paceloom-presets', fileVersion: 2, strips });
    const refused = (await uploadPresets(educator, many)).error;
    expect(refused?.problems).toHaveLength(50);
    expect(Number(refused?.details?.more)).toBeGreaterThan(300);
  });

  it.each([
    ['not JSON', 'decision'],
    ['{}', 'token'],
    ['{"token":"0","choice":"skip"}', 'token'],
    [`{"token":"${'0'.repeat(64)}","choice":"both"}`, 'choice'],
  ])('the decision %s', async (decision, path) => {
    const { status, error } = await uploadPresets(educator, frozen(2), decision);
    expect(status).toBe(400);
    expect(error?.problems?.map((one) => one.path)).toContain(path);
  });

  it('two files, a file of another name, no file, and a form that breaks off', async () => {
    const two = new FormData();
    for (const name of ['a.json', 'b.json']) two.append('file', new Blob(['{}']), name);
    expect((await educator.raw('POST', '/api/strips/import', { body: two })).status).toBe(400);
    const named = await uploadPresets(educator, frozen(2), undefined, 'presets.exe');
    expect([named.status, named.error?.problems?.[0].allowed]).toEqual([
      400,
      'a preset file, ending in .json',
    ]);
    expect((await educator.raw('POST', '/api/strips/import', { body: new FormData() })).status).toBe(400);
    const broken = await educator.raw('POST', '/api/strips/import', {
      body: '--x\r\nContent-Disposition: form-data; name="file"; filename="a.json"\r\n\r\n{',
      headers: { 'content-type': 'multipart/form-data; boundary=x' },
    });
    expect(broken.status).toBe(400);
    const none = await educator.raw('POST', '/api/strips/import', {
      body: 'x',
      headers: { 'content-type': 'multipart/form-data' },
    });
    expect(none.status).toBe(400);
  });
});
