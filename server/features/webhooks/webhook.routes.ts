import { z } from 'zod';
import { only } from '#server/auth/access.ts';
import { route } from '#server/http/route.ts';
import { id } from '#shared/contracts/fields.ts';
import { setWebhookRequest, webhookResponse } from '#shared/contracts/webhook.ts';
import type { WebhookService } from './webhook.service.ts';

const path = '/api/sites/:siteId/webhook';

/** The site's webhook. */
export const webhookRoutes = (webhooks: WebhookService) => [
  route({
    method: 'get',
    path,
    access: only('lead'),
    response: webhookResponse,
    handle: ({ principal }) => webhooks.standing(principal),
  }),
  route({
    method: 'put',
    path,
    access: only('lead'),
    body: setWebhookRequest,
    response: webhookResponse,
    handle: ({ principal, body }) => webhooks.set(principal, body),
  }),
  route({
    method: 'delete',
    path,
    access: only('lead'),
    response: null,
    handle: ({ principal }) => webhooks.remove(principal),
  }),
  route({
    method: 'post',
    path: `${path}/deliveries/:deliveryId/send-again`,
    access: only('lead'),
    params: z.object({ siteId: id, deliveryId: id }),
    response: null,
    handle: ({ principal, params }) => webhooks.sendAgain(principal, params.deliveryId),
  }),
];
