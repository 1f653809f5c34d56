import { z } from 'zod';
import { seatTaper } from './bearing-position.ts';
import { findingState } from './finding.ts';
import { fitRecordResponse, seatName } from './fit-record.ts';
import { inspectionOutcome, inspectionState } from './inspection.ts';

/** What the readings behind a record say of one part. */
export const partFigures = z.object({
  part: z.enum(['seat', 'ring']),
  planes: z.array(
    z.object({
      plane: z.union([z.literal(1), z.literal(2)]),
      meanMm: z.number(),
      /** Null below two directions. */
      outOfRoundnessUm: z.number().nullable(),
      readingCount: z.int(),
    }),
  ),
  /** Mean of plane 1 less mean of plane 2; null where one plane was read. */
  taperUm: z.number().nullable(),
  /** Of the mean of all readings, about 95 %. */
  expandedUncertaintyUm: z.number(),
});
export type PartFigures = z.infer<typeof partFigures>;

export const seatHistoryEntry = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('record'),
    on: z.string(),
    record: fitRecordResponse,
    /** A later record of the same day says otherwise and counts instead. */
    corrected: z.boolean(),
    figures: z.array(partFigures),
  }),
  z.object({
    kind: z.literal('finding'),
    on: z.string(),
    findingId: z.int(),
    state: findingState,
  }),
  z.object({
    kind: z.literal('inspection'),
    on: z.string(),
    inspectionId: z.int(),
    state: inspectionState,
    /** What the owner found; null until it is reported. */
    outcome: inspectionOutcome.nullable(),
    workDone: z.string().nullable(),
    checksThisSeat: z.boolean(),
  }),
]);
export type SeatHistoryEntry = z.infer<typeof seatHistoryEntry>;

/** Between two measurements of the seat, the older first. */
export const seatWearStep = z.object({
  fromRecordId: z.int(),
  toRecordId: z.int(),
  fromOn: z.string(),
  toOn: z.string(),
  /** Work lay between them: a change of size is the work's, not wear. */
  isWork: z.boolean(),
  lossUm: z.number(),
  expandedUncertaintyUm: z.number(),
  /** Null for a span too short to speak of years. */
  perYearUm: z.number().nullable(),
  perYearUncertaintyUm: z.number().nullable(),
  isSignificant: z.boolean(),
});
export type SeatWearStep = z.infer<typeof seatWearStep>;

export const seatHistoryResponse = z.object({
  machineId: z.int(),
  machineTag: z.string(),
  positionId: z.int(),
  positionCode: z.string(),
  positionName: z.string(),
  seat: seatName,
  nominalMm: z.number().nullable(),
  taper: seatTaper.nullable(),
  /** Newest first. */
  entries: z.array(seatHistoryEntry),
  /** Newest first. */
  wear: z.array(seatWearStep),
  /** How to measure it next time; null where its size is not known. */
  plan: z
    .object({
      instrument: z.string(),
      /** Distance of each plane from the open end of the seat; null where the width is unknown. */
      planesMm: z.array(z.number()).nullable(),
      directionsDeg: z.array(z.number()),
      steps: z.array(z.string()),
    })
    .nullable(),
});
export type SeatHistoryResponse = z.infer<typeof seatHistoryResponse>;
