import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { routeAccess } from '../../server/middleware/authorize';
import type { ApiClient, Person } from '../support/server/api-client';
import { startTestServer, type TestServer } from '../support/server/test-server';

/** An educator's strip, shared with the department, version 1. */
const shared = 'tarn-valley-week-one-av-sequential';

/** What a person's own exports allow is in exports.test.ts. */
const noExport = '/api/exports/6f1c1d5e-64a5-4f3f-9d3f-0d6a3b1f5b11';

const newStrip = {
  title: 'Changed',
  teachingPoint: '',
  tags: [],
  group: null,
  visibility: 'department',
  parameters: {},
};
const strip = { version: 1, ...newStrip };

type Asker = Person | 'nobody';
type Statuses = Record<Asker, number>;

/** Statuses of a route that makes strips. */
function makers(status: number, exceptions: Partial<Statuses> = {}): Statuses {
  return {
    nobody: 401,
    learner: 403,
    educator: status,
    technician: status,
    administrator: status,
    otherDepartment: status,
    ...exceptions,
  };
}

function everyone(status: number, nobody = status): Statuses {
  return { ...makers(status), learner: status, nobody };
}

interface RouteCase {
  route: string;
  path: string;
  body?: unknown;
  expected: Statuses;
}

/** Written out by hand: what product.md says each role may do. */
const cases: RouteCase[] = [
  { route: 'GET /api/health', path: '/api/health', expected: everyone(200) },
  { route: 'GET /api/demo', path: '/api/demo', expected: everyone(200) },
  { route: 'POST /api/session', path: '/api/session', body: {}, expected: everyone(400) },
  { route: 'GET /api/session', path: '/api/session', expected: everyone(200, 401) },
  { route: 'DELETE /api/session', path: '/api/session', expected: everyone(204) },
  {
    route: 'POST /api/recorder-report',
    path: '/api/recorder-report',
    body: { settings: [{ kind: 'recorder', recorder: {} }] },
    expected: everyone(200, 401),
  },
  { route: 'GET /api/exports', path: '/api/exports', expected: makers(200) },
  { route: 'POST /api/exports', path: '/api/exports', body: {}, expected: makers(400) },
  { route: 'GET /api/exports/:exportId', path: noExport, expected: makers(404) },
  { route: 'DELETE /api/exports/:exportId', path: noExport, expected: makers(404) },
  { route: 'GET /api/exports/:exportId/file', path: `${noExport}/file`, expected: makers(404) },
  { route: 'POST /api/exports/:exportId/cancel', path: `${noExport}/cancel`, expected: makers(404) },
  { route: 'POST /api/exports/:exportId/restart', path: `${noExport}/restart`, expected: makers(404) },
  {
    route: 'POST /api/sheets',
    path: '/api/sheets',
    body: {
      strips: [{ stripId: shared }],
      setup: { sheets: 'plain', layout: 'single' },
      format: 'svg',
      page: 1,
    },
    expected: makers(200, { otherDepartment: 404 }),
  },
  { route: 'GET /api/strips', path: '/api/strips', expected: makers(200) },
  { route: 'POST /api/strips', path: '/api/strips', body: newStrip, expected: makers(201) },
  {
    route: 'POST /api/strips/render',
    path: '/api/strips/render',
    body: { stripId: shared, parameters: {} },
    expected: makers(400),
  },
  {
    route: 'POST /api/strips/export',
    path: '/api/strips/export',
    body: { ids: [shared] },
    expected: makers(200, { otherDepartment: 404 }),
  },
  { route: 'POST /api/strips/import', path: '/api/strips/import', body: {}, expected: makers(400) },
  {
    route: 'GET /api/strips/:stripId',
    path: `/api/strips/${shared}`,
    expected: makers(200, { otherDepartment: 404 }),
  },
  {
    route: 'PUT /api/strips/:stripId',
    path: `/api/strips/${shared}`,
    body: strip,
    expected: makers(200, { otherDepartment: 404 }),
  },
  {
    route: 'DELETE /api/strips/:stripId',
    path: `/api/strips/${shared}`,
    expected: makers(204, { technician: 403, otherDepartment: 404 }),
  },
  {
    route: 'POST /api/strips/:stripId/duplicate',
    path: `/api/strips/${shared}/duplicate`,
    expected: makers(201, { otherDepartment: 404 }),
  },
  {
    route: 'POST /api/strips/:stripId/restore',
    path: `/api/strips/${shared}/restore`,
    expected: makers(200, { technician: 403, otherDepartment: 404 }),
  },
];

