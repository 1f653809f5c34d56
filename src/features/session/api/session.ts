import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  productResponse,
  sessionResponse,
  type SessionResponse,
  type SignInRequest,
} from '#shared/contracts/session.ts';
import { request, requestNothing } from '#src/lib/api-client.ts';
import { ApiError } from '#src/lib/api-error.ts';
import { refreshSession } from '#src/lib/session-refresh.ts';

/** Who is signed in; null where nobody is. */
export const sessionQuery = () =>
  queryOptions({
    queryKey: ['session'],
    staleTime: 60_000,
    queryFn: async ({ signal }): Promise<SessionResponse | null> => {
      try {
        return await request('/api/session', sessionResponse, { signal });
      } catch (error) {
        if (!(error instanceof ApiError) || error.status !== 401) throw error;
        // The access token is short-lived: the refresh token may still open the session.
        if (!(await refreshSession())) return null;
        return request('/api/session', sessionResponse, { signal });
      }
    },
  });

export const productQuery = () =>
  queryOptions({
    queryKey: ['product'],
    staleTime: Infinity,
    queryFn: ({ signal }) => request('/api/product', productResponse, { signal }),
  });

export function useSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: SignInRequest) =>
      request('/api/session', sessionResponse, { method: 'POST', body }),
    onSuccess: (session) => {
      // Nothing the person before has seen may show through.
      client.clear();
      client.setQueryData(sessionQuery().queryKey, session);
    },
  });
}

export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => requestNothing('/api/session', { method: 'DELETE' }),
    onSuccess: () => {
      client.clear();
      client.setQueryData(sessionQuery().queryKey, null);
    },
  });
}
