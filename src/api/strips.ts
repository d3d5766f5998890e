import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { stripListResponseSchema, type StripListQueryInput } from '../../shared/api/strip-list';
import {
  stripResponseSchema,
  type CreateStripInput,
  type Strip,
  type UpdateStripInput,
} from '../../shared/api/strips';
import { requestJson, requestNothing } from './http';

/** Keys under which strips are kept; a change of any strip makes every list stale. */
export const stripKeys = {
  all: ['strips'] as const,
  list: (query: StripListQueryInput) => ['strips', 'list', query] as const,
  one: (stripId: string) => ['strips', 'one', stripId] as const,
};

const address = (stripId: string): string => `/api/strips/${encodeURIComponent(stripId)}`;

function searchParams(query: StripListQueryInput): string {
  const params = new URLSearchParams();
  for (const [key, value] of Object.entries(query)) {
    const values = Array.isArray(value) ? value : [value];
    for (const one of values) {
      if (one !== undefined && one !== null && one !== '') params.append(key, String(one));
    }
  }
  return params.toString();
}

export function stripListQuery(query: StripListQueryInput) {
  return queryOptions({
    queryKey: stripKeys.list(query),
    queryFn: ({ signal }) =>
      requestJson(stripListResponseSchema, `/api/strips?${searchParams(query)}`, { signal }),
    placeholderData: keepPreviousData,
  });
}

export function stripQuery(stripId: string) {
  return queryOptions({
    queryKey: stripKeys.one(stripId),
    queryFn: async ({ signal }): Promise<Strip> =>
      (await requestJson(stripResponseSchema, address(stripId), { signal })).strip,
  });
}

export async function createStrip(input: CreateStripInput): Promise<Strip> {
  return (await requestJson(stripResponseSchema, '/api/strips', { method: 'POST', body: input })).strip;
}

/** Fails with `staleStrip` when someone saved in between; `details.current` is then the strip as it stands. */
export async function updateStrip(stripId: string, input: UpdateStripInput): Promise<Strip> {
  return (await requestJson(stripResponseSchema, address(stripId), { method: 'PUT', body: input })).strip;
}

export async function duplicateStrip(stripId: string): Promise<Strip> {
  const path = `${address(stripId)}/duplicate`;
  return (await requestJson(stripResponseSchema, path, { method: 'POST', body: {} })).strip;
}

export function deleteStrip(stripId: string): Promise<void> {
  return requestNothing(address(stripId), { method: 'DELETE' });
}

export async function restoreStrip(stripId: string): Promise<Strip> {
  const path = `${address(stripId)}/restore`;
  return (await requestJson(stripResponseSchema, path, { method: 'POST', body: {} })).strip;
}
