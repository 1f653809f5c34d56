import { z } from 'zod';
import { anyMember, only } from '#server/auth/access.ts';
import { route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import {
  decideFindingRequest,
  findingListQuery,
  findingListResponse,
  findingResponse,
} from '#shared/contracts/finding.ts';
import { presentFinding, presentFindingItem } from './finding.presenter.ts';
import type { FindingService } from './finding.service.ts';

const findingParams = z.object({ siteId: id, findingId: id });

/** Findings and the lead's decisions on them. */
export const findingRoutes = (findings: FindingService) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/findings',
    access: anyMember(),
    query: findingListQuery,
    response: findingListResponse,
    handle: async ({ principal, query }) => {
      const { rows, total } = await findings.list(principal, query);
      return {
        items: rows.map(({ finding, links, monitoring }) =>
          presentFindingItem(finding, links, monitoring),
        ),
        total,
        page: query.page,
        pageSize: query.pageSize,
      };
    },
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/findings/:findingId',
    access: anyMember(),
    params: findingParams,
    response: findingResponse,
    handle: async ({ principal, params }) =>
      presentFinding(principal, await findings.whole(principal, params.findingId)),
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/findings/:findingId/decision',
    access: only('lead'),
    params: findingParams,
    body: decideFindingRequest,
    response: findingResponse,
    handle: async ({ principal, params, body }) =>
      presentFinding(principal, await findings.decide(principal, params.findingId, body)),
  }),
];
