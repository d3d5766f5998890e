import { apiErrorSchema, type ApiErrorBody, type ApiErrorId } from '../../shared/api/errors';
import type { z } from 'zod';

/** A failure the server explained, or `offline` when it could not be reached. Branch on `id`, never on the text. */
export class ApiError extends Error {
  readonly id: ApiErrorId | 'offline';
  readonly problems: NonNullable<ApiErrorBody['error']['problems']>;
  readonly details: Record<string, unknown>;
  readonly retryAfterS: number | null;

  constructor(
    error: Partial<Omit<ApiErrorBody['error'], 'id'>> & { id: ApiErrorId | 'offline' },
    retryAfterS: number | null = null,
  ) {
    super(error.message ?? 'The server cannot be reached. Nothing is lost; try again.');
    this.name = 'ApiError';
    this.id = error.id;
    this.problems = error.problems ?? [];
    this.details = error.details ?? {};
    this.retryAfterS = retryAfterS;
  }
}

export interface ApiRequest {
  method?: 'GET' | 'POST' | 'PUT' | 'DELETE';
  /** Sent as JSON; a form as it is, with its files. */
  body?: unknown;
  signal?: AbortSignal;
}

async function failureOf(response: Response): Promise<ApiError> {
  const retryAfter = Number(response.headers.get('Retry-After'));
  const retryAfterS = Number.isFinite(retryAfter) && retryAfter > 0 ? retryAfter : null;
  const body = apiErrorSchema.safeParse(await response.json().catch(() => null));
  return new ApiError(body.success ? body.data.error : { id: 'unexpected' }, retryAfterS);
}

/** The body as fetch takes it; a form brings its own content type. */
function bodyInit(body: unknown): Pick<RequestInit, 'body' | 'headers'> {
  if (body === undefined) return {};
  if (body instanceof FormData) return { body };
  return { headers: { 'Content-Type': 'application/json' }, body: JSON.stringify(body) };
}

async function send(path: string, { method = 'GET', body, signal }: ApiRequest): Promise<Response> {
  let response: Response;
  try {
    response = await fetch(path, {
      method,
      signal,
      credentials: 'same-origin',
      ...bodyInit(body),
    });
  } catch (error) {
    if (signal?.aborted) throw error;
    throw new ApiError({ id: 'offline' });
  }
  if (!response.ok) throw await failureOf(response);
  return response;
}

/** A JSON answer, checked against its schema. Throws `ApiError`. */
export async function requestJson<Schema extends z.ZodType>(
  schema: Schema,
  path: string,
  request: ApiRequest = {},
): Promise<z.output<Schema>> {
  const response = await send(path, request);
  return schema.parse(await response.json());
}

/** A request whose answer has no body. Throws `ApiError`. */
export async function requestNothing(path: string, request: ApiRequest): Promise<void> {
  await send(path, request);
}

/** A binary answer. Throws `ApiError`. */
export async function requestBytes(path: string, request: ApiRequest): Promise<ArrayBuffer> {
  return (await send(path, request)).arrayBuffer();
}
