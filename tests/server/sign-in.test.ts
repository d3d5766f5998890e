import { request as httpRequest } from 'node:http';
import jwt from 'jsonwebtoken';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { demoResponseSchema } from '../../shared/api/demo';
import { sessionResponseSchema } from '../../shared/api/session';
import { credentialsOf, errorIdOf, type Answer } from '../support/server/api-client';
import { startTestServer, type TestServer } from '../support/server/test-server';

let server: TestServer;
beforeEach(async () => {
  server = await startTestServer();
});
afterEach(() => server.close());

const wrong = { ...credentialsOf('educator'), password: 'not this one' };

function tokenIn(cookie: string | null): string {
  return (cookie ?? '').split('=')[1];
}

/** Signs in under another host name, which fetch does not let one choose. */
function signInAs(host: string, forwardedProto?: string): Promise<{ status: number; cookies: string[] }> {
  const body = JSON.stringify(credentialsOf('educator'));
  const headers = { host, 'content-type': 'application/json', 'content-length': Buffer.byteLength(body) };
  const forwarded = forwardedProto === undefined ? {} : { 'x-forwarded-proto': forwardedProto };
  return new Promise((resolve, reject) => {
    const request = httpRequest(`${server.url}/api/session`, {
      method: 'POST',
      headers: { ...headers, ...forwarded },
    });
    request.on('response', (response) => {
      response.resume();
      resolve({ status: response.statusCode ?? 0, cookies: response.headers['set-cookie'] ?? [] });
    });
    request.on('error', reject);
    request.end(body);
  });
}

describe('signing in', () => {
  it('says who one is, then and later', async () => {
    const client = server.client();
    const answer = await client.send('POST', '/api/session', credentialsOf('educator'));
    const session = sessionResponseSchema.parse(answer.body);
    expect(session.user).toEqual({
      id: 'demo-educator',
      name: 'Maren Oakhollow',
      email: 'm.oakhollow@tarnvalley.example',
      role: 'educator',
      department: 'Paramedic practice',
      organisation: 'Tarn Valley Ambulance College',
    });
    expect((await client.get('/api/session')).body).toEqual(session);
    expect(JSON.stringify(answer.body)).not.toContain('$2');
  });

  it('takes no heed of the e-mail’s case', async () => {
    const { email, password } = credentialsOf('educator');
    const answer = await server
      .client()
      .send('POST', '/api/session', { email: ` ${email.toUpperCase()}`, password });
    expect(answer.status).toBe(200);
  });

  it('answers a wrong password and an unknown address alike', async () => {
    const wrongPassword = await server.client().send('POST', '/api/session', wrong);
    const unknown = await server
      .client()
      .send('POST', '/api/session', { ...wrong, email: 'nobody@tarnvalley.example' });
    expect(wrongPassword.status).toBe(401);
    expect(unknown.status).toBe(401);
    expect(unknown.body).toEqual(wrongPassword.body);
    expect(wrongPassword.headers.getSetCookie()).toEqual([]);
  });

  it('sets a cookie that scripts cannot read and other sites do not send', async () => {
    const answer = await server.client().send('POST', '/api/session', credentialsOf('educator'));
    const [cookie] = answer.headers.getSetCookie();
    const flags = cookie.split('; ').slice(1);
    expect(flags).toEqual(expect.arrayContaining(['Path=/', 'HttpOnly', 'SameSite=Strict']));
    expect(flags).not.toContain('Secure');
    expect(flags.some((flag) => flag.startsWith('Expires='))).toBe(true);
  });
});

describe('connections', () => {
  it('refuses plain http under any name but this computer’s own', async () => {
    expect(await signInAs('paceloom.tarnvalley.example')).toEqual({ status: 403, cookies: [] });
    expect(await signInAs('localhost.tarnvalley.example')).toEqual({ status: 403, cookies: [] });
    expect((await signInAs('localhost:4280')).status).toBe(200);
  });

  it('does not take a client’s word for https', async () => {
    expect((await signInAs('paceloom.tarnvalley.example', 'https')).status).toBe(403);
  });

  it('takes a trusted proxy’s word for https, and then insists on it', async () => {
    await server.close();
    server = await startTestServer({ trustedProxies: 1 });
    const { status, cookies } = await signInAs('paceloom.tarnvalley.example', 'https');
    expect(status).toBe(200);
    expect(cookies[0].split('; ')).toContain('Secure');
  });
});

