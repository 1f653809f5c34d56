import { z } from 'zod';
import { administrator, only } from '#server/auth/access.ts';
import { route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import { outboxQuery, outboxResponse } from '#shared/contracts/mail.ts';
import type { OutboxService } from './outbox.service.ts';

/** The mails on their way, with their faults. */
export const outboxRoutes = (outbox: OutboxService) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/mails',
    access: only('lead'),
    query: outboxQuery,
    response: outboxResponse,
    handle: ({ principal, query }) => outbox.list(principal.siteId, query),
  }),
  route({
    method: 'post',
    path: '/api/sites/:siteId/mails/:mailId/send-again',
    access: only('lead'),
    params: z.object({ siteId: id, mailId: id }),
    response: null,
    handle: ({ principal, params }) => outbox.sendAgain(principal, principal.siteId, params.mailId),
  }),
  route({
    method: 'get',
    path: '/api/administration/mails',
    access: administrator(),
    query: outboxQuery,
    response: outboxResponse,
    handle: ({ query }) => outbox.list(null, query),
  }),
  route({
    method: 'post',
    path: '/api/administration/mails/:mailId/send-again',
    access: administrator(),
    params: z.object({ mailId: id }),
    response: null,
    handle: ({ principal, params }) => outbox.sendAgain(principal, null, params.mailId),
  }),
];
