import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  inspectionListResponse,
  inspectionResponse,
  type InspectionListQuery,
  type InspectionReport,
} from '#shared/contracts/inspection.ts';
import { request } from '#src/lib/api-client.ts';

export const inspectionListQuery = (siteId: number, query: Partial<InspectionListQuery>) =>
  queryOptions({
    queryKey: ['sites', siteId, 'inspections', 'list', query],
    placeholderData: keepPreviousData,
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/inspections`, inspectionListResponse, { query, signal }),
  });

export const inspectionQuery = (siteId: number, inspectionId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'inspections', 'one', inspectionId],
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/inspections/${inspectionId}`, inspectionResponse, { signal }),
  });

export type InspectionStep =
  | { step: 'accept'; version: number }
  | { step: 'close' | 'cancel'; version: number; reason: string }
  | { step: 'report'; version: number; report: InspectionReport };

/** Takes an inspection one step on; the answer is the inspection as it then is. */
export function useInspectionStep(siteId: number, inspectionId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ step, ...body }: InspectionStep) =>
      request(`/api/sites/${siteId}/inspections/${inspectionId}/${step}`, inspectionResponse, {
        method: 'POST',
        body,
      }),
    onSettled: () => client.invalidateQueries({ queryKey: ['sites', siteId] }),
  });
}
