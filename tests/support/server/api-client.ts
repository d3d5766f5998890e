import type { ApiErrorBody } from '../../../shared/api/errors';
import type { Strip, StripResponse } from '../../../shared/api/strips';
import { demoPeople } from '../../../server/services/demo/demo-people';

/** People of the demonstration by what the tests need them for. */
export const personIds = {
  educator: 'demo-educator',
  technician: 'demo-technician',
  learner: 'demo-learner',
  administrator: 'demo-administrator',
  otherDepartment: 'demo-nursing-educator',
} as const;
export type Person = keyof typeof personIds;

export function credentialsOf(person: Person): { email: string; password: string } {
  const found = demoPeople.find((one) => one.id === personIds[person]);
  if (!found) throw new Error(`no such person: ${person}`);
  return { email: found.email, password: found.password };
}

export interface Answer<Body = unknown> {
  status: number;
  headers: Headers;
  body: Body;
}

type Method = 'GET' | 'POST' | 'PUT' | 'DELETE' | 'PATCH';

/** A browser's part: keeps the session cookie, sends JSON, reads JSON. */
export class ApiClient {
  cookie: string | null = null;

  constructor(readonly url: string) {}

  async raw(method: Method, path: string, init: RequestInit = {}): Promise<Response> {
    const headers = new Headers(init.headers);
    if (this.cookie !== null) headers.set('cookie', this.cookie);
    const response = await fetch(this.url + path, { ...init, method, headers });
    const cookie = response.headers.getSetCookie().find((one) => one.startsWith('paceloom-session='));
    if (cookie) this.cookie = cookie.split(';')[0];
    return response;
  }

  /** Sends `body` as JSON when given. */
  async send<Body>(
    method: Method,
    path: string,
    body?: unknown,
    headers: Record<string, string> = {},
  ): Promise<Answer<Body>> {
    const json = body === undefined ? {} : { body: JSON.stringify(body) };
    const type: Record<string, string> = body === undefined ? {} : { 'content-type': 'application/json' };
    const response = await this.raw(method, path, { ...json, headers: { ...type, ...headers } });
    const text = await response.text();
    const isJson = response.headers.get('content-type')?.includes('json');
    const read = isJson ? (JSON.parse(text) as Body) : (text as Body);
    return { status: response.status, headers: response.headers, body: read };
  }

  get<Body>(path: string): Promise<Answer<Body>> {
    return this.send<Body>('GET', path);
  }

  async signIn(person: Person): Promise<this> {
    const { status } = await this.send('POST', '/api/session', credentialsOf(person));
    if (status !== 200) throw new Error(`sign-in as ${person} answered ${status}`);
    return this;
  }

  /** Creates a strip and gives it back. */
  async keep(input: Record<string, unknown>): Promise<Strip> {
    const { status, body } = await this.send<StripResponse>('POST', '/api/strips', input);
    if (status !== 201) throw new Error(`creating a strip answered ${status}: ${JSON.stringify(body)}`);
    return body.strip;
  }

  async read(id: string): Promise<Strip> {
    const { status, body } = await this.get<StripResponse>(`/api/strips/${id}`);
    if (status !== 200) throw new Error(`reading ${id} answered ${status}`);
    return body.strip;
  }
}

/** The id of a failure, or what came instead of one. */
export function errorIdOf(answer: Answer): string {
  const body = answer.body as Partial<ApiErrorBody> | string;
  return typeof body === 'object' && body.error ? body.error.id : `no error: ${JSON.stringify(body)}`;
}

/** What PUT takes, made from a strip as it was read. */
export function updateOf(strip: Strip, changes: Record<string, unknown> = {}): Record<string, unknown> {
  const { version, title, teachingPoint, tags, group, visibility, parameters } = strip;
  return { version, title, teachingPoint, tags, group, visibility, parameters, ...changes };
}
