import type { ImportAnalysis, ImportDecisionInput, ImportResult } from '../../../shared/api/preset-files';
import type { ApiErrorBody } from '../../../shared/api/errors';
import type { ApiClient } from './api-client';

export interface UploadAnswer {
  status: number;
  analysis?: ImportAnalysis;
  result?: ImportResult;
  error?: ApiErrorBody['error'];
}

/** Sends a preset file as a browser's form does; with a decision it is imported. */
export async function uploadPresets(
  client: ApiClient,
  content: string | Uint8Array<ArrayBuffer>,
  decision?: ImportDecisionInput | string,
  name = 'presets.json',
): Promise<UploadAnswer> {
  const form = new FormData();
  form.append('file', new Blob([content], { type: 'application/json' }), name);
  if (decision !== undefined) {
    form.append('decision', typeof decision === 'string' ? decision : JSON.stringify(decision));
  }
  const response = await client.raw('POST', '/api/strips/import', { body: form });
  return { status: response.status, ...((await response.json()) as object) };
}

/** Looks at a file and imports it with one choice for all. */
export async function importPresetsWith(
  client: ApiClient,
  content: string,
  choice: ImportDecisionInput['choice'],
  exceptions: ImportDecisionInput['exceptions'] = [],
): Promise<ImportResult> {
  const { analysis } = await uploadPresets(client, content);
  const { result, error } = await uploadPresets(client, content, {
    token: analysis?.token ?? '',
    choice,
    exceptions,
  });
  if (!result) throw new Error(`importing failed: ${JSON.stringify(error)}`);
  return result;
}

/** Strips as a preset file. */
export async function exportPresetsOf(client: ApiClient, ids: readonly string[]): Promise<string> {
  const response = await client.raw('POST', '/api/strips/export', {
    body: JSON.stringify({ ids }),
    headers: { 'content-type': 'application/json' },
  });
  if (response.status !== 200) throw new Error(`exporting presets answered ${response.status}`);
  return response.text();
}
