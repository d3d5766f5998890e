import {
  importAnalysisResponseSchema,
  importResultResponseSchema,
  type ExportPresetsInput,
  type ImportAnalysis,
  type ImportDecisionInput,
  type ImportResult,
} from '../../shared/api/preset-files';
import { requestBytes, requestJson } from './http';

const importAddress = '/api/strips/import';

/** Strips as a preset file. Throws `ApiError`. */
export function requestPresetFile(request: ExportPresetsInput): Promise<ArrayBuffer> {
  return requestBytes('/api/strips/export', { method: 'POST', body: request });
}

function formOf(file: File, decision?: ImportDecisionInput): FormData {
  const form = new FormData();
  form.append('file', file);
  if (decision) form.append('decision', JSON.stringify(decision));
  return form;
}

/** What a preset file would do; nothing is changed. Throws `ApiError` with every problem of the file. */
export async function lookAtPresetFile(file: File): Promise<ImportAnalysis> {
  const request = { method: 'POST', body: formOf(file) } as const;
  return (await requestJson(importAnalysisResponseSchema, importAddress, request)).analysis;
}

/** Imports a preset file. Fails with `staleImport` when the library changed since the look. */
export async function importPresetFile(file: File, decision: ImportDecisionInput): Promise<ImportResult> {
  const request = { method: 'POST', body: formOf(file, decision) } as const;
  return (await requestJson(importResultResponseSchema, importAddress, request)).result;
}
