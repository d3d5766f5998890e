import { QueryClient } from '@tanstack/react-query';
import { ApiError } from './http';

const mostRetries = 2;

/** Retries only what may pass by itself: a server that is away, or a full queue. */
function mayPass(error: Error): boolean {
  return error instanceof ApiError && (error.id === 'offline' || error.id === 'renderQueueFull');
}

export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      // A server on this computer answers without a network; elsewhere a request fails at once, and the page says so.
      queries: {
        networkMode: 'always',
        staleTime: 10_000,
        retry: (count, error) => count < mostRetries && mayPass(error),
      },
      mutations: { networkMode: 'always', retry: false },
    },
  });
}
