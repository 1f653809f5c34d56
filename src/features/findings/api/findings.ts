import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  findingListResponse,
  findingResponse,
  type AssignInspectionRequest,
  type DecideFindingRequest,
  type FindingListQuery,
} from '#shared/contracts/finding.ts';
import { inspectionResponse } from '#shared/contracts/inspection.ts';
import { membersResponse } from '#shared/contracts/person.ts';
import { request } from '#src/lib/api-client.ts';

export const findingListQuery = (siteId: number, query: Partial<FindingListQuery>) =>
  queryOptions({
    queryKey: ['sites', siteId, 'findings', 'list', query],
    placeholderData: keepPreviousData,
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/findings`, findingListResponse, { query, signal }),
  });

export const findingQuery = (siteId: number, findingId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'findings', 'one', findingId],
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/findings/${findingId}`, findingResponse, { signal }),
  });

/** Whom the lead can ask; only a lead may read it. */
export const assigneesQuery = (siteId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'members'],
    queryFn: ({ signal }) => request(`/api/sites/${siteId}/members`, membersResponse, { signal }),
  });

export function useDecideFinding(siteId: number, findingId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: DecideFindingRequest) =>
      request(`/api/sites/${siteId}/findings/${findingId}/decision`, findingResponse, {
        method: 'POST',
        body,
      }),
    onSettled: () => client.invalidateQueries({ queryKey: ['sites', siteId] }),
  });
}

export function useAssignInspection(siteId: number, findingId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: AssignInspectionRequest) =>
      request(`/api/sites/${siteId}/findings/${findingId}/inspections`, inspectionResponse, {
        method: 'POST',
        body,
      }),
    onSettled: () => client.invalidateQueries({ queryKey: ['sites', siteId] }),
  });
}
