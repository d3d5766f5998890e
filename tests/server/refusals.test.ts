import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { apiErrorSchema, type ApiErrorBody } from '../../shared/api/errors';
import { errorIdOf, type ApiClient } from '../support/server/api-client';
import { startTestServer, type TestServer } from '../support/server/test-server';

let server: TestServer;
let educator: ApiClient;
beforeAll(async () => {
  server = await startTestServer();
  educator = await server.signedIn('educator');
});
afterAll(() => server.close());
afterEach(() => expect(server.logged).toEqual([]));

const shared = '/api/strips/tarn-valley-week-one-av-sequential';
const strip = { title: 'A strip', parameters: {} };
const nul = '\u0000';

function pathsOf(body: unknown): string[] {
  return (apiErrorSchema.parse(body).error.problems ?? []).map((problem) => problem.path);
}

describe('bodies that are refused, field by field', () => {
  const cases: { what: string; method: 'POST' | 'PUT'; path: string; body: unknown; problems: string[] }[] = [
    { what: 'no title', method: 'POST', path: '/api/strips', body: { parameters: {} }, problems: ['title'] },
    {
      what: 'an empty title',
      method: 'POST',
      path: '/api/strips',
      body: { ...strip, title: '  ' },
      problems: ['title'],
    },
    {
      what: 'a long title',
      method: 'POST',
      path: '/api/strips',
      body: { ...strip, title: 'x'.repeat(121) },
      problems: ['title'],
    },
    {
      what: 'a NUL in the title',
      method: 'POST',
      path: '/api/strips',
      body: { ...strip, title: `a${nul}b` },
      problems: ['title'],
    },
    {
      what: 'a NUL in a tag',
      method: 'POST',
      path: '/api/strips',
      body: { ...strip, tags: [`a${nul}`] },
      problems: ['tags.0'],
    },
    {
      what: 'a NUL in the notes',
      method: 'POST',
      path: '/api/strips',
      body: { ...strip, parameters: { notes: nul } },
      problems: ['parameters.notes'],
    },
    {
      what: 'the same tag twice',
      method: 'POST',
      path: '/api/strips',
      body: { ...strip, tags: ['Café', 'cafe'] },
      problems: ['tags'],
    },
    {
      what: 'thirteen tags',
      method: 'POST',
      path: '/api/strips',
      body: { ...strip, tags: Array.from({ length: 13 }, (_, i) => `t${i}`) },
      problems: ['tags'],
    },
    {
      what: 'an unknown group',
      method: 'POST',
      path: '/api/strips',
      body: { ...strip, group: 'nowhere' },
      problems: ['group'],
    },
    {
      what: 'an unknown key',
      method: 'POST',
      path: '/api/strips',
      body: { ...strip, owner: 'me' },
      problems: ['owner'],
    },
    {
      what: 'an unknown key inside',
      method: 'POST',
      path: '/api/strips',
      body: { ...strip, parameters: { pacing: { rate: 60 } } },
      problems: ['parameters.pacing.rate'],
    },
    {
      what: 'values out of range, each named',
      method: 'POST',
      path: '/api/strips',
      body: { title: '', parameters: { seed: -1, pacing: { lowerRateBpm: 500 } } },
      problems: ['title', 'parameters.seed', 'parameters.pacing.lowerRateBpm'],
    },
    {
      what: 'no version',
      method: 'PUT',
      path: shared,
      body: { ...strip, teachingPoint: '', tags: [], group: null, visibility: 'private' },
      problems: ['version'],
    },
    { what: 'a list', method: 'POST', path: '/api/strips', body: [], problems: ['(root)'] },
    { what: 'null', method: 'POST', path: '/api/strips', body: null, problems: ['(root)'] },
    {
      what: 'neither parameters nor strip',
      method: 'POST',
      path: '/api/strips/render',
      body: {},
      problems: ['(root)'],
    },
    {
      what: 'an e-mail that is none',
      method: 'POST',
      path: '/api/session',
      body: { email: 'x', password: 'y' },
      problems: ['email'],
    },
    {
      what: 'an e-mail that is an object',
      method: 'POST',
      path: '/api/session',
      body: { email: { $gt: '' }, password: ['y'] },
      problems: ['email', 'password'],
    },
    {
      what: 'a title for a copy that is no text',
      method: 'POST',
      path: `${shared}/duplicate`,
      body: { title: 7 },
      problems: ['title'],
    },
  ];

  it.each(cases)('$what', async ({ method, path, body, problems }) => {
    const answer = await educator.send(method, path, body);
    expect(answer.status).toBe(400);
    expect(errorIdOf(answer)).toBe('invalidInput');
    expect(pathsOf(answer.body).sort()).toEqual([...problems].sort());
  });

  it('names value and allowed range of each problem', async () => {
    const answer = await educator.send<ApiErrorBody>('POST', '/api/strips', {
      ...strip,
      parameters: { pacing: { lowerRateBpm: 500 } },
    });
    expect(answer.body.error.problems).toEqual([
      { path: 'parameters.pacing.lowerRateBpm', value: '500', allowed: '20 to 200 /min' },
    ]);
  });

  it('refuses __proto__ as the unknown key it is', async () => {
    const body = '{"title":"x","parameters":{},"__proto__":{"visibility":"department"}}';
    const response = await educator.raw('POST', '/api/strips', {
      body,
      headers: { 'content-type': 'application/json' },
    });
    expect([400, 201]).toContain(response.status);
    const answer = (await response.json()) as { strip?: { visibility: string } };
    expect(answer.strip?.visibility ?? 'private').toBe('private');
  });
});

