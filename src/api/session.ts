import { queryOptions } from '@tanstack/react-query';
import { demoResponseSchema } from '../../shared/api/demo';
import { sessionResponseSchema, type SignInRequest, type User } from '../../shared/api/session';
import { ApiError, requestJson, requestNothing } from './http';

export const sessionKeys = { session: ['session'] as const, demo: ['demo'] as const };

/** The person who is signed in; null for nobody. */
export const sessionQuery = queryOptions({
  queryKey: sessionKeys.session,
  queryFn: async ({ signal }): Promise<User | null> => {
    try {
      return (await requestJson(sessionResponseSchema, '/api/session', { signal })).user;
    } catch (error) {
      if (error instanceof ApiError && error.id === 'signInRequired') return null;
      throw error;
    }
  },
  staleTime: 60_000,
});

/** Accounts of the demonstration; an empty list when there is none. */
export const demoQuery = queryOptions({
  queryKey: sessionKeys.demo,
  queryFn: ({ signal }) => requestJson(demoResponseSchema, '/api/demo', { signal }),
  staleTime: Infinity,
});

export async function signIn(request: SignInRequest): Promise<User> {
  return (await requestJson(sessionResponseSchema, '/api/session', { method: 'POST', body: request })).user;
}

export function signOut(): Promise<void> {
  return requestNothing('/api/session', { method: 'DELETE' });
}
