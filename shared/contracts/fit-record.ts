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

const diameterMm = numberBetween(1, 3000, 'mm');

export const createFitRecordRequest = z
  .strictObject({
    seat: seatName,
    recordedOn: isoDate,
    source: fitSource,
    toleranceClass: line(8, 'a tolerance class such as k5').nullable().default(null),
    seatMeasuredMm: diameterMm.nullable().default(null),
    ringMeasuredMm: diameterMm.nullable().default(null),
    condition: seatCondition.nullable().default(null),
    note: paragraph(2000).nullable().default(null),
  })
  .refine(
    (record) =>
      record.toleranceClass !== null || record.seatMeasuredMm !== null || record.condition !== null,
    {
      path: ['toleranceClass'],
      message: 'Enter at least a tolerance class, a measured diameter or a condition.',
    },
  );
export type CreateFitRecordRequest = z.infer<typeof createFitRecordRequest>;

export const fitRecordResponse = z.object({
  id: z.int(),
  bearingPositionId: z.int(),
  seat: seatName,
  recordedOn: z.string(),
  source: fitSource,
  toleranceClass: z.string().nullable(),
  seatMeasuredMm: z.number().nullable(),
  ringMeasuredMm: z.number().nullable(),
  condition: seatCondition.nullable(),
  note: z.string().nullable(),
  inspectionId: z.int().nullable(),
  recordedByName: z.string(),
});
export type FitRecordResponse = z.infer<typeof fitRecordResponse>;