describe('bodies that cannot be read', () => {
  const json = { 'content-type': 'application/json' };
  const cases: {
    what: string;
    body?: RequestInit['body'];
    headers: Record<string, string>;
    status: number;
    id: string;
  }[] = [
    { what: 'cut JSON', body: '{"title":', headers: json, status: 400, id: 'invalidInput' },
    {
      what: 'bytes that are no text',
      body: new Uint8Array([0xff, 0xfe, 0x00]),
      headers: json,
      status: 400,
      id: 'invalidInput',
    },
    { what: 'a NUL alone', body: nul, headers: json, status: 400, id: 'invalidInput' },
    { what: 'no body', headers: json, status: 400, id: 'invalidInput' },
    {
      what: 'nesting without end',
      body: '['.repeat(100_000),
      headers: json,
      status: 400,
      id: 'invalidInput',
    },
    {
      what: 'deep nesting in a field',
      body: `{"title":${'['.repeat(5000)}${']'.repeat(5000)}}`,
      headers: json,
      status: 400,
      id: 'invalidInput',
    },
    {
      what: 'brackets inside a text are text',
      body: `{"title":"${'['.repeat(130)}"}`,
      headers: json,
      status: 400,
      id: 'invalidInput',
    },
    {
      what: 'a form',
      body: 'title=x',
      headers: { 'content-type': 'application/x-www-form-urlencoded' },
      status: 415,
      id: 'wrongContentType',
    },
    {
      what: 'text',
      body: '{}',
      headers: { 'content-type': 'text/plain' },
      status: 415,
      id: 'wrongContentType',
    },
    {
      what: 'no content type',
      body: new Uint8Array([123, 125]),
      headers: {},
      status: 415,
      id: 'wrongContentType',
    },
    {
      what: 'an unknown character set',
      body: '{}',
      headers: { 'content-type': 'application/json; charset=klingon' },
      status: 415,
      id: 'wrongContentType',
    },
    {
      what: 'an unknown encoding',
      body: '{}',
      headers: { ...json, 'content-encoding': 'zip' },
      status: 415,
      id: 'wrongContentType',
    },
    {
      what: 'a body that is not what its encoding says',
      body: '{}',
      headers: { ...json, 'content-encoding': 'gzip' },
      status: 400,
      id: 'invalidInput',
    },
    {
      what: 'half a megabyte',
      body: JSON.stringify({ title: 'x'.repeat(500_000) }),
      headers: json,
      status: 413,
      id: 'tooLarge',
    },
  ];

  it.each(cases)('$what', async ({ body, headers, status, id }) => {
    const response = await educator.raw('POST', '/api/strips', { body, headers });
    const answer = {
      status: response.status,
      headers: response.headers,
      body: (await response.json()) as unknown,
    };
    expect(answer.status).toBe(status);
    expect(errorIdOf(answer)).toBe(id);
  });

  it('are not even read before the session is checked', async () => {
    const body = JSON.stringify({ title: 'x'.repeat(500_000) });
    const response = await server.client().raw('POST', '/api/strips', { body, headers: json });
    expect(response.status).toBe(401);
  });
});

