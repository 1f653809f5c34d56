import { QueryClient } from '@tanstack/react-query';
import { ApiError } from './api-error.ts';

const retries = 2;

/** Only what may go better the next time is asked again: no answer, or a fault of the server. */
export function shouldRetry(failureCount: number, error: unknown): boolean {
  if (failureCount >= retries || !(error instanceof ApiError)) return false;
  return error.code === 'unreachable' || error.status >= 500;
}

export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: 10_000,
        gcTime: 5 * 60_000,
        retry: shouldRetry,
        // A refused query must not be sent again by every window that comes to the front.
        refetchOnWindowFocus: (query) => query.state.status === 'success',
      },
      // A decision sent twice could be made twice: people press again, the program does not.
      mutations: { retry: false },
    },
  });
}
