import { queryOptions } from '@tanstack/react-query';
import { outcomesResponse } from '#shared/contracts/outcomes.ts';
import { request } from '#src/lib/api-client.ts';

export const outcomesQuery = (siteId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'outcomes'],
    queryFn: ({ signal }) => request(`/api/sites/${siteId}/outcomes`, outcomesResponse, { signal }),
  });
