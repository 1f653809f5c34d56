import { z } from 'zod';
import { only } from '#server/auth/access.ts';
import { route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import {
  decideRequest,
  decideResponse,
  reviewQueueQuery,
  reviewQueueResponse,
} from '#shared/contracts/review.ts';
import { presentQueueItem } from './review.presenter.ts';
import type { ReviewService } from './review.service.ts';

const screeningParams = z.object({ siteId: id, screeningId: id });

/** The review desk. */
export const reviewRoutes = (review: ReviewService) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/review-queue',
    access: only('analyst', 'lead'),
    query: reviewQueueQuery,
    response: reviewQueueResponse,
    handle: async ({ principal, query }) => {
      const { rows, total } = await review.queue(principal, query);
      return {
        items: rows.flatMap(presentQueueItem),
        total,
        page: query.page,
        pageSize: query.pageSize,
      };
    },
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/screenings/:screeningId/decision',
    access: only('analyst', 'lead'),
    params: screeningParams,
    body: decideRequest,
    response: decideResponse,
    handle: ({ principal, params, body }) => review.decide(principal, params.screeningId, body),
  }),
  route({
    method: 'delete',
    path: '/api/sites/:siteId/screenings/:screeningId/decision',
    access: only('analyst', 'lead'),
    params: screeningParams,
    response: null,
    handle: ({ principal, params }) => review.undo(principal, params.screeningId),
  }),
];
