import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { ApiErrorBody } from '../../shared/api/errors';
import { stripResponseSchema, stripSchema, type StripResponse } from '../../shared/api/strips';
import { drawsDifferently, engineVersion } from '../../shared/engine/engine-version';
import { parseStripParameters } from '../../shared/parameters/parse';
import { errorIdOf, updateOf, type ApiClient } from '../support/server/api-client';
import { startTestServer, type TestServer } from '../support/server/test-server';

let server: TestServer;
let educator: ApiClient;
beforeEach(async () => {
  server = await startTestServer();
  educator = await server.signedIn('educator');
});
afterEach(() => server.close());

const strip = {
  title: '  AV sequential, late V  ',
  teachingPoint: 'Two spikes a beat.',
  tags: ['AV sequential', 'lesson 3'],
  group: 'two-chambers',
  parameters: {
    title: 'another title',
    notes: 'quiet notes',
    pacing: { source: 'implanted', pacedAvDelayMs: 210 },
  },
};

describe('keeping a strip', () => {
  it('gives back what was kept, complete and under one title', async () => {
    const kept = await educator.keep(strip);
    expect(stripSchema.parse(kept)).toEqual(kept);
    expect(kept).toMatchObject({
      title: 'AV sequential, late V',
      tags: ['AV sequential', 'lesson 3'],
      group: 'two-chambers',
      visibility: 'private',
      keptBy: 'me',
      owner: { id: 'demo-educator', name: 'Maren Oakhollow' },
      version: 1,
      canEdit: true,
      canDelete: true,
    });
    expect(kept.parameters).toEqual(parseStripParameters({ ...strip.parameters, title: kept.title }));
    expect(await educator.read(kept.id)).toEqual(kept);
  });

  it('says where the new strip is', async () => {
    const answer = await educator.send<StripResponse>('POST', '/api/strips', strip);
    expect(answer.headers.get('location')).toBe(`/api/strips/${answer.body.strip.id}`);
  });

  it('says which engine each strip was saved with, and takes the new one with the next save', async () => {
    const kept = await educator.keep(strip);
    expect(kept.engineVersion).toBe(engineVersion);
    await server.database.strips.update({ engineVersion: '0.9.0' }, { where: { id: kept.id } });
    const old = await educator.read(kept.id);
    expect(old.engineVersion).toBe('0.9.0');
    expect(drawsDifferently(old.engineVersion)).toBe(true);
    const again = await educator.send<StripResponse>('PUT', `/api/strips/${kept.id}`, updateOf(old));
    expect(again.body.strip.engineVersion).toBe(engineVersion);
  });

  it('brings parameters that were saved under an older schema up to date', async () => {
    const kept = await educator.keep(strip);
    const sparse = JSON.stringify({ pacing: { source: 'implanted' } });
    await server.database.strips.update({ parameters: sparse }, { where: { id: kept.id } });
    const read = await educator.read(kept.id);
    expect(read.parameters).toEqual(parseStripParameters({ pacing: { source: 'implanted' } }));
  });
});

