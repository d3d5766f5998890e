import {
  exportListResponseSchema,
  exportResponseSchema,
  type CreateExportInput,
  type ExportJob,
  type ExportList,
  type ExportState,
} from '../../../shared/api/exports';
import type { ApiErrorBody } from '../../../shared/api/errors';
import type { Answer, ApiClient } from './api-client';

/** Asks for an export; the answer is the job or a failure. */
export function askForExport(
  client: ApiClient,
  body: CreateExportInput | Record<string, unknown>,
): Promise<Answer<{ export: ExportJob } & ApiErrorBody>> {
  return client.send('POST', '/api/exports', body);
}

export async function startExport(client: ApiClient, body: CreateExportInput): Promise<ExportJob> {
  const answer = await askForExport(client, body);
  if (answer.status !== 201)
    throw new Error(`asking answered ${answer.status}: ${JSON.stringify(answer.body)}`);
  return exportResponseSchema.parse(answer.body).export;
}

export async function readExport(client: ApiClient, id: string): Promise<ExportJob> {
  const { status, body } = await client.get<{ export: ExportJob }>(`/api/exports/${id}`);
  if (status !== 200) throw new Error(`reading an export answered ${status}`);
  return exportResponseSchema.parse(body).export;
}

export async function listExports(client: ApiClient): Promise<ExportList> {
  return exportListResponseSchema.parse((await client.get('/api/exports')).body);
}

const pollMs = 40;

/** Follows an export until it is in one of these states. */
export async function followExport(
  client: ApiClient,
  id: string,
  until: readonly ExportState[] = ['done', 'failed', 'cancelled'],
  onLook: (job: ExportJob) => void = () => undefined,
): Promise<ExportJob> {
  for (;;) {
    const job = await readExport(client, id);
    onLook(job);
    if (until.includes(job.state)) return job;
    await new Promise((done) => setTimeout(done, pollMs));
  }
}

export async function fetchExport(
  client: ApiClient,
  id: string,
  headers: Record<string, string> = {},
): Promise<{ status: number; headers: Headers; bytes: Buffer }> {
  const response = await client.raw('GET', `/api/exports/${id}/file`, { headers });
  const bytes = Buffer.from(await response.arrayBuffer());
  return { status: response.status, headers: response.headers, bytes };
}
