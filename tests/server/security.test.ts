import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { errorIdOf, type ApiClient } from '../support/server/api-client';
import { startTestServer, type TestServer } from '../support/server/test-server';

let server: TestServer;
let educator: ApiClient;
const clientDirectory = mkdtempSync(join(tmpdir(), 'paceloom-client-'));
beforeAll(async () => {
  mkdirSync(join(clientDirectory, 'assets'));
  writeFileSync(
    join(clientDirectory, 'index.html'),
    '<!doctype html><title>The page</title>nonce __STYLE_NONCE__',
  );
  writeFileSync(join(clientDirectory, 'assets', 'index-a1b2c3.js'), `/* ${'long '.repeat(1000)} */`);
  writeFileSync(join(clientDirectory, 'favicon.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>');
  server = await startTestServer({ clientDirectory });
  educator = await server.signedIn('educator');
});
afterAll(async () => {
  await server.close();
  rmSync(clientDirectory, { recursive: true, force: true });
});

describe('requests from other sites', () => {
  const strip = { title: 'Sent from elsewhere', parameters: {} };
  const refused: Record<string, string>[] = [
    { origin: 'https://elsewhere.example' },
    { origin: 'null' },
    { origin: 'http://127.0.0.1:1' },
    { 'sec-fetch-site': 'cross-site' },
    { 'sec-fetch-site': 'same-site' },
  ];
  it.each(refused)('%o may not change anything', async (headers) => {
    for (const [method, path] of [
      ['POST', '/api/strips'],
      ['PUT', '/api/strips/tarn-valley-week-one-av-sequential'],
      ['DELETE', '/api/strips/tarn-valley-week-one-av-sequential'],
      ['POST', '/api/strips/import'],
      ['POST', '/api/exports'],
      ['POST', '/api/session'],
      ['DELETE', '/api/session'],
    ] as const) {
      const answer = await educator.send(method, path, strip, headers);
      expect(answer.status).toBe(403);
      expect(errorIdOf(answer)).toBe('crossSite');
    }
    expect((await educator.get('/api/session')).status).toBe(200);
  });

  it('from our own pages pass', async () => {
    const headers = { origin: server.url, 'sec-fetch-site': 'same-origin' };
    expect((await educator.send('POST', '/api/strips', strip, headers)).status).toBe(201);
  });

  it('get no permission to read answers', async () => {
    const answer = await educator.raw('GET', '/api/strips', {
      headers: { origin: 'https://elsewhere.example' },
    });
    expect(answer.headers.get('access-control-allow-origin')).toBeNull();
  });
});

describe('headers', () => {
  it.each(['/', '/strips/new', '/api/health', '/api/nothing', '/assets/index-a1b2c3.js'])(
    'of %s allow nothing from another origin',
    async (path) => {
      const { headers } = await educator.raw('GET', path);
      const policy = headers.get('content-security-policy') ?? '';
      const directives = new Map(
        policy.split(';').map((one) => [one.split(' ')[0], one.split(' ').slice(1)]),
      );
      for (const kind of ['default-src', 'script-src', 'connect-src', 'worker-src', 'font-src']) {
        expect(directives.get(kind)).toEqual(["'self'"]);
      }
      expect(policy).not.toMatch(/https?:|\*|unsafe-eval/);
      expect(policy.match(/unsafe-inline/g)).toHaveLength(1);
      // Style elements only with this answer's own nonce.
      expect(directives.get('style-src')).toEqual([
        "'self'",
        expect.stringMatching(/^'nonce-[A-Za-z0-9+/]{22}=='$/),
      ]);
      expect(directives.get('style-src-attr')).toEqual(["'unsafe-inline'"]);
      expect(directives.get('frame-ancestors')).toEqual(["'none'"]);
      expect(headers.get('x-content-type-options')).toBe('nosniff');
      expect(headers.get('x-powered-by')).toBeNull();
    },
  );

  it('keep API answers out of caches', async () => {
    expect((await educator.raw('GET', '/api/strips')).headers.get('cache-control')).toBe('no-store');
    expect((await server.client().raw('GET', '/api/strips')).headers.get('cache-control')).toBe('no-store');
  });
});

describe('pages', () => {
  it.each(['/', '/sign-in', '/strips/new', '/strips/abc?x=1'])(
    '%s is the one page, never cached',
    async (path) => {
      const response = await server.client().raw('GET', path);
      expect(response.status).toBe(200);
      expect(await response.text()).toContain('The page');
      // It carries a nonce of its own, so nothing may keep it.
      expect(response.headers.get('cache-control')).toBe('no-store');
    },
  );

  it('hands the page the nonce of its own answer, a new one each time', async () => {
    const nonces = await Promise.all(
      [1, 2].map(async () => {
        const response = await server.client().raw('GET', '/sign-in');
        const policy = response.headers.get('content-security-policy') ?? '';
        const nonce = /'nonce-([^']+)'/.exec(policy)?.[1] ?? 'none';
        expect(await response.text()).toContain(`nonce ${nonce}`);
        return nonce;
      }),
    );
    expect(nonces[0]).not.toBe(nonces[1]);
  });

  it('keeps hashed files for ever, compressed on the way', async () => {
    const response = await server.client().raw('GET', '/assets/index-a1b2c3.js');
    expect(response.status).toBe(200);
    expect(response.headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
    expect(response.headers.get('content-encoding')).toMatch(/gzip|br/);
  });

  it.each([
    '/assets/index-gone.js',
    '/favicon.ico',
    '/..%2f..%2fpackage.json',
    '/assets/..%2f..%2fsecret.txt',
  ])('%s is 404 and not the page', async (path) => {
    const response = await server.client().raw('GET', path);
    expect(response.status).toBe(404);
    expect(await response.text()).not.toContain('The page');
  });

  it('are not there for other methods', async () => {
    expect((await server.client().raw('POST', '/strips/new')).status).toBe(404);
  });

  it('are said to be missing when they are not built', async () => {
    const bare = await startTestServer();
    expect((await bare.client().raw('GET', '/')).status).toBe(503);
    await bare.close();
  });
});
