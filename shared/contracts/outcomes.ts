import { z } from 'zod';
import { machineKind } from './machine.ts';

/** What came of a finding. `unsettled`: inspected, but the owner could not tell. */
export const findingOutcomes = [
  'confirmed',
  'not found',
  'unsettled',
  'dismissed',
  'waiting',
] as const;
export type FindingOutcome = (typeof findingOutcomes)[number];

/** Traits of a flag that are counted against what its inspection found. */
export const outcomeTraits = [
  'machine kind',
  'speed source',
  'kind of looseness',
  'direction',
] as const;
export type OutcomeTrait = (typeof outcomeTraits)[number];

export const outcomeSteps = [
  'survey to inspection',
  'inspection to closing',
  'survey to closing',
] as const;
export type OutcomeStep = (typeof outcomeSteps)[number];

/** Findings of one group, and the share of confirmed ones among those that an inspection settled. */
const outcomeGroup = {
  confirmedCount: z.int(),
  notFoundCount: z.int(),
  unsettledCount: z.int(),
  dismissedCount: z.int(),
  waitingCount: z.int(),
  /** 95 % interval; null where nothing is settled. */
  predictiveValue: z.object({ share: z.number(), low: z.number(), high: z.number() }).nullable(),
};
export const outcomeGroupResponse = z.object(outcomeGroup);
export type OutcomeGroupResponse = z.infer<typeof outcomeGroupResponse>;

export const outcomesResponse = z.object({
  /** Flagged screenings by what the analyst decided. */
  flags: z.object({
    flaggedCount: z.int(),
    acceptedCount: z.int(),
    rejectedCount: z.int(),
    retakeCount: z.int(),
    waitingCount: z.int(),
  }),
  site: outcomeGroupResponse,
  byVerdict: z.array(z.object({ verdict: z.enum(['suspected', 'likely']), ...outcomeGroup })),
  byMachineKind: z.array(z.object({ machineKind, ...outcomeGroup })),
  times: z.array(
    z.object({
      step: z.enum(outcomeSteps),
      medianDays: z.number().nullable(),
      findingCount: z.int(),
    }),
  ),
  /** Flags of findings that an inspection settled, by trait. */
  traits: z.array(
    z.object({
      trait: z.enum(outcomeTraits),
      value: z.string(),
      confirmedCount: z.int(),
      notFoundCount: z.int(),
    }),
  ),
});
export type OutcomesResponse = z.infer<typeof outcomesResponse>;
