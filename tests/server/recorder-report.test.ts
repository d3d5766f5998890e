import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { ApiErrorBody } from '../../shared/api/errors';
import type { ApiClient } from '../support/server/api-client';
import { startTestServer, type TestServer } from '../support/server/test-server';

let server: TestServer;
let learner: ApiClient;
beforeEach(async () => {
  server = await startTestServer();
  learner = await server.signedIn('learner');
});
afterEach(() => server.close());

const send = (body: unknown) =>
  learner.raw('POST', '/api/recorder-report', {
    body: JSON.stringify(body),
    headers: { 'content-type': 'application/json' },
  });
const monitor = { kind: 'recorder', recorder: { bandwidth: 'monitor' } };

describe('the conformance report from the server', () => {
  it('is a dated PDF', async () => {
    const answer = await send({ settings: [monitor, { kind: 'recorder', recorder: {} }] });
    expect(answer.status).toBe(200);
    expect(answer.headers.get('content-type')).toContain('application/pdf');
    expect(answer.headers.get('content-disposition')).toMatch(/recorder-conformance-\d{4}-\d{2}-\d{2}\.pdf/);
    const bytes = Buffer.from(await answer.arrayBuffer());
    expect(bytes.subarray(0, 5).toString()).toBe('%PDF-');
    expect(bytes.subarray(-6).toString()).toContain('%%EOF');
  });

  it.each([
    ['no setting', { settings: [] }, 'settings', ''],
    ['five settings', { settings: Array(5).fill(monitor) }, 'settings', '4'],
    ['an unknown kind', { settings: [{ kind: 'loud' }] }, 'settings.0.kind', ''],
    [
      'a bandwidth that is none',
      { settings: [{ kind: 'recorder', recorder: { bandwidth: 'loud' } }] },
      'settings.0.recorder.bandwidth',
      'monitor',
    ],
    [
      'limits the wrong way round',
      { settings: [{ kind: 'recorder', recorder: { bandwidth: { lowHz: 40, highHz: 20 } } }] },
      'settings.0.recorder.bandwidth',
      '',
    ],
    [
      'a zero-phase limit out of range',
      { settings: [{ kind: 'zeroPhase', lowHz: 1000, recorder: {} }] },
      'settings.0.lowHz',
      'Hz',
    ],
    ['what is no object', ['monitor'], '', ''],
  ])('refuses %s, naming the field', async (_, body, path, allowed) => {
    const answer = await send(body);
    expect(answer.status).toBe(400);
    const { error } = (await answer.json()) as ApiErrorBody;
    const problem = error.problems?.find((one) => one.path.startsWith(path));
    expect(problem).toBeDefined();
    expect(problem?.allowed).toContain(allowed);
    expect(server.logged).toEqual([]);
  });
});
