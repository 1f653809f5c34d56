import { only } from '#server/auth/access.ts';
import { route } from '#server/http/route.ts';
import { outcomesResponse } from '#shared/contracts/outcomes.ts';
import type { OutcomesService } from './outcomes.service.ts';

/** How often the flags proved right. */
export const outcomesRoutes = (outcomes: OutcomesService) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/outcomes',
    access: only('analyst', 'lead'),
    response: outcomesResponse,
    handle: ({ principal }) => outcomes.outcomes(principal),
  }),
];