describe('addresses', () => {
  const missing = [
    'nothing',
    '%00',
    '..%2f..%2fetc',
    '%20',
    'UPPER',
    'a--b',
    'x'.repeat(65),
    '1;DROP TABLE strips',
    '💓',
  ];
  it.each(missing)('strip %s is not there', async (id) => {
    const answer = await educator.get(`/api/strips/${encodeURI(id).replace(/%25/g, '%')}`);
    expect(answer.status).toBe(404);
    expect(errorIdOf(answer)).toBe('notFound');
  });

  it('that cannot be decoded are refused', async () => {
    const answer = await educator.get('/api/strips/%E0%A4%A');
    expect(answer.status).toBe(400);
    expect(errorIdOf(answer)).toBe('invalidInput');
  });

  it('without a route are 404 in JSON, for everyone', async () => {
    for (const client of [educator, server.client()]) {
      const answer = await client.get('/api/nothing/here');
      expect(answer.status).toBe(404);
      expect(errorIdOf(answer)).toBe('notFound');
    }
  });

  it('say which methods they take', async () => {
    const answer = await educator.send('PATCH', '/api/strips');
    expect(answer.status).toBe(405);
    expect(errorIdOf(answer)).toBe('methodNotAllowed');
    expect(answer.headers.get('allow')).toBe('GET, POST');
  });
});

describe('queries', () => {
  const cases = [
    ['page=0', 'page'],
    ['page=1.5', 'page'],
    ['page=x', 'page'],
    ['page=1&page=2', 'page'],
    ['pageSize=101', 'pageSize'],
    ['sort=colour', 'sort'],
    ['keptBy=nobody', 'keptBy'],
    ['group=nowhere', 'group'],
    ['search=%00', 'search'],
    ['search=a&search=b', 'search'],
    [`search=${'x'.repeat(201)}`, 'search'],
    ['tag=', 'tag.0'],
    ['colour=red', 'colour'],
    ['__proto__[x]=1', '__proto__[x]'],
  ];
  it.each(cases)('%s is refused at %s', async (query, path) => {
    const answer = await educator.get(`/api/strips?${query}`);
    expect(answer.status).toBe(400);
    expect(pathsOf(answer.body)).toEqual([path]);
  });
});

describe('a defect of ours', () => {
  it('answers one safe 500, is logged, and says nothing of its insides', async () => {
    const kept = await educator.keep(strip);
    await server.database.strips.update({ parameters: '{"seed":"secret"}' }, { where: { id: kept.id } });
    const answer = await educator.get<ApiErrorBody>(`/api/strips/${kept.id}`);
    expect(answer.status).toBe(500);
    expect(answer.body.error.id).toBe('unexpected');
    expect(JSON.stringify(answer.body)).not.toContain('secret');
    const list = await educator.get<{ strips: unknown[]; total: number }>('/api/strips?keptBy=me');
    expect(list.status).toBe(200);
    expect(list.body.strips).toHaveLength(list.body.total - 1);
    expect(server.logged).toHaveLength(2);
    server.logged.length = 0;
    await educator.send('DELETE', `/api/strips/${kept.id}`);
  });
});
