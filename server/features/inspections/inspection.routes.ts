import { z } from 'zod';
import { anyMember, only } from '#server/auth/access.ts';
import { route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import { assignInspectionRequest } from '#shared/contracts/finding.ts';
import {
  inspectionListQuery,
  inspectionListResponse,
  inspectionResponse,
  inspectionStepRequest,
  reportInspectionRequest,
} from '#shared/contracts/inspection.ts';
import { presentInspection } from './inspection.presenter.ts';
import type { InspectionService } from './inspection.service.ts';

const inspectionParams = z.object({ siteId: id, inspectionId: id });

/** Fit inspections. */
export const inspectionRoutes = (inspections: InspectionService) => [
  route({
    method: 'post',
    path: '/api/sites/:siteId/findings/:findingId/inspections',
    status: 201,
    access: only('lead'),
    params: z.object({ siteId: id, findingId: id }),
    body: assignInspectionRequest,
    response: inspectionResponse,
    handle: async ({ principal, params, body }) =>
      presentInspection(principal, await inspections.assign(principal, params.findingId, body)),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/inspections',
    access: anyMember(),
    query: inspectionListQuery,
    response: inspectionListResponse,
    handle: async ({ principal, query }) => ({
      ...(await inspections.list(principal, query)),
      page: query.page,
      pageSize: query.pageSize,
    }),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/inspections/:inspectionId',
    access: anyMember(),
    params: inspectionParams,
    response: inspectionResponse,
    handle: async ({ principal, params }) =>
      presentInspection(principal, await inspections.whole(principal, params.inspectionId)),
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/inspections/:inspectionId/accept',
    access: only('owner'),
    params: inspectionParams,
    body: inspectionStepRequest,
    response: inspectionResponse,
    handle: async ({ principal, params, body }) =>
      presentInspection(
        principal,
        await inspections.accept(principal, params.inspectionId, body.version),
      ),
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/inspections/:inspectionId/report',
    access: only('owner'),
    params: inspectionParams,
    body: reportInspectionRequest,
    response: inspectionResponse,
    handle: async ({ principal, params, body }) =>
      presentInspection(
        principal,
        await inspections.report(principal, params.inspectionId, body.version, body.report),
      ),
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/inspections/:inspectionId/close',
    access: only('lead'),
    params: inspectionParams,
    body: inspectionStepRequest,
    response: inspectionResponse,
    handle: async ({ principal, params, body }) =>
      presentInspection(
        principal,
        await inspections.close(principal, params.inspectionId, body.version, body.reason),
      ),
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/inspections/:inspectionId/cancel',
    access: only('lead'),
    params: inspectionParams,
    body: inspectionStepRequest,
    response: inspectionResponse,
    handle: async ({ principal, params, body }) =>
      presentInspection(
        principal,
        await inspections.cancel(principal, params.inspectionId, body.version, body.reason),
      ),
  }),
];
