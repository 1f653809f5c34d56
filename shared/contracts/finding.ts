import { z } from 'zod';
import { id, isoDate, line, paragraph } from './fields.ts';
import { inspectionListItem } from './inspection.ts';
import { listQuery, listResponse } from './list.ts';
import { direction } from './measuring-point.ts';
import { orderCell } from './order-cells.ts';
import { verdict } from './screening.ts';
import { seatAssessmentsResponse } from './seat-assessment.ts';
import { verificationResponse } from './verification.ts';

export const findingStates = [
  'open',
  'inspecting',
  'monitoring',
  'repaired',
  'verified',
  'dismissed',
] as const;
export const findingState = z.enum(findingStates);
export type FindingState = z.infer<typeof findingState>;

export const findingListQuery = listQuery(['openedAt', 'state', 'machineTag', 'score']).extend({
  direction: z.enum(['asc', 'desc']).default('desc'),
  state: findingState.optional(),
  /** Leaves out what is verified or dismissed. */
  active: z.stringbool().optional(),
  /** Only monitored ones on which the lead has to decide again. */
  overdue: z.stringbool().optional(),
});
export type FindingListQuery = z.infer<typeof findingListQuery>;

export const findingActions = ['assign', 'monitor', 'dismiss', 'reopen', 'verify'] as const;
export type FindingAction = (typeof findingActions)[number];

/** How long a finding is monitored; without day and count it has no end. */
export const monitoring = z.object({
  since: z.string().nullable(),
  untilOn: z.string().nullable(),
  surveyLimit: z.int().nullable(),
  /** Surveys of the position after the day it began. */
  surveyCount: z.int(),
  /** The day has passed or the surveys are there: the lead decides again. */
  overdue: z.boolean(),
});
export type MonitoringResponse = z.infer<typeof monitoring>;

export const findingListItem = z.object({
  id: z.int(),
  state: findingState,
  openedAt: z.string(),
  machineId: z.int(),
  machineTag: z.string(),
  machineName: z.string(),
  positionCode: z.string(),
  positionName: z.string(),
  ownerName: z.string().nullable(),
  /** Of the screening with the highest score. */
  verdict,
  score: z.number().nullable(),
  kind: z.string().nullable(),
  orders: z.array(orderCell),
  screeningCount: z.int(),
  /** Null unless it is being monitored. */
  monitoring: monitoring.nullable(),
});
export type FindingListItem = z.infer<typeof findingListItem>;
export const findingListResponse = listResponse(findingListItem);
export type FindingListResponse = z.infer<typeof findingListResponse>;

export const findingScreening = z.object({
  screeningId: z.int(),
  waveformId: z.int(),
  surveyedOn: z.string(),
  pointLabel: z.string(),
  direction,
  verdict,
  score: z.number().nullable(),
  speedRpm: z.number().nullable(),
  overallMmPerSRms: z.number().nullable(),
  orders: z.array(orderCell),
  decisionReason: z.string().nullable(),
  decidedByName: z.string().nullable(),
  evidence: z.array(z.object({ for: z.boolean(), text: z.string() })),
});

export type FindingScreeningResponse = z.infer<typeof findingScreening>;

export const stateChangeResponse = z.object({
  id: z.int(),
  subject: z.enum(['finding', 'inspection']),
  fromState: z.string().nullable(),
  toState: z.string(),
  reason: z.string().nullable(),
  changedByName: z.string(),
  changedAt: z.string(),
});
export type StateChangeResponse = z.infer<typeof stateChangeResponse>;

export const findingResponse = findingListItem.extend({
  bearingPositionId: z.int(),
  ownerUserId: z.int().nullable(),
  version: z.int(),
  screenings: z.array(findingScreening),
  seats: seatAssessmentsResponse,
  inspections: z.array(inspectionListItem),
  history: z.array(stateChangeResponse),
  /** The surveys after the repair against what raised the finding; null where none is due. */
  verification: verificationResponse.nullable(),
  can: z.object({
    assign: z.boolean(),
    monitor: z.boolean(),
    dismiss: z.boolean(),
    reopen: z.boolean(),
    verify: z.boolean(),
  }),
});
export type FindingResponse = z.infer<typeof findingResponse>;

/** The lead's decision on a finding; assigning an inspection has its own request. */
export const decideFindingRequest = z
  .strictObject({
    action: z.enum(['monitor', 'dismiss', 'reopen', 'verify']),
    reason: paragraph(2000).min(1, 'Give a reason.'),
    version: z.int().min(1),
    /** Only with `monitor`: the day, the number of surveys or both, whichever comes first. */
    monitorUntilOn: isoDate.nullish(),
    monitorSurveys: z
      .int('Enter a whole number.')
      .min(1, 'At least 1.')
      .max(24, 'At most 24.')
      .nullish(),
  })
  .refine(
    ({ action, monitorUntilOn, monitorSurveys }) =>
      action !== 'monitor' || monitorUntilOn != null || monitorSurveys != null,
    {
      path: ['monitorUntilOn'],
      message: 'Say until which day or for how many surveys.',
      // The other faults of the form are told in the same go.
      when: () => true,
    },
  )
  .refine(
    ({ action, monitorUntilOn, monitorSurveys }) =>
      action === 'monitor' || (monitorUntilOn == null && monitorSurveys == null),
    { path: ['monitorUntilOn'], message: 'Only monitoring has an end.' },
  );
export type DecideFindingRequest = z.infer<typeof decideFindingRequest>;

export const assignInspectionRequest = z
  .strictObject({
    assigneeUserId: id,
    dueOn: isoDate,
    checkShaftSeat: z.boolean(),
    checkHousingSeat: z.boolean(),
    checkInPlace: z.boolean(),
    workOrderReference: line(60, 'the work order').nullable().default(null),
    instructions: paragraph(4000).nullable().default(null),
    version: z.int().min(1),
  })
  .refine((body) => body.checkShaftSeat || body.checkHousingSeat || body.checkInPlace, {
    path: ['checkShaftSeat'],
    message: 'Choose at least one thing to check.',
  });
export type AssignInspectionRequest = z.infer<typeof assignInspectionRequest>;