describe('saving changes', () => {
  it('replaces everything and counts the version up', async () => {
    const kept = await educator.keep(strip);
    const changes = {
      title: 'Later',
      tags: ['other'],
      group: null,
      visibility: 'department',
      parameters: { seed: 9 },
    };
    const answer = await educator.send('PUT', `/api/strips/${kept.id}`, updateOf(kept, changes));
    const { strip: saved } = stripResponseSchema.parse(answer.body);
    expect(saved).toMatchObject({
      ...changes,
      version: 2,
      createdAt: kept.createdAt,
      parameters: { seed: 9 },
    });
    expect(saved.parameters.title).toBe('Later');
    expect(saved.parameters.pacing.source).toBe('none');
  });

  it('refuses a stale save with the strip as it stands, and loses nothing', async () => {
    const kept = await educator.keep(strip);
    await educator.send('PUT', `/api/strips/${kept.id}`, updateOf(kept, { title: 'First' }));
    const second = await educator.send<ApiErrorBody>(
      'PUT',
      `/api/strips/${kept.id}`,
      updateOf(kept, { title: 'Second', tags: [] }),
    );
    expect(second.status).toBe(409);
    expect(second.body.error.id).toBe('staleStrip');
    const current = stripSchema.parse(second.body.error.details?.current);
    expect(current).toMatchObject({ title: 'First', version: 2, tags: strip.tags });
    expect(await educator.read(kept.id)).toEqual(current);
  });

  it('lets exactly one of many writers at once win', async () => {
    const kept = await educator.keep({ ...strip, visibility: 'department' });
    const technician = await server.signedIn('technician');
    const writers = Array.from({ length: 8 }, (_, i) => ({
      client: i % 2 ? educator : technician,
      title: `Writer ${i}`,
    }));
    const answers = await Promise.all(
      writers.map(({ client, title }) =>
        client.send<StripResponse>('PUT', `/api/strips/${kept.id}`, updateOf(kept, { title, tags: [title] })),
      ),
    );
    const statuses = answers.map((answer) => answer.status).sort();
    expect(statuses).toEqual([200, ...Array<number>(7).fill(409)]);
    const winner = answers.find((answer) => answer.status === 200);
    const { title, tags, version } = await educator.read(kept.id);
    expect({ title, tags, version }).toEqual({
      title: winner?.body.strip.title,
      tags: [winner?.body.strip.title],
      version: 2,
    });
  });

  it('answers 404 for a strip that was deleted meanwhile', async () => {
    const kept = await educator.keep(strip);
    await educator.send('DELETE', `/api/strips/${kept.id}`);
    const answer = await educator.send('PUT', `/api/strips/${kept.id}`, updateOf(kept));
    expect(errorIdOf(answer)).toBe('notFound');
  });
});

describe('duplicating', () => {
  it('makes a private copy of one’s own, down to the parameters', async () => {
    const original = await educator.read('tarn-valley-mannequin-monitor-lead');
    const answer = await educator.send('POST', `/api/strips/${original.id}/duplicate`);
    const { strip: copy } = stripResponseSchema.parse(answer.body);
    const title = `Copy of ${original.title}`;
    expect(copy).toMatchObject({
      title,
      tags: original.tags,
      group: original.group,
      teachingPoint: original.teachingPoint,
      parameters: { ...original.parameters, title },
      visibility: 'private',
      keptBy: 'me',
      version: 1,
    });
    expect(copy.id).not.toBe(original.id);
    expect(await educator.read(original.id)).toEqual(original);
  });

  it('takes a title, and cuts a made-up one to the length a title may have', async () => {
    const kept = await educator.keep({ ...strip, title: 'x'.repeat(120) });
    const named = await educator.send<StripResponse>('POST', `/api/strips/${kept.id}/duplicate`, {
      title: 'Mine',
    });
    const unnamed = await educator.send<StripResponse>('POST', `/api/strips/${kept.id}/duplicate`, {});
    expect(named.body.strip.title).toBe('Mine');
    expect(unnamed.body.strip.title).toBe(`Copy of ${'x'.repeat(112)}`);
  });
});

describe('deleting', () => {
  it('hides the strip from everyone, and undoing brings it back as it was', async () => {
    const kept = await educator.keep({ ...strip, visibility: 'department' });
    const technician = await server.signedIn('technician');
    expect((await educator.send('DELETE', `/api/strips/${kept.id}`)).status).toBe(204);
    for (const client of [educator, technician]) {
      expect((await client.get(`/api/strips/${kept.id}`)).status).toBe(404);
      const { body } = await client.get<{ total: number }>(
        `/api/strips?search=${encodeURIComponent('AV sequential, late V')}`,
      );
      expect(body.total).toBe(0);
    }
    expect((await educator.send('DELETE', `/api/strips/${kept.id}`)).status).toBe(404);
    expect((await technician.send('POST', `/api/strips/${kept.id}/restore`)).status).toBe(403);
    const restored = await educator.send<StripResponse>('POST', `/api/strips/${kept.id}/restore`);
    expect(restored.body.strip).toEqual(kept);
    expect(await educator.read(kept.id)).toEqual(kept);
  });

  it('undone twice changes nothing', async () => {
    const kept = await educator.keep(strip);
    const again = await educator.send<StripResponse>('POST', `/api/strips/${kept.id}/restore`);
    expect(again.status).toBe(200);
    expect(again.body.strip).toEqual(kept);
  });
});
