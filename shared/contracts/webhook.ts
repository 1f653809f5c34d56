import { z } from 'zod';
import { outboxStates } from './mail.ts';

export const webhookSecretMin = 16;

/** Sets where a site's changes are told. Without a secret the present one stays. */
export const setWebhookRequest = z.strictObject({
  url: z
    .url({
      protocol: /^https?$/,
      message: 'Enter an address that begins with https:// or http://.',
    })
    .max(500, 'At most 500 characters.'),
  secret: z
    .string()
    .min(webhookSecretMin, `At least ${webhookSecretMin} characters.`)
    .max(200, 'At most 200 characters.')
    .optional(),
});
export type SetWebhookRequest = z.infer<typeof setWebhookRequest>;

export const webhookDeliveryItem = z.object({
  id: z.int(),
  inspectionId: z.int(),
  toState: z.string(),
  state: z.enum(outboxStates),
  attempts: z.int(),
  lastError: z.string().nullable(),
  createdAt: z.string(),
  sentAt: z.string().nullable(),
  nextAttemptAt: z.string().nullable(),
});
export type WebhookDeliveryItem = z.infer<typeof webhookDeliveryItem>;

/** The secret is never told. */
export const webhookResponse = z.object({
  url: z.string().nullable(),
  since: z.string().nullable(),
  deliveries: z.array(webhookDeliveryItem),
});
export type WebhookResponse = z.infer<typeof webhookResponse>;

/** What is sent, as JSON: one change of state of an inspection. */
export const webhookBody = z.object({
  /** Stays the same in every attempt: a receiver tells a repeat by it. */
  id: z.int(),
  event: z.literal('inspection.state-changed'),
  /** ISO 8601, UTC. */
  changedAt: z.iso.datetime(),
  siteId: z.int(),
  inspectionId: z.int(),
  findingId: z.int(),
  fromState: z.string().nullable(),
  toState: z.string(),
  workOrderReference: z.string().nullable(),
  machineTag: z.string(),
  positionCode: z.string(),
  /** A day, YYYY-MM-DD. */
  dueOn: z.string(),
  link: z.string(),
});
export type WebhookBody = z.infer<typeof webhookBody>;
