import { z } from 'zod';
import { isoDate, line, numberBetween, paragraph } from './fields.ts';

/** The mating pairs of a bearing position. */
export const seatNames = ['shaft', 'housing'] as const;
export const seatName = z.enum(seatNames);
export type SeatName = z.infer<typeof seatName>;

export const fitSources = ['drawing', 'mounting', 'inspection'] as const;
export const fitSource = z.enum(fitSources);
export type FitSource = z.infer<typeof fitSource>;

/** What a seat looked like, in the words of ISO 15243 where that standard has them. */
export const seatConditions = [
  'sound',
  'fretting corrosion',
  'creep marks',
  'adhesive wear',
  'abrasive wear',
  'moisture corrosion',
  'plastic deformation',
  'cracked',
] as const;
export const seatCondition = z.enum(seatConditions);
export type SeatCondition = z.infer<typeof seatCondition>;

/** Whether a loose fit is held by adhesive on purpose, as on some small mass-made machines. */
export const seatBondings = ['bonded', 'not bonded'] as const;
export const seatBonding = z.enum(seatBondings);
export type SeatBonding = z.infer<typeof seatBonding>;

/** In which unit the diameters of a record were read; they are kept in millimetres all the same. */
export const diameterUnits = ['mm', 'in'] as const;
export const diameterUnit = z.enum(diameterUnits);
export type DiameterUnit = z.infer<typeof diameterUnit>;

/** Whether a seat is told as it was met or as it was left after the work. */
export const seatStages = ['as found', 'as left'] as const;
export const seatStage = z.enum(seatStages);
export type SeatStage = z.infer<typeof seatStage>;

// Wide on purpose: a slip of unit is told from the nominal size, in words that help.
const diameterMm = numberBetween(0.001, 5_000_000, 'mm');

export const createFitRecordRequest = z
  .strictObject({
    seat: seatName,
    recordedOn: isoDate,
    source: fitSource,
    toleranceClass: line(8, 'a tolerance class such as k5').nullable().default(null),
    seatMeasuredMm: diameterMm.nullable().default(null),
    ringMeasuredMm: diameterMm.nullable().default(null),
    diameterUnit: diameterUnit.default('mm'),
    /** Of a tapered seat, which is judged by these instead of diameters. */
    driveUpMm: z
      .number('Enter a number in mm.')
      .min(0, 'A ring is driven up, not down: the drive-up can’t be negative.')
      .max(100, 'At most 100 mm.')
      .nullable()
      .default(null),
    clearanceReductionUm: z
      .number('Enter a number in µm.')
      .min(0, 'Driving up takes clearance away: its loss can’t be negative.')
      .max(2000, 'At most 2000 µm.')
      .nullable()
      .default(null),
    bonding: seatBonding.nullable().default(null),
    condition: seatCondition.nullable().default(null),
    note: paragraph(2000).nullable().default(null),
  })
  .refine(
    (record) =>
      [
        record.toleranceClass,
        record.seatMeasuredMm,
        record.driveUpMm,
        record.clearanceReductionUm,
        record.bonding,
        record.condition,
      ].some((value) => value !== null),
    {
      path: ['toleranceClass'],
      message: 'Enter at least a tolerance class, a measured diameter, a drive-up or a condition.',
    },
  );
export type CreateFitRecordRequest = z.infer<typeof createFitRecordRequest>;

/** Entered by hand; a second record of a seat and date must say that it corrects the first. */
export const addFitRecordRequest = createFitRecordRequest.safeExtend({
  correctsSameDay: z.boolean().default(false),
});
export type AddFitRecordRequest = z.infer<typeof addFitRecordRequest>;

export const fitRecordResponse = z.object({
  id: z.int(),
  bearingPositionId: z.int(),
  seat: seatName,
  recordedOn: z.string(),
  source: fitSource,
  toleranceClass: z.string().nullable(),
  seatMeasuredMm: z.number().nullable(),
  ringMeasuredMm: z.number().nullable(),
  diameterUnit,
  driveUpMm: z.number().nullable(),
  clearanceReductionUm: z.number().nullable(),
  bonding: seatBonding.nullable(),
  condition: seatCondition.nullable(),
  /** Of an inspection: before or after the work. */
  stage: seatStage.nullable(),
  note: z.string().nullable(),
  inspectionId: z.int().nullable(),
  recordedByName: z.string(),
});
export type FitRecordResponse = z.infer<typeof fitRecordResponse>;
