import { z } from 'zod';
import { numberBetween, paragraph } from './fields.ts';
import { seatCondition, seatName, seatStage } from './fit-record.ts';
import { inPlaceCheck, inPlaceCheckNames } from './in-place-check.ts';
import { inspectionPhotoResponse } from './inspection-photo.ts';
import { listQuery, listResponse } from './list.ts';
import { seatAssessmentsResponse } from './seat-assessment.ts';

export const inspectionStates = [
  'assigned',
  'accepted',
  'reported',
  'closed',
  'cancelled',
] as const;
export const inspectionState = z.enum(inspectionStates);
export type InspectionState = z.infer<typeof inspectionState>;

/** Two planes across the seat, four directions in each, as a micrometer is set. */
export const planes = [1, 2] as const;
export const readingDirectionsDeg = [0, 45, 90, 135] as const;

export const seatReading = z.strictObject({
  /** The seat itself (shaft, housing bore) or the bearing's ring. */
  part: z.enum(['seat', 'ring']),
  plane: z.union([z.literal(1), z.literal(2)]),
  directionDeg: z.union([z.literal(0), z.literal(45), z.literal(90), z.literal(135)]),
  diameterMm: numberBetween(1, 3000, 'mm'),
});
export type SeatReading = z.infer<typeof seatReading>;

export const inspectionOutcomes = ['loose', 'not loose', 'not clear'] as const;
export const inspectionOutcome = z.enum(inspectionOutcomes);
export type InspectionOutcome = z.infer<typeof inspectionOutcome>;

export const reportedSeat = z.strictObject({
  seat: seatName,
  stage: seatStage.default('as found'),
  condition: seatCondition,
  readings: z.array(seatReading).max(16),
});
export type ReportedSeat = z.infer<typeof reportedSeat>;

/** What the owner found and did. */
export const inspectionReport = z.strictObject({
  /** Cautions must be read and ticked before anything can be reported. */
  cautionsRead: z.literal(true, 'Read the cautions and tick the box first.'),
  outcome: inspectionOutcome,
  seats: z.array(reportedSeat).max(4),
  inPlaceResult: paragraph(2000).nullable(),
  /** What was checked on pedestal, foot or frame before anything was opened, each check once. */
  inPlaceChecks: z
    .array(inPlaceCheck)
    .max(inPlaceCheckNames.length)
    .refine(
      (checks) => new Set(checks.map(({ check }) => check)).size === checks.length,
      'A check is given twice.',
    )
    .default([]),
  /** The cause was found in place: the seats stayed closed. */
  causeInPlace: z.boolean().default(false),
  workDone: paragraph(4000).min(1, 'Say what was done, or that nothing was.'),
  /** True where the fit was put right, so that the next survey can prove it. */
  repaired: z.boolean(),
});
export type InspectionReport = z.infer<typeof inspectionReport>;

export const inspectionListQuery = listQuery(['dueOn', 'state', 'machineTag']).extend({
  state: inspectionState.optional(),
  active: z.stringbool().optional(),
});
export type InspectionListQuery = z.infer<typeof inspectionListQuery>;

export const inspectionListItem = z.object({
  id: z.int(),
  findingId: z.int(),
  state: inspectionState,
  machineId: z.int(),
  machineTag: z.string(),
  machineName: z.string(),
  positionCode: z.string(),
  positionName: z.string(),
  assigneeName: z.string(),
  assignedByName: z.string(),
  assignedAt: z.string(),
  dueOn: z.string(),
  overdue: z.boolean(),
  workOrderReference: z.string().nullable(),
  checkShaftSeat: z.boolean(),
  checkHousingSeat: z.boolean(),
  checkInPlace: z.boolean(),
});
export type InspectionListItem = z.infer<typeof inspectionListItem>;
export const inspectionListResponse = listResponse(inspectionListItem);
export type InspectionListResponse = z.infer<typeof inspectionListResponse>;

export const inspectionResponse = inspectionListItem.extend({
  instructions: z.string().nullable(),
  /** What was seen, in plain words. */
  summary: z.string(),
  seats: seatAssessmentsResponse,
  report: inspectionReport.nullable(),
  reportedAt: z.string().nullable(),
  photos: z.array(inspectionPhotoResponse),
  version: z.int(),
  can: z.object({
    accept: z.boolean(),
    report: z.boolean(),
    close: z.boolean(),
    cancel: z.boolean(),
    /** An assignee who isn't the machine's owner sees the task, not the finding behind it. */
    seeFinding: z.boolean(),
  }),
});
export type InspectionResponse = z.infer<typeof inspectionResponse>;

/** Accept, cancel, close: a step with the version it was decided on. */
export const inspectionStepRequest = z.strictObject({
  version: z.int().min(1),
  reason: paragraph(2000).default(''),
});
export type InspectionStepRequest = z.infer<typeof inspectionStepRequest>;

export const reportInspectionRequest = z.strictObject({
  version: z.int().min(1),
  report: inspectionReport,
});
export type ReportInspectionRequest = z.infer<typeof reportInspectionRequest>;
