import { queryOptions } from '@tanstack/react-query';
import {
  exportListResponseSchema,
  exportResponseSchema,
  type CreateExportInput,
  type ExportJob,
} from '../../shared/api/exports';
import { requestJson, requestNothing } from './http';

/** How often an unfinished export is looked at, ms. */
const pollMs = 700;

export const exportKeys = {
  all: ['exports'] as const,
  list: ['exports', 'list'] as const,
  one: (id: string) => ['exports', 'one', id] as const,
};

const address = (id: string): string => `/api/exports/${encodeURIComponent(id)}`;

/** Where the file of an export is fetched. */
export const exportFileAddress = (id: string): string => `${address(id)}/file`;

export function isUnfinished({ state }: ExportJob): boolean {
  return state === 'waiting' || state === 'running';
}

/** One's exports, asked for again and again while any of them is unfinished. */
export const exportListQuery = queryOptions({
  queryKey: exportKeys.list,
  queryFn: ({ signal }) => requestJson(exportListResponseSchema, '/api/exports', { signal }),
  refetchInterval: ({ state }) => (state.data?.exports.some(isUnfinished) ? pollMs : false),
});

/** One export, asked for again and again until it has ended. */
export function exportQuery(id: string) {
  return queryOptions({
    queryKey: exportKeys.one(id),
    queryFn: async ({ signal }): Promise<ExportJob> =>
      (await requestJson(exportResponseSchema, address(id), { signal })).export,
    refetchInterval: ({ state }) => (state.data && !isUnfinished(state.data) ? false : pollMs),
  });
}

async function post(path: string, body: unknown): Promise<ExportJob> {
  return (await requestJson(exportResponseSchema, path, { method: 'POST', body })).export;
}

export function createExport(input: CreateExportInput): Promise<ExportJob> {
  return post('/api/exports', input);
}

export function cancelExport(id: string): Promise<ExportJob> {
  return post(`${address(id)}/cancel`, {});
}

/** Starts an export again that failed or was cancelled. */
export function restartExport(id: string): Promise<ExportJob> {
  return post(`${address(id)}/restart`, {});
}

export function deleteExport(id: string): Promise<void> {
  return requestNothing(address(id), { method: 'DELETE' });
}
