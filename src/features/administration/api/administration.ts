import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  administeredPeopleResponse,
  administeredSitesResponse,
  type CreatePersonRequest,
  type CreateSiteRequest,
} from '#shared/contracts/administration.ts';
import type { SiteRole } from '#shared/contracts/session.ts';
import { request } from '#src/lib/api-client.ts';

const key = ['administration'] as const;

export const sitesQuery = () =>
  queryOptions({
    queryKey: [...key, 'sites'],
    queryFn: ({ signal }) =>
      request('/api/administration/sites', administeredSitesResponse, { signal }),
  });

export const peopleQuery = () =>
  queryOptions({
    queryKey: [...key, 'people'],
    queryFn: ({ signal }) =>
      request('/api/administration/people', administeredPeopleResponse, { signal }),
  });

function useInvalidate() {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: key });
}

export const useCreateSite = () =>
  useMutation({
    onSuccess: useInvalidate(),
    mutationFn: (body: CreateSiteRequest) =>
      request('/api/administration/sites', administeredSitesResponse, { method: 'POST', body }),
  });

export const useCreatePerson = () =>
  useMutation({
    onSuccess: useInvalidate(),
    mutationFn: (body: CreatePersonRequest) =>
      request('/api/administration/people', administeredPeopleResponse, { method: 'POST', body }),
  });

export const useSetMembership = () =>
  useMutation({
    onSuccess: useInvalidate(),
    mutationFn: ({
      userId,
      siteId,
      role,
    }: {
      userId: number;
      siteId: number;
      role: SiteRole | null;
    }) =>
      request(
        `/api/administration/people/${userId}/memberships/${siteId}`,
        administeredPeopleResponse,
        { method: 'PUT', body: { role } },
      ),
  });
