import { z } from 'zod';
import { only } from '#server/auth/access.ts';
import type { SitePrincipal } from '#server/auth/principal.ts';
import { route } from '#server/http/route.ts';
import {
  changeDueDateRequest,
  deskResponse,
  reassignInspectionRequest,
  type ChangeDueDateRequest,
  type ReassignInspectionRequest,
} from '#shared/contracts/desk.ts';
import { id } from '#shared/contracts/fields.ts';
import type { DeskService } from './desk.service.ts';

/** What the desk changes of inspections; theirs to know how. */
interface Changes {
  reassign: (
    principal: SitePrincipal,
    inspectionId: number,
    request: ReassignInspectionRequest,
  ) => Promise<void>;
  changeDueDate: (
    principal: SitePrincipal,
    inspectionId: number,
    request: ChangeDueDateRequest,
  ) => Promise<void>;
  remind: (principal: SitePrincipal, inspectionId: number) => Promise<void>;
}

const params = z.object({ siteId: id, inspectionId: id });

/** The lead's desk. */
export const deskRoutes = (desk: DeskService, changes: Changes) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/desk',
    access: only('lead'),
    response: deskResponse,
    handle: ({ principal }) => desk.desk(principal),
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/inspections/:inspectionId/reassign',
    access: only('lead'),
    params,
    body: reassignInspectionRequest,
    response: null,
    handle: ({ principal, params: { inspectionId }, body }) =>
      changes.reassign(principal, inspectionId, body),
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/inspections/:inspectionId/due-date',
    access: only('lead'),
    params,
    body: changeDueDateRequest,
    response: null,
    handle: ({ principal, params: { inspectionId }, body }) =>
      changes.changeDueDate(principal, inspectionId, body),
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/inspections/:inspectionId/remind',
    access: only('lead'),
    params,
    response: null,
    handle: ({ principal, params: { inspectionId } }) => changes.remind(principal, inspectionId),
  }),
];
