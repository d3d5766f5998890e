import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { stripListResponseSchema, type StripListResponse } from '../../shared/api/strip-list';
import { courseGroups } from '../../shared/gallery/course';
import { gallery } from '../../shared/gallery/gallery';
import type { ApiClient } from '../support/server/api-client';
import { startTestServer, type TestServer } from '../support/server/test-server';

let server: TestServer;
let educator: ApiClient;
beforeAll(async () => {
  server = await startTestServer();
  educator = await server.signedIn('educator');
});
afterAll(() => server.close());

async function list(query: string, client = educator): Promise<StripListResponse> {
  const { status, body } = await client.get<StripListResponse>(`/api/strips?${query}`);
  if (status !== 200) throw new Error(`${query} answered ${status}: ${JSON.stringify(body)}`);
  return body;
}

const titles = (answer: StripListResponse): string[] => answer.strips.map((strip) => strip.title);
const ids = (answer: StripListResponse): string[] => answer.strips.map((strip) => strip.id);

describe('what is listed', () => {
  it('is as the schema says', async () => {
    const answer = await list('pageSize=100');
    expect(stripListResponseSchema.parse(answer)).toEqual(answer);
  });

  it('is what the one who asks may see, and kept by exactly one', async () => {
    const answer = await list('pageSize=100');
    const { everyone, me, department, gallery: shipped } = answer.facets.keptBy;
    expect(answer.total).toBe(gallery.length + 4);
    expect({ everyone, me, department, shipped }).toEqual({
      everyone: gallery.length + 4,
      me: 3,
      department: 1,
      shipped: gallery.length,
    });
    const other = await list('pageSize=100', await server.signedIn('otherDepartment'));
    expect(other.total).toBe(gallery.length);
  });

  it.each(['me', 'department', 'gallery'] as const)('filters by keeper %s', async (keeper) => {
    const answer = await list(`keptBy=${keeper}&pageSize=100`);
    expect(answer.strips.map((strip) => strip.keptBy)).toEqual(Array(answer.total).fill(keeper));
    expect(answer.total).toBe(answer.facets.keptBy[keeper]);
  });
});

describe('search', () => {
  it('looks in title, teaching point, tags and notes', async () => {
    const own = async (search: string): Promise<string[]> =>
      ids(await list(`keptBy=me&search=${encodeURIComponent(search)}`));
    expect(await own('old unipolar')).toEqual(['tarn-valley-unipolar-ward-story']);
    expect(await own('perfuses')).toEqual(['tarn-valley-failing-output-draft']);
    expect(await own('assessment threshold')).toEqual(['tarn-valley-failing-output-draft']);
    expect(await own('spring')).toEqual(['tarn-valley-failing-output-draft']);
    expect(await own('perfuses unipolar')).toEqual([]);
  });

  it('takes no heed of case or accents', async () => {
    const kept = await educator.keep({ title: 'Überleitung geprüft', parameters: {} });
    for (const search of ['überleitung', 'UBERLEITUNG', 'GEPRUFT ÜBER']) {
      expect(ids(await list(`search=${encodeURIComponent(search)}`))).toEqual([kept.id]);
    }
    await educator.send('DELETE', `/api/strips/${kept.id}`);
  });

  it('takes wildcards and quotes as they are', async () => {
    const kept = await educator.keep({ title: `100% of "beats" don't_x\\y`, parameters: {} });
    for (const search of ['100%', '"beats"', "don't_x", '\\y', `100% don't`]) {
      expect(ids(await list(`search=${encodeURIComponent(search)}`))).toEqual([kept.id]);
    }
    for (const search of ['1%0', 'don_t_x', "' OR 1=1 --", '%%%']) {
      expect(ids(await list(`search=${encodeURIComponent(search)}`))).toEqual([]);
    }
    await educator.send('DELETE', `/api/strips/${kept.id}`);
  });
});

describe('tags and groups', () => {
  it('must all hold, whatever their case', async () => {
    const both = await list('tag=VVI&tag=UNIPOLAR&keptBy=me');
    expect(ids(both)).toEqual(['tarn-valley-unipolar-ward-story']);
    expect(both.facets.tags.map((one) => one.tag).sort()).toEqual(['VVI', 'spike size', 'unipolar'].sort());
    expect((await list('tag=VVI&tag=DDD&keptBy=me')).total).toBe(0);
    expect((await list('tag=VV&keptBy=me')).total).toBe(0);
  });

  it('are counted with all other filters applied', async () => {
    const answer = await list('keptBy=me&group=capture&pageSize=100');
    expect(answer.total).toBe(1);
    expect(answer.facets.keptBy.gallery).toBe(gallery.filter((one) => one.group === 'capture').length);
    const groups = Object.fromEntries(answer.facets.groups.map(({ id, count }) => [id, count]));
    expect(groups).toMatchObject({ 'two-chambers': 1, 'recognise-the-chamber': 1, capture: 1, sensing: 0 });
    expect(answer.facets.groups.map((one) => one.id)).toEqual(courseGroups.map((one) => one.id));
  });

  it('counts each tag as often as strips carry it', async () => {
    const { strips, facets } = await list('keptBy=gallery&pageSize=100');
    for (const { tag, count } of facets.tags) {
      const carrying = strips.filter((strip) =>
        strip.tags.some((one) => one.toLowerCase() === tag.toLowerCase()),
      );
      expect({ tag, count }).toEqual({ tag, count: carrying.length });
    }
    expect(facets.tags.map((one) => one.count)).toEqual(
      facets.tags.map((one) => one.count).sort((a, b) => b - a),
    );
  });
});

describe('order and pages', () => {
  it('follows the course unless told otherwise', async () => {
    const answer = await list('keptBy=gallery&pageSize=100');
    expect(ids(answer)).toEqual(
      courseGroups.flatMap((group) => gallery.filter((one) => one.group === group.id).map((one) => one.id)),
    );
  });

  it('sorts by title, both ways', async () => {
    const up = titles(await list('sort=title&pageSize=100'));
    const down = titles(await list('sort=title&direction=descending&pageSize=100'));
    expect(up).toEqual([...up].sort((a, b) => (a.toLowerCase() < b.toLowerCase() ? -1 : 1)));
    expect(down).toEqual([...up].reverse());
  });

  it('sorts by last change, newest first', async () => {
    const older = await educator.keep({ title: 'Older', parameters: {} });
    await educator.keep({ title: 'Newer', parameters: {} });
    expect(titles(await list('sort=updated&pageSize=2'))).toEqual(['Newer', 'Older']);
    const changed = {
      version: 1,
      title: 'Older',
      teachingPoint: '',
      tags: [],
      group: null,
      visibility: 'private',
      parameters: {},
    };
    await educator.send('PUT', `/api/strips/${older.id}`, changed);
    expect(titles(await list('sort=updated&pageSize=2'))).toEqual(['Older', 'Newer']);
  });

  it('cuts into pages without loss or repeat, and is empty past the end', async () => {
    const all = ids(await list('pageSize=100'));
    const pages: string[] = [];
    for (let page = 1; page <= Math.ceil(all.length / 7); page++)
      pages.push(...ids(await list(`page=${page}&pageSize=7`)));
    expect(pages).toEqual(all);
    const past = await list('page=1000&pageSize=7');
    expect(past.strips).toEqual([]);
    expect(past.total).toBe(all.length);
  });
});
