import { z } from 'zod';
import { inspectionOutcome } from './inspection.ts';
import { machineKind } from './machine.ts';
import { paragraph } from './fields.ts';
import { reviewDecision } from './review.ts';
import { verdict } from './screening.ts';

const scoreOf = (number: z.ZodNumber | z.ZodCoercedNumber) =>
  number.min(0, 'A score lies between 0 and 1.').max(1, 'A score lies between 0 and 1.');

const bothOrNone = (limits: { suspectedScore?: number | null; likelyScore?: number | null }) =>
  (limits.suspectedScore ?? null) === null
    ? (limits.likelyScore ?? null) === null
    : (limits.likelyScore ?? null) !== null;
const bothFault = { path: ['likelyScore'], message: 'Give both limits.' };

const inOrder = ({
  suspectedScore,
  likelyScore,
}: {
  suspectedScore?: number | null;
  likelyScore?: number | null;
}) => suspectedScore == null || likelyScore == null || suspectedScore <= likelyScore;
const orderFault = {
  path: ['suspectedScore'],
  message: 'Suspicion begins at or below the limit of likely.',
};

export const verdictLimits = z.object({ suspectedScore: z.number(), likelyScore: z.number() });
export type VerdictLimitsResponse = z.infer<typeof verdictLimits>;

/** Limits for the site, or for one kind of its machines. */
export const limitsInForce = z.object({
  /** Null for the whole site. */
  machineKind: machineKind.nullable(),
  ...verdictLimits.shape,
  /** False where the kind follows the site, or the site the method. */
  own: z.boolean(),
  machineCount: z.int(),
});
export type LimitsInForce = z.infer<typeof limitsInForce>;

export const limitsResponse = z.object({
  site: limitsInForce,
  /** Kinds of machines that the site has, or has set limits for. */
  kinds: z.array(limitsInForce),
  /** What the method proposes. */
  method: verdictLimits,
  history: z.array(
    z.object({
      id: z.int(),
      machineKind: machineKind.nullable(),
      suspectedScore: z.number().nullable(),
      likelyScore: z.number().nullable(),
      reason: z.string(),
      changedByName: z.string(),
      changedAt: z.string(),
    }),
  ),
  /** Of the newest change, 0 before the first: two leads are told apart by it. */
  version: z.int(),
});
export type LimitsResponse = z.infer<typeof limitsResponse>;

/** Limits to try; without scores the kind follows the site, and the site the method. */
export const tryLimitsQuery = z
  .object({
    machineKind: machineKind.optional(),
    suspectedScore: scoreOf(z.coerce.number('Enter a number.')).optional(),
    likelyScore: scoreOf(z.coerce.number('Enter a number.')).optional(),
  })
  .refine(bothOrNone, bothFault)
  .refine(inOrder, orderFault);
export type TryLimitsQuery = z.infer<typeof tryLimitsQuery>;

/** A screening whose verdict would change. */
export const changedFlag = z.object({
  screeningId: z.int(),
  surveyId: z.int(),
  surveyedOn: z.string(),
  machineTag: z.string(),
  positionName: z.string(),
  pointLabel: z.string(),
  score: z.number(),
  /** By the limits in force, and by those on trial. */
  verdictNow: verdict,
  verdictThen: verdict,
  /** As it was given with the limits of its day. */
  verdictGiven: verdict,
  decision: reviewDecision.nullable(),
  /** What the first inspection of the bearing position said that was reported after the survey. */
  inspection: z.object({ outcome: inspectionOutcome, reportedOn: z.string() }).nullable(),
});
export type ChangedFlag = z.infer<typeof changedFlag>;

const trialCount = {
  flagCount: z.int(),
  /** Of these flags. */
  looseCount: z.int(),
  notLooseCount: z.int(),
};

export const limitsTrialResponse = z.object({
  now: verdictLimits,
  tried: verdictLimits,
  /** Judged screenings of the machines that the limits are for. */
  screeningCount: z.int(),
  flagsNowCount: z.int(),
  flagsThenCount: z.int(),
  coming: z.object(trialCount),
  going: z.object(trialCount),
  /** Flags that stay but change between suspected and likely. */
  changingCount: z.int(),
  /** Screenings made with another version of the method than the present one. */
  otherMethodCount: z.int(),
  /** Highest score first; no more than `shownMax` of them. */
  changes: z.array(changedFlag),
});
export type LimitsTrialResponse = z.infer<typeof limitsTrialResponse>;

/** So many changes are listed. */
export const shownMax = 200;

export const setLimitsRequest = z
  .strictObject({
    /** Null for the whole site. */
    machineKind: machineKind.nullable(),
    /** Both null: the kind follows the site, the site the method. */
    suspectedScore: scoreOf(z.number('Enter a number.')).nullable(),
    likelyScore: scoreOf(z.number('Enter a number.')).nullable(),
    reason: paragraph(2000).min(1, 'Give a reason.'),
    version: z.int().min(0),
  })
  .refine(bothOrNone, bothFault)
  .refine(inOrder, orderFault);
export type SetLimitsRequest = z.infer<typeof setLimitsRequest>;
