import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { pointChoicesResponse } from '#shared/contracts/measuring-point.ts';
import {
  routeListResponse,
  routeResponse,
  type CreateRouteRequest,
  type RouteListQuery,
  type UpdateRouteRequest,
} from '#shared/contracts/route.ts';
import { request } from '#src/lib/api-client.ts';

export const routeListQuery = (siteId: number, query: Partial<RouteListQuery>) =>
  queryOptions({
    queryKey: ['sites', siteId, 'routes', 'list', query],
    placeholderData: keepPreviousData,
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/routes`, routeListResponse, { query, signal }),
  });

export const routeQuery = (siteId: number, routeId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'routes', 'one', routeId],
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/routes/${routeId}`, routeResponse, { signal }),
  });

export const pointChoicesQuery = (siteId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'points'],
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/points`, pointChoicesResponse, { signal }),
  });

export function useSaveRoute(siteId: number, routeId?: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateRouteRequest | UpdateRouteRequest) =>
      routeId === undefined
        ? request(`/api/sites/${siteId}/routes`, routeResponse, { method: 'POST', body })
        : request(`/api/sites/${siteId}/routes/${routeId}`, routeResponse, {
            method: 'PATCH',
            body,
          }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['sites', siteId] }),
  });
}
