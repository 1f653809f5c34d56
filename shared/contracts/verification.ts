import { z } from 'zod';
import { verificationProposals } from '../verification/verify-repair.ts';
import { verdict } from './screening.ts';

/** One record of a point, as a verification compares it. */
export const verificationReadingResponse = z.object({
  surveyedOn: z.string(),
  verdict,
  score: z.number().nullable(),
  /** Consecutive orders that stand out. */
  runLength: z.int(),
  /** Orders 2–10 together. */
  runMmPerSRms: z.number(),
  overallMmPerSRms: z.number().nullable(),
  speedRpm: z.number().nullable(),
});
export type VerificationReadingResponse = z.infer<typeof verificationReadingResponse>;

export const verificationResponse = z.object({
  /** The day the owner reported the repair. */
  repairedOn: z.string(),
  /** Surveys after the repair that measured the position. */
  surveyCount: z.int(),
  /** Null until there is one. */
  comparison: z
    .object({
      surveyedOn: z.string(),
      proposal: z.enum(verificationProposals),
      sentence: z.string(),
      points: z.array(
        z.object({
          pointLabel: z.string(),
          /** What became of the signs, in a few words; the sentence adds the numbers. */
          outcome: z.string(),
          sentence: z.string(),
          before: verificationReadingResponse.nullable(),
          after: verificationReadingResponse.nullable(),
        }),
      ),
      /** What was measured otherwise than before the repair. */
      conditions: z.array(z.string()),
    })
    .nullable(),
});
export type VerificationResponse = z.infer<typeof verificationResponse>;
