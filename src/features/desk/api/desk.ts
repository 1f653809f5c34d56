import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  deskResponse,
  type ChangeDueDateRequest,
  type ReassignInspectionRequest,
} from '#shared/contracts/desk.ts';
import { request, requestNothing } from '#src/lib/api-client.ts';

export const deskQuery = (siteId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'desk'],
    queryFn: ({ signal }) => request(`/api/sites/${siteId}/desk`, deskResponse, { signal }),
  });

export type DeskChange =
  | { what: 'reassign'; body: ReassignInspectionRequest }
  | { what: 'due-date'; body: ChangeDueDateRequest }
  | { what: 'remind'; body?: undefined };

/** Changes one inspection; everything of the site is read again. */
export function useDeskChange(siteId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ inspectionId, what, body }: DeskChange & { inspectionId: number }) =>
      requestNothing(`/api/sites/${siteId}/inspections/${inspectionId}/${what}`, {
        method: 'POST',
        body,
      }),
    onSettled: () => client.invalidateQueries({ queryKey: ['sites', siteId] }),
  });
}
