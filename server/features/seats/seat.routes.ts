import { z } from 'zod';
import { anyMember } from '#server/auth/access.ts';
import { route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import { seatName } from '#shared/contracts/fit-record.ts';
import { seatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import { seatHistoryResponse } from '#shared/contracts/seat-history.ts';
import type { SeatHistoryService } from './seat-history.service.ts';
import type { SeatService } from './seat.service.ts';

/** What the records of a position's seats mean. */
export const seatRoutes = (seats: SeatService, histories: SeatHistoryService) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/positions/:positionId/seats',
    access: anyMember(),
    params: z.object({ siteId: id, positionId: id }),
    response: seatAssessmentsResponse,
    handle: ({ principal, params }) => seats.ofPosition(principal, params.positionId),
  }),
  route({
    method: 'get',
    path: '/api/sites/:siteId/positions/:positionId/seats/:seat/history',
    access: anyMember(),
    params: z.object({ siteId: id, positionId: id, seat: seatName }),
    response: seatHistoryResponse,
    handle: ({ principal, params }) => histories.ofSeat(principal, params.positionId, params.seat),
  }),
];
