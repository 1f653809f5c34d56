import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  bearingPositionResponse,
  type CreateBearingPositionRequest,
  type UpdateBearingPositionRequest,
} from '#shared/contracts/bearing-position.ts';
import type { AddFitRecordRequest } from '#shared/contracts/fit-record.ts';
import {
  machineListResponse,
  machineResponse,
  type CreateMachineRequest,
  type MachineListQuery,
  type UpdateMachineRequest,
} from '#shared/contracts/machine.ts';
import type { Direction } from '#shared/contracts/measuring-point.ts';
import { membersResponse } from '#shared/contracts/person.ts';
import { request } from '#src/lib/api-client.ts';

const machinesKey = (siteId: number) => ['sites', siteId, 'machines'] as const;

export const machineListQuery = (siteId: number, query: Partial<MachineListQuery>) =>
  queryOptions({
    queryKey: [...machinesKey(siteId), 'list', query],
    placeholderData: keepPreviousData,
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/machines`, machineListResponse, { query, signal }),
  });

export const machineQuery = (siteId: number, machineId: number) =>
  queryOptions({
    queryKey: [...machinesKey(siteId), 'one', machineId],
    queryFn: ({ signal }) =>
      request(`/api/sites/${siteId}/machines/${machineId}`, machineResponse, { signal }),
  });

export const membersQuery = (siteId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'members'],
    queryFn: ({ signal }) => request(`/api/sites/${siteId}/members`, membersResponse, { signal }),
  });

export function useSaveMachine(siteId: number, machineId?: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateMachineRequest | UpdateMachineRequest) =>
      machineId === undefined
        ? request(`/api/sites/${siteId}/machines`, machineResponse, { method: 'POST', body })
        : request(`/api/sites/${siteId}/machines/${machineId}`, machineResponse, {
            method: 'PATCH',
            body,
          }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['sites', siteId] }),
  });
}

/** A change below a machine: a position, a point or a fit record. */
function useChangeBelow<Body>(siteId: number, path: string, method: 'POST' | 'PATCH') {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Body) =>
      request(`/api/sites/${siteId}${path}`, bearingPositionResponse, { method, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['sites', siteId] }),
  });
}

export const useCreatePosition = (siteId: number, machineId: number) =>
  useChangeBelow<CreateBearingPositionRequest>(siteId, `/machines/${machineId}/positions`, 'POST');

export const useUpdatePosition = (siteId: number, positionId: number) =>
  useChangeBelow<UpdateBearingPositionRequest>(siteId, `/positions/${positionId}`, 'PATCH');

export const useAddPoint = (siteId: number, positionId: number) =>
  useChangeBelow<{ direction: Direction }>(siteId, `/positions/${positionId}/points`, 'POST');

export const useAddFitRecord = (siteId: number, positionId: number) =>
  useChangeBelow<AddFitRecordRequest>(siteId, `/positions/${positionId}/fit-records`, 'POST');
