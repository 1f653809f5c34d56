import { z } from 'zod';
import { anyoneBecause, only } from '#server/auth/access.ts';
import { handled, route } from '#server/http/route.ts';
import { calendarAddressResponse, calendarFeedResponse } from '#shared/contracts/calendar.ts';
import type { CalendarService } from './calendar.service.ts';

const path = '/api/sites/:siteId/calendar-feed';

/** The calendar of inspections due. */
export const calendarRoutes = (calendar: CalendarService) => [
  route({
    method: 'get',
    path,
    access: only('lead', 'owner'),
    response: calendarFeedResponse,
    handle: ({ principal }) => calendar.standing(principal),
  }),
  route({
    method: 'post',
    path,
    status: 201,
    access: only('lead', 'owner'),
    response: calendarAddressResponse,
    handle: ({ principal }) => calendar.make(principal),
  }),
  route({
    method: 'delete',
    path,
    access: only('lead', 'owner'),
    response: null,
    handle: ({ principal }) => calendar.revoke(principal),
  }),
  route({
    method: 'get',
    path: '/api/calendar/:token.ics',
    access: anyoneBecause(
      'calendar programs can’t sign in; the secret in the address is the proof',
    ),
    params: z.object({ token: z.string().max(100) }),
    response: 'binary',
    handle: async ({ params, res }) => {
      const text = await calendar.read(params.token);
      res.type('text/calendar; charset=utf-8').send(text);
      return handled;
    },
  }),
];
