import { z } from 'zod';
import { only } from '#server/auth/access.ts';
import { route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import { pointChoicesResponse } from '#shared/contracts/measuring-point.ts';
import {
  createRouteRequest,
  routeListQuery,
  routeListResponse,
  routeResponse,
  updateRouteRequest,
} from '#shared/contracts/route.ts';
import type { RouteService } from './route.service.ts';

const routeParams = z.object({ siteId: id, routeId: id });

/** Routes and the measuring points they are made of. */
export const routeRoutes = (routes: RouteService) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/points',
    access: only('analyst', 'lead'),
    response: pointChoicesResponse,
    handle: async ({ principal }) => ({ points: await routes.pointChoices(principal) }),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/routes',
    access: only('analyst', 'lead'),
    query: routeListQuery,
    response: routeListResponse,
    handle: async ({ principal, query }) => {
      const { rows, total } = await routes.list(principal, query);
      return { items: rows, total, page: query.page, pageSize: query.pageSize };
    },
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/routes',
    status: 201,
    access: only('lead'),
    body: createRouteRequest,
    response: routeResponse,
    handle: ({ principal, body }) => routes.create(principal, body),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/routes/:routeId',
    access: only('analyst', 'lead'),
    params: routeParams,
    response: routeResponse,
    handle: ({ principal, params }) => routes.whole(principal, params.routeId),
  }),
  route({
    method: 'patch',
    path: '/api/sites/:siteId/routes/:routeId',
    access: only('lead'),
    params: routeParams,
    body: updateRouteRequest,
    response: routeResponse,
    handle: ({ principal, params, body }) => routes.update(principal, params.routeId, body),
  }),
];
