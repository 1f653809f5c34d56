import { z } from 'zod';
import { id, paragraph } from './fields.ts';
import { listResponse } from './list.ts';
import { direction } from './measuring-point.ts';
import { orderCell } from './order-cells.ts';
import { verdict } from './screening.ts';

export const reviewDecisions = ['accepted', 'rejected', 'retake'] as const;
export const reviewDecision = z.enum(reviewDecisions);
export type ReviewDecision = z.infer<typeof reviewDecision>;

/** The queue: flags that nobody has decided, worst first. */
export const reviewQueueQuery = z.object({
  surveyId: id.optional(),
  verdict: verdict.optional(),
  /** 'open' (default) for what waits for a decision, 'decided' for what has one. */
  show: z.enum(['open', 'decided']).default('open'),
  page: z.coerce.number().int().min(1).default(1),
  pageSize: z.coerce.number().int().min(1).max(200).default(100),
});
export type ReviewQueueQuery = z.infer<typeof reviewQueueQuery>;

export const reviewQueueItem = z.object({
  screeningId: z.int(),
  waveformId: z.int(),
  surveyId: z.int(),
  surveyedOn: z.string(),
  pointLabel: z.string(),
  machineId: z.int(),
  machineTag: z.string(),
  machineName: z.string(),
  positionName: z.string(),
  direction,
  verdict,
  score: z.number().nullable(),
  kind: z.string().nullable(),
  speedRpm: z.number().nullable(),
  orders: z.array(orderCell),
  decision: reviewDecision.nullable(),
  decidedByName: z.string().nullable(),
});
export type ReviewQueueItem = z.infer<typeof reviewQueueItem>;
export const reviewQueueResponse = listResponse(reviewQueueItem);
export type ReviewQueueResponse = z.infer<typeof reviewQueueResponse>;

/** Rejecting and asking for a retake need a reason; accepting may have one. */
export const decideRequest = z
  .strictObject({ decision: reviewDecision, reason: paragraph(2000).default('') })
  .refine((body) => body.decision === 'accepted' || body.reason.length > 0, {
    path: ['reason'],
    message: 'Give a reason.',
  });
export type DecideRequest = z.infer<typeof decideRequest>;

export const decideResponse = z.object({
  screeningId: z.int(),
  decision: reviewDecision,
  /** The finding that was made or extended by accepting. */
  findingId: z.int().nullable(),
  findingIsNew: z.boolean(),
});
export type DecideResponse = z.infer<typeof decideResponse>;
