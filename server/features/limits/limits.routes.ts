import { only } from '#server/auth/access.ts';
import { route } from '#server/http/route.ts';
import {
  limitsResponse,
  limitsTrialResponse,
  setLimitsRequest,
  tryLimitsQuery,
} from '#shared/contracts/limits.ts';
import type { LimitsService } from './limits.service.ts';

/** Limits of the verdict. */
export const limitsRoutes = (limits: LimitsService) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/limits',
    access: only('lead'),
    response: limitsResponse,
    handle: ({ principal }) => limits.limits(principal),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/limits/trial',
    access: only('lead'),
    query: tryLimitsQuery,
    response: limitsTrialResponse,
    handle: ({ principal, query }) => limits.trial(principal, query),
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/limits',
    access: only('lead'),
    body: setLimitsRequest,
    response: limitsResponse,
    handle: ({ principal, body }) => limits.set(principal, body),
  }),
];
