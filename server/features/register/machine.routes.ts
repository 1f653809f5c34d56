import { z } from 'zod';
import { anyMember, only } from '#server/auth/access.ts';
import { route } from '#server/http/route.ts';
import {
  bearingPositionResponse,
  createBearingPositionRequest,
  updateBearingPositionRequest,
} from '#shared/contracts/bearing-position.ts';
import { id } from '#shared/contracts/fields.ts';
import { addFitRecordRequest } from '#shared/contracts/fit-record.ts';
import {
  createMachineRequest,
  machineListQuery,
  machineListResponse,
  machineResponse,
  updateMachineRequest,
} from '#shared/contracts/machine.ts';
import { createMeasuringPointRequest } from '#shared/contracts/measuring-point.ts';
import type { MachineService } from './machine.service.ts';
import type { PositionService } from './position.service.ts';
import { presentMachine, presentPosition } from './register.presenter.ts';

const machineParams = z.object({ siteId: id, machineId: id });
const positionParams = z.object({ siteId: id, positionId: id });

/** The machine register. */
export const machineRoutes = (machines: MachineService) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/machines',
    access: anyMember(),
    query: machineListQuery,
    response: machineListResponse,
    handle: async ({ principal, query }) => {
      const { rows, total } = await machines.list(principal, query);
      return { items: rows, total, page: query.page, pageSize: query.pageSize };
    },
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/machines',
    status: 201,
    access: only('lead'),
    body: createMachineRequest,
    response: machineResponse,
    handle: async ({ principal, body }) =>
      presentMachine(principal, await machines.create(principal, body)),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/machines/:machineId',
    access: anyMember(),
    params: machineParams,
    response: machineResponse,
    handle: async ({ principal, params }) =>
      presentMachine(principal, await machines.whole(principal, params.machineId)),
  }),
  route({
    method: 'patch',
    path: '/api/sites/:siteId/machines/:machineId',
    access: only('lead'),
    params: machineParams,
    body: updateMachineRequest,
    response: machineResponse,
    handle: async ({ principal, params, body }) =>
      presentMachine(principal, await machines.update(principal, params.machineId, body)),
  }),
];

type PositionWhole = Awaited<ReturnType<PositionService['create']>>;
const presentWhole = ({ position, machineTag, points, fitRecords }: PositionWhole) =>
  presentPosition(position, machineTag, points, fitRecords);

/** Bearing positions with their points and fit records. */
export const positionRoutes = (positions: PositionService) => [
  route({
    method: 'post',
    path: '/api/sites/:siteId/machines/:machineId/positions',
    status: 201,
    access: only('lead'),
    params: machineParams,
    body: createBearingPositionRequest,
    response: bearingPositionResponse,
    handle: async ({ principal, params, body }) =>
      presentWhole(await positions.create(principal, params.machineId, body)),
  }),
  route({
    method: 'patch',
    path: '/api/sites/:siteId/positions/:positionId',
    access: only('lead'),
    params: positionParams,
    body: updateBearingPositionRequest,
    response: bearingPositionResponse,
    handle: async ({ principal, params, body }) =>
      presentWhole(await positions.update(principal, params.positionId, body)),
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/positions/:positionId/points',
    status: 201,
    access: only('lead'),
    params: positionParams,
    body: createMeasuringPointRequest,
    response: bearingPositionResponse,
    handle: async ({ principal, params, body }) =>
      presentWhole(await positions.addPoint(principal, params.positionId, body)),
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/positions/:positionId/fit-records',
    status: 201,
    access: only('lead'),
    params: positionParams,
    body: addFitRecordRequest,
    response: bearingPositionResponse,
    handle: async ({ principal, params, body }) =>
      presentWhole(await positions.addFitRecord(principal, params.positionId, body)),
  }),
];
