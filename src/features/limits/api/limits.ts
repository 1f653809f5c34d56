import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  limitsResponse,
  limitsTrialResponse,
  type SetLimitsRequest,
  type TryLimitsQuery,
} from '#shared/contracts/limits.ts';
import { request } from '#src/lib/api-client.ts';

export const limitsQuery = (siteId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'limits', 'in-force'],
    queryFn: ({ signal }) => request(`/api/sites/${siteId}/limits`, limitsResponse, { signal }),
  });

export const limitsTrialQuery = (siteId: number, query: TryLimitsQuery) =>
  queryOptions({
    queryKey: ['sites', siteId, 'limits', 'trial', query],
    placeholderData: keepPreviousData,
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/limits/trial`, limitsTrialResponse, { query, signal }),
  });

export function useSetLimits(siteId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: SetLimitsRequest) =>
      request(`/api/sites/${siteId}/limits`, limitsResponse, { method: 'POST', body }),
    onSettled: () => client.invalidateQueries({ queryKey: ['sites', siteId, 'limits'] }),
  });
}