describe('too many attempts', () => {
  const limits = { windowMs: 600_000, perPerson: 3, perAddress: 6 };

  beforeEach(async () => {
    await server.close();
    server = await startTestServer({ signInLimits: limits });
  });

  async function attempt(email: string, password: string): Promise<Answer> {
    return server.client().send('POST', '/api/session', { email, password });
  }

  it('lock that person’s sign-in from there, even with the right password, and say for how long', async () => {
    for (let i = 0; i < limits.perPerson; i++) expect((await attempt(wrong.email, 'no')).status).toBe(401);
    const { email, password } = credentialsOf('educator');
    const locked = await attempt(email.toUpperCase(), password);
    expect(locked.status).toBe(429);
    expect(errorIdOf(locked)).toBe('tooManyAttempts');
    const waitS = Number(locked.headers.get('retry-after'));
    expect(waitS).toBeGreaterThan(0);
    expect(waitS).toBeLessThanOrEqual(600);
    const other = credentialsOf('technician');
    expect((await attempt(other.email, other.password)).status).toBe(200);
  });

  it('count failures only', async () => {
    const { email, password } = credentialsOf('educator');
    for (let i = 0; i < 2 * limits.perPerson; i++) expect((await attempt(email, password)).status).toBe(200);
    for (let i = 0; i < 2 * limits.perPerson; i++) expect((await attempt(email, '')).status).toBe(400);
    expect((await attempt(email, 'no')).status).toBe(401);
  });

  it('lock an address that tries one person after another', async () => {
    for (let i = 0; i < limits.perAddress; i++) {
      expect((await attempt(`person${i}@tarnvalley.example`, 'no')).status).toBe(401);
    }
    expect((await attempt('one.more@tarnvalley.example', 'no')).status).toBe(429);
  });
});

describe('a session', () => {
  it('ends with signing out, also for whoever copied the cookie', async () => {
    const client = await server.signedIn('educator');
    const copy = server.client();
    copy.cookie = client.cookie;
    expect((await copy.get('/api/session')).status).toBe(200);
    const answer = await client.send('DELETE', '/api/session');
    expect(answer.status).toBe(204);
    expect(answer.headers.getSetCookie()[0]).toMatch(/^paceloom-session=;/);
    expect(errorIdOf(await copy.get('/api/session'))).toBe('signInRequired');
  });

  it('ends by itself after half a day', async () => {
    let now = new Date('2026-02-01T08:00:00.000Z');
    await server.close();
    server = await startTestServer({ now: () => now });
    const client = await server.signedIn('educator');
    now = new Date('2026-02-01T19:59:59.000Z');
    expect((await client.get('/api/session')).status).toBe(200);
    now = new Date('2026-02-01T20:00:00.000Z');
    expect((await client.get('/api/session')).status).toBe(401);
  });

  it('outlives the server', async () => {
    const client = await server.signedIn('educator');
    const second = await startTestServer({ databaseFile: server.databaseFile });
    const later = second.client();
    later.cookie = client.cookie;
    expect((await later.get('/api/session')).status).toBe(200);
    await second.close();
  });

  it('carries the role the person has now', async () => {
    const client = await server.signedIn('educator');
    await server.database.users.update({ role: 'learner' }, { where: { id: 'demo-educator' } });
    expect((await client.get('/api/strips')).status).toBe(403);
  });

  it('cannot be forged', async () => {
    const { cookie } = await server.signedIn('educator');
    const { sid } = jwt.decode(tokenIn(cookie)) as { sid: string };
    const claims = { sid, sub: 'demo-administrator' };
    const forged = [
      'rubbish',
      '',
      jwt.sign({ ...claims, sub: 'demo-educator' }, 'another key'),
      jwt.sign(claims, null as unknown as string, { algorithm: 'none' }),
      jwt.sign(claims, 'a key for tests only, of no worth'),
      jwt.sign({ sub: 'demo-educator' }, 'a key for tests only, of no worth'),
      `${tokenIn(cookie)}x`,
    ];
    for (const token of forged) {
      const client = server.client();
      client.cookie = `paceloom-session=${token}`;
      expect((await client.get('/api/session')).status).toBe(401);
    }
  });
});

describe('the demonstration', () => {
  it('offers accounts that can be entered, one per role', async () => {
    const { accounts, organisation } = demoResponseSchema.parse(
      (await server.client().get('/api/demo')).body,
    );
    expect(organisation).toBe('Tarn Valley Ambulance College');
    expect(new Set(accounts.map((one) => one.role)).size).toBe(4);
    for (const { email, password, role } of accounts) {
      const answer = await server.client().send('POST', '/api/session', { email, password });
      expect(sessionResponseSchema.parse(answer.body).user.role).toBe(role);
    }
  });

  it('offers none once they are nobody’s demonstration any more', async () => {
    await server.database.users.update({ isDemo: 0 }, { where: {} });
    expect((await server.client().get('/api/demo')).body).toEqual({ organisation: null, accounts: [] });
  });
});
