import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { calendarAddressResponse, calendarFeedResponse } from '#shared/contracts/calendar.ts';
import { request, requestNothing } from '#src/lib/api-client.ts';

const address = (siteId: number) => `/api/sites/${siteId}/calendar-feed`;

export const calendarFeedQuery = (siteId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'calendar-feed'],
    queryFn: ({ signal }) => request(address(siteId), calendarFeedResponse, { signal }),
  });

/** The answer holds the address; it is told this once. */
export function useMakeCalendar(siteId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => request(address(siteId), calendarAddressResponse, { method: 'POST' }),
    onSuccess: () => client.invalidateQueries({ queryKey: calendarFeedQuery(siteId).queryKey }),
  });
}

export function useRevokeCalendar(siteId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => requestNothing(address(siteId), { method: 'DELETE' }),
    onSuccess: () => client.invalidateQueries({ queryKey: calendarFeedQuery(siteId).queryKey }),
  });
}
