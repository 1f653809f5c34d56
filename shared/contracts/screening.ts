import { z } from 'zod';
import {
  loosenessKinds,
  speedSources,
  truncationSides,
  verdicts,
  type ScreeningResult,
} from '../signal/screening-types.ts';
import { quantity } from './waveform.ts';

export const verdict = z.enum(verdicts);

export const orderLine = z.object({
  order: z.number(),
  frequencyHz: z.number(),
  velocityMmPerSRms: z.number(),
  amplitudePeak: z.number(),
  floorMmPerSRms: z.number(),
  prominenceDb: z.number(),
  pNoise: z.number(),
  explainedBy: z.string().nullable(),
});

/** A screening's result as it travels and as the table keeps it (see screening-types for the meaning). */
export const screeningResult = z.object({
  verdict,
  score: z.number().nullable(),
  kind: z.enum(loosenessKinds).nullable(),
  speed: z.object({
    speedHz: z.number().nullable(),
    source: z.enum(speedSources),
    intervalHz: z.tuple([z.number(), z.number()]).readonly().nullable(),
    alternatives: z.array(z.object({ speedHz: z.number(), reason: z.string() })).readonly(),
  }),
  orders: z.array(orderLine).readonly(),
  harmonicRun: z.object({
    length: z.int(),
    from: z.number(),
    to: z.number(),
    pChance: z.number(),
    significantOfFirst10: z.int(),
    significantOfFirst20: z.int(),
    slopeDbPerOrder: z.number().nullable(),
    halfOrderCount: z.int(),
    thirdOrderCount: z.int(),
  }),
  truncation: z.object({
    side: z.enum(truncationSides),
    share: z.number(),
    expectedShare: z.number(),
    instrument: z.boolean(),
    ranges: z.array(z.tuple([z.int(), z.int()]).readonly()).readonly(),
  }),
  overallVelocity: z
    .object({ mmPerSRms: z.number(), fromHz: z.number(), toHz: z.number() })
    .nullable(),
  quality: z
    .array(
      z.object({
        code: z.string(),
        forcesRetake: z.boolean(),
        message: z.string(),
        advice: z.string(),
      }),
    )
    .readonly(),
  evidence: z.array(z.object({ for: z.boolean(), text: z.string() })).readonly(),
  lookAlikes: z
    .array(z.object({ name: z.string(), ruledOut: z.boolean(), reason: z.string() }))
    .readonly(),
  quantity,
  revolutions: z.number().nullable(),
  methodVersion: z.string(),
  limits: z.object({
    suspectedScore: z.number(),
    likelyScore: z.number(),
    minRevolutions: z.number(),
    minOrdersInBand: z.number(),
  }),
}) satisfies z.ZodType<ScreeningResult>;

export const screeningResponse = z.object({
  id: z.int(),
  waveformId: z.int(),
  run: z.int(),
  result: screeningResult,
  screenedAt: z.string(),
  decision: z.string().nullable(),
  decisionReason: z.string().nullable(),
  decidedByName: z.string().nullable(),
  decidedAt: z.string().nullable(),
  /** The finding this screening belongs to, where it was accepted. */
  findingId: z.int().nullable(),
});
export type ScreeningResponse = z.infer<typeof screeningResponse>;