let server: TestServer;
beforeEach(async () => {
  server = await startTestServer();
});
afterEach(() => server.close());

function asker(who: Asker): Promise<ApiClient> | ApiClient {
  return who === 'nobody' ? server.client() : server.signedIn(who);
}

describe('who may ask for what', () => {
  it('covers every route', () => {
    expect(cases.map((one) => one.route).sort()).toEqual(Object.keys(routeAccess).sort());
  });

  const pairs = cases.flatMap((one) =>
    (Object.keys(one.expected) as Asker[]).map((who) => ({ ...one, who, status: one.expected[who] })),
  );
  it.each(pairs)('$route by $who answers $status', async ({ route, path, body, who, status }) => {
    const client = await asker(who);
    const method = route.split(' ')[0] as 'GET' | 'POST' | 'PUT' | 'DELETE';
    const answer = await client.send(method, path, body);
    expect(answer.status).toBe(status);
    expect(server.logged).toEqual([]);
  });
});

describe('private strips', () => {
  const own = 'tarn-valley-failing-output-draft';

  it.each(['technician', 'administrator', 'otherDepartment'] as const)('do not exist for %s', async (who) => {
    const client = await server.signedIn(who);
    expect((await client.get(`/api/strips/${own}`)).status).toBe(404);
    expect((await client.send('PUT', `/api/strips/${own}`, strip)).status).toBe(404);
    expect((await client.send('DELETE', `/api/strips/${own}`)).status).toBe(404);
    expect((await client.send('POST', `/api/strips/${own}/duplicate`)).status).toBe(404);
    expect((await client.send('POST', `/api/strips/${own}/restore`)).status).toBe(404);
    expect((await client.send('POST', '/api/strips/render', { stripId: own })).status).toBe(404);
    const sheets = { strips: [{ stripId: own }], setup: {}, format: 'pdf' };
    expect((await client.send('POST', '/api/sheets', sheets)).status).toBe(404);
  });

  it('are their owner’s to change', async () => {
    const client = await server.signedIn('educator');
    expect((await client.send('PUT', `/api/strips/${own}`, { ...strip, visibility: 'private' })).status).toBe(
      200,
    );
  });
});

describe('a department’s strip', () => {
  it('may be edited by a colleague, who may not hide it from the others', async () => {
    const client = await server.signedIn('technician');
    const hidden = await client.send('PUT', `/api/strips/${shared}`, { ...strip, visibility: 'private' });
    expect(hidden.status).toBe(403);
    expect(await client.read(shared)).toMatchObject({ version: 1, canEdit: true, canDelete: false });
  });

  it('may be hidden by its owner, and is gone for colleagues then', async () => {
    const owner = await server.signedIn('educator');
    const colleague = await server.signedIn('technician');
    const hidden = await owner.send('PUT', `/api/strips/${shared}`, { ...strip, visibility: 'private' });
    expect(hidden.status).toBe(200);
    expect((await colleague.get(`/api/strips/${shared}`)).status).toBe(404);
  });
});

describe('a strip of the gallery', () => {
  it('is nobody’s to change or delete, and everybody’s to duplicate', async () => {
    const client = await server.signedIn('administrator');
    const id = 'demand-pacing-inhibited';
    expect(await client.read(id)).toMatchObject({
      keptBy: 'gallery',
      owner: null,
      canEdit: false,
      canDelete: false,
    });
    expect((await client.send('PUT', `/api/strips/${id}`, strip)).status).toBe(403);
    expect((await client.send('DELETE', `/api/strips/${id}`)).status).toBe(403);
    expect((await client.send('POST', `/api/strips/${id}/restore`)).status).toBe(403);
    expect((await client.send('POST', `/api/strips/${id}/duplicate`)).status).toBe(201);
  });
});
