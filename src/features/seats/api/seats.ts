import { queryOptions } from '@tanstack/react-query';
import { seatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import { request } from '#src/lib/api-client.ts';

export const seatsQuery = (siteId: number, positionId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'seats', positionId],
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/positions/${positionId}/seats`, seatAssessmentsResponse, {
        signal,
      }),
  });
