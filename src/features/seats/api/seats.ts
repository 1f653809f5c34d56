import { queryOptions } from '@tanstack/react-query';
import { seatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import { seatHistoryResponse } from '#shared/contracts/seat-history.ts';
import { request } from '#src/lib/api-client.ts';

export const seatsQuery = (siteId: number, positionId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'seats', positionId],
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/positions/${positionId}/seats`, seatAssessmentsResponse, {
        signal,
      }),
  });

export const seatHistoryQuery = (siteId: number, positionId: number, seat: string) =>
  queryOptions({
    queryKey: ['sites', siteId, 'seats', positionId, seat, 'history'],
    queryFn: ({ signal }) =>
      request(
        `/api/sites/${siteId}/positions/${positionId}/seats/${seat}/history`,
        seatHistoryResponse,
        { signal },
      ),
  });
