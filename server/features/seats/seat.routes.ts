import { z } from 'zod';
import { anyMember } from '#server/auth/access.ts';
import { route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import { seatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import type { SeatService } from './seat.service.ts';

/** What the records of a position's seats mean. */
export const seatRoutes = (seats: SeatService) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/positions/:positionId/seats',
    access: anyMember(),
    params: z.object({ siteId: id, positionId: id }),
    response: seatAssessmentsResponse,
    handle: ({ principal, params }) => seats.ofPosition(principal, params.positionId),
  }),
];
